import type { CST } from 'yaml';
import type { Diagnostic } from '../../base/diagnostic';
import { visitTokens } from './visitTokens';

const refused: Readonly<Record<string, { code: string; message: string }>> = {
  anchor: { code: 'yaml-anchor', message: 'Anchors (&) are not part of a match description; write the text out, or use «let» for a value.' },
  alias: { code: 'yaml-alias', message: 'Aliases (*) are not part of a match description; write the text out, or use «let» for a value.' },
  tag: { code: 'yaml-tag', message: 'Tags (!) are not part of a match description; leave it out.' },
};

/** An error for each anchor, alias and tag, and for each quotation mark and bracket that is never closed. */
export function refusedFeatures(tokens: readonly CST.Token[], toOriginal: (offset: number) => number): Diagnostic[] {
  const found: Diagnostic[] = [];
  const add = (word: { code: string; message: string }, start: number, length: number): void => {
    found.push({ ...word, severity: 'error', span: { start: toOriginal(start), end: toOriginal(start + length) } });
  };
  visitTokens(tokens, (token) => {
    const word = refused[token.type];
    if (word && 'source' in token) add(word, token.offset, token.source.length);
    if (token.type === 'single-quoted-scalar' || token.type === 'double-quoted-scalar') {
      const { source } = token;
      if (source.length < 2 || source[source.length - 1] !== source[0]) {
        add({ code: 'unclosed-quote', message: 'This quotation mark is never closed.' }, token.offset, 1);
      }
    }
    if (token.type === 'flow-collection' && !token.end.some((end) => end.type === 'flow-map-end' || end.type === 'flow-seq-end')) {
      add({ code: 'unclosed-bracket', message: `This «${token.start.source}» is never closed.` }, token.offset, 1);
    }
  });
  return found;
}
