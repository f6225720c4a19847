import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { panelView } from '../../src/assistance/panelView';
import { bestCodes } from '../../src/study/tuning/bestCodes';
import { coverage } from '../../src/study/tuning/coverage';

// Invented.
const text = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 863 .. 870 MHz
tunables:
  bank: {2: 2 pF, 5: 4 pF, 9: 7 pF}
ladder:
  - series L1: 9.1 nH
  - shunt C1: tunable bank
channels: 863 MHz .. 870 MHz step 1 MHz
goals:
  - return loss >= 3 dB
`;
const assessment = assess(text, new Map(), { expressions: true });
const problem = assessment.model.problem!;
const codesAt = (markerHz: number | null, covered: ReturnType<typeof coverage> | null = null) =>
  panelView(assessment, { fileName: 'a', pinned: false, markerHz, codes: { coverage: covered, firmware: [] } })!.codes!;

describe('codes in the panel’s view', () => {
  it('are the best of each channel', () => {
    const { channels, tunables } = codesAt(null);
    assert.deepEqual(tunables, [{ name: 'bank', low: 2, high: 9 }]);
    const best = bestCodes(problem);
    assert.deepEqual(channels.map(({ frequencyHz, codes, marginDb, holds }) => [frequencyHz, [...codes], marginDb, holds]), best.map(({ frequencyHz, codes, marginDb, holds }) => [frequencyHz, [...codes.values()], marginDb, holds]));
  });

  it('say which channel is shown, and what a wrong code leaves there', () => {
    const { shown, stepsText, channels } = codesAt(869.2e6);
    assert.equal(channels[shown].text, '869 MHz');
    const [{ lowerDb, higherDb }] = bestCodes(problem)[shown].steps;
    const sides = [lowerDb === null ? '' : 'one lower', higherDb === null ? '' : 'one higher'].filter((side) => side !== '').map((side) => `${side} −?[\\d.]+ dB`);
    assert.match(stepsText, new RegExp(`^A wrong code at 869 MHz leaves a margin of: bank ${sides.join(', ')}$`));
  });

  it('have the coverage of that channel, and none of another', () => {
    const found = coverage(problem, { frequencyHz: 869e6, across: 21 });
    assert.ok(typeof found !== 'string');
    const view = codesAt(869.2e6, found).coverage!;
    assert.equal(view.across, 21);
    assert.ok(view.marginDb.every((margin, at) => (margin === null ? !Number.isFinite(found.marginDb[at]) : margin === found.marginDb[at])));
    const other = codesAt(864e6, found);
    assert.equal(other.coverage, null);
    assert.match(other.coverageText, /being worked out/);
    assert.equal(codesAt(null, 'an invented reason').coverageText, 'No coverage: an invented reason.');
  });

  it('are none where nothing is set by a code', () => {
    assert.equal(panelView(assess(text.replace('tunable bank', '4 pF'), new Map(), { expressions: true }), { fileName: 'a', pinned: false, markerHz: null })!.codes, null);
  });
});
