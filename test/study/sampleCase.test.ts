import assert from 'node:assert/strict';
import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import { impedanceOf } from '../../src/network/immittance';
import { nearestBand, sampleLoad, sampleSource } from '../../src/study/sampleCase';
import { evaluate } from '../../src/study/evaluate';
import { band, fileOf, goalOf, judge, lineOf, near, ohms, onePort, points, problemOf, resistor, series, shunt, capacitor } from './problems';
import { ladderAtCodes } from '../../src/study/tunableCodes';
import { idealPart } from '../../src/network/part';
import type { Tunable } from '../../src/study/problem';

const pad: Element = series('R9', resistor(10));
const realAt = (impedance: ReturnType<typeof sampleLoad>) => [...impedanceOf(impedance).re];

describe('a load case', () => {
  it('loses its fixture where it is a file, and only there', () => {
    const file = fileOf(onePort(points(1e9, 2e9), () => ({ re: 0, im: 0 })));
    near(realAt(sampleLoad({ name: null, load: file, fixture: [pad] }, points(1e9)))[0], 40, 1e-12);
    near(realAt(sampleLoad({ name: null, load: ohms(50), fixture: [pad] }, points(1e9)))[0], 50, 1e-12);
    const beside: Impedance = { form: 'series', members: [file, ohms(5)] };
    near(realAt(sampleLoad({ name: null, load: beside, fixture: [pad] }, points(1e9)))[0], 55, 1e-12);
  });
  it('a line removed from a measurement turns it back (numbers from first principles)', () => {
    // 30 + j20 Ω measured at 1 GHz through 20 mm of 50 Ω line, velocity factor 0.7.
    const z = { re: 30, im: 20 };
    const size = (z.re + 50) ** 2 + z.im ** 2;
    const reflection = { re: ((z.re - 50) * (z.re + 50) + z.im ** 2) / size, im: (z.im * (z.re + 50) - (z.re - 50) * z.im) / size };
    const line: Element = { form: 'line', name: 'F1', line: { ...lineOf(50, 0.1, 1e9), lengthM: 0.02, velocityFactor: 0.7 } };
    const removed = impedanceOf(sampleLoad({ name: null, load: fileOf(onePort(points(0.9e9, 1e9), () => reflection)), fixture: [line] }, points(1e9)));
    near(removed.re[0], 24.59083, 5e-7);
    near(removed.im[0], -3.182643, 5e-7);
  });
});

describe('a source by band', () => {
  const bands = [band('low', points(100e6, 200e6)), band('high', points(800e6, 1000e6)), band('inner', points(900e6)), band('none', points(3e9))];
  const source = { impedance: ohms(50), byBand: new Map([['low', ohms(10)], ['high', ohms(20)], ['inner', ohms(30)]]) };
  const at = (frequencyHz: number, name: string | null = null) => realAt(sampleSource(source, bands, points(frequencyHz), name))[0];
  it('each frequency takes that of the band that holds it, of the nearest one otherwise', () => {
    // Between 200 and 800 MHz the middle in octaves is 400 MHz.
    for (const [frequencyHz, ohm] of [[50e6, 10], [150e6, 10], [399e6, 10], [401e6, 20], [900e6, 20], [1e9, 20], [1.7e9, 20]]) {
      near(at(frequencyHz), ohm, 1e-12, `${frequencyHz}`);
    }
  });
  it('a band without one of its own takes the general one', () => {
    near(at(3e9), 50, 1e-12);
    near(at(2e9), 50, 1e-12);
  });
  it('the points of a band take that band\'s, also where bands overlap', () => {
    near(at(900e6, 'inner'), 30, 1e-12);
    near(at(900e6, 'high'), 20, 1e-12);
  });
  it('mixed points come out in their own order', () => {
    assert.deepEqual(realAt(sampleSource(source, bands, points(900e6, 150e6, 3e9))), [20, 10, 50]);
    assert.equal(nearestBand([], 1e9), null);
    const partly = { ...source, byBand: new Map<string, Impedance>([['low', { form: 'unknown', reason: 'radio.s1p is missing' }]]) };
    const sampled = sampleSource(partly, bands, points(900e6, 150e6));
    assert.deepEqual([[...sampled.known], sampled.reason], [[1, 0], 'radio.s1p is missing']);
  });
  it('goals on overlapping bands use each band\'s own', () => {
    const problem = { ...problemOf({ load: ohms(30), bands }), source };
    const reflection = (name: string) => judge(problem, goalOf('reflection', '<=', 1, { place: { form: 'band', band: name } })).value;
    assert.equal(reflection('inner'), 0);
    near(reflection('high'), 0.2, 1e-12);
  });
});

describe('tunables', () => {
  const tunable: Tunable = { name: 'antcap', kind: 'capacitor', elements: ['C1'], states: [3, 5, 9].map((pF, code) => ({ code: code + 1, part: idealPart('capacitor', pF * 1e-12) })) };
  const problem = problemOf({ ladder: [shunt('C1', capacitor(1e-12), true), series('R1', resistor(5))], tunables: [tunable], sweepHz: points(1e9) });
  const valueOf = (codes?: ReadonlyMap<string, number>) => {
    const [element] = ladderAtCodes(problem, codes);
    return element.form === 'branch' && element.branch.form === 'part' && element.pair ? element.branch.part.value : null;
  };
  it('stand at their first state without a code, or with one that they do not have', () => {
    assert.equal(valueOf(), 3e-12);
    assert.equal(valueOf(new Map([['antcap', 2]])), 5e-12);
    assert.equal(valueOf(new Map([['antcap', 77]])), 3e-12);
  });
  it('evaluation takes codes', () => {
    const codes = new Map([['antcap', 3]]);
    const expected = evaluate({ ...problem, tunables: [], ladder: ladderAtCodes(problem, codes) }).traces[0].gainDb[0];
    assert.equal(evaluate(problem, { codes }).traces[0].gainDb[0], expected);
    assert.notEqual(evaluate(problem).traces[0].gainDb[0], expected);
  });
});
