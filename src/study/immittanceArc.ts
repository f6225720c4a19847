import { add, complex, magnitude, multiply, scale, subtract, type Complex, type ComplexArray } from '../network/complex';

/** Z = numerator/denominator at one point. */
export interface Ratio {
  readonly numerator: Complex;
  readonly denominator: Complex;
}

/** What is added to it: an impedance top/bottom in series, or an admittance top/bottom across. */
export interface Added {
  readonly along: 'series' | 'shunt';
  readonly top: Complex;
  readonly bottom: Complex;
}

/**
 * Reflection against z0 while t·(top/bottom) is added and t grows from 0 to 1.
 *
 * Γ is a fraction of straight lines in t; with both ends scaled to denominators of magnitude 1, t runs such that the chart
 * is crossed at the same pace at both ends, also where the whole of it is an open or a short (`bottom` 0).
 */
export function immittanceArc(before: Ratio, added: Added, z0Ohm: number, points: number): ComplexArray {
  // An open or short has no phase to arrive by: taken as +j∞, the limit of a coil in series or of a capacitor across.
  const bottom = magnitude(added.bottom) > 0 ? added.bottom : scale(multiply(added.top, complex(0, -1)), 1e-200);
  const start: Ratio = { numerator: multiply(before.numerator, bottom), denominator: multiply(before.denominator, bottom) };
  const end: Ratio = added.along === 'series'
    ? { numerator: add(start.numerator, multiply(added.top, before.denominator)), denominator: start.denominator }
    : { numerator: start.numerator, denominator: add(start.denominator, multiply(added.top, before.numerator)) };
  const [fromTop, fromBottom] = waves(start, z0Ohm);
  const [toTop, toBottom] = waves(end, z0Ohm);
  const arc: ComplexArray = { re: new Float64Array(points), im: new Float64Array(points) };
  for (let k = 0; k < points; k++) {
    const share = k / (points - 1);
    const top = add(scale(fromTop, 1 - share), scale(toTop, share));
    const base = add(scale(fromBottom, 1 - share), scale(toBottom, share));
    const size = base.re * base.re + base.im * base.im;
    arc.re[k] = (top.re * base.re + top.im * base.im) / size;
    arc.im[k] = (top.im * base.re - top.re * base.im) / size;
  }
  return arc;
}

/** Numerator and denominator of the reflection, scaled so that the latter has magnitude 1. */
function waves({ numerator, denominator }: Ratio, z0Ohm: number): readonly [Complex, Complex] {
  const top = subtract(numerator, scale(denominator, z0Ohm));
  const bottom = add(numerator, scale(denominator, z0Ohm));
  const size = magnitude(bottom);
  return [scale(top, 1 / size), scale(bottom, 1 / size)];
}
