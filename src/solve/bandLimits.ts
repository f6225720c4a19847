import { impedanceOf } from '../network/immittance';
import type { Band, LoadCase, Problem } from '../study/problem';
import { sampleLoad } from '../study/sampleCase';
import { bodeFanoLimit, type MatchLimit } from './bodeFano';

/** How good one band could be: that of the case with the largest limit, since a ladder serves them all. */
export interface BandLimit {
  readonly band: string;
  readonly caseName: string | null;
  /** The band is judged at so many points; the limit is of the whole range between its ends. */
  readonly points: number;
  readonly limit: MatchLimit;
}

const made = new WeakMap<LoadCase, WeakMap<Float64Array, MatchLimit>>();

/**
 * Bode–Fano for every band, from each case's own data at the band's points, the fixture removed. It bounds |Γ| against any
 * source: a source that has a reactance of its own can only make it worse. A ladder that is tuned anew at each channel is
 * not bound by it, and has no limit here. Remembered by case and points.
 */
export function bandLimits({ bands, cases, tunables }: Pick<Problem, 'bands' | 'cases' | 'tunables'>): readonly BandLimit[] {
  const tuned = tunables.some(({ elements }) => elements.length > 0);
  return bands.map((band) => {
    const limits = cases.map((each): BandLimit => ({
      band: band.name, caseName: each.name, points: band.frequencyHz.length,
      limit: tuned ? unknown('the ladder is tuned anew at each channel, which the limit of one that stays does not cover') : limitOf(each, band),
    }));
    const known = limits.filter(({ limit }) => limit.reflection !== null);
    return known.length === 0 ? limits[0] : known.reduce((worst, each) => ((each.limit.reflection ?? 0) > (worst.limit.reflection ?? 0) ? each : worst));
  });
}

const unknown = (reason: string): MatchLimit => ({ model: null, reflection: null, certain: null, byReactances: [], qw: null, reason });

function limitOf(loadCase: LoadCase, { frequencyHz }: Band): MatchLimit {
  const byPoints = made.get(loadCase) ?? new WeakMap<Float64Array, MatchLimit>();
  made.set(loadCase, byPoints);
  const found = byPoints.get(frequencyHz);
  if (found) return found;
  const load = sampleLoad(loadCase, frequencyHz);
  const limit = load.known.includes(0) ? unknown(load.reason ?? 'the load is not known there') : bodeFanoLimit(impedanceOf(load), frequencyHz);
  byPoints.set(frequencyHz, limit);
  return limit;
}
