import assert from 'node:assert/strict';
import { airCoil, currentSheetInductanceH } from '../../src/network/airCoil';

// Single-layer windings against the current sheet (rows W7 to W9 of the checks).
const mu0 = 4e-7 * Math.PI;

/** Complete elliptic integrals by the arithmetic-geometric mean (M. Abramowitz and I. Stegun, Handbook, §17.6). */
function elliptic(modulus: number): { first: number; second: number } {
  let [a, b, c] = [1, Math.sqrt(1 - modulus ** 2), modulus];
  let sum = c * c / 2;
  // It converges quadratically; the last difference may hover at a rounding of a.
  for (let n = 0; n < 12 && Math.abs(c) > 1e-17; n++) {
    [a, b, c] = [(a + b) / 2, Math.sqrt(a * b), (a - b) / 2];
    sum += 2 ** n * c * c;
  }
  const first = Math.PI / (2 * a);
  return { first, second: first * (1 - sum) };
}

/** L. Lorenz 1879, in Nagaoka's form: K of a sheet of diameter D and length l. */
function nagaoka(ratio: number): number {
  const k2 = ratio ** 2 / (1 + ratio ** 2);
  const k = Math.sqrt(k2);
  const { first, second } = elliptic(k);
  return (4 / (3 * Math.PI * Math.sqrt(1 - k2))) * (((1 - k2) / k2) * first - ((1 - 2 * k2) / k2) * second - k);
}

const sheet = (turns: number, diameterM: number, lengthM: number) => (mu0 * turns ** 2 * Math.PI * (diameterM / 2) ** 2 * nagaoka(diameterM / lengthM)) / lengthM;

describe('windings against published values', () => {
  // H. Nagaoka, J. Coll. Sci. Tokyo 27, 1909, table; digits from the checks, row W7.
  for (const [ratio, k] of [[0.05, 0.9790917], [0.1, 0.9588071], [0.2, 0.9200927], [0.5, 0.8181358], [1, 0.6884226], [2, 0.52551], [3, 0.4291986], [5, 0.3198255], [10, 0.2033235]] as const) {
    it(`Nagaoka's coefficient at D/l = ${ratio} is ${k} (row W7)`, () => {
      assert.ok(Math.abs(nagaoka(ratio) - k) < 6e-8, `the reference itself: ${nagaoka(ratio)}`);
      const ours = (currentSheetInductanceH(1, ratio, 1) / (mu0 * Math.PI * (ratio / 2) ** 2));
      assert.ok(Math.abs(ours / k - 1) < 2.6e-6, `${ours}`);
    });
  }

  it('R. Lundin, Proc. IEEE 73, 1985: within 2.5e-6 of the sheet from D/l = 0.02 to 50 (row W8)', () => {
    let worst = 0;
    for (let i = 0; i <= 400; i++) {
      const ratio = 0.02 * 2500 ** (i / 400);
      worst = Math.max(worst, Math.abs(currentSheetInductanceH(7, ratio * 1e-3, 1e-3) / sheet(7, ratio * 1e-3, 1e-3) - 1));
    }
    assert.ok(worst < 2.6e-6, `${worst}`);
    assert.ok(Math.abs(currentSheetInductanceH(10, 10e-3, 20e-3) - 0.4037337e-6) < 1.1e-12, 'N = 10, a = 5 mm, l = 20 mm');
    assert.ok(Math.abs(currentSheetInductanceH(10, 20e-3, 5e-3) - 2.885334e-6) < 8e-12, 'N = 10, a = 10 mm, l = 5 mm');
  });

  it('H. A. Wheeler, Proc. IRE 16, 1928: his formula is within 1 % for l > 0.8 r, with the errors of row W9', () => {
    for (const [ratio, percent] of [[0.8, -0.5442149], [1, -0.1215162], [2, -0.09587496], [4, -0.4949582], [10, -0.5628937]] as const) {
      const [radiusM, turns] = [5e-3, 8];
      const inches = (m: number) => m / 0.0254;
      const wheeler = (inches(radiusM) ** 2 * turns ** 2 * 1e-6) / (9 * inches(radiusM) + 10 * inches(ratio * radiusM));
      const error = (wheeler / currentSheetInductanceH(turns, 2 * radiusM, ratio * radiusM) - 1) * 100;
      // 2.5e-6 of Lundin's formula.
      assert.ok(Math.abs(error - percent) < 3e-4, `${ratio}: ${error}`);
    }
  });

  it('meets itself where its two branches join', () => {
    const [below, above] = [currentSheetInductanceH(5, 1e-2, 1.0000001e-2), currentSheetInductanceH(5, 1.0000001e-2, 1e-2)];
    assert.ok(Math.abs(below / above - 1) < 1e-5);
  });

  it('has a Q and a self-resonance of the size that one finds (invented winding, common practice: tens to hundreds)', () => {
    const coil = airCoil(6, 5e-3, 7e-3, 0.8e-3);
    const q = coil.qAt(100e6);
    assert.ok(q > 80 && q < 600, `${q}`);
    assert.ok(Math.abs(coil.qAt(400e6) / q - 2) < 0.1, 'skin effect: Q grows with the root of the frequency');
    const srfHz = 1 / (2 * Math.PI * Math.sqrt(coil.inductanceH * coil.selfCapacitanceF));
    assert.ok(srfHz > 300e6 && srfHz < 3e9, `${srfHz}`);
  });

  it('stays finite down to the lowest frequency', () => {
    const coil = airCoil(3, 4e-3, 5e-3, 0.5e-3);
    for (const f of [1, 1e3, 1e6, 1e9, 1e11]) assert.ok(coil.qAt(f) > 0 && Number.isFinite(coil.qAt(f)));
  });

  it('has copper\'s skin depth: 66 mm at 1 Hz to 0.147 mm at 200 kHz (public table, row W2), seen in the loss of a straight wire', () => {
    // Q of one wide turn is ωL/R with R = length/(σ·area); in a thick wire the area is that of the skin.
    const [diameterM, wireM, f] = [0.1, 2e-3, 1e6];
    const coil = airCoil(1, diameterM, 1, wireM);
    const skinM = Math.sqrt(1 / (Math.PI * f * mu0 * 5.8e7));
    const resistance = Math.hypot(Math.PI * diameterM, 1) / (5.8e7 * Math.PI * skinM * (wireM - skinM));
    assert.ok(Math.abs(coil.qAt(f) / ((2 * Math.PI * f * coil.inductanceH) / resistance) - 1) < 1e-4);
    // 66.1 µm at 1 MHz: the table's 65.6 mm at 1 Hz, for ρ = 1.7e-8, over a thousand.
    assert.ok(Math.abs(skinM * 1e3 * Math.sqrt(5.8e7 * 1.7e-8) - 0.06562126) < 1e-6);
  });
});
