import type { Span } from '../base/span';
import type { ElementResult } from '../study/evaluation';
import { isPending } from '../study/judgeYield';
import { unsolvedElements } from '../study/obstacles';
import { printQuantity } from '../quantity/printQuantity';
import type { Assessment } from './assess';
import { goalDetail, goalMarginText, goalValueText, isKnownResult } from './goalText';
import { goalSyntaxOf } from './goalDiagnostics';
import { reactanceText } from './ladderRows';

export interface InlayHint {
  readonly offset: number;
  readonly label: string;
  readonly tooltip: string;
}

/** Behind each element its reactance or susceptance, behind each goal its margin; those that begin inside `span`. */
export function inlayHints({ description, model, evaluation }: Assessment, span: Span): InlayHint[] {
  if (!evaluation) return [];
  const within = (offset: number) => span.start <= offset && offset <= span.end;
  const elements = (description.syntax.ladder?.elements ?? []).flatMap((entry) => {
    const result = evaluation.elements.find((candidate) => candidate.name === entry.name.value);
    const label = result ? reactanceText(result) : '–';
    return result && within(entry.span.end) && label !== '–' ? [{ offset: entry.span.end, label, tooltip: `${wordFor(result)} of ${result.name} at ${printQuantity(result.frequencyHz, 'Hz', { digits: 5 })}` }] : [];
  });
  // While values are to be solved no goal has one, and saying so at each would tell nothing.
  const unsolved = model.problem !== null && unsolvedElements(model.problem).length > 0;
  const goals = (unsolved ? [] : evaluation.goals).flatMap((result) => {
    const syntax = goalSyntaxOf(description, result.goal);
    if (!syntax || !within(syntax.span.end) || isPending(result)) return [];
    const label = goalMarginText(result) || goalValueText(result);
    return [{ offset: syntax.span.end, label: `${result.ok ? '✓' : isKnownResult(result) ? '✗' : '?'} ${label}`, tooltip: [goalValueText(result), goalDetail(result)].filter((text) => text !== '').join(', ') }];
  });
  return [...elements, ...goals];
}

const wordFor = ({ orientation }: ElementResult) => (orientation === 'shunt' ? 'Susceptance' : 'Reactance');
