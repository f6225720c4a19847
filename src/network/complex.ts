/** A complex scalar. Arrays of complex numbers are pairs of Float64Array instead. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

/** Complex numbers at n points: two arrays of the same length. */
export interface ComplexArray {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export const complex = (re: number, im = 0): Complex => ({ re, im });
export const complexArray = (length: number): ComplexArray => ({ re: new Float64Array(length), im: new Float64Array(length) });
export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
export const subtract = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });
export const multiply = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
export const scale = (a: Complex, k: number): Complex => ({ re: a.re * k, im: a.im * k });
export const conjugate = (a: Complex): Complex => ({ re: a.re, im: -a.im });
export const magnitude = (a: Complex): number => Math.hypot(a.re, a.im);
/** Degrees, −180 … 180. */
export const angleDeg = (a: Complex): number => (Math.atan2(a.im, a.re) * 180) / Math.PI;
export const polar = (r: number, degrees: number): Complex => ({ re: r * Math.cos((degrees * Math.PI) / 180), im: r * Math.sin((degrees * Math.PI) / 180) });
/** a / b by Smith's method, which does not overflow; b = 0 gives NaN or infinities. */
export function divide(a: Complex, b: Complex): Complex {
  if (Math.abs(b.re) >= Math.abs(b.im)) {
    const r = b.im / b.re;
    const d = b.re + b.im * r;
    return { re: (a.re + a.im * r) / d, im: (a.im - a.re * r) / d };
  }
  const r = b.re / b.im;
  const d = b.re * r + b.im;
  return { re: (a.re * r + a.im) / d, im: (a.im * r - a.re) / d };
}
