import assert from 'node:assert/strict';
import { band, capacitor, fileOf, goalOf, inductor, judge, near, ohms, onePort, points, problemOf, series, shunt } from './problems';

const shuntC = [shunt('C1', capacitor(3e-12))];

/** Insertion loss of a capacitance across R (load) and 50 Ω, by hand: 4 Rs RL/|(Rs + RL) + jωC Rs RL|². */
function lossDb(frequencyHz: number, loadOhm: number): number {
  const cross = 2 * Math.PI * frequencyHz * 3e-12 * 50 * loadOhm;
  return -10 * Math.log10((4 * 50 * loadOhm) / ((50 + loadOhm) ** 2 + cross ** 2));
}

describe('rejection', () => {
  const bands = [band('low', points(0.5e9, 1e9)), band('high', points(2e9))];
  const harmonic = { form: 'harmonic', order: 2, band: 'low' } as const;
  const problem = problemOf({ load: ohms(100), bands, ladder: shuntC });

  it('loss at each point asked for, less the largest in the band of the multiple', () => {
    const result = judge(problem, goalOf('rejection', '>=', 3, { place: harmonic, unit: 'dB' }));
    near(result.value, lossDb(1e9, 100) - lossDb(1e9, 100), 1e-9, 'the worst point is at twice the lowest edge');
    assert.equal(result.frequencyHz, 1e9);
  });
  it('is that of the band that is multiplied, with its own source', () => {
    const source = { impedance: ohms(50), byBand: new Map([['high', ohms(20)]]) };
    const place = { form: 'harmonic', order: 2.1, band: 'low' } as const; // up to 2.1 GHz, next to the other band
    near(judge({ ...problem, source }, goalOf('insertion loss', '<=', 3, { place })).value, lossDb(2.1e9, 100), 1e-9);
  });
  it('against another band, else the first', () => {
    const at = { form: 'frequency', frequencyHz: 4e9 } as const;
    near(judge(problem, goalOf('rejection', '>=', 3, { place: at, against: 'high' })).value, lossDb(4e9, 100) - lossDb(2e9, 100), 1e-9);
    near(judge(problem, goalOf('rejection', '>=', 3, { place: at })).value, lossDb(4e9, 100) - lossDb(1e9, 100), 1e-9);
    assert.match(judge(problem, goalOf('rejection', '>=', 3, { place: at, against: 'none' })).reason!, /no band called none/);
  });
  it('the band of the multiple goes before `against`', () => {
    const place = { form: 'harmonic', order: 8, band: 'low' } as const;
    near(judge(problem, goalOf('rejection', '>=', 3, { place, against: 'high' })).value, lossDb(4e9, 100) - lossDb(1e9, 100), 1e-9);
  });
  it('`into` replaces the load only at the points asked for', () => {
    const result = judge(problem, goalOf('rejection', '>=', 3, { place: { form: 'harmonic', order: 2, band: 'high' }, into: ohms(50) }));
    near(result.value, lossDb(4e9, 50) - lossDb(2e9, 100), 1e-9);
  });
  it('each case against itself', () => {
    const two = problemOf({ load: { one: ohms(100), two: ohms(20) }, bands, ladder: shuntC });
    const at = { form: 'frequency', frequencyHz: 4e9 } as const;
    const of = (loadOhm: number) => lossDb(4e9, loadOhm) - lossDb(1e9, loadOhm);
    const worst = judge(two, goalOf('rejection', '>=', 3, { place: at }));
    assert.equal(worst.caseName, 'two');
    near(worst.value, of(20), 1e-9);
    near(judge(two, goalOf('rejection', '>=', 3, { place: at, caseName: 'one' })).value, of(100), 1e-9);
    // With a load of its own there, the cases still differ in what passes.
    const into = judge(two, goalOf('rejection', '>=', 3, { place: at, into: ohms(50) }));
    near(into.value, Math.min(lossDb(4e9, 50) - lossDb(1e9, 100), lossDb(4e9, 50) - lossDb(1e9, 20)), 1e-9);
    assert.ok(into.caseName === 'one' || into.caseName === 'two');
  });
  it('a harmonic beyond the file is known only with `into`', () => {
    const file = fileOf(onePort(points(0.4e9, 0.8e9, 1.2e9), () => ({ re: 1 / 3, im: 0 })));
    const measured = problemOf({ load: file, bands, ladder: shuntC });
    const place = { form: 'harmonic', order: 4, band: 'low' } as const;
    assert.match(judge(measured, goalOf('rejection', '>=', 3, { place })).reason!, /^load: /);
    near(judge(measured, goalOf('rejection', '>=', 3, { place, into: ohms(50) })).value, lossDb(2e9, 50) - lossDb(1e9, 100), 1e-9);
  });
  it('nothing arrives: infinite, or not known where nothing arrives in the reference either', () => {
    const omega = 2 * Math.PI * 2e9;
    const open = problemOf({ load: ohms(50), bands, ladder: [] });
    const stop = judge(open, goalOf('rejection', '>=', 60, { place: harmonic, into: { form: 'open' } }));
    assert.deepEqual([stop.ok, stop.value, stop.reason], [true, null, null]);
    const blocked = problemOf({ load: { form: 'short' }, bands, ladder: [series('L1', inductor(50 / omega))] });
    assert.match(judge(blocked, goalOf('rejection', '>=', 3, { place: harmonic })).reason!, /nothing reaches the load/);
    const unpassed = judge(blocked, goalOf('rejection', '>=', 3, { place: harmonic, into: ohms(50) }));
    assert.deepEqual([unpassed.ok, unpassed.value, unpassed.reason], [false, null, null]);
  });
});
