import type { Element } from '../network/element';
import type { Part } from '../network/part';
import { evaluate } from '../study/evaluate';
import type { GoalResult } from '../study/goal';
import { tuningInPlacePoints } from '../study/limits';
import { isCondition, marginDb } from '../study/marginDb';
import type { Problem } from '../study/problem';
import { tuningPoints } from '../study/tuning/tuneChannels';

/** The least margin in dB over the goals that ladders are ranked by; null where there is none, or one of them is not known. */
export function worstMarginDb(results: readonly GoalResult[]): number | null {
  const margins = results.filter(({ goal }) => !isCondition(goal)).map(marginDb);
  const known = margins.filter((margin) => margin !== null);
  return known.length === 0 || known.length < margins.length ? null : Math.min(...known);
}

/** The least margin with another part in the place of the one part of an element; null where that cannot be told. */
export function worstMarginWith(problem: Problem, elementName: string, part: Part): number | null {
  // Codes would have to be sought anew for every value.
  if (tuningPoints(problem) > tuningInPlacePoints) return null;
  const ladder = problem.ladder.map((element): Element =>
    element.form === 'branch' && element.name === elementName && element.branch.form === 'part'
      ? { ...element, branch: { form: 'part', part } }
      : element);
  // One point is enough of the sweep: only the goals are asked for.
  return worstMarginDb(evaluate({ ...problem, ladder, sweepHz: problem.sweepHz.slice(0, 1) }).goals);
}
