import assert from 'node:assert/strict';
import fc from 'fast-check';
import { angleDeg, complex, magnitude, multiply, subtract } from '../../src/network/complex';
import { impedanceOf, reflectionOf } from '../../src/network/immittance';
import type { Line } from '../../src/network/line';
import { lineAbcd, lineInput } from '../../src/network/linePropagation';
import { hz, lineOf, near, nearComplex, pointOf } from './expect';

const lossy = (conductorLossDb: number, dielectricLossDb: number, lossAtHz = 1e9): Line => ({ impedanceOhm: 50, lengthM: 0.05, velocityFactor: 0.66, conductorLossDb, dielectricLossDb, lossAtHz });

/** |e^−γl| in dB, from what a short shows: Γ = −e^−2γl. */
const lossDb = (line: Line, f: number) => -10 * Math.log10(magnitude(pointOf(reflectionOf(lineInput(line, 'short', hz(f)), line.impedanceOhm))));

describe('lines', () => {
  it('are reciprocal and symmetric: A = D, AD − BC = 1', () => {
    const line = fc.record({
      impedanceOhm: fc.double({ min: 5, max: 300, noNaN: true }), lengthM: fc.double({ min: 0, max: 2, noNaN: true }), velocityFactor: fc.double({ min: 0.1, max: 1, noNaN: true }),
      conductorLossDb: fc.double({ min: 0, max: 20, noNaN: true }), dielectricLossDb: fc.double({ min: 0, max: 20, noNaN: true }), lossAtHz: fc.constant(1e9),
    });
    fc.assert(fc.property(line, fc.double({ min: 0, max: 2e9, noNaN: true }), (each, f) => {
      const { a, b, c, d, scale: divisor, known } = lineAbcd(each, hz(f));
      assert.deepEqual([known[0], pointOf(divisor)], [1, complex(1)]);
      assert.deepEqual(pointOf(a), pointOf(d));
      const size = 1 + magnitude(pointOf(a)) ** 2;
      nearComplex(subtract(multiply(pointOf(a), pointOf(d)), multiply(pointOf(b), pointOf(c))), complex(1), 1e-14 * size);
    }), { numRuns: 200 });
  });

  it('grow in phase with frequency: 360°·l·f/(vf·c)', () => {
    for (const f of [1e8, 5e8, 0.98e9]) {
      const expected = (-2 * 360 * 0.05 * f) / (0.66 * 299792458);
      near(angleDeg(pointOf(reflectionOf(lineInput(lossy(0, 0), 'open', hz(f)), 50))), expected, 1e-9);
    }
  });

  it('lose with √f in the conductor and with f in the dielectric, from where the loss is stated', () => {
    near(lossDb(lossy(0.4, 0), 1e9), 0.4, 1e-13);
    near(lossDb(lossy(0.4, 0), 4e9), 0.8, 1e-13);
    near(lossDb(lossy(0, 0.4), 4e9), 1.6, 1e-13);
    near(lossDb(lossy(0.1, 0.3, 2e9), 0.5e9), 0.05 + 0.075, 1e-13);
    near(lossDb(lossy(0.4, 0.4), 0), 0, 0);
  });

  it('of no length are nothing, at 0 Hz too', () => {
    for (const [line, f] of [[{ ...lossy(0, 0), lengthM: 0 }, 1e9], [lossy(0.4, 0.4), 0]] as const) {
      const { a, b, c } = lineAbcd(line, hz(f));
      assert.deepEqual([pointOf(a), pointOf(b), pointOf(c)], [complex(1), complex(0), complex(0)]);
    }
  });

  it('as stubs are open or shorted at 0 Hz and at half a wave, and the other at a quarter', () => {
    const at = (end: 'open' | 'short', degrees: number) => pointOf(reflectionOf(lineInput(lineOf(70, degrees, 1e9), end, hz(1e9)), 50));
    for (const [end, degrees, expected] of [['open', 0, 1], ['short', 0, -1], ['open', 180, 1], ['short', 180, -1], ['open', 90, -1], ['short', 90, 1]] as const) nearComplex(at(end, degrees), complex(expected), 1e-14, `${end} ${degrees}°`);
    assert.equal(impedanceOf(lineInput(lineOf(70, 0, 1e9), 'open', hz(1e9))).re[0], Infinity);
  });

  it('beyond measure of loss are a termination, in plain numbers', () => {
    const { a, b, c } = lineAbcd(lossy(1e6, 0), hz(1e9));
    assert.ok([a, b, c].every(({ re, im }) => Number.isFinite(re[0]) && Number.isFinite(im[0])));
    for (const end of ['open', 'short'] as const) nearComplex(pointOf(impedanceOf(lineInput(lossy(1e6, 0), end, hz(1e9)))), complex(50), 1e-12);
  });
});
