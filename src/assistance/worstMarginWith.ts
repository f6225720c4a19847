import type { Element } from '../network/element';
import { evaluate } from '../study/evaluate';
import type { GoalResult } from '../study/goal';
import { marginDb } from '../study/marginDb';
import type { Problem } from '../study/problem';

/** The least margin in dB over the goals that have one; null where none has. */
export function worstMarginDb(results: readonly GoalResult[]): number | null {
  const margins = results.map(marginDb).filter((margin) => margin !== null);
  return margins.length === 0 ? null : Math.min(...margins);
}

/** The least margin with another value in the one part of an element; null where that cannot be told. */
export function worstMarginWith(problem: Problem, elementName: string, value: number): number | null {
  const ladder = problem.ladder.map((element): Element =>
    element.form === 'branch' && element.name === elementName && element.branch.form === 'part'
      ? { ...element, branch: { form: 'part', part: { ...element.branch.part, value } } }
      : element);
  // One point is enough of the sweep: only the goals are asked for.
  return worstMarginDb(evaluate({ ...problem, ladder, sweepHz: problem.sweepHz.slice(0, 1) }).goals);
}
