import assert from 'node:assert/strict';
import type { Goal } from '../../src/study/goal';
import { isCondition, marginDb } from '../../src/study/marginDb';
import { goalOf, judge, near, ohms, problemOf, resistor, series } from './problems';

describe('margins in dB', () => {
  // 150 Ω: |Γ| 0.5, return loss 6.02 dB, VSWR 3, mismatch loss 1.249 dB, gain −1.249 dB.
  const problem = problemOf({ load: ohms(150) });
  const lossDb = 20 * Math.log10(2);
  const table: [string, Goal, number][] = [
    ['return loss, its own', goalOf('return loss', '>=', 10), lossDb - 10],
    ['return loss from above', goalOf('return loss', '<=', 10), 10 - lossDb],
    ['VSWR as return loss', goalOf('VSWR', '<=', 2), lossDb - 20 * Math.log10(3)],
    ['VSWR from below', goalOf('VSWR', '>=', 2), 20 * Math.log10(3) - lossDb],
    ['reflection', goalOf('reflection', '<=', 0.1), lossDb - 20],
    ['mismatch loss', goalOf('mismatch loss', '<=', -10 * Math.log10(1 - 0.25 ** 2)), lossDb - 40 * Math.log10(2)],
    ['gain', goalOf('gain', '>=', -2), 2 + 10 * Math.log10(0.75)],
    ['insertion loss', goalOf('insertion loss', '<=', 2), 2 + 10 * Math.log10(0.75)],
    ['VSWR exactly at the limit', goalOf('VSWR', '<=', 3), 0],
  ];
  for (const [what, goal, expected] of table) {
    it(what, () => {
      const margin = marginDb(judge(problem, goal));
      assert.ok(margin !== null && Math.abs(margin - expected) < 1e-12, `${margin} is not ${expected}`);
    });
  }
  it('efficiency in % and in dB come to the same', () => {
    const lossy = problemOf({ load: ohms(40), ladder: [series('R1', resistor(10))] });
    const expected = 10 * Math.log10(0.8 / 0.5);
    near(marginDb(judge(lossy, goalOf('efficiency', '>=', 50, { unit: '%' }))), expected, 1e-12);
    near(marginDb(judge(lossy, goalOf('efficiency', '>=', 10 * Math.log10(0.5), { unit: 'dB' }))), expected, 1e-12);
  });
  it('infinite values: an open is a return loss of 0, a match without bound', () => {
    const open = problemOf({ load: { form: 'open' } });
    near(marginDb(judge(open, goalOf('VSWR', '<=', 2))), -20 * Math.log10(3), 1e-12);
    near(marginDb(judge(open, goalOf('mismatch loss', '<=', 10 * Math.log10(4 / 3)))), -lossDb, 1e-12);
    assert.equal(marginDb(judge(open, goalOf('gain', '>=', -1))), -Infinity);
    assert.equal(marginDb(judge(open, goalOf('gain', '<=', -1))), Infinity);
    assert.equal(marginDb(judge(problemOf({}), goalOf('return loss', '>=', 10))), Infinity);
    assert.equal(marginDb(judge(problemOf({}), goalOf('return loss', '<=', 10))), -Infinity);
    assert.equal(marginDb(judge(problemOf({}), goalOf('VSWR', '<=', 1))), 0);
  });
  it('conditions have none, nor has what is not known', () => {
    const conditions: Goal['quantity'][] = ['input resistance', 'input reactance', 'bandwidth', 'voltage', 'current', 'dissipation', 'parts', 'yield', 'dc path', 'dc block', 'dc short at load'];
    for (const quantity of conditions) assert.equal(isCondition({ quantity }), true, quantity);
    for (const quantity of ['return loss', 'VSWR', 'reflection', 'mismatch loss', 'gain', 'insertion loss', 'efficiency', 'rejection'] as const) assert.equal(isCondition({ quantity }), false, quantity);
    assert.equal(marginDb(judge(problem, goalOf('parts', '<=', 3))), null);
    assert.equal(marginDb(judge(problem, goalOf('gain', '>=', -1, { caseName: 'none' }))), null);
  });
});
