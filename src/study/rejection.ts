import { decibels } from '../network/figures';
import { casesOf } from './casesOf';
import type { Goal, GoalResult } from './goal';
import { placeOfBand, placesOf, type Place } from './place';
import type { Band, Problem } from './problem';
import type { Sampler, Trace } from './sampler';
import { judged, notKnown, wantsLarge } from './verdict';
import { worseOf, type Worst } from './worst';

/**
 * Rejection in dB, per case: the insertion loss at each point asked for, less the largest insertion loss in the reference
 * band, each with the case's own load. `into` replaces the load only at the points asked for.
 */
export function judgeRejection(goal: Goal, sampler: Sampler): GoalResult {
  const reference = referenceBand(goal, sampler.problem);
  if (typeof reference === 'string') return notKnown(goal, reference);
  const places = placesOf(goal, sampler.problem);
  if (typeof places === 'string') return notKnown(goal, places);
  const cases = casesOf(goal, sampler.problem);
  if (typeof cases === 'string') return notKnown(goal, cases);
  const smallIsBad = wantsLarge(goal);
  let worst: Worst | null = null;
  for (const at of cases) {
    const passed = sampler.trace(placeOfBand(reference), at);
    if (passed.reason !== null) return unknownTrace(goal, passed, passed.caseName);
    const largestLossDb = -decibels(passed.gain().reduce((least, ratio) => Math.min(least, ratio), Infinity));
    for (const place of places) {
      const asked = sampler.trace(place, goal.into ?? at);
      if (asked.reason !== null) return unknownTrace(goal, asked, passed.caseName);
      const found = worstOfPlace(place, asked, largestLossDb, passed.caseName, smallIsBad);
      if (found === null) return notKnown(goal, `nothing reaches the load, neither there nor in ${reference.name}`, place.frequencyHz[0], passed.caseName);
      worst = worseOf(worst, found, smallIsBad);
    }
  }
  return worst ? judged(goal, worst.value, worst.frequencyHz, worst.caseName) : notKnown(goal, 'there is no frequency to judge it at');
}

/** The band of `N x BAND`, else the one after `against`, else the first. */
function referenceBand(goal: Goal, problem: Pick<Problem, 'bands'>): Band | string {
  const name = goal.place.form === 'harmonic' ? goal.place.band : goal.against;
  const band = name === null ? problem.bands[0] : problem.bands.find((each) => each.name === name);
  return band ?? (name === null ? 'there is no band to compare with' : `there is no band called ${name}`);
}

function worstOfPlace(place: Place, asked: Trace, largestLossDb: number, caseName: string | null, smallIsBad: boolean): Worst | null {
  const gain = asked.gain();
  let worst: Worst | null = null;
  for (let k = 0; k < gain.length; k++) {
    const value = -decibels(gain[k]) - largestLossDb;
    if (Number.isNaN(value)) return null;
    worst = worseOf(worst, { value, frequencyHz: place.frequencyHz[k], caseName }, smallIsBad);
  }
  return worst;
}

const unknownTrace = (goal: Goal, trace: Trace, caseName: string | null): GoalResult =>
  notKnown(goal, trace.reason ?? '', trace.frequencyHz[trace.firstUnknown ?? 0], caseName);
