import type { Span } from '../base/span';
import type { DescriptionSyntax } from '../description/syntax';
import type { SolveResult } from '../solve/solution';
import { unsolvedElements } from '../study/obstacles';
import type { Assessment } from './assess';
import { valuesText } from './candidates';
import { verdictText } from './goalText';
import { printNumber } from '../quantity/printQuantity';

/** What stands above `ladder:`: text and what a click does. */
export interface Lens {
  readonly title: string;
  readonly tooltip: string;
  readonly action: 'worst goal' | 'insert' | 'solve again' | null;
}

/** The place of `ladder:` and what is said above it; null without a ladder. `solved`: null where there is no answer, `solving` where it may still come. */
export function ladderLenses({ description, model, evaluation, diagnostics }: Assessment, solved: SolveResult | null, solving: boolean): { readonly span: Span; readonly lenses: readonly Lens[] } | null {
  const { ladder } = description.syntax;
  if (!ladder) return null;
  const { problem } = model;
  const errors = diagnostics.filter(({ severity }) => severity === 'error').length;
  const lenses: Lens[] = [];
  if (errors > 0) {
    lenses.push({ title: errors === 1 ? '1 error' : `${errors} errors`, tooltip: 'Errors have to be mended before the ladder can be judged.', action: null });
  } else if (problem && unsolvedElements(problem).length > 0) {
    lenses.push(solveLens(solved, solving));
  } else if (problem && evaluation) {
    lenses.push({ title: verdictText(evaluation.goals) || 'no goals', tooltip: 'Go to the goal with the least margin.', action: evaluation.goals.length > 0 ? 'worst goal' : null });
  }
  if (errors === 0 && canSolveAgain(description.syntax)) {
    lenses.push({ title: 'Solve again', tooltip: 'Reconsiders every value that says «from» and is not «fixed».', action: 'solve again' });
  }
  return { span: ladder.keySpan, lenses };
}

function solveLens(solved: SolveResult | null, solving: boolean): Lens {
  if (solved === null && !solving) return { title: 'the solver stopped', tooltip: 'It had no answer yet; the log says why. It starts anew with the next change of the text.', action: null };
  if (solved === null) return { title: 'solving …', tooltip: 'The values are being worked out.', action: null };
  const [best] = solved.solutions;
  if (!best) return { title: `no solution: ${solved.reason ?? ''}`, tooltip: solved.outOfReach.map(({ form, reason }) => `${form}: ${reason}`).join('\n'), action: null };
  const margin = `margin ${printNumber(best.marginDb, 3)} dB`;
  return {
    title: `Insert solved values: ${valuesText(best)} (${best.holds ? margin : `misses a goal, ${margin}`})`,
    tooltip: 'Puts the best values into the text; one undo takes them back.', action: 'insert',
  };
}

/** True where a value says `from` and may be reconsidered. */
export function canSolveAgain({ ladder }: DescriptionSyntax): boolean {
  return ladder?.elements.some(({ body }) =>
    body.form === 'branch' && body.branch.form === 'part' && body.branch.value.form === 'known' && body.branch.from !== null && !body.branch.fixed && !body.branch.label) ?? false;
}
