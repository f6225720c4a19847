import { cascade, type Cascade } from '../network/cascade';
import type { ComplexArray } from '../network/complex';
import type { Element } from '../network/element';
import { efficiency, powerWaveReflection, transducerGain } from '../network/figures';
import { sampleImpedance, type Immittance } from '../network/immittance';
import type { Impedance } from '../network/impedance';
import { throughNetwork } from '../network/throughElements';
import { ladderStress, type Stress } from './ladderStress';
import { named } from './obstacles';
import type { Place } from './place';
import type { Problem } from './problem';
import { sampleLoad, sampleSource } from './sampleCase';
import { uncoveredElement } from './uncoveredElement';

/** One load through the ladder at the frequencies of one place. Figures are worked out when first asked for. */
export interface Trace {
  /** Null for a single load, and for a goal's own (`into`). */
  readonly caseName: string | null;
  readonly frequencyHz: Float64Array;
  readonly load: Immittance;
  readonly source: Immittance;
  readonly network: Cascade;
  /** Looking into the ladder from the source. */
  input(): Immittance;
  /** 0 where the load, the source or an element is not known. */
  readonly known: Uint8Array;
  readonly firstUnknown: number | null;
  /** Why the first point that is not known is so. */
  readonly reason: string | null;
  /** Against the source, power waves. */
  reflection(): ComplexArray;
  /** Transducer gain as a power ratio. */
  gain(): Float64Array;
  /** 0 … 1; NaN where no power enters the ladder. */
  efficiency(): Float64Array;
  /** Of each element, from the load on, and last of the load, at the power available. */
  stress(): readonly Stress[];
}

/** Samples of one problem with one ladder, shared between everything that asks for the same place and load. */
export interface Sampler {
  readonly problem: Problem;
  readonly ladder: readonly Element[];
  /** `load`: a case by its index, or an impedance instead of every case. */
  trace(place: Place, load: number | Impedance): Trace;
}

interface Grid {
  readonly network: Cascade;
  readonly source: Immittance;
  readonly traces: Map<number | Impedance, Trace>;
}

export function sampler(problem: Problem, ladder: readonly Element[]): Sampler {
  const grids = new Map<string | Float64Array, Grid>();
  const gridOf = (place: Place): Grid => {
    const found = place.key === null ? undefined : grids.get(place.key);
    if (found) return found;
    const grid: Grid = {
      network: cascade(ladder, place.frequencyHz),
      source: sampleSource(problem.source, problem.bands, place.frequencyHz, place.band),
      traces: new Map(),
    };
    if (place.key !== null) grids.set(place.key, grid);
    return grid;
  };
  return {
    problem,
    ladder,
    trace(place, load) {
      const grid = gridOf(place);
      const found = grid.traces.get(load);
      if (found) return found;
      const made = makeTrace(problem, ladder, place, grid, load);
      grid.traces.set(load, made);
      return made;
    },
  };
}

function makeTrace(problem: Problem, ladder: readonly Element[], place: Place, grid: Grid, which: number | Impedance): Trace {
  const { frequencyHz } = place;
  const { network, source } = grid;
  const ofCase = typeof which === 'number';
  const caseName = ofCase ? problem.cases[which].name : null;
  const load = ofCase ? sampleLoad(problem.cases[which], frequencyHz) : sampleImpedance(which, frequencyHz);
  const known = new Uint8Array(frequencyHz.length);
  let firstUnknown: number | null = null;
  for (let k = 0; k < known.length; k++) {
    known[k] = load.known[k] & network.known[k] & source.known[k];
    if (!known[k] && firstUnknown === null) firstUnknown = k;
  }
  const input = once(() => throughNetwork(network, load));
  const loadName = caseName === null ? 'load' : `load ${caseName}`;
  return {
    caseName, frequencyHz, load, source, network, input, known, firstUnknown,
    reason: firstUnknown === null ? null : reasonAt(firstUnknown, loadName, load, source, ladder, network),
    reflection: once(() => powerWaveReflection(input(), source)),
    gain: once(() => transducerGain(network, source, load)),
    efficiency: once(() => efficiency(network, load)),
    stress: once(() => ladderStress(ladder, load, source, frequencyHz, problem.availablePowerW)),
  };
}

function reasonAt(k: number, loadName: string, load: Immittance, source: Immittance, ladder: readonly Element[], network: Cascade): string {
  if (!load.known[k]) return named(loadName, load.reason ?? 'not known there');
  if (network.known[k]) return named('source', source.reason ?? 'not known there');
  return uncoveredElement(ladder, network.frequencyHz[k]) ?? network.reason ?? 'the ladder is not known there';
}

function once<T>(make: () => T): () => T {
  let made: { readonly value: T } | null = null;
  return () => (made ??= { value: make() }).value;
}
