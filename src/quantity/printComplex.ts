import { printNumber, withMinus } from './printQuantity';

interface Pair {
  readonly re: number;
  readonly im: number;
}

const decimalsFor = (magnitude: number) => (magnitude >= 1000 ? 0 : magnitude >= 100 ? 0 : magnitude >= 1 ? 1 : 3);

/** `18.0 − j37.2 Ω`; `open` where infinite. The unit may be empty. */
export function printComplex({ re, im }: Pair, unit: string): string {
  if (!Number.isFinite(re) || !Number.isFinite(im)) return Number.isNaN(re) && Number.isNaN(im) ? 'not known' : 'open';
  const decimals = decimalsFor(Math.max(Math.abs(re), Math.abs(im)));
  const real = tidyZero(re.toFixed(decimals));
  const imaginary = Math.abs(im).toFixed(decimals);
  return `${withMinus(real)} ${im < 0 && Number(imaginary) !== 0 ? '−' : '+'} j${imaginary}${unit === '' ? '' : ` ${unit}`}`;
}

/** `0.620 ∠ −38°` */
export function printPolar({ re, im }: Pair): string {
  const radius = Math.hypot(re, im);
  const degrees = (Math.atan2(im, re) * 180) / Math.PI;
  return `${radius.toFixed(3)} ∠ ${withMinus(tidyZero(degrees.toFixed(0)))}°`;
}

const tidyZero = (text: string) => (Number(text) === 0 ? text.replace('-', '') : text);

/** `+j70.8 Ω`, `−j51.0 Ω`; susceptances in mS. */
export function printReactance(value: number, unit: 'Ω' | 'S'): string {
  if (!Number.isFinite(value)) return '∞';
  const scaled = unit === 'S' ? value * 1000 : value;
  const magnitude = Math.abs(scaled);
  const text = magnitude >= 1000 ? printNumber(magnitude, 4) : magnitude.toFixed(magnitude >= 0.05 || magnitude === 0 ? 1 : 3);
  return `${scaled < 0 ? '−' : '+'}j${text} ${unit === 'S' ? 'mS' : unit}`;
}
