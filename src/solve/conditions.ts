import type { Element } from '../network/element';
import type { Goal } from '../study/goal';
import { judgeGoal } from '../study/judgeGoal';
import { isCondition } from '../study/marginDb';
import type { Problem } from '../study/problem';
import { sampler } from '../study/sampler';

/** Goals that ladders are not ranked by in dB. Yield is left aside: it is asked of the ladders that were found. */
export interface Conditions {
  /** How many of those that the structure alone decides (parts, direct current) a ladder misses. */
  structureMissed(ladder: readonly Element[]): number;
  /** True where there are others, which need the values. */
  readonly needValues: boolean;
  /** How many of the others it misses. */
  valuesMissed(ladder: readonly Element[]): number;
}

const byStructure: ReadonlySet<Goal['quantity']> = new Set(['parts', 'dc path', 'dc block', 'dc short at load']);

export function conditionsOf(problem: Problem): Conditions {
  const all = problem.goals.filter((goal) => isCondition(goal) && goal.quantity !== 'yield');
  const structure = all.filter(({ quantity }) => byStructure.has(quantity));
  const values = all.filter(({ quantity }) => !byStructure.has(quantity));
  const missed = (goals: readonly Goal[], ladder: readonly Element[]): number => {
    if (goals.length === 0) return 0;
    const samples = sampler(problem, ladder);
    return goals.filter((goal) => !judgeGoal(goal, samples).ok).length;
  };
  return {
    structureMissed: (ladder) => missed(structure, ladder),
    needValues: values.length > 0,
    valuesMissed: (ladder) => missed(values, ladder),
  };
}
