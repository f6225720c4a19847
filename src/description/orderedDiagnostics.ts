import type { Diagnostic } from '../base/diagnostic';
import { diagnosticsAtMost } from './limits';

/** What a trap of YAML leaves behind for the readers of phrases: said once, by the trap, at the place where it begins. */
const follows: Readonly<Record<string, ReadonlySet<string>>> = { 'second-colon': new Set(['unexpected-words', 'goal-word', 'word-unknown']) };

/**
 * In the order of the text, each one once, and only so many: the first errors, and what comes first of the others as far
 * as there is room, so that no crowd of warnings hides an error.
 */
export function orderedDiagnostics(found: readonly Diagnostic[]): Diagnostic[] {
  const seen = new Set<string>();
  const unique = found.filter(({ code, span, message }) => {
    const mark = `${span.start} ${span.end} ${code} ${message}`;
    return !seen.has(mark) && seen.add(mark);
  }).filter(({ code, span }, _, all) => !all.some((trap) => Object.hasOwn(follows, trap.code) && follows[trap.code].has(code) && trap.span.start === span.start));
  const inOrder = (some: readonly Diagnostic[]) => [...some].sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end);
  const isError = ({ severity }: Diagnostic) => severity === 'error';
  const byWeight = [...inOrder(unique.filter(isError)), ...inOrder(unique.filter((each) => !isError(each)))];
  return inOrder(byWeight.slice(0, diagnosticsAtMost));
}
