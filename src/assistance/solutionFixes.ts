import type { Fix } from '../base/diagnostic';
import type { Span } from '../base/span';
import { printNumber } from '../quantity/printQuantity';
import type { SolveResult } from '../solve/solution';
import type { Assessment } from './assess';
import { insertSolution, solvedValue } from './insertSolution';

/** Values of one element that are offered besides the best. */
const offered = 5;

/** What can be put in the place of a `solve` that `span` touches: all values of the best solution, then those of this element alone. */
export function solutionFixes({ description, model }: Assessment, result: SolveResult, span: Span): Fix[] {
  const { syntax } = description;
  const { ladder } = syntax;
  const [best] = result.solutions;
  if (!ladder || !best || !model.problem) return [];
  const touches = (other: Span): boolean => other.start <= span.end && span.start <= other.end;
  const name = ladder.elements.find((element) => touches(element.span) && model.problem?.unknowns.some((unknown) => unknown.name === element.name.value))?.name.value;
  if (!name && !(ladder.solve && touches(ladder.span))) return [];
  const margin = (marginDb: number): string => `margin ${printNumber(marginDb, 3)} dB`;
  const fixes: Fix[] = [{ title: `Insert solved values (${margin(best.marginDb)})`, edits: insertSolution(syntax, best), preferred: true }];
  if (!name) return fixes;
  const seen = new Set<string>();
  for (const solution of result.solutions) {
    const own = solution.solved.find((each) => each.name === name);
    const value = own && solvedValue(own);
    if (!value || seen.has(value) || seen.size >= offered) continue;
    seen.add(value);
    fixes.push({ title: `${name}: ${value} (${seen.size === 1 ? 'best' : 'next best'}, ${margin(solution.marginDb)})`, edits: insertSolution(syntax, solution, [name]) });
  }
  return fixes;
}
