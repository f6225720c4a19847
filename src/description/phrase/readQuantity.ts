import { readExpressionAt } from './readExpression';
import { literalAt, literalValue, type Literal } from '../../quantity/literal';
import { dimensionOf, meantUnit, unitOf, type Dimension } from '../../quantity/unit';
import type { Span } from '../../base/span';
import type { Quantity } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { complain, expectEnd, nextWord, replaceBy, scanner, skipBlanks, spanOf, type Scanner } from './scanner';

/** What a place in a description wants a number to be. */
export type QuantityKind =
  | 'resistance' | 'inductance' | 'capacitance' | 'conductance' | 'frequency' | 'time' | 'length' | 'angle' | 'wavelengths' | 'power' | 'decibels'
  | 'voltage' | 'current' | 'ratio' | 'number' | 'integer' | 'loss per length';

/** A literal that was accepted, with the unit that it was written in. */
export interface ReadQuantity extends Quantity {
  readonly literal: Literal | null;
}

const accepted: Readonly<Record<QuantityKind, readonly Dimension[]>> = {
  resistance: ['resistance'], inductance: ['inductance'], capacitance: ['capacitance'], conductance: ['conductance'], frequency: ['frequency'],
  time: ['time'], length: ['length'], angle: ['angle'], wavelengths: ['wavelengths'], power: ['power', 'power level'], decibels: ['decibels'],
  voltage: ['voltage'], current: ['current'], ratio: ['percent', 'number'], number: ['number'], integer: ['number'], 'loss per length': ['loss per length'],
};

export const usualUnit: Readonly<Record<QuantityKind, string>> = {
  resistance: 'Ω', inductance: 'nH', capacitance: 'pF', conductance: 'S', frequency: 'MHz', time: 's', length: 'mm', angle: '°', wavelengths: 'λ', power: 'dBm',
  decibels: 'dB', voltage: 'V', current: 'mA', ratio: '%', number: '', integer: '', 'loss per length': 'dB/m',
};

const article: Readonly<Record<QuantityKind, string>> = {
  resistance: 'a resistance in Ω', inductance: 'an inductance in H', capacitance: 'a capacitance in F', conductance: 'a conductance in S', frequency: 'a frequency in Hz',
  time: 'a time in s', length: 'a length in m', angle: 'an angle in °', wavelengths: 'a length in λ', power: 'a power in dBm or W', decibels: 'decibels (dB)',
  voltage: 'a voltage in V', current: 'a current in A', ratio: 'a number or %', number: 'a plain number', integer: 'a whole number', 'loss per length': 'a loss in dB/m',
};

export const describeKind = (kind: QuantityKind): string => article[kind];

const kindsInWords = 5;
const describeKinds = (kinds: readonly QuantityKind[]): string => (kinds.length > kindsInWords ? 'a number with its unit' : kinds.map((kind) => article[kind]).join(', or '));

/** The dimensions that any of `kinds` takes. */
export const dimensionsOf = (kinds: readonly QuantityKind[]): Dimension[] => kinds.flatMap((kind) => accepted[kind]);

/** The whole phrase as one quantity of that kind; null where it is not one (reported). */
export function readQuantityPhrase(phrase: Phrase, kind: QuantityKind, context: PhraseContext): Quantity | null {
  const s = scanner(phrase, context);
  const found = quantityAt(s, [kind]);
  if (found) expectEnd(s);
  return found && { value: found.value, span: found.span };
}

/** A quantity of one of the kinds at the scanner; null (reported) where there is none. Expressions count where they may stand. */
export function quantityAt(s: Scanner, kinds: readonly QuantityKind[], unitless: 'refuse' | 'keep' = 'refuse'): (ReadQuantity & { readonly kind: QuantityKind }) | null {
  skipBlanks(s);
  const expression = readExpressionAt(s, kinds);
  if (expression !== undefined) return expression;
  const dimensions = dimensionsOf(kinds);
  const literal = literalAt(s.text, s.at, dimensions);
  if (!literal) {
    const word = nextWord(s);
    const wanted = describeKinds(kinds);
    complain(s, 'number-expected', word ? `Here ${wanted} was expected, not «${word.value}».` : `Here ${wanted} is missing.`, word?.span ?? spanOf(s, s.at, s.at));
    return null;
  }
  const commaAt = decimalComma(s.text, literal);
  if (commaAt !== null) {
    const span = spanOf(s, literal.start, commaAt.end);
    complain(s, 'decimal-comma', `«${s.text.slice(literal.start, commaAt.end)}» has a decimal comma; numbers here have a point.`, span, [replaceBy(spanOf(s, commaAt.comma, commaAt.comma + 1), '.')]);
    s.at = commaAt.end;
    return null;
  }
  s.at = literal.end;
  return judge(s, literal, kinds, unitless);
}

function decimalComma(text: string, literal: Literal): { comma: number; end: number } | null {
  const pattern = /[+\-−]?\d+(,)\d+(?:\s?[\p{L}\u2126%°]+)?/uy;
  pattern.lastIndex = literal.start;
  const found = pattern.exec(text);
  return found ? { comma: literal.start + found[0].indexOf(','), end: literal.start + found[0].length } : null;
}

function judge(s: Scanner, literal: Literal, kinds: readonly QuantityKind[], unitless: 'refuse' | 'keep'): (ReadQuantity & { readonly kind: QuantityKind }) | null {
  const span = spanOf(s, literal.start, literal.end);
  const written = s.text.slice(literal.start, literal.end);
  const done = (kind: QuantityKind) => {
    const value = literalValue(literal);
    if (!Number.isFinite(value)) {
      complain(s, 'number-too-large', `«${written}» is beyond what can be computed with.`, span);
      return null;
    }
    if (kind === 'integer' && !Number.isSafeInteger(value)) {
      complain(s, 'integer-expected', `«${written}» should be a whole number.`, span);
      return null;
    }
    return { value, span, literal, kind };
  };
  if (literal.form === 'letters' || literal.form === 'prefix') {
    const coded = kinds.filter((candidate) => candidate === 'resistance' || candidate === 'inductance' || candidate === 'capacitance');
    if (coded.length === 1) return letterFits(s, literal, coded[0], span) ? done(coded[0]) : null;
    complain(s, 'unit-missing', `«${written}» needs a unit here, since nothing else says whether it is Ω, H or F.`, span);
    return null;
  }
  if (literal.form === 'bare') {
    const plain = kinds.find((kind) => accepted[kind].includes('number'));
    if (plain) return done(plain);
    if (unitless === 'keep') return { value: literalValue(literal), span, literal, kind: kinds[0] };
    const joint = /\s*(?:-|−|–|—|to\b)\s*(?=[\d.])/y;
    joint.lastIndex = literal.end;
    const joined = joint.exec(s.text);
    if (joined) {
      const place = { start: s.phrase.at(literal.end), end: s.phrase.at(literal.end + joined[0].length) };
      complain(s, 'range-dots', 'A range is written with two dots: «863 .. 870 MHz».', spanOf(s, literal.start, s.text.length), [{ title: 'Write « .. »', edits: [{ span: place, text: ' .. ' }], preferred: true }]);
      s.at = s.text.length;
      return null;
    }
    if (literalValue(literal) === 0 && kinds.includes('resistance')) {
      // 0 is 0 in any unit, but the language wants it written.
      complain(s, 'unit-missing', `«${written}» needs a unit: ${article[kinds[0]]}.`, span, [replaceBy(span, `${written} Ω`)]);
      return null;
    }
    complain(s, 'unit-missing', `«${written}» needs a unit: ${describeKinds(kinds)}.`, span, kinds.map((kind, i) => replaceBy(span, `${written} ${usualUnit[kind]}`, kinds.length === 1 && i === 0)));
    return null;
  }
  return judgeUnit(s, literal, kinds, done);
}

/** `4R7` is a code of resistances and `4n7` one of inductances and capacitances; one in the other's place is a slip. */
function letterFits(s: Scanner, literal: Literal, kind: QuantityKind, span: Span): boolean {
  if ((kind === 'resistance' ? /[RKkMGLm]/ : /[pnuµμmf]/).test(literal.letter)) return true;
  const written = s.text.slice(literal.start, literal.end);
  const fixes = kind === 'inductance' && literal.letter === 'R' ? [replaceBy(span, `${literal.digits.replace(/^(-?\d+)\.$/, '$1')} µH`, false)] : [];
  complain(s, 'unit-wrong', `«${written}» is a code of ${kind === 'resistance' ? 'inductances and capacitances' : 'resistances'}, and this is ${article[kind]}${fixes.length > 0 ? '; printed on a coil it means µH' : ''}.`, span, fixes);
  return false;
}

function judgeUnit<T>(s: Scanner, literal: Literal, kinds: readonly QuantityKind[], done: (kind: QuantityKind) => T): T | null {
  const unitSpan = spanOf(s, literal.unitStart, literal.end);
  const dimension = dimensionOf(literal.unit);
  const kind = dimension && kinds.find((candidate) => accepted[candidate].includes(dimension));
  if (kind && !(kind === 'frequency' && /^[mnpuµμ]Hz$/.test(literal.unit))) return done(kind);
  if (kind) {
    const meant = literal.unit === 'mHz' ? 'MHz' : 'kHz';
    complain(s, 'unit-case', `«${literal.unit}» is ${literal.unit === 'mHz' ? 'millihertz' : 'a fraction of a hertz'}; ${meant} was probably meant.`, unitSpan, [replaceBy(unitSpan, meant)]);
    return null;
  }
  const wanted = describeKinds(kinds);
  if (dimension) {
    complain(s, 'unit-wrong', `«${literal.unit}» does not fit here: this is ${wanted}.`, unitSpan, meantFixes(literal, kinds, unitSpan));
    return null;
  }
  const fixes = meantFixes(literal, kinds, unitSpan);
  const meant = fixes.length > 0 ? fixes[0].edits[0].text : null;
  complain(s, 'unit-unknown', `«${literal.unit}» is not a unit here${meant ? `; ${meant} was probably meant` : `: this is ${wanted}`}. Upper and lower case count.`, unitSpan, fixes);
  return null;
}

function meantFixes(literal: Literal, kinds: readonly QuantityKind[], span: { start: number; end: number }) {
  // `5.6 n`: the prefix alone is short for the unit only where it touches the number.
  if (kinds.length === 1 && /^[pnuµμmkM]$/.test(literal.unit)) {
    const meant = `${literal.unit}${usualUnit[kinds[0]].replace(/^[pnmM](?=.)/, '')}`;
    if (unitOf(meant) && accepted[kinds[0]].includes(dimensionOf(meant)!)) return [replaceBy(span, meant)];
  }
  for (const dimension of dimensionsOf(kinds)) {
    const meant = meantUnit(literal.unit, dimension);
    if (meant && meant !== literal.unit && (unitOf(meant)?.dimension ?? dimensionOf(meant))) return [replaceBy(span, meant)];
  }
  return [];
}
