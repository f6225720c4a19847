import type { Stress } from './ladderStress';
import type { Place } from './place';
import type { Sampler } from './sampler';

/** The largest of each over all places and cases. */
export interface StressFigures {
  readonly peakVoltageV: number;
  readonly rmsCurrentA: number;
  readonly dissipationW: number;
}

export interface WorstStress {
  /** From the load on; null where something in the places is not known. */
  readonly elements: readonly StressFigures[] | null;
  readonly load: StressFigures | null;
  readonly reason: string | null;
}

/** The worst of each element and of the load over all cases. A worst over half of the points would mislead: then none. */
export function worstStress(sampler: Sampler, places: readonly Place[]): WorstStress {
  const figures = Array.from({ length: sampler.ladder.length + 1 }, () => ({ peakVoltageV: 0, rmsCurrentA: 0, dissipationW: -Infinity }));
  for (const place of places) {
    for (let at = 0; at < sampler.problem.cases.length; at++) {
      const trace = sampler.trace(place, at);
      if (trace.reason !== null) return { elements: null, load: null, reason: trace.reason };
      trace.stress().forEach((stress, k) => {
        figures[k].peakVoltageV = largest(stress, 'peakVoltageV', figures[k].peakVoltageV);
        figures[k].rmsCurrentA = largest(stress, 'rmsCurrentA', figures[k].rmsCurrentA);
        figures[k].dissipationW = largest(stress, 'dissipationW', figures[k].dissipationW);
      });
    }
  }
  if (!figures.every((each) => Object.values(each).every(Number.isFinite))) {
    return { elements: null, load: null, reason: 'voltage and current have no value there' };
  }
  return { elements: figures.slice(0, -1), load: figures[figures.length - 1], reason: null };
}

function largest(stress: Stress, figure: keyof Stress, before: number): number {
  let worst = before;
  for (const value of stress[figure]) worst = value > worst || Number.isNaN(value) ? value : worst;
  return worst;
}
