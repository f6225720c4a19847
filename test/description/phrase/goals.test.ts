import assert from 'node:assert/strict';
import { goalConditions, goalWords } from '../../../src/description/phrase/goalQuantities';
import { readGoalPhrase } from '../../../src/description/phrase/readGoal';
import { checkCarets, clean, mended, readPhrase } from './support';

const goal = (text: string) => {
  const { text: kept, ...rest } = clean(readGoalPhrase, text) as { text: string };
  assert.equal(kept, text.trim());
  return rest;
};
const bands = { form: 'bands' };
const uplink = { form: 'band', band: 'uplink' };
const ohms = (value: number) => ({ form: 'part', kind: 'resistor', value: { form: 'known', value, unit: 'Ω' } });

const cases: readonly (readonly [text: string, meaning: object])[] = [
  ['return loss >= 12 dB in uplink', { quantity: 'return loss', comparison: '>=', limit: 12, unit: 'dB', place: uplink }],
  ['return loss≥12dB', { quantity: 'return loss', comparison: '>=', limit: 12, unit: 'dB', place: bands }],
  ['VSWR <= 2', { quantity: 'VSWR', comparison: '<=', limit: 2, unit: '', place: bands }],
  ['reflection < 0.316', { quantity: 'reflection', comparison: '<', limit: 0.316, unit: '', place: bands }],
  ['mismatch loss ≤ 0.5 dB', { quantity: 'mismatch loss', comparison: '<=', limit: 0.5, unit: 'dB', place: bands }],
  ['gain >= −1.5 dB in 863 .. 870 MHz', { quantity: 'gain', comparison: '>=', limit: -1.5, unit: 'dB', place: { form: 'range', range: { min: 863e6, max: 870e6 } } }],
  ['gain > -1.5 dB in 863 .. 870 MHz, 31 points for wet bark', { quantity: 'gain', comparison: '>', limit: -1.5, unit: 'dB', place: { form: 'range', range: { min: 863e6, max: 870e6, points: 31 } }, caseName: 'wet bark' }],
  ['insertion loss <= 1.5 dB at 868 MHz', { quantity: 'insertion loss', comparison: '<=', limit: 1.5, unit: 'dB', place: { form: 'frequency', frequencyHz: 868e6 } }],
  ['efficiency >= 80 %', { quantity: 'efficiency', comparison: '>=', limit: 80, unit: '%', place: bands }],
  ['efficiency >= -1 dB', { quantity: 'efficiency', comparison: '>=', limit: -1, unit: 'dB', place: bands }],
  ['rejection >= 18 dB at 2 x uplink into 50 Ω', { quantity: 'rejection', comparison: '>=', limit: 18, unit: 'dB', place: { form: 'harmonic', order: 2, band: 'uplink' }, into: ohms(50) }],
  ['rejection >= 18 dB at 3×wet band against uplink', { quantity: 'rejection', comparison: '>=', limit: 18, unit: 'dB', place: { form: 'harmonic', order: 3, band: 'wet band' }, against: 'uplink' }],
  ['rejection >= 18 dB against uplink at 1.7 GHz into 30 + j20 Ω', { quantity: 'rejection', comparison: '>=', limit: 18, unit: 'dB', place: { form: 'frequency', frequencyHz: 1.7e9 }, against: 'uplink', into: { form: 'complex', value: { re: 30, im: 20 } } }],
  ['input resistance >= 40 Ω', { quantity: 'input resistance', comparison: '>=', limit: 40, unit: 'Ω', place: bands }],
  ['input reactance >= -10 Ω', { quantity: 'input reactance', comparison: '>=', limit: -10, unit: 'Ω', place: bands }],
  ['bandwidth >= 10 MHz', { quantity: 'bandwidth', comparison: '>=', limit: 10e6, unit: 'Hz', place: bands }],
  ['bandwidth >= 10 MHz at 3 dB in uplink', { quantity: 'bandwidth', comparison: '>=', limit: 10e6, unit: 'Hz', place: uplink, bandwidthDropDb: 3 }],
  ['voltage C1 <= 25 V', { quantity: 'voltage', comparison: '<=', limit: 25, unit: 'V', elementName: 'C1', place: bands }],
  ['voltage load <= 25 V in uplink', { quantity: 'voltage', comparison: '<=', limit: 25, unit: 'V', elementName: 'load', place: uplink }],
  ['current L1 <= 300 mA', { quantity: 'current', comparison: '<=', limit: 0.3, unit: 'A', elementName: 'L1', place: bands }],
  ['dissipation L1 <= 0.1 W', { quantity: 'dissipation', comparison: '<=', limit: 0.1, unit: 'W', elementName: 'L1', place: bands }],
  ['parts <= 3', { quantity: 'parts', comparison: '<=', limit: 3, unit: '', place: bands }],
  ['yield >= 95 %', { quantity: 'yield', comparison: '>=', limit: 95, unit: '%', place: bands }],
  ['dc path', { quantity: 'dc path', unit: '', place: bands }], ['dc block for free air', { quantity: 'dc block', unit: '', place: bands, caseName: 'free air' }], ['dc short at load', { quantity: 'dc short at load', unit: '', place: bands }],
  ['return loss >= =(10 + 2)', { quantity: 'return loss', comparison: '>=', limit: 12, unit: 'dB', place: bands }],
];

describe('goals', () => {
  for (const [text, meaning] of cases) it(`«${text}»`, () => assert.deepEqual(goal(text), meaning));

  it('have examples that read', () => {
    for (const { example, quantity } of goalWords) assert.equal((goal(example) as { quantity: string }).quantity, quantity);
    for (const condition of goalConditions) goal(condition);
  });

  for (const [text, code, fixed] of [
    ['S11 <= -10 dB', 'goal-word', 'return loss >= 10 dB'], ['S11 < −10dB in uplink', 'goal-word', 'return loss > 10 dB in uplink'], ['|S11| <= -10 dB', 'goal-word', 'return loss >= 10 dB'], ['S21 >= -2 dB at 2 x uplink', 'goal-word', 'gain >= -2 dB at 2 x uplink'], ['S11 <= 0.3', 'goal-word', 'reflection <= 0.3'],
    ['RL >= 12 dB', 'goal-word', 'return loss >= 12 dB'], ['SWR <= 2', 'goal-word', 'VSWR <= 2'], ['vswr <= 2', 'goal-word', 'VSWR <= 2'], ['IL <= 2 dB', 'goal-word', 'insertion loss <= 2 dB'], ['retrun loss >= 12 dB', 'goal-word', 'return loss >= 12 dB'], ['Yield >= 95 %', 'goal-word', 'yield >= 95 %'], ['DC path', 'goal-word', 'dc path'], ['voltag C1 <= 25 V', 'goal-word', 'voltage C1 <= 25 V'],
    ['VSWR <= 2:1', 'vswr-ratio', 'VSWR <= 2'], ['VSWR <= 2 : 1 in uplink', 'vswr-ratio', 'VSWR <= 2 in uplink'], ['return loss <= -12 dB', 'loss-negative', 'return loss >= 12 dB'], ['return loss >= -12 dB in uplink', 'loss-negative', 'return loss >= 12 dB in uplink'], ['insertion loss >= -1.5 dB', 'loss-negative', 'insertion loss <= 1.5 dB'], ['insertion loss < −1.5 dB', 'loss-negative', 'insertion loss < 1.5 dB'],
    ['gain = -1 dB', 'comparison', 'gain >= -1 dB'], ['return loss >= 12', 'unit-missing', 'return loss >= 12 dB'], ['gain >= -1.5 db', 'unit-unknown', 'gain >= -1.5 dB'], ['yield >= 95', 'unit-missing', 'yield >= 95 %'], ['yield >= 0.95', 'unit-missing', 'yield >= 95 %'], ['efficiency >= 80', 'unit-missing', 'efficiency >= 80 %'], ['efficiency >= 0.57', 'unit-missing', 'efficiency >= 57 %'],
    ['return loss >= 12,5 dB', 'decimal-comma', 'return loss >= 12.5 dB'], ['return loss >= 12 dB at 868 mHz', 'unit-case', 'return loss >= 12 dB at 868 MHz'], ['return loss >= 12 dB in 863-870 MHz', 'range-dots', 'return loss >= 12 dB in 863 .. 870 MHz'], ['return loss >= 12 dB at 868', 'unit-missing', 'return loss >= 12 dB at 868 MHz'],
  ] as const) it(`«${text}» is mended`, () => assert.deepEqual(mended(readGoalPhrase, text), { code, text: fixed }));

  it('that are wrong are marked where they are', () => {
    checkCarets(readGoalPhrase, 'return loss', `${' '.repeat(11)} comparison`);
    checkCarets(readGoalPhrase, 'gain at 868 MHz', '     ^^ comparison');
    checkCarets(readGoalPhrase, 'voltage <= 25 V', '        ^^ goal-element');
    checkCarets(readGoalPhrase, 'beauty >= 3', '^^^^^^ goal-word');
    checkCarets(readGoalPhrase, 'VSWR <= 0.5', '        ^^^ goal-limit');
    checkCarets(readGoalPhrase, 'gain >= 1 dB', '        ^^^^ goal-limit');
    checkCarets(readGoalPhrase, 'efficiency >= 120 %', '              ^^^^^ goal-limit');
    checkCarets(readGoalPhrase, 'parts <= 3.5', '         ^^^ integer-expected');
    checkCarets(readGoalPhrase, 'return loss >= 12 Ω', '                  ^ unit-wrong');
    checkCarets(readGoalPhrase, 'return loss >= 12 dB over uplink', '                     ^^^^^^^^^^^ unexpected-words');
    checkCarets(readGoalPhrase, 'return loss >= 12 dB into 50 Ω for free air', '                                   ^^^^^^^^ into-with-for');
    checkCarets(readGoalPhrase, 'return loss >= 12 dB in uplink in rx2', '                               ^^ clause-twice');
    checkCarets(readGoalPhrase, 'return loss >= 12 dB against uplink', '                     ^^^^^^^^^^^^^^ against-without-rejection');
    checkCarets(readGoalPhrase, 'return loss >= 12 dB in', `${' '.repeat(23)} number-expected`);
    checkCarets(readGoalPhrase, 'return loss >= 12 dB at 0 Hz', '                        ^^^^ frequency-not-positive');
    checkCarets(readGoalPhrase, 'rejection >= 18 dB at 0 x uplink', '                          ^^^^^^ harmonic');
    checkCarets(readGoalPhrase, 'bandwidth >= 10 MHz at 0 dB', '                       ^^^^ not-physical');
    checkCarets(readGoalPhrase, '', ' goal-word');
  });

  it('keep their limit where only the writing of it is wrong', () => {
    assert.equal(readPhrase(readGoalPhrase, 'VSWR <= 2:1').value?.limit?.value, 2);
  });
});
