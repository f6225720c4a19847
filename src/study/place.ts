import type { Goal } from './goal';
import type { Band, Problem } from './problem';

/** Frequencies at which something is judged together. */
export interface Place {
  /** The same for the same frequencies and band, so that samples can be shared; null where that is not worth it. */
  readonly key: string | Float64Array | null;
  readonly frequencyHz: Float64Array;
  /** The band whose source serves all points; null where each frequency finds its own. */
  readonly band: string | null;
}

export const placeOfBand = (band: Band): Place => ({ key: band.frequencyHz, frequencyHz: band.frequencyHz, band: band.name });

export const sweepPlace = (problem: Problem): Place => ({ key: 'sweep', frequencyHz: problem.sweepHz, band: null });

/** Bands that goals without a place go over: all but those that are only watched. */
export const judgedBands = (problem: Pick<Problem, 'bands'>): readonly Band[] => problem.bands.filter((band) => !band.watch);

/** Bands over which an element's stress is taken: those that are judged, or all of them where every one is only watched. */
export function stressedBands(problem: Pick<Problem, 'bands'>): readonly Band[] {
  const judged = judgedBands(problem);
  return judged.length > 0 ? judged : problem.bands;
}

/** Geometric mean of a band's ends. */
export function middleOf(frequencyHz: Float64Array): number {
  const startHz = frequencyHz[0];
  const stopHz = frequencyHz[frequencyHz.length - 1];
  return startHz === stopHz ? startHz : Math.sqrt(startHz * stopHz);
}

/** Where elements are looked at: the middle of the first band, or of the sweep where there is no band. */
export const firstMiddle = (problem: Pick<Problem, 'bands' | 'sweepHz'>): number => middleOf(problem.bands[0]?.frequencyHz ?? problem.sweepHz);

/** The places of a goal, or why it has none. */
export function placesOf(goal: Goal, problem: Pick<Problem, 'bands'>): readonly Place[] | string {
  const place = goal.place;
  if (place.form === 'bands') {
    const bands = judgedBands(problem);
    return bands.length > 0 ? bands.map(placeOfBand) : 'every band is only watched; the goal needs a place of its own';
  }
  if (place.form === 'frequency') return [{ key: `at ${place.frequencyHz}`, frequencyHz: Float64Array.of(place.frequencyHz), band: null }];
  if (place.form === 'range') return [{ key: null, frequencyHz: place.frequencyHz, band: null }];
  const band = problem.bands.find((each) => each.name === place.band);
  if (!band) return `there is no band called ${place.band}`;
  if (place.form === 'band') return [placeOfBand(band)];
  // A multiple of a band arises while the source works in that band, so that its source counts and not that of what lies nearby.
  return [{ key: `${place.order} x ${band.name}`, frequencyHz: band.frequencyHz.map((each) => each * place.order), band: band.name }];
}
