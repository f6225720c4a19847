import assert from 'node:assert/strict';
import { cascade } from '../../src/network/cascade';
import { decibels, mismatchLossDb, powerWaveReflection, returnLossDb, transducerGain, vswr } from '../../src/network/figures';
import type { Impedance } from '../../src/network/impedance';
import { fromReflection } from '../../src/network/immittance';
import { hz, near, nearComplex, ohm, pointOf, sampled } from './expect';

const F = 1e9;
const powerWave = (load: Impedance, source: Impedance) => pointOf(powerWaveReflection(sampled(load, F), sampled(source, F)));

describe('power waves', () => {
  it('are the usual reflection against a real source', () => nearComplex(powerWave(ohm(18, -37), ohm(50)), { re: -807 / 5993, im: -3700 / 5993 }, 1e-15));
  it('are nothing at a conjugate match, where the voltage ratio is not', () => nearComplex(powerWave(ohm(18, -22), ohm(18, 22)), { re: 0, im: 0 }, 0));
  it('reflect all of an open, a short and a reactance', () => {
    for (const load of [{ form: 'open' }, { form: 'short' }, ohm(0, 30)] as const) {
      const { re, im } = powerWave(load, ohm(18, 22));
      near(Math.hypot(re, im), 1, 1e-15);
    }
    nearComplex(powerWave({ form: 'open' }, ohm(18, 22)), { re: 1, im: 0 }, 0);
  });
  it('keep their angle for a source given as a ratio with a complex denominator', () => {
    // The same 18 + j22 Ω by way of its reflection coefficient.
    const z = { re: 18, im: 22 };
    const size = (z.re + 50) ** 2 + z.im ** 2;
    const reflection = { re: ((z.re - 50) * (z.re + 50) + z.im ** 2) / size, im: (z.im * (z.re + 50) - z.im * (z.re - 50)) / size };
    const source = fromReflection({ re: hz(reflection.re), im: hz(reflection.im) }, 50);
    nearComplex(pointOf(powerWaveReflection(sampled(ohm(75, -40), F), source)), powerWave(ohm(75, -40), ohm(18, 22)), 1e-14);
  });
  it('are symmetric in magnitude', () => {
    const size = ({ re, im }: { re: number; im: number }) => Math.hypot(re, im);
    near(size(powerWave(ohm(75, -40), ohm(20, 30))), size(powerWave(ohm(20, 30), ohm(75, -40))), 1e-15);
  });
  it('have no bound at minus the source', () => assert.equal(powerWave(ohm(-50), ohm(50)).re, Infinity));
  it('are not known where either end is not', () => {
    assert.ok(Number.isNaN(powerWave({ form: 'unknown', reason: 'x' }, ohm(50)).re));
    assert.ok(Number.isNaN(powerWave(ohm(50), { form: 'unknown', reason: 'x' }).im));
  });
});

describe('transducer gain', () => {
  const gain = (load: Impedance, source: Impedance) => transducerGain(cascade([], hz(F)), sampled(source, F), sampled(load, F))[0];
  it('of a straight connection is what the reflection leaves', () => {
    for (const [load, source] of [[ohm(18, -37), ohm(50)], [ohm(75, -40), ohm(20, 30)], [ohm(1e-3, 400), ohm(50, -400)]] as const) {
      const { re, im } = powerWave(load, source);
      near(gain(load, source), 1 - re * re - im * im, 1e-14);
    }
  });
  it('is 0 into an open, a short or a reactance', () => {
    for (const load of [{ form: 'open' }, { form: 'short' }, ohm(0, 30)] as const) assert.equal(gain(load, ohm(50, 7)), 0);
  });
  it('is not known where an end is not', () => {
    assert.ok(Number.isNaN(gain({ form: 'unknown', reason: 'x' }, ohm(50))));
    assert.ok(Number.isNaN(gain(ohm(50), { form: 'unknown', reason: 'x' })));
  });
});

describe('figures of one magnitude', () => {
  const cases: readonly [(x: number) => number, number, number][] = [
    [returnLossDb, 1, 0], [returnLossDb, 0, Infinity], [returnLossDb, 0.1, 20], [returnLossDb, 10, -20],
    [vswr, 0, 1], [vswr, 0.5, 3], [vswr, 1, Infinity], [vswr, 1.2, Infinity],
    [mismatchLossDb, 0, 0], [mismatchLossDb, 1, Infinity], [mismatchLossDb, 1.2, Infinity], [mismatchLossDb, Math.sqrt(0.9), 10],
    [decibels, 1, 0], [decibels, 0.5, 10 * Math.log10(0.5)], [decibels, 0, -Infinity], [decibels, -0.1, -Infinity],
  ];
  for (const [figure, x, expected] of cases) {
    it(`${figure.name}(${x}) is ${expected}`, () => {
      if (Number.isFinite(expected)) near(figure(x), expected, 1e-12);
      else assert.equal(figure(x), expected);
      assert.ok(!Object.is(figure(x), -0));
    });
  }
  it('keep what is not known', () => {
    for (const figure of [returnLossDb, vswr, mismatchLossDb, decibels]) assert.ok(Number.isNaN(figure(NaN)));
  });
});
