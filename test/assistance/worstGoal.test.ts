import assert from 'node:assert/strict';
import { worstGoal, worstGoalDetail, worstGoalText } from '../../src/assistance/worstGoal';
import type { Goal, GoalResult } from '../../src/study/goal';

const goal = (text: string, parts: Partial<Goal>): Goal => ({
  text, line: 1, quantity: 'return loss', comparison: '>=', limit: 10, unit: 'dB', place: { form: 'bands' }, caseName: null, into: null, against: null, elementName: null,
  bandwidthDropDb: null, ...parts,
});

const result = (of: Goal, parts: Partial<GoalResult>): GoalResult => ({ goal: of, ok: true, value: 12, margin: 2, frequencyHz: 868e6, caseName: null, reason: null, ...parts });

const held = result(goal('return loss >= 10 dB', {}), {});
const barelyHeld = result(goal('gain >= -1 dB', { quantity: 'gain', limit: -1 }), { value: -0.9, margin: 0.1 });
const missed = result(goal('rejection >= 18 dB', { quantity: 'rejection', limit: 18 }), { ok: false, value: 15.4, margin: -2.6 });
const unknown = result(goal('efficiency >= 80 %', { quantity: 'efficiency', limit: 80, unit: '%' }), { ok: false, value: null, margin: null, frequencyHz: null, reason: 'the file ends at 1 GHz' });
const endless = result(goal('return loss >= 10 dB', {}), { value: null, margin: null });
const met = result(goal('dc block', { quantity: 'dc block', comparison: null, limit: null, unit: '' }), { value: 1, margin: 1, frequencyHz: null });
const notMet = result(goal('dc path', { quantity: 'dc path', comparison: null, limit: null, unit: '' }), { ok: false, value: 0, margin: 0, frequencyHz: null });
const parts = result(goal('parts <= 3', { quantity: 'parts', comparison: '<=', limit: 3, unit: '' }), { value: 3, margin: 0, frequencyHz: null });
const tooMany = result(goal('parts <= 2', { quantity: 'parts', comparison: '<=', limit: 2, unit: '' }), { ok: false, value: 3, margin: -1, frequencyHz: null });
const volts = result(goal('voltage C1 <= 30 V', { quantity: 'voltage', comparison: '<=', limit: 30, unit: 'V', elementName: 'C1' }), { value: 29, margin: 1 });

describe('the goal with the least margin', () => {
  const cases: [what: string, results: GoalResult[], expected: GoalResult | null][] = [
    ['none of none', [], null],
    ['the smaller of two that hold', [held, barelyHeld], barelyHeld],
    ['one that is missed before one that barely holds', [barelyHeld, missed, held], missed],
    ['one that is not known before one that is missed', [missed, unknown], unknown],
    ['a number before a condition that is met', [met, held], held],
    ['a number before a count that is kept', [parts, endless], endless],
    ['a condition that is not met before what holds', [held, notMet], notMet],
    ['a count that is not kept before what holds', [barelyHeld, tooMany], tooMany],
    ['a condition where there is nothing else', [met], met],
    ['the first of equals', [held, { ...held }], held],
  ];
  for (const [what, results, expected] of cases) it(`is ${what}`, () => assert.equal(worstGoal(results), expected));

  const texts: [GoalResult, RegExp][] = [
    [missed, /^rejection 2\.6 dB short$/],
    [barelyHeld, /^gain 0\.10? dB to spare$/],
    [volts, /^voltage C1 1 V to spare$/],
    [unknown, /^efficiency not known$/],
    [met, /^dc block met$/],
    [endless, /^return loss ∞ to spare$/],
  ];
  for (const [given, expected] of texts) it(`is told as ${expected.source}`, () => assert.match(worstGoalText(given), expected));

  it('is told in full with its value and place', () => {
    assert.match(worstGoalDetail(missed), /^rejection ≥ 18 dB: 15\.4 dB, worst: 868 MHz$/);
    assert.match(worstGoalDetail(unknown), /^efficiency ≥ 80 %: not known, the file ends at 1 GHz$/);
  });
});
