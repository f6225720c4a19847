import { evaluate } from '../study/evaluate';
import type { Solution } from '../solve/solution';
import { withLadder } from '../solve/solutionOf';
import type { Assessment } from './assess';

/** The same description as it would be with a solution in it: its numbers, not its text. */
export function solvedAssessment(assessment: Assessment, solution: Pick<Solution, 'ladder'>): Assessment {
  const { problem } = assessment.model;
  if (!problem) return assessment;
  const solved = withLadder(problem, solution.ladder);
  return { ...assessment, model: { ...assessment.model, problem: solved }, evaluation: evaluate(solved) };
}
