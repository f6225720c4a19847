import { evaluate } from '../study/evaluate';
import { tuningInPlacePoints } from '../study/limits';
import { unsolvedElements } from '../study/obstacles';
import type { Problem } from '../study/problem';
import { tuningPoints } from '../study/tuning/tuneChannels';
import type { Solution, SolveResult } from '../solve/solution';
import { withLadder } from '../solve/solutionOf';
import type { Assessment } from './assess';

/** What the unknowns came out as; `stale` where the text has changed since. */
export interface SolvedUnknowns {
  readonly result: SolveResult;
  readonly stale: boolean;
}

/** The solution that stands in for what is left to solve, as long as it is not in the text; null where there is none. */
export function shownSolution(problem: Problem | null, solved: SolvedUnknowns | null): Solution | null {
  if (problem === null || solved === null || solved.stale || unsolvedElements(problem).length === 0) return null;
  return isQuick(problem) ? solved.result.solutions[0] ?? null : null;
}

/** False where codes of tunable parts would take so long to seek that nobody who types could wait for the picture of a solution. */
export const isQuick = (problem: Problem): boolean => tuningPoints(problem) <= tuningInPlacePoints;

/** The problem whose numbers are shown: with the best solution in it where values are left to solve. */
export function shownProblem(problem: Problem | null, solved: SolvedUnknowns | null): Problem | null {
  const solution = shownSolution(problem, solved);
  return problem && solution ? withLadder(problem, solution.ladder) : problem;
}

/** The same description as it would be with a solution in it: its numbers, not its text. */
export function solvedAssessment(assessment: Assessment, solution: Pick<Solution, 'ladder' | 'yield'>): Assessment {
  const { problem } = assessment.model;
  if (!problem) return assessment;
  const solved = withLadder(problem, solution.ladder);
  return { ...assessment, model: { ...assessment.model, problem: solved }, evaluation: evaluate(solved, solution.yield === null ? {} : { yield: solution.yield }) };
}
