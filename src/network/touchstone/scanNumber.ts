import { numberAtMost } from './limits';
import { exactPowers, roundDecimal } from './roundDecimal';

/** Whole numbers of so many digits are exact as doubles. */
const exactDigits = 15;
const exponentAtMost = 100_000;

/** What stands at one place of a line of bytes. */
export interface ScannedNumber {
  /** NaN where it is no number; infinite where it is too large for one. */
  value: number;
  /** The number times 10^shift, rounded once. */
  shifted: number;
  /** Where it ends: at a blank or at `stop`. */
  end: number;
}

const isDigit = (byte: number) => byte >= 48 && byte <= 57;

/**
 * Reads one decimal number of a line of ASCII bytes, up to the next blank, correctly rounded: up to 15 digits and small
 * exponents by one exact multiplication or division (W. D. Clinger, «How to read floating point numbers accurately», PLDI
 * 1990), up to 30 digits in pairs of doubles, the rest by `Number`. Allocates nothing on the first two ways. `into.shifted` is the number times 10^shift, rounded once
 * too, so that 868.3 MHz are 868,300,000 Hz and not a neighbour of it.
 */
export function scanNumber(bytes: Uint8Array, start: number, stop: number, shift: number, into: ScannedNumber): void {
  let at = start;
  const negative = bytes[at] === 45;
  if (negative || bytes[at] === 43) at++;
  let high = 0;
  let digits = 0;
  let low = 0;
  let lowDigits = 0;
  let seen = 0;
  let fraction = -1;
  for (; at < stop; at++) {
    const digit = bytes[at] - 48;
    if (digit >= 0 && digit <= 9) {
      if (digits < exactDigits) {
        high = high * 10 + digit;
        if (high > 0) digits++;
      } else {
        low = low * 10 + digit;
        lowDigits++;
      }
      if (fraction >= 0) fraction++;
      seen++;
    } else if (digit === -2 && fraction < 0) {
      fraction = 0;
    } else {
      break;
    }
  }
  let good = seen > 0;
  let exponent = fraction > 0 ? -fraction : 0;
  const mantissaEnd = at;
  let stated = 0;
  if (good && at < stop && (bytes[at] | 32) === 101) {
    at++;
    const down = bytes[at] === 45;
    if (down || bytes[at] === 43) at++;
    good = at < stop && isDigit(bytes[at]);
    for (; at < stop && isDigit(bytes[at]); at++) stated = Math.min(stated * 10 + bytes[at] - 48, exponentAtMost);
    if (down) stated = -stated;
    exponent += stated;
  }
  if (at < stop && bytes[at] > 32) {
    good = false;
    while (at < stop && bytes[at] > 32) at++;
  }
  into.end = at;
  if (!good || at - start > numberAtMost) {
    into.value = into.shifted = NaN;
    return;
  }
  let size = decimal(high, low, lowDigits, exponent);
  if (Number.isNaN(size)) size = Number(textOf(bytes, negative ? start + 1 : start, mantissaEnd, stated));
  into.value = into.shifted = negative ? -size : size;
  if (shift === 0) return;
  size = decimal(high, low, lowDigits, exponent + shift);
  if (Number.isNaN(size)) size = Number(textOf(bytes, negative ? start + 1 : start, mantissaEnd, stated + shift));
  into.shifted = negative ? -size : size;
}

/** NaN where neither of the fast ways will do. */
function decimal(high: number, low: number, lowDigits: number, exponent: number): number {
  if (exponent > 22 || exponent < -44 || lowDigits > exactDigits) return NaN;
  if (lowDigits > 0) return high === 0 ? NaN : roundDecimal(high, low, lowDigits, exponent);
  if (exponent >= 0) return high * exactPowers[exponent];
  return exponent >= -22 ? high / exactPowers[-exponent] : roundDecimal(high, 0, 0, exponent);
}

function textOf(bytes: Uint8Array, start: number, end: number, exponent: number): string {
  let text = '';
  for (let i = start; i < end; i++) text += String.fromCharCode(bytes[i]);
  return `${text}e${exponent}`;
}
