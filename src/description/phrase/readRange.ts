import type { Located } from '../../base/span';
import type { Literal } from '../../quantity/literal';
import { literalValue } from '../../quantity/literal';
import { describeKind, quantityAt, usualUnit, type QuantityKind } from './readQuantity';
import type { Quantity, RangeSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { complain, expectEnd, peek, replaceBy, scanner, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

/** Beyond this a band or sweep has more points than anyone can look at. */
export const pointsAtMost = 100_001;

/** `a .. b`, `a .. b step c`, `a .. b, n points`; the whole phrase. */
export function readRangePhrase(phrase: Phrase, kind: QuantityKind, context: PhraseContext): RangeSyntax | null {
  const s = scanner(phrase, context);
  const range = rangeAt(s, [kind], 'whole');
  if (range) expectEnd(s, 'a range is «a .. b», «a .. b step c» or «a .. b, n points»');
  return range;
}

/** True where a range stands at the scanner rather than one quantity. */
export function rangeFollows(s: Scanner): boolean {
  return peek(s, /[^,]*?(?:\.\.|…)/y);
}

/** A range at the scanner; null (reported) where it cannot be read. With `ends`, step and points are left alone. */
export function rangeAt(s: Scanner, kinds: readonly QuantityKind[], extent: 'whole' | 'ends'): RangeSyntax | null {
  skipBlanks(s);
  const start = s.at;
  const first = quantityAt(s, kinds, 'keep');
  if (!first) return null;
  if (!take(s, /\.\.\.?|…/y)) {
    complain(s, 'range-expected', `Here a range «a .. b» of ${describeKind(kinds[0])} was expected.`, spanOf(s, start, s.at));
    return null;
  }
  const last = quantityAt(s, kinds);
  if (!last) return null;
  const min = withUnitOf(first, last.literal, s, last.kind);
  if (!min) return null;
  let step: Quantity | null = null;
  let points: Located<number> | null = null;
  if (extent === 'whole') {
    if (takeWord(s, 'step')) step = stepAt(s, last.kind, last.literal);
    points = pointsAt(s);
  }
  const span = spanOf(s, start, s.at);
  if (min.value > last.value) {
    const swapped = first.literal && last.literal && [{ span: min.span, text: writtenWithUnit(s, last.literal) }, { span: last.span, text: writtenWithUnit(s, first.literal, last.literal) }];
    complain(s, 'range-upside-down', 'The smaller end of a range comes first.', span, swapped ? [{ title: 'Swap the ends', edits: swapped, preferred: true }] : []);
    return null;
  }
  if (step && points) {
    complain(s, 'range-step-and-points', 'A range has either a step or a number of points, not both.', span);
    points = null;
  }
  if (points && points.value < 2 && min.value < last.value) {
    complain(s, 'too-few-points', 'Both ends are points of the range, so that there are 2 at least.', points.span);
    points = null;
  }
  if (step && step.value > 0) {
    const count = (last.value - min.value) / step.value;
    if (count > pointsAtMost) {
      complain(s, 'too-many-points', `This makes ${Math.floor(count)} points; at most ${pointsAtMost} are taken.`, step.span);
      step = null;
    } else if (Math.abs(count - Math.round(count)) > 1e-6) {
      complain(s, 'step-misses-end', 'The steps do not meet the upper end; the last point lies below it.', step.span, [], 'warning');
    }
  }
  return { min: plain(min), max: plain(last), step, points, span };
}

const plain = ({ value, span }: Quantity): Quantity => ({ value, span });

/** A bare first end takes the unit of the second. */
function withUnitOf(first: Quantity & { literal: Literal | null; kind: QuantityKind }, other: Literal | null, s: Scanner, kind: QuantityKind): Quantity | null {
  const { literal } = first;
  if (!literal || literal.form !== 'bare') return first;
  if (!other || other.form === 'bare' || kind === 'number' || kind === 'integer') return first;
  if (other.form === 'letters') {
    complain(s, 'unit-missing', `«${literal.digits}» needs a unit: ${describeKind(kind)}.`, first.span, [replaceBy(first.span, `${literal.digits} ${usualUnit[kind]}`)]);
    return null;
  }
  return { value: literalValue({ ...literal, form: other.form, unit: other.unit, prefixExponent: other.prefixExponent }), span: first.span };
}

function writtenWithUnit(s: Scanner, literal: Literal, unitFrom?: Literal): string {
  const own = s.text.slice(literal.start, literal.end);
  return literal.form === 'bare' && unitFrom && unitFrom.form === 'unit' ? `${own} ${unitFrom.unit}` : own;
}

function stepAt(s: Scanner, kind: QuantityKind, unit: Literal | null): Quantity | null {
  const step = quantityAt(s, [kind], 'keep');
  if (!step) return null;
  const withUnit = withUnitOf(step, unit, s, kind);
  if (!withUnit) return null;
  if (!(withUnit.value > 0)) {
    complain(s, 'step-not-positive', 'A step is greater than zero.', step.span);
    return null;
  }
  return plain(withUnit);
}

/** `, 401 points` */
export function pointsAt(s: Scanner): Located<number> | null {
  if (!peek(s, /,\s*[^,]*?points?(?![\p{L}\d])/uy)) return null;
  take(s, /,/y);
  const count = quantityAt(s, ['integer']);
  if (!takeWord(s, 'points')) takeWord(s, 'point');
  if (!count) return null;
  if (count.value < 1 || count.value > pointsAtMost) {
    complain(s, count.value < 1 ? 'points-not-positive' : 'too-many-points', `A range has 1 to ${pointsAtMost} points.`, count.span);
    return null;
  }
  return { value: count.value, span: count.span };
}
