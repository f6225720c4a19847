import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { hoverAt } from '../../src/assistance/hover';
import { panelView } from '../../src/assistance/panelView';
import { currentSheetInductanceH } from '../../src/network/airCoil';
import { coilWinding } from '../../src/network/coilWinding';

// Invented: a beacon of a few watts.
const text = `ohmward: 1
load: 12 Ω + 3.3 pF
power: 5 W
bands:
  main: 862 .. 871 MHz
ladder:
  - series L1: 47 nH Q 40 rated 100 mA
  - shunt C1: 1 pF Q 150 rated 5 V
  - shunt C2: 1 pF Q 150 rated 5 kV
goals:
  - gain >= -20 dB
`;
const assessed = (from = text) => assess(from, new Map(), { expressions: true });

describe('real parts', () => {
  it('are warned of where they bear more than they are rated for', () => {
    const above = assessed().diagnostics.filter(({ code }) => code === 'above-rating');
    assert.deepEqual(above.map(({ message }) => message.split(' ')[0]), ['L1', 'C1']);
    assert.match(above[0].message, /^L1 bears [\d.]+ m?A of rms current, rated 100 mA\.$/);
    assert.match(above[1].message, /V of peak voltage, rated 5 V\.$/);
    assert.deepEqual(assessed(text.replace('5 W', '0 dBm')).diagnostics.filter(({ code }) => code === 'above-rating'), []);
  });

  it('show their share of the power and what a per cent of their value costs, in table and hover', () => {
    const { ladder } = panelView(assessed(), { fileName: 'a', pinned: false, markerHz: null }) ?? { ladder: [] };
    const row = ladder.find(({ id }) => id === 'L1');
    assert.match(String(row?.loss), /^[\d.]+ %$/);
    assert.match(String(row?.sensitivity), /^[\d.]+$/);
    const hover = hoverAt(assessed(), text.indexOf('L1'))?.markdown ?? '';
    assert.match(hover, /of the power available \| [\d.]+ %/);
    assert.match(hover, /1 % of its value costs \| [\d.]+ dB/);
    assert.match(hover, /coil \d+ turns, diameter [\d.]+ mm, length [\d.]+ mm, wire [\d.]+ mm/);
  });

  it('of small inductance can be wound, and the winding has that inductance', () => {
    for (const inductanceH of [5e-9, 22e-9, 100e-9, 470e-9, 2.2e-6]) {
      const winding = coilWinding(inductanceH);
      assert.ok(winding, String(inductanceH));
      const { turns, diameterM, lengthM, wireM } = winding;
      assert.ok(Number.isInteger(turns) && lengthM > turns * wireM);
      assert.ok(Math.abs(currentSheetInductanceH(turns, diameterM, lengthM) / inductanceH - 1) < 1e-9);
    }
    assert.equal(coilWinding(100e-6), null);
    assert.equal(coilWinding(1e-12), null);
  });
});
