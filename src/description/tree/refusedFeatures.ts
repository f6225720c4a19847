import type { Diagnostic } from '../../base/diagnostic';
import { diagnosticsAtMost } from '../limits';
import type { Composed } from './composeYaml';
import { isUnclosed } from './skippedLines';
import { visitTokens } from './visitTokens';

const refused: Readonly<Record<string, { code: string; message: string }>> = {
  anchor: { code: 'yaml-anchor', message: 'Anchors (&) are not part of a match description; write the text out, or use «let» for a value.' },
  alias: { code: 'yaml-alias', message: 'Aliases (*) are not part of a match description; write the text out, or use «let» for a value.' },
  tag: { code: 'yaml-tag', message: 'Tags (!) are not part of a match description; leave it out.' },
};

/** An error for each anchor, alias and tag, and for each quotation mark and bracket that is never closed. */
export function refusedFeatures({ tokens }: Composed, toOriginal: (offset: number) => number): Diagnostic[] {
  const found: Diagnostic[] = [];
  const add = (word: { code: string; message: string }, start: number, length: number): void => {
    if (found.length < diagnosticsAtMost) found.push({ ...word, severity: 'error', span: { start: toOriginal(start), end: toOriginal(start + length) } });
  };
  visitTokens(tokens, (token) => {
    const word = refused[token.type];
    if (word && 'source' in token) add(word, token.offset, token.source.length);
    if (!isUnclosed(token)) return;
    if (token.type === 'flow-collection') add({ code: 'unclosed-bracket', message: `This «${token.start.source}» is never closed.` }, token.offset, 1);
    else add({ code: 'unclosed-quote', message: 'This quotation mark is never closed.' }, token.offset, 1);
  });
  return found;
}
