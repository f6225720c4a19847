import type { TextEdit } from '../../base/diagnostic';
import type { Composed } from './composeYaml';
import { lineAt } from './lineAt';
import type { RepairedText } from './repairedText';
import { visitTokens } from './visitTokens';

/**
 * The edits, in the original's offsets, that blank the line of YAML's first error, or else the one below it: tried one
 * after the other so that the remaining lines can be read all the same. Of a quotation mark or bracket that is never
 * closed it is the line on which it opens. Empty without errors.
 */
export function skippedLines(composed: Composed, { text, toOriginal }: RepairedText, original: string): TextEdit[] {
  const [first] = composed.errors;
  if (!first) return [];
  const unclosed = /Missing closing|^Flow (sequence|map)/.test(first.message) ? unclosedAt(composed) : null;
  const place = Math.min(unclosed ?? first.pos[0], text.length);
  const line = lineAt(original, toOriginal(place));
  const below = lineAt(original, line.start + line.text.length + (original.startsWith('\r\n', line.start + line.text.length) ? 2 : 1));
  return [line, below].filter((each, i) => each.text.trim() !== '' && (i === 0 || each.start > line.start))
    .map((each) => ({ span: { start: each.start, end: each.start + each.text.length }, text: ' '.repeat(each.text.length) }));
}

function unclosedAt(composed: Composed): number | null {
  let found: number | null = null;
  visitTokens(composed.tokens, (token) => {
    if (found === null && isUnclosed(token)) found = token.offset;
  });
  return found;
}

/** True for a quoted phrase, list or mapping in brackets that lacks its end. */
export function isUnclosed(token: Composed['tokens'][number]): boolean {
  if (token.type === 'single-quoted-scalar' || token.type === 'double-quoted-scalar') {
    return token.source.length < 2 || token.source[token.source.length - 1] !== token.source[0];
  }
  return token.type === 'flow-collection' && !token.end.some((end) => end.type === 'flow-map-end' || end.type === 'flow-seq-end');
}
