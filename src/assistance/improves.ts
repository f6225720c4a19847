import type { Solution } from '../solve/solution';
import { solutionOf } from '../solve/solutionOf';
import { unsolvedElements } from '../study/obstacles';
import type { Problem } from '../study/problem';

/** Margins closer than this, in dB, are the same: far above rounding, far below what a part's tolerance does. */
const sameMarginDb = 1e-6;

/**
 * True where a solution is worth being put in the place of a problem's own values: it misses fewer conditions, or as many and
 * has a larger margin. Always true where a value is left to solve, which has nothing to lose, and where a goal on yield is asked
 * for, since the solver then ranks by builds, and those of the present values are not known here.
 */
export function improves(problem: Problem, { marginDb, conditionsMissed }: Solution): boolean {
  if (unsolvedElements(problem).length > 0 || problem.goals.some(({ quantity }) => quantity === 'yield')) return true;
  const now = solutionOf(problem, [], problem.ladder, { proved: false, boundDb: null, nodes: 0 });
  if (conditionsMissed !== now.conditionsMissed) return conditionsMissed < now.conditionsMissed;
  return marginDb > now.marginDb + sameMarginDb;
}
