import type { Diagnostic } from '../base/diagnostic';
import { diagnosticsAtMost } from './limits';

/** In the order of the text, each one once, the first so many; the last one says that more were left out. */
export function orderedDiagnostics(found: readonly Diagnostic[]): Diagnostic[] {
  const seen = new Set<string>();
  const unique = found.filter(({ code, span, message }) => {
    const mark = `${span.start} ${span.end} ${code} ${message}`;
    return !seen.has(mark) && seen.add(mark);
  });
  return unique.sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end).slice(0, diagnosticsAtMost);
}
