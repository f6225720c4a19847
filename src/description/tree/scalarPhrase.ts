import type { Phrase } from '../phrase/phrase';
import type { ScalarStyle } from './treeNode';

const escapeLengths: Readonly<Record<string, number>> = { x: 4, u: 6, U: 10 };
const isSpace = (char: string | undefined) => char === ' ' || char === '\t' || char === '\n' || char === '\r';

/**
 * The phrase of one scalar: `value` is what YAML makes of it, `source` what stands in the text from `start` on. Folding,
 * quotes, escapes and indentation only ever add or take white space and marks, so that each character of the value has
 * its place: both are walked together. Line ends inside the value become spaces.
 */
export function scalarPhrase(value: string, source: string, start: number, style: ScalarStyle, toDocument: (offset: number) => number): Phrase {
  if (style === 'plain' && value === source) {
    return { text: value, at: (i) => toDocument(start + clamp(i, value.length)) };
  }
  const text = (style === 'block' ? value.trimEnd() : value).replace(/[\n\r]/g, ' ');
  const places = new Int32Array(text.length + 1);
  let at = style === 'block' ? headerEnd(source) : style === 'plain' ? 0 : 1;
  for (let i = 0; i < text.length; i++) {
    if (style === 'double') {
      while (source[at] === '\\' && isSpace(source[at + 1]) && source[at + 1] !== ' ' && source[at + 1] !== '\t') at = skipSpace(source, at + 1);
      if (source[at] === '\\') {
        places[i] = at;
        // A character beyond the basic plane fills two places of the value.
        const wide = source[at + 1] === 'U' && (text.codePointAt(i) ?? 0) > 0xffff;
        at += escapeLengths[source[at + 1]] ?? 2;
        if (wide) places[++i] = at;
        continue;
      }
    }
    if (isSpace(text[i])) {
      places[i] = Math.min(at, source.length);
      at = isSpace(source[at]) ? afterSpace(source, at, text, i) : at;
      continue;
    }
    while (at < source.length && isSpace(source[at])) at++;
    places[i] = Math.min(at, source.length);
    at += style === 'single' && text[i] === "'" ? 2 : 1;
  }
  places[text.length] = Math.min(at, source.length);
  return { text, at: (i) => toDocument(start + places[clamp(i, text.length)]) };
}

const clamp = (i: number, length: number) => Math.min(Math.max(i, 0), length);

function headerEnd(source: string): number {
  const end = /\r\n|\n|\r/.exec(source);
  return end ? end.index + end[0].length : source.length;
}

function skipSpace(source: string, from: number): number {
  let at = from;
  while (at < source.length && isSpace(source[at])) at++;
  return at;
}

/** One white character of the value takes one of the source, or all of them where the next one of the value is none. */
function afterSpace(source: string, at: number, text: string, i: number): number {
  return i + 1 < text.length && isSpace(text[i + 1]) ? at + 1 : skipSpace(source, at);
}
