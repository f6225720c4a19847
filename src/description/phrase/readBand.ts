import type { Located } from '../../base/span';
import type { BandSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { quantityAt } from './readQuantity';
import { rangeAt, rangeFollows } from './readRange';
import { complain, expectEnd, scanner, spanOf, take, takeWord } from './scanner';

/** `863 .. 870 MHz, 31 points, watch`, or one frequency. */
export function readBandPhrase(name: Located<string>, phrase: Phrase, context: PhraseContext): BandSyntax | null {
  const s = scanner(phrase, context);
  const range = rangeFollows(s) ? rangeAt(s, ['frequency'], 'whole') : null;
  const single = range === null && !rangeFollows(s) && s.at === 0 ? quantityAt(s, ['frequency']) : null;
  if (!range && !single) return null;
  let watch = false;
  if (take(s, /,(?=\s*watch(?![\p{L}\d]))/uy)) watch = takeWord(s, 'watch');
  expectEnd(s, 'a band is a frequency or a range, and may end in «, n points» and «, watch»');
  const lowest = range ? range.min : single!;
  if (!(lowest.value > 0)) {
    complain(s, 'frequency-not-positive', 'A frequency is greater than zero.', lowest.span);
    return null;
  }
  return { name, span: spanOf(s, 0, phrase.text.length), range, frequencyHz: single && { value: single.value, span: single.span }, watch };
}
