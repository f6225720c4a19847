import { complexArray, type ComplexArray } from './complex';
import type { Immittance } from './immittance';

/** Ratios whose larger part leaves 1/RATIO_LIMIT … RATIO_LIMIT are rescaled, so that products of many stay finite. */
const RATIO_LIMIT = 1e30;

/** A known immittance of all zeros, to be filled with `writeRatio`. */
export function knownImmittance(length: number, reason: string | null = null): Immittance {
  return { numerator: complexArray(length), denominator: complexArray(length), known: new Uint8Array(length).fill(1), reason };
}

/** Not known anywhere. */
export function unknownImmittance(length: number, reason: string): Immittance {
  const result = knownImmittance(length, reason);
  for (let k = 0; k < length; k++) forget(result, k);
  return result;
}

/** Marks point k as not known. */
export function forget(z: Immittance, k: number): void {
  z.known[k] = 0;
  z.numerator.re[k] = z.numerator.im[k] = z.denominator.re[k] = z.denominator.im[k] = NaN;
}

/** Writes one point, rescaled where it is very large or very small. Not both may be 0. */
export function writeRatio(z: Immittance, k: number, nRe: number, nIm: number, dRe: number, dIm: number): void {
  const largest = Math.max(Math.abs(nRe), Math.abs(nIm), Math.abs(dRe), Math.abs(dIm));
  const factor = largest > RATIO_LIMIT || largest < 1 / RATIO_LIMIT ? 1 / largest : 1;
  z.numerator.re[k] = nRe * factor;
  z.numerator.im[k] = nIm * factor;
  z.denominator.re[k] = dRe * factor;
  z.denominator.im[k] = dIm * factor;
}

/** top / bottom by Smith's method; a division by 0 is +∞ + j0. */
export function writeQuotient(into: ComplexArray, k: number, topRe: number, topIm: number, bottomRe: number, bottomIm: number): void {
  if (bottomRe === 0 && bottomIm === 0) {
    into.re[k] = Infinity;
    into.im[k] = 0;
  } else if (Math.abs(bottomRe) >= Math.abs(bottomIm)) {
    const r = bottomIm / bottomRe;
    const d = bottomRe + bottomIm * r;
    into.re[k] = (topRe + topIm * r) / d;
    into.im[k] = (topIm - topRe * r) / d;
  } else {
    const r = bottomRe / bottomIm;
    const d = bottomRe * r + bottomIm;
    into.re[k] = (topRe * r + topIm) / d;
    into.im[k] = (topIm * r - topRe) / d;
  }
}
