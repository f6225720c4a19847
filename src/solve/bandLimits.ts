import { impedanceOf } from '../network/immittance';
import type { Band, LoadCase, Problem } from '../study/problem';
import { sampleLoad } from '../study/sampleCase';
import { bodeFanoLimit, type MatchLimit } from './bodeFano';

/** How good one band could be: that of the case with the largest limit, since a ladder serves them all. */
export interface BandLimit {
  readonly band: string;
  readonly caseName: string | null;
  readonly limit: MatchLimit;
}

const made = new WeakMap<LoadCase, WeakMap<Band, MatchLimit>>();

/**
 * Bode–Fano for every band, from each case's own data at the band's points, the fixture removed. It bounds |Γ| against any
 * source: a source that has a reactance of its own can only make it worse. Remembered by case and band.
 */
export function bandLimits(problem: Pick<Problem, 'bands' | 'cases'>): readonly BandLimit[] {
  return problem.bands.map((band) => {
    const limits = problem.cases.map((each): BandLimit => ({ band: band.name, caseName: each.name, limit: limitOf(each, band) }));
    const known = limits.filter(({ limit }) => limit.reflection !== null);
    return known.length === 0 ? limits[0] : known.reduce((worst, each) => ((each.limit.reflection ?? 0) > (worst.limit.reflection ?? 0) ? each : worst));
  });
}

function limitOf(loadCase: LoadCase, band: Band): MatchLimit {
  const byBand = made.get(loadCase) ?? new WeakMap<Band, MatchLimit>();
  made.set(loadCase, byBand);
  const found = byBand.get(band);
  if (found) return found;
  const load = sampleLoad(loadCase, band.frequencyHz);
  const unknown: MatchLimit = { model: null, reflection: null, byReactances: [], qw: null, reason: load.reason ?? 'the load is not known there' };
  const limit = load.known.includes(0) ? unknown : bodeFanoLimit(impedanceOf(load), band.frequencyHz);
  byBand.set(band, limit);
  return limit;
}
