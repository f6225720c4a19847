import { casesOf } from './casesOf';
import type { Goal, GoalResult } from './goal';
import { placesOf } from './place';
import { pointValues, type PointQuantity } from './pointQuantities';
import type { Sampler } from './sampler';
import { judged, notKnown, wantsLarge } from './verdict';
import { worseOf, worstIndex, type Worst } from './worst';

/** Counts as an element's name in goals on voltage, current and dissipation. */
export const loadName = 'load';

/**
 * A goal on a quantity that has a value at every frequency: the worst over its places and cases decides, by the side on
 * which its limit lies. Where anything in its places is not known, the goal is not known.
 */
export function judgePoints(quantity: PointQuantity, goal: Goal, sampler: Sampler): GoalResult {
  const element = goal.elementName === null ? -1 : stressedIndex(goal.elementName, sampler);
  if (goal.elementName !== null && element < 0) return notKnown(goal, `there is no element called ${goal.elementName}`);
  const places = placesOf(goal, sampler.problem);
  if (typeof places === 'string') return notKnown(goal, places);
  const loads = goal.into ? [goal.into] : casesOf(goal, sampler.problem);
  if (typeof loads === 'string') return notKnown(goal, loads);
  const smallIsBad = wantsLarge(goal);
  let worst: Worst | null = null;
  for (const place of places) {
    for (const load of loads) {
      const trace = sampler.trace(place, load);
      if (trace.reason !== null) return notKnown(goal, trace.reason, trace.frequencyHz[trace.firstUnknown ?? 0], trace.caseName);
      const { values, reasonOfNaN } = pointValues(quantity, goal, trace, element);
      const at = worstIndex(values, smallIsBad);
      if (at < 0) continue;
      const frequencyHz = trace.frequencyHz[at];
      if (Number.isNaN(values[at])) return notKnown(goal, reasonOfNaN, frequencyHz, trace.caseName);
      worst = worseOf(worst, { value: values[at], frequencyHz, caseName: trace.caseName }, smallIsBad);
    }
  }
  return worst ? judged(goal, worst.value, worst.frequencyHz, worst.caseName) : notKnown(goal, 'there is no frequency to judge it at');
}

/** Index of the element in the ladder, its length for `load`, −1 where there is none of that name. */
function stressedIndex(name: string, sampler: Sampler): number {
  return name === loadName ? sampler.ladder.length : sampler.ladder.findIndex((element) => element.name === name);
}
