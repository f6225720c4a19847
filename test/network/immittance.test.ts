import assert from 'node:assert/strict';
import type { Impedance } from '../../src/network/impedance';
import { fromReflection, impedanceOf, reflectionOf, sampleImpedance } from '../../src/network/immittance';
import { capacitor, coil, hz, nearComplex, ohm, pointOf, resistor, sampled } from './expect';

const F = 868e6;
const W = 2 * Math.PI * F;
const open: Impedance = { form: 'open' };
const short: Impedance = { form: 'short' };

describe('an impedance as a ratio', () => {
  const cases: readonly [string, Impedance, { re: number; im: number }][] = [
    ['a constant', ohm(18, -37), { re: 18, im: -37 }],
    ['a reflection coefficient', { form: 'reflection', reflection: { re: 0.2, im: 0.4 }, referenceOhm: 50 }, { re: 50, im: 50 }],
    ['a wire', short, { re: 0, im: 0 }],
    ['a sum', { form: 'series', members: [resistor(12), capacitor(3.3e-12)] }, { re: 12, im: -1 / (W * 3.3e-12) }],
    ['side by side', { form: 'parallel', members: [ohm(100), ohm(0, 100)] }, { re: 50, im: 50 }],
    ['a short beside anything', { form: 'parallel', members: [ohm(100), short, short] }, { re: 0, im: 0 }],
    ['an open beside something', { form: 'parallel', members: [open, ohm(100), open] }, { re: 100, im: 0 }],
    ['nothing in series is a wire', { form: 'series', members: [] }, { re: 0, im: 0 }],
    ['sums inside parallels', { form: 'parallel', members: [{ form: 'series', members: [ohm(10), ohm(0, 20)] }, ohm(10, -20)] }, { re: 25, im: 0 }],
  ];
  for (const [title, impedance, expected] of cases) {
    it(title, () => nearComplex(pointOf(impedanceOf(sampled(impedance, F))), expected, 1e-10));
  }

  it('has opens that are infinite and reflect with +1', () => {
    const opens: readonly Impedance[] = [
      open, { form: 'series', members: [open, ohm(5), open] }, { form: 'parallel', members: [] }, { form: 'parallel', members: [open, open] },
      { form: 'reflection', reflection: { re: 1, im: 0 }, referenceOhm: 50 }, capacitor(0),
    ];
    for (const impedance of opens) {
      const z = sampled(impedance, F);
      assert.equal(impedanceOf(z).re[0], Infinity);
      nearComplex(pointOf(reflectionOf(z, 50)), { re: 1, im: 0 }, 0);
    }
  });

  it('goes through lossless resonances exactly at a point', () => {
    // L = C = 1 and ω = 1: reactances of exactly +1 and −1.
    const one = 1 / (2 * Math.PI);
    nearComplex(pointOf(reflectionOf(sampled({ form: 'series', members: [coil(1), capacitor(1)] }, one), 1)), { re: -1, im: 0 }, 1e-14);
    nearComplex(pointOf(reflectionOf(sampled({ form: 'parallel', members: [coil(1), capacitor(1)] }, one), 1)), { re: 1, im: 0 }, 1e-14);
    nearComplex(pointOf(impedanceOf(sampled({ form: 'parallel', members: [{ form: 'series', members: [coil(1), capacitor(1)] }, ohm(50)] }, one))), { re: 0, im: 0 }, 1e-14);
  });

  it('stays finite for sizes outside of all sense', () => {
    for (const size of [1e-300, 1e-200, 1e200, 1e300]) {
      const many: Impedance = { form: 'parallel', members: Array.from({ length: 9 }, () => ({ form: 'series', members: [ohm(size), ohm(0, size)] })) };
      const reflection = pointOf(reflectionOf(sampled(many, F), 50));
      nearComplex(reflection, { re: size < 1 ? -1 : 1, im: 0 }, 1e-12);
    }
  });

  it('reads a table linearly in the reflection coefficient, and not past its ends', () => {
    const table: Impedance = { form: 'table', frequencyHz: hz(1e9, 2e9, 4e9), reflectionRe: hz(0, 0.5, -0.5), reflectionIm: hz(0, 0.2, 0.2), referenceOhm: 75 };
    const z = sampleImpedance(table, hz(0.9e9, 1e9, 1.5e9, 2e9, 3e9, 4e9, 4.1e9));
    assert.deepEqual([...z.known], [0, 1, 1, 1, 1, 1, 0]);
    assert.equal(z.reason, 'the table does not reach that frequency');
    const reflection = reflectionOf(z, 75);
    [[1, 0, 0], [2, 0.25, 0.1], [3, 0.5, 0.2], [4, 0, 0.2], [5, -0.5, 0.2]].forEach(([k, re, im]) => nearComplex(pointOf(reflection, k), { re, im }, 1e-15));
    assert.ok(Number.isNaN(reflection.re[0]) && Number.isNaN(reflection.im[6]));
  });

  it('reads a table of one point at that point', () => {
    const z = sampleImpedance({ form: 'table', frequencyHz: hz(1e9), reflectionRe: hz(0.5), reflectionIm: hz(0), referenceOhm: 50 }, hz(1e9, 1.1e9));
    assert.deepEqual([...z.known], [1, 0]);
    nearComplex(pointOf(impedanceOf(z)), { re: 150, im: 0 }, 1e-12);
  });

  it('carries the reason of what is not known through sums', () => {
    const unknown: Impedance = { form: 'unknown', reason: 'the file is missing' };
    for (const form of ['series', 'parallel'] as const) {
      const z = sampled({ form, members: [ohm(5), unknown, ohm(3)] }, F, 2 * F);
      assert.deepEqual([...z.known], [0, 0]);
      assert.equal(z.reason, 'the file is missing');
      assert.ok(Number.isNaN(impedanceOf(z).re[0]) && Number.isNaN(reflectionOf(z, 50).im[1]));
    }
  });

  it('comes back from its reflection, and is not known where that is not a number', () => {
    const z = fromReflection({ re: hz(-1, 1, 0.2, NaN, Infinity, 0), im: hz(0, 0, 0.4, 0, 0, 0) }, 50, Uint8Array.of(1, 1, 1, 1, 1, 0));
    assert.deepEqual([...z.known], [1, 1, 1, 0, 0, 0]);
    assert.equal(z.reason, 'a reflection coefficient is not a finite number');
    const back = reflectionOf(z, 50);
    nearComplex(pointOf(back, 0), { re: -1, im: 0 }, 0);
    nearComplex(pointOf(back, 1), { re: 1, im: 0 }, 0);
    nearComplex(pointOf(back, 2), { re: 0.2, im: 0.4 }, 1e-15);
  });

  it('reflects without bound, and without NaN, at minus the reference', () => {
    assert.equal(reflectionOf(sampled(ohm(-50), F), 50).re[0], Infinity);
  });
});
