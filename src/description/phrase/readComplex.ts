import { literalAt, literalValue } from '../../quantity/literal';
import type { ImpedanceSyntax } from '../syntax';
import { quantityAt } from './readQuantity';
import { complain, peek, replaceBy, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

const number = '(?:\\d+(?:\\.\\d*)?|\\.\\d+)(?:[eE][+\\-−]?\\d+)?';
const unit = '(?:\\s*[\\p{L}\\u2126]+)?';
/** `18 - j37`, `-j37`, `j40`, with or without the unit. */
const rectangular = new RegExp(`(?:([+\\-−]?${number})(${unit})\\s*([+\\-−])\\s*|([+\\-−]?))[jJ]\\s?(${number})`, 'uy');
/** `18-37j`, `18 + 37i`, `37j`: the imaginary unit behind. */
const behind = new RegExp(`(?:([+\\-−]?${number})\\s*([+\\-−])\\s*|([+\\-−]?))(${number})\\s?[ijIJ](?![\\p{L}\\d])(?:\\s*(ohm|[kmM]?[Ω\\u2126])(?![\\p{L}]))?`, 'uy');

export const complexFollows = (s: Scanner): boolean => peek(s, rectangular) || peek(s, behind);

const sign = (text: string) => (/[-−]/.test(text) ? -1 : 1);
const value = (text: string) => Number(text.replace(/−/g, '-'));

/** `18 - j37 Ω`, optionally `at 868 MHz`. */
export function complexAt(s: Scanner): ImpedanceSyntax {
  skipBlanks(s);
  const start = s.at;
  const found = take(s, rectangular);
  if (!found) return slip(s, start);
  const [, real, inner, innerSign, lonelySign, imaginary] = found;
  const comma = take(s, /,\d+(?:[ \u00a0]?[\p{L}\u2126]+)?/uy);
  if (comma) {
    const at = s.at - comma[0].length;
    complain(s, 'decimal-comma', `«${imaginary}${comma[0]}» has a decimal comma; numbers here have a point.`, spanOf(s, at - imaginary.length, s.at), [replaceBy(spanOf(s, at, at + 1), '.')]);
    return { form: 'faulty', span: spanOf(s, start, s.at) };
  }
  const innerUnit = (inner ?? '').trim();
  // The unit stands behind the imaginary part and counts for both; `18 Ω - j37 Ω` says it twice.
  const literal = literalAt(`${imaginary}${s.text.slice(s.at)}`, 0, ['resistance'])!;
  const tail = literal.end - imaginary.length;
  const unitText = literal.form === 'unit' ? literal.unit : '';
  s.at += Math.max(0, literal.form === 'unit' ? tail : 0);
  const span = spanOf(s, start, s.at);
  const scale = unitText === '' ? null : unitScale(unitText);
  if (scale === null) {
    complain(s, unitText === '' ? 'unit-missing' : 'unit-wrong', unitText === '' ? 'An impedance needs its unit, Ω.' : `«${unitText}» does not fit here: an impedance is in Ω.`, span,
      unitText === '' ? [replaceBy(span, `${s.text.slice(start, s.at)} Ω`)] : []);
    return { form: 'faulty', span };
  }
  if (innerUnit !== '' && innerUnit !== unitText) {
    complain(s, 'unit-wrong', `«${innerUnit}» and «${unitText}» differ; write the unit once, at the end.`, span);
    return { form: 'faulty', span };
  }
  const re = real === undefined ? 0 : value(real);
  const im = sign(real === undefined ? lonelySign : innerSign) * value(imaginary);
  const atHz = takeWord(s, 'at') ? quantityAt(s, ['frequency']) : null;
  if (atHz && !(atHz.value > 0)) {
    complain(s, 'frequency-not-positive', 'A frequency is greater than zero.', atHz.span);
    return { form: 'faulty', span };
  }
  if (re < 0) complain(s, 'not-passive', 'The real part of a passive impedance is not negative.', span, [], 'warning');
  return { form: 'complex', value: { re: scale(re), im: scale(im) }, atHz: atHz && { value: atHz.value, span: atHz.span }, span: spanOf(s, start, s.at) };
}

/** Decimal shift by the unit's prefix, exact; null where it is no resistance. */
function unitScale(unitText: string): ((n: number) => number) | null {
  const one = literalAt(`1 ${unitText}`, 0, ['resistance']);
  if (!one || one.form !== 'unit' || !/(?:Ω|\u2126|ohm)$/.test(unitText)) return null;
  const factor = literalValue(one);
  return Number.isFinite(factor) ? (n) => n * factor : null;
}

function slip(s: Scanner, start: number): ImpedanceSyntax {
  const [, real, innerSign, lonelySign, imaginary, unitText] = take(s, behind)!;
  const span = spanOf(s, start, s.at);
  const written = real === undefined ? `${lonelySign}j${imaginary}` : `${real} ${innerSign} j${imaginary}`;
  complain(s, 'j-behind', 'The imaginary unit stands before its number: «18 - j37 Ω».', span, [replaceBy(span, `${written} ${unitText ?? 'Ω'}`)]);
  if (takeWord(s, 'at')) quantityAt(s, ['frequency']);
  return { form: 'faulty', span };
}
