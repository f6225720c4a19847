import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { markerView } from '../../src/assistance/markerView';
import { panelView } from '../../src/assistance/panelView';
import { markerReading } from '../../src/study/markerReading';
import { bestCodes } from '../../src/study/tuning/bestCodes';

// Invented: a whip that a bank follows over a wide band.
const text = `ohmward: 1
load: 9 Ω + 5.5 nH + 2.6 pF
bands:
  main: 860 .. 930 MHz
tunables:
  bank: capacitor 4 bits 1 pF .. 9 pF Q 60
channels: 860 MHz .. 930 MHz step 10 MHz
ladder:
  - series L1: 8.2 nH
  - shunt C1: tunable bank
goals:
  - return loss >= 3 dB
`;

describe('tunables in the panel', () => {
  const assessment = assess(text, new Map(), { expressions: true });
  const problem = assessment.model.problem!;
  const codes = bestCodes(problem);
  const viewAt = (markerHz: number) => panelView(assessment, { fileName: 'a.match.yaml', pinned: false, markerHz })!;

  it('the marker reads what the codes of its channel make, and the traces go with it', () => {
    assert.notDeepEqual(codes[0].codes, codes[7].codes, 'the channels differ');
    for (const [markerHz, channel] of [[861e6, 0], [929e6, 7]] as const) {
      const { reflection, chartReflection } = markerReading(problem, markerHz, codes[channel].codes)[0];
      assert.deepEqual(markerView(problem, markerHz)?.cases[0].inputReflection, chartReflection);
      const view = viewAt(markerHz);
      assert.deepEqual(view.marker?.cases[0].inputReflection, chartReflection);
      const nearest = view.frequencyHz.reduce((best, each, k) => (Math.abs(each - markerHz) < Math.abs(view.frequencyHz[best] - markerHz) ? k : best), 0);
      const there = view.traces[0].reflectionDb[nearest];
      // The sweep's nearest point lies up to 1.2 MHz aside.
      assert.ok(Math.abs((there ?? NaN) - 20 * Math.log10(Math.hypot(reflection!.re, reflection!.im))) < 0.5, `${there}`);
    }
  });

  it('the ladder shows the value at that code', () => {
    const valueAt = (markerHz: number) => viewAt(markerHz).ladder.find(({ id }) => id === 'C1')?.value;
    assert.notEqual(valueAt(861e6), valueAt(929e6));
  });
});
