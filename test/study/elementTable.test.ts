import assert from 'node:assert/strict';
import type { Element } from '../../src/network/element';
import { evaluate } from '../../src/study/evaluate';
import { markerReading } from '../../src/study/markerReading';
import { band, bridge, capacitor, fileOf, inductor, lineOf, near, notFitted, ohms, onePort, points, problemOf, resistor, series, shunt } from './problems';

const omega = 2 * Math.PI * 1e9;
/** Geometric mean 1 GHz. */
const bands = [band('first', points(0.8e9, 1.25e9)), band('second', points(3e9))];

describe('the ladder as a table', () => {
  const stub: Element = { form: 'stub', name: 'S1', end: 'short', line: lineOf(50, 0.1, 1e9) };
  const ladder: Element[] = [
    shunt('C1', capacitor(2e-12)), series('L1', inductor(10e-9)), series('R1', resistor(3)), series('L2', inductor(1e-9), true),
    shunt('trap', { form: 'series', members: [inductor(1e-9), capacitor(1e-12)] }), bridge('R2'), notFitted('C2'), stub,
    { form: 'line', name: 'T1', line: lineOf(50, 0.1, 1e9) }, { form: 'transformer', name: 'T2', turnsSource: 1, turnsLoad: 2, windingH: null, coupling: 1 },
  ];
  const table = evaluate(problemOf({ load: ohms(25, 10), bands, ladder })).elements;

  it('says what each element is', () => {
    assert.deepEqual(table.map(({ name, orientation, kind, value, unit, fitted }) => [name, orientation, kind, value, unit, fitted]), [
      ['C1', 'shunt', 'capacitor', 2e-12, 'F', true],
      ['L1', 'series', 'inductor', 10e-9, 'H', true],
      ['R1', 'series', 'resistor', 3, 'Ω', true],
      ['L2', 'series', 'inductor', 1e-9, 'H', true],
      ['trap', 'shunt', 'branch', null, null, true],
      ['R2', 'series', 'bridge', 0, 'Ω', false],
      ['C2', 'shunt', 'capacitor', null, null, false],
      ['S1', 'shunt', 'stub', lineOf(50, 0.1, 1e9).lengthM, 'm', true],
      ['T1', 'through', 'line', lineOf(50, 0.1, 1e9).lengthM, 'm', true],
      ['T2', 'through', 'transformer', null, null, true],
    ]);
    for (const { frequencyHz, reason } of table) {
      near(frequencyHz, 1e9, 1e-12);
      assert.equal(reason, null);
    }
  });
  it('reactance and susceptance of the element alone, of both parts of a pair, at the middle of the first band', () => {
    near(table[0].reactanceOhm, -1 / (omega * 2e-12), 1e-12);
    near(table[0].susceptanceS, omega * 2e-12, 1e-12);
    near(table[1].reactanceOhm, omega * 10e-9, 1e-12);
    assert.deepEqual([table[2].reactanceOhm, table[2].susceptanceS], [0, 0]);
    near(table[3].reactanceOhm, 2 * omega * 1e-9, 1e-12);
    near(table[4].reactanceOhm, omega * 1e-9 - 1 / (omega * 1e-12), 1e-12);
    assert.deepEqual([table[5].reactanceOhm, table[5].susceptanceS], [0, null]);
    assert.deepEqual([table[6].reactanceOhm, table[6].susceptanceS], [null, 0]);
    // Pozar, Microwave Engineering, eq. 2.45c: j·50·tan 36°.
    near(table[7].reactanceOhm, 36.32713, 5e-7);
    assert.deepEqual([table[8].reactanceOhm, table[8].susceptanceS], [null, null]);
  });
  it('what is seen after each element (25 + j10 Ω, 2 pF, 10 nH; numbers from first principles)', () => {
    near(table[1].impedanceAfterOhm!.re, 28.96334, 5e-7);
    near(table[1].impedanceAfterOhm!.im, 63.86223, 5e-7);
    near(table[1].reflectionAfter!.re, 0.2343761, 5e-7);
    near(table[1].reflectionAfter!.im, 0.6192044, 5e-7);
    near(table[2].impedanceAfterOhm!.re, 31.96334, 5e-7);
  });
  it('beyond an unsolved element nothing is known, and the reason names it', () => {
    const unsolved: Element = { form: 'unsolved', name: 'C9', orientation: 'shunt', kind: null };
    const rows = evaluate(problemOf({ ladder: [series('R1', resistor(50)), unsolved, series('R2', resistor(1))] })).elements;
    near(rows[0].impedanceAfterOhm!.re, 100, 1e-12);
    assert.deepEqual([rows[1].kind, rows[1].fitted, rows[1].impedanceAfterOhm, rows[1].peakVoltageV], ['branch', false, null, null]);
    for (const row of rows) assert.match(row.reason!, /C9 is still to be solved/);
    assert.equal(rows[2].reflectionAfter, null);
  });
  it('a load that is not known there', () => {
    const file = fileOf(onePort(points(2.9e9, 3.1e9), () => ({ re: 0.1, im: 0 })));
    const rows = evaluate(problemOf({ load: file, bands, ladder: [series('R1', resistor(50))] })).elements;
    assert.equal(rows[0].impedanceAfterOhm, null);
    assert.match(rows[0].reason!, /^load: /);
    assert.equal(rows[0].reactanceOhm, 0);
  });
});

describe('values at the marker', () => {
  it('each case at one frequency', () => {
    const problem = problemOf({ load: { one: ohms(100), two: fileOf(onePort(points(2e9, 3e9), () => ({ re: 0, im: 0 }))) }, sourceOhm: ohms(50, 20) });
    const [one, two] = markerReading(problem, 1e9);
    // (100 − 50 + j20)/(150 + j20)
    near(Math.hypot(one.reflection!.re, one.reflection!.im), Math.hypot(50, 20) / Math.hypot(150, 20), 1e-12);
    near(one.chartReflection!.re, 1 / 3, 1e-12);
    assert.deepEqual(one.impedanceOhm, { re: 100, im: 0 });
    near(one.gainDb, 10 * Math.log10((4 * 50 * 100) / (150 ** 2 + 20 ** 2)), 1e-12);
    near(one.efficiency, 1, 1e-12);
    near(one.returnLossDb, -20 * Math.log10(Math.hypot(50, 20) / Math.hypot(150, 20)), 1e-12);
    assert.deepEqual([two.reflection, two.gainDb, two.caseName], [null, null, 'two']);
    assert.match(two.reason!, /^load two: /);
  });
});
