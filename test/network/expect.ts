import assert from 'node:assert/strict';
import type { Complex, ComplexArray } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import { sampleImpedance, type Immittance } from '../../src/network/immittance';
import type { Line } from '../../src/network/line';
import { idealPart, type Part, type PartKind } from '../../src/network/part';

// Short words for ladders and numbers in the tests of this room.

export const hz = (...values: number[]): Float64Array => Float64Array.from(values);
export const ohm = (re: number, im = 0): Impedance => ({ form: 'constant', impedanceOhm: { re, im } });
export const sampled = (impedance: Impedance, ...frequencies: number[]): Immittance => sampleImpedance(impedance, hz(...frequencies));

export function part(kind: PartKind, value: number, figures: Partial<Part> = {}): Impedance {
  return { form: 'part', part: { ...idealPart(kind, value), ...figures } };
}
export const coil = (value: number, figures?: Partial<Part>): Impedance => part('inductor', value, figures);
export const capacitor = (value: number, figures?: Partial<Part>): Impedance => part('capacitor', value, figures);
export const resistor = (value: number, figures?: Partial<Part>): Impedance => part('resistor', value, figures);

let names = 0;
export const series = (branch: Impedance, pair = false): Element => ({ form: 'branch', name: `X${++names}`, orientation: 'series', branch, pair });
export const shunt = (branch: Impedance, pair = false): Element => ({ form: 'branch', name: `X${++names}`, orientation: 'shunt', branch, pair });

const LIGHT_M_PER_S = 299792458;
/** A line of so many degrees at a frequency, with loss in dB for the whole. */
export const lineOf = (impedanceOhm: number, degrees: number, atHz: number, conductorLossDb = 0): Line => ({
  impedanceOhm, lengthM: (degrees / 360) * (LIGHT_M_PER_S / atHz), velocityFactor: 1, conductorLossDb, dielectricLossDb: 0, lossAtHz: atHz,
});
export const through = (line: Line): Element => ({ form: 'line', name: `X${++names}`, line });
export const stub = (end: 'open' | 'short', line: Line): Element => ({ form: 'stub', name: `X${++names}`, end, line });
export const transformer = (turnsSource: number, turnsLoad: number, windingH: number | null = null, coupling = 1): Element =>
  ({ form: 'transformer', name: `X${++names}`, turnsSource, turnsLoad, windingH, coupling });

export const pointOf = (x: ComplexArray, k = 0): Complex => ({ re: x.re[k], im: x.im[k] });

/** Within `tolerance`, absolute. */
export function near(actual: number, expected: number, tolerance: number, what = ''): void {
  assert.ok(Math.abs(actual - expected) <= tolerance, `${what} ${actual} is not within ${tolerance} of ${expected}`);
}
export function nearComplex(actual: Complex, expected: Complex, tolerance: number, what = ''): void {
  near(actual.re, expected.re, tolerance, `${what} (real part)`);
  near(actual.im, expected.im, tolerance, `${what} (imaginary part)`);
}

/** Seven digits, as far as the recomputed values of the tables are given. */
export const toSevenDigits = (actual: number, expected: number, what = ''): void => near(actual, expected, 6e-7 * Math.max(Math.abs(expected), 1e-3), what);
