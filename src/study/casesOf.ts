import type { Goal } from './goal';
import type { Problem } from './problem';

/** Indices of the load cases that a goal is judged in, or why there is none. */
export function casesOf(goal: Goal, problem: Pick<Problem, 'cases'>): readonly number[] | string {
  if (goal.caseName === null) return problem.cases.map((_, at) => at);
  const at = problem.cases.findIndex((each) => each.name === goal.caseName);
  return at < 0 ? `there is no load case called ${goal.caseName}` : [at];
}
