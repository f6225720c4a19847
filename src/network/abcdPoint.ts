import type { Cascade } from './cascade';
import type { Complex, ComplexArray } from './complex';

// One point of arrays of complex numbers.

export const at = (x: ComplexArray, k: number): Complex => ({ re: x.re[k], im: x.im[k] });

export function put(x: ComplexArray, k: number, value: Complex): void {
  x.re[k] = value.re;
  x.im[k] = value.im;
}

export const isZeroAt = (x: ComplexArray, k: number): boolean => x.re[k] === 0 && x.im[k] === 0;

/** |re| + |im|: as good as the magnitude for comparing. */
export const sizeAt = (x: ComplexArray, k: number): number => Math.abs(x.re[k]) + Math.abs(x.im[k]);

/**
 * A pair (voltage, current) that the matrix gives for some load. Where the matrix lets nothing through it is the only one
 * there is, up to a factor: the impedance that the source sees whatever the load.
 */
export function largerColumn(network: Cascade, k: number): readonly [Complex, Complex] {
  const { a, b, c, d } = network;
  return sizeAt(a, k) + sizeAt(c, k) >= sizeAt(b, k) + sizeAt(d, k) ? [at(a, k), at(c, k)] : [at(b, k), at(d, k)];
}

/** The same seen from the load. */
export function largerRow(network: Cascade, k: number): readonly [Complex, Complex] {
  const { a, b, c, d } = network;
  return sizeAt(a, k) + sizeAt(b, k) >= sizeAt(c, k) + sizeAt(d, k) ? [at(a, k), at(b, k)] : [at(c, k), at(d, k)];
}
