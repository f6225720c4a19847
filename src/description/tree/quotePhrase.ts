import type { TextEdit } from '../../base/diagnostic';

/** Edits that put what stands between two offsets into quotes, with the marks inside it kept. */
export function quotePhrase(text: string, start: number, end: number): TextEdit[] {
  const inside = text.slice(start, end);
  const quote = /["\\]/.test(inside) ? "'" : '"';
  const edits: TextEdit[] = [{ span: { start, end: start }, text: quote }];
  if (quote === "'") {
    for (let i = 0; i < inside.length; i++) if (inside[i] === "'") edits.push({ span: { start: start + i, end: start + i }, text: "'" });
  }
  edits.push({ span: { start: end, end }, text: quote });
  // Two insertions at one offset (a phrase that begins with a quote mark) become one, in order.
  return edits.reduce<TextEdit[]>((merged, edit) => {
    const last = merged[merged.length - 1];
    if (last && last.span.start === edit.span.start) merged[merged.length - 1] = { span: last.span, text: last.text + edit.text };
    else merged.push(edit);
    return merged;
  }, []);
}

/** Where the phrase that begins at `start` ends on its line: before a comment and trailing white space. */
export function phraseEndOnLine(text: string, start: number): number {
  const rest = /^[^\n\r]*/.exec(text.slice(start))?.[0] ?? '';
  const comment = /(^|[ \t])#/.exec(rest);
  return start + (comment ? rest.slice(0, comment.index) : rest).trimEnd().length;
}
