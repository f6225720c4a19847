import { dimensionOf, metresOf, prefixes, unitOf, type Dimension } from './unit';

/** A number with its unit as it stands in a text, from `start` to `end`. Nothing about it has been judged yet. */
export interface Literal {
  readonly start: number;
  readonly end: number;
  /** Digits with an ASCII sign and point, as `Number` reads them. */
  readonly digits: string;
  /** Power of ten from a letter code or a bare prefix; 0 else. */
  readonly prefixExponent: number;
  /** `letters`: 4n7 and the like. `prefix`: 5.6n. `unit`: a word follows, known or not. `bare`: nothing does. */
  readonly form: 'letters' | 'prefix' | 'unit' | 'bare';
  /** The letter of a code or the bare prefix; empty else. */
  readonly letter: string;
  /** The unit's letters as written; empty without one. */
  readonly unit: string;
  readonly unitStart: number;
}

const number = /[+\-−]?(?:\d+(?:\.(?!\.)\d*)?|\.\d+)(?:[eE][+\-−]?\d+)?/y;
const unitWord = /\s*(dB\/m(?![\p{L}\d])|[\p{L}\u2126]+|°|%)/uy;
const codeInside = /[+\-−]?(\d*)([RKkMGLpnuµμmf])(\d+)(?![\p{L}\d.])/uy;
const barePrefix = /[pnuµμmkKMGRf](?![\p{L}\d\u2126])/uy;

/** IEC 60062 letters and their powers of ten; `L` is milliohm, `R` stands for the point alone. */
const codeExponents: Readonly<Record<string, number>> = { ...prefixes, R: 0, K: 3, L: -3 };

const dimensionsWithCodes: readonly Dimension[] = ['resistance', 'inductance', 'capacitance'];

/** Words that follow a number without being its unit. */
const followers = new Set(['at', 'in', 'for', 'into', 'against', 'with', 'from', 'or', 'x', 'points', 'step', 'bits', 'bit', 'turns', 'turn', 'port', 'Q', 'ESR', 'ESL', 'SRF', 'rated', 'part', 'fixed', 'up', 'to', 'vf', 'elements', 'watch', 'e']);

const ascii = (text: string) => text.replace(/−/g, '-').replace(/^\+/, '');

function match(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

/**
 * The literal at `at`, or null where there is no number. Letter codes and bare prefixes are taken only where the kind of
 * part gives the unit, so `expected` says what is wanted; an inch, too, is one only where a length is expected.
 */
export function literalAt(text: string, at: number, expected: readonly Dimension[]): Literal | null {
  const coded = expected.some((dimension) => dimensionsWithCodes.includes(dimension));
  if (coded) {
    const code = match(codeInside, text, at);
    if (code) {
      const sign = /^[-−]/.test(code[0]) ? '-' : '';
      const end = at + code[0].length;
      return { start: at, end, digits: `${sign}${code[1] || '0'}.${code[3]}`, prefixExponent: codeExponents[code[2]], form: 'letters', letter: code[2], unit: '', unitStart: end };
    }
  }
  const found = match(number, text, at);
  if (!found) return null;
  const digits = ascii(found[0]).replace(/\.(?=$|[eE])/, '');
  const numberEnd = at + found[0].length;
  if (coded) {
    const prefix = match(barePrefix, text, numberEnd);
    if (prefix && !(prefix[0] === 'm' && expected.includes('length'))) {
      return { start: at, end: numberEnd + 1, digits, prefixExponent: codeExponents[prefix[0]], form: 'prefix', letter: prefix[0], unit: '', unitStart: numberEnd };
    }
  }
  const word = match(unitWord, text, numberEnd);
  const spelled = word?.[1] ?? '';
  const isFollower = followers.has(spelled) && !(spelled === 'in' && expected.includes('length')) && dimensionOf(spelled) === (spelled === 'in' ? 'length' : null);
  if (!word || isFollower || (spelled !== '' && unitOf(spelled) === null && /^\s/.test(word[0]) && !looksLikeUnit(spelled))) {
    return { start: at, end: numberEnd, digits, prefixExponent: 0, form: 'bare', letter: '', unit: '', unitStart: numberEnd };
  }
  return { start: at, end: numberEnd + word[0].length, digits, prefixExponent: 0, form: 'unit', letter: '', unit: spelled, unitStart: numberEnd + word[0].length - spelled.length };
}

/** After a blank only short words are taken for a misspelt unit; longer ones are the next word of the phrase. */
const looksLikeUnit = (word: string) => word.length <= 4 || /^(ohm|hertz|farad|henry|volt|watt|amp|degree|inch|metre|meter|percent|siemens|lambda)s?$/i.test(word);

/** The literal's number in SI units: exact digits, so that 4.7 nH is the double nearest to 4.7e-9. dBm becomes watt, % a share. */
export function literalValue(literal: Literal): number {
  const [mantissa, exponent = '0'] = literal.digits.toLowerCase().split('e');
  const scaled = (power: number) => Number(`${mantissa}e${Number(exponent) + power}`);
  if (literal.form !== 'unit') return scaled(literal.prefixExponent);
  if (Object.hasOwn(metresOf, literal.unit)) return metresOf[literal.unit](scaled(0));
  const unit = unitOf(literal.unit);
  if (unit?.dimension === 'power level') return 10 ** (scaled(0) / 10) / 1000;
  return scaled((unit?.exponent ?? 0) + (unit?.dimension === 'percent' ? -2 : 0));
}
