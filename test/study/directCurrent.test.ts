import assert from 'node:assert/strict';
import type { Element } from '../../src/network/element';
import type { NetworkData } from '../../src/network/networkData';
import { directCurrent } from '../../src/study/directCurrent';
import { bridge, capacitor, goalOf, inductor, judge, lineOf, notFitted, points, problemOf, resistor, series, shunt } from './problems';

/** A straight connection at 1 GHz. Invented. */
const twoPort: NetworkData = {
  ports: 2, frequencyHz: points(1e9), referenceOhm: points(50, 50), sRe: points(0, 1, 1, 0), sIm: points(0, 0, 0, 0),
};
const coil = inductor(1e-9);
const cap = capacitor(1e-12);
const line: Element = { form: 'line', name: 'T1', line: lineOf(50, 0.1, 1e9) };
const stub = (end: 'open' | 'short'): Element => ({ form: 'stub', name: 'S1', end, line: lineOf(50, 0.1, 1e9) });
const transformer: Element = { form: 'transformer', name: 'T2', turnsSource: 1, turnsLoad: 2, windingH: 1e-6, coupling: 0.9 };
const block: Element = { form: 'block', name: 'F1', data: twoPort, reversed: false };

describe('conditions on direct current', () => {
  // Ladders stand load first. `?` is: cannot be told.
  const table: [string, Element[], path: boolean | null, shortAtLoad: boolean | null][] = [
    ['no element at all', [], true, false],
    ['series coil, shunt capacitor', [series('L1', coil), shunt('C1', cap)], true, false],
    ['series capacitor, shunt coil', [series('C1', cap), shunt('L1', coil)], false, false],
    ['shunt coil at the load, series capacitor', [shunt('L1', coil), series('C1', cap)], false, true],
    ['shunt coil behind a series coil', [series('L1', coil), shunt('L2', coil)], true, true],
    ['shunt coil behind a resistor', [series('R1', resistor(10)), shunt('L2', coil)], true, false],
    ['resistor to ground is a path, not a short', [shunt('R1', resistor(1e4))], true, false],
    ['a resistor of 0 Ω', [series('R1', resistor(0)), shunt('L1', coil)], true, true],
    ['bridge, line, then a shorted stub', [bridge('R1'), line, stub('short')], true, true],
    ['open stub, empty pads', [stub('open'), notFitted('C1')], true, false],
    ['series branch of coil and capacitor', [series('trap', { form: 'series', members: [coil, cap] })], false, false],
    ['series branch of coil beside capacitor', [series('trap', { form: 'parallel', members: [coil, cap] }), shunt('L1', coil)], true, true],
    ['shunt branch of coil and capacitor', [shunt('trap', { form: 'series', members: [coil, cap] })], true, false],
    ['shunt branch of coil beside capacitor', [shunt('trap', { form: 'parallel', members: [cap, coil] })], true, true],
    ['coil and resistor in a shunt branch', [shunt('trap', { form: 'series', members: [coil, resistor(5)] })], true, false],
    ['two capacitors side by side', [series('C1', { form: 'parallel', members: [cap, cap] })], false, false],
    ['two capacitors side by side across', [shunt('C1', { form: 'parallel', members: [cap, cap] })], true, false],
    ['two coils one after the other across', [shunt('L1', { form: 'series', members: [coil, coil] })], true, true],
    ['a resistor beside a capacitor in the path', [series('R1', { form: 'parallel', members: [cap, resistor(10)] }), shunt('L1', coil)], true, false],
    ['an open in the path', [series('X1', { form: 'open' })], false, false],
    ['a short across', [shunt('X1', { form: 'short' })], true, true],
    ['a pair of capacitors', [series('C1', cap, true)], false, false],
    ['a transformer parts the sides and grounds both', [transformer], false, true],
    ['a transformer behind a capacitor', [series('C1', cap), transformer], false, false],
    ['a block', [block], null, null],
    ['a block behind a capacitor', [series('C1', cap), block], false, false],
    ['a block behind a coil to ground', [shunt('L1', coil), block], null, true],
    ['a coil to ground behind a block', [block, shunt('L1', coil)], null, null],
    ['a branch that could not be read, in parallel with a coil', [shunt('L1', { form: 'parallel', members: [{ form: 'unknown', reason: 'x' }, coil] })], true, true],
    ['a branch that could not be read, then a coil to ground', [shunt('X1', { form: 'unknown', reason: 'x' }), shunt('L1', coil)], true, true],
    ['a branch that could not be read in the path', [series('X1', { form: 'unknown', reason: 'x' })], null, null],
  ];
  for (const [what, ladder, path, short] of table) {
    it(what, () => {
      assert.equal(directCurrent('dc path', ladder).met, path, 'dc path');
      assert.equal(directCurrent('dc block', ladder).met, path === null ? null : !path, 'dc block');
      const atLoad = directCurrent('dc short at load', ladder);
      assert.equal(atLoad.met, short, 'dc short at load');
      assert.equal(atLoad.reason === null, short !== null, 'a reason exactly where it cannot be told');
    });
  }

  it('as goals: 1 where met, 0 where not, a reason that names the block where it cannot be told', () => {
    const ladder = [series('L1', coil), shunt('C1', cap)];
    const met = judge(problemOf({ ladder }), goalOf('dc path'));
    assert.deepEqual([met.ok, met.value, met.frequencyHz, met.caseName, met.reason], [true, 1, null, null, null]);
    const missed = judge(problemOf({ ladder }), goalOf('dc block'));
    assert.deepEqual([met.margin, missed.ok, missed.value, missed.margin], [1, false, 0, -1]);
    const unknown = judge(problemOf({ ladder: [block] }), goalOf('dc block'));
    assert.deepEqual([unknown.ok, unknown.value, unknown.margin], [false, null, null]);
    assert.match(unknown.reason!, /F1/);
  });
});
