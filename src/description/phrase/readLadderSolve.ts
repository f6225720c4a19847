import type { LadderSolveSyntax, Quantity } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { quantityAt } from './readQuantity';
import { sourcesAt } from './readSolve';
import { complain, expectEnd, scanner, spanOf, takeWord } from './scanner';

const elementsAtMost = 6;
const shape = '«solve up to 4 elements from coils, caps», «solve pi Q 5 from coils, caps» or «solve tee bandwidth 20 MHz»';

/** A whole ladder to be found; null (reported) where the phrase does not say which. */
export function readLadderSolvePhrase(phrase: Phrase, context: PhraseContext): LadderSolveSyntax | null {
  const s = scanner(phrase, context);
  const whole = spanOf(s, 0, phrase.text.length);
  const refuse = (): null => {
    complain(s, 'ladder-solve', `A ladder is a list of elements, or ${shape}.`, whole);
    return null;
  };
  if (!takeWord(s, 'solve')) return refuse();
  const form = takeWord(s, 'up to') ? 'up to' : takeWord(s, 'pi') ? 'pi' : takeWord(s, 'tee') ? 'tee' : null;
  if (!form) return refuse();
  let elements: number | null = null;
  let q: Quantity | null = null;
  let bandwidthHz: Quantity | null = null;
  if (form === 'up to') {
    const count = quantityAt(s, ['integer']);
    if (!count) return null;
    if (!takeWord(s, 'elements')) takeWord(s, 'element');
    if (count.value < 1 || count.value > elementsAtMost) {
      complain(s, 'ladder-solve', `A ladder can be solved for 1 to ${elementsAtMost} elements.`, count.span);
      return null;
    }
    elements = count.value;
  } else {
    if (takeWord(s, 'Q')) q = quantityAt(s, ['number']);
    else if (takeWord(s, 'bandwidth')) bandwidthHz = quantityAt(s, ['frequency']);
    else return refuse();
    const chosen = q ?? bandwidthHz;
    if (!chosen) return null;
    if (!(chosen.value > 0)) {
      complain(s, 'not-physical', 'A loaded Q and a bandwidth are greater than zero.', chosen.span);
      return null;
    }
  }
  const sources = takeWord(s, 'from') ? sourcesAt(s) : { series: null, families: [] };
  expectEnd(s);
  const plain = (quantity: Quantity | null) => quantity && { value: quantity.value, span: quantity.span };
  return { span: whole, form, elements, q: plain(q), bandwidthHz: plain(bandwidthHz), ...sources };
}
