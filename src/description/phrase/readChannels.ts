import type { Located } from '../../base/span';
import type { Quantity, RangeSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { quantityAt } from './readQuantity';
import { rangeAt, rangeFollows } from './readRange';
import { familyNameAt } from './readSolve';
import { expectEnd, peek, scanner } from './scanner';

/** One item of `channels`: a range with a step, a frequency, or a band's name. */
export function readChannelsPhrase(phrase: Phrase, context: PhraseContext): { band: Located<string> | null; range: RangeSyntax | null; frequencyHz: Quantity | null } | null {
  const s = scanner(phrase, context);
  if (peek(s, /[\p{L}]/uy)) {
    const band = familyNameAt(s);
    expectEnd(s);
    return { band, range: null, frequencyHz: null };
  }
  if (rangeFollows(s)) {
    const range = rangeAt(s, ['frequency'], 'whole');
    if (range) expectEnd(s);
    return range && { band: null, range, frequencyHz: null };
  }
  const single = quantityAt(s, ['frequency']);
  if (!single) return null;
  expectEnd(s);
  return { band: null, range: null, frequencyHz: { value: single.value, span: single.span } };
}
