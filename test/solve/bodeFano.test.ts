import assert from 'node:assert/strict';
import type { ComplexArray } from '../../src/network/complex';
import { bodeFanoLimit } from '../../src/solve/bodeFano';
import { bodeFanoReflection, equalRipple } from '../../src/solve/equalRipple';
import { fitLoad, modelImpedance, type LoadModel, type LoadModelForm } from '../../src/solve/fitLoad';

// Seven printed digits: half of the last one is at most 5e-7.
const near = (actual: number | null, expected: number, relative = 5e-7): void =>
  assert.ok(actual !== null && Math.abs(actual - expected) <= relative * Math.abs(expected), `${actual} is not ${expected}`);

const band = (startHz: number, stopHz: number, points = 21): Float64Array =>
  Float64Array.from({ length: points }, (_, k) => startHz + ((stopHz - startHz) * k) / (points - 1));

function loadOf(model: Omit<LoadModel, 'fitError'>, frequencyHz: Float64Array): ComplexArray {
  const z = Array.from(frequencyHz, (hz) => modelImpedance(model, hz));
  return { re: Float64Array.from(z, ({ re }) => re), im: Float64Array.from(z, ({ im }) => im) };
}

const modelOf = (form: LoadModelForm, resistanceOhm: number, inductanceH: number | null, capacitanceF: number | null) => ({ form, resistanceOhm, inductanceH, capacitanceF });

describe('equal ripple and the limit behind it', () => {
  // Rows B8 and B10: equations after Fano 1950 and Matthaei, Young, Jones §4.09; numbers derived.
  for (const [qw, values] of [
    [0.5, [0.2360680, 0.05572809, 0.02384915, 0.01353857, 0.001867443]],
    [1, [0.4142136, 0.1715729, 0.1110106, 0.08615434, 0.04321392]],
    [3, [0.7207592, 0.5194939, 0.4518503, 0.4197645, 0.3509198]],
  ] as const) {
    it(`gives the |Γ| of row B8 for Q·w = ${qw}`, () => {
      for (let n = 1; n <= 4; n++) near(equalRipple(n, qw).largest, values[n - 1]);
      near(bodeFanoReflection(qw), values[4]);
    });
  }

  // B6 and B7: Lopez 2004 after Wheeler and Fano, from memory; his numbers are a fit, the recomputed ones exact.
  for (const [n, third, fifth] of [
    [1, 0.75, 0.4166667], [2, 1.732051, 1.118034], [3, 2.144694, 1.425068], [4, 2.357607, 1.583368], [5, 2.483596, 1.676728], [8, 2.662111, 1.808330],
  ] as const) {
    it(`reaches |Γ| = 1/3 and 0.2 with ${n} resonators at the published Q·w`, () => {
      near(equalRipple(n, third).largest, 1 / 3, 1e-6);
      near(equalRipple(n, fifth).largest, 0.2, 1e-6);
    });
  }

  // B9: formulas after Levy, IRE Trans. CT-11, 1964; numbers derived.
  for (const [n, qw, g] of [
    [2, 1, [1, 0.5, 1.414214]], [3, 1, [1, 0.9656071, 0.7632495, 0.8667538]], [4, 1, [1, 1.158019, 1.439443, 0.5239177, 1.188553]], [3, 2, [2, 0.7598389, 1.351057, 0.6014839]],
  ] as const) {
    it(`gives Levy's elements for n = ${n}, Q·w = ${qw}`, () => {
      const found = equalRipple(n, qw).g;
      assert.equal(found.length, g.length);
      g.forEach((value, i) => near(found[i], value, 1e-6));
    });
  }

  it('stays finite at both ends', () => {
    for (const qw of [1e-3, 1e-2, 30, 1e3]) {
      for (let n = 1; n <= 4; n++) {
        const { largest, least } = equalRipple(n, qw);
        assert.ok(largest >= 0 && largest < 1 && least >= 0 && least <= largest * (1 + 1e-12), `${n} ${qw} ${largest} ${least}`);
        assert.ok(largest >= bodeFanoReflection(qw) * (1 - 1e-12));
      }
    }
  });
});

describe('the limit of a load over a band', () => {
  const oneToTwo = band(1e9, 2e9);

  // B1 and B4, numbers derived from the limit of Bode 1945 and Fano 1950.
  it('is e⁻² for 50 Ω ∥ 5 pF and 0.2865 for 50 Ω + 20 nH from 1 to 2 GHz', () => {
    const parallel = bodeFanoLimit(loadOf(modelOf('parallel RC', 50, null, 5e-12), oneToTwo), oneToTwo);
    assert.equal(parallel.model?.form, 'parallel RC');
    near(parallel.reflection, 0.1353353);
    near(parallel.byReactances[0], equalRipple(1, Math.PI / 2).largest);
    const series = bodeFanoLimit(loadOf(modelOf('series RL', 50, 20e-9, null), oneToTwo), oneToTwo);
    assert.equal(series.model?.form, 'series RL');
    near(series.reflection, 0.2865048);
  });

  it('uses 1/ω1 − 1/ω2 for the two other forms', () => {
    const inverse = 1 / (2 * Math.PI * 1e9) - 1 / (2 * Math.PI * 2e9);
    near(bodeFanoLimit(loadOf(modelOf('series RC', 40, null, 2e-12), oneToTwo), oneToTwo).reflection, Math.exp((-Math.PI * 40 * 2e-12) / inverse), 1e-9);
    near(bodeFanoLimit(loadOf(modelOf('parallel RL', 80, 6e-9, null), oneToTwo), oneToTwo).reflection, Math.exp((-Math.PI * 6e-9) / 80 / inverse), 1e-9);
  });

  it('takes the larger Q of a resonance, in the middle or beside it', () => {
    const at = 2 * Math.PI * Math.sqrt(1e9 * 1.2e9);
    const points = band(1e9, 1.2e9);
    const w = 0.2 / Math.sqrt(1.2);
    const tuned = modelOf('series RLC', 30, (30 * 9) / at, 1 / (30 * 9 * at));
    near(bodeFanoLimit(loadOf(tuned, points), points).reflection, Math.exp(-Math.PI / (9 * w)), 1e-6);
    const beside = modelOf('parallel RLC', 200, 200 / (7 * at), 9 / (200 * at));
    const found = bodeFanoLimit(loadOf(beside, points), points);
    assert.equal(found.model?.form, 'parallel RLC');
    near(found.reflection, Math.exp(-Math.PI / (9 * w)), 1e-6);
    assert.ok((found.model?.fitError ?? 1) < 1e-9);
  });

  it('is 0 for a single point and for a plain resistance', () => {
    const load = loadOf(modelOf('series RC', 20, null, 1e-12), Float64Array.of(1e9));
    assert.equal(bodeFanoLimit(load, Float64Array.of(1e9)).reflection, 0);
    const plain = bodeFanoLimit(loadOf(modelOf('resistor', 75, null, null), oneToTwo), oneToTwo);
    assert.deepEqual([plain.model?.form, plain.reflection], ['resistor', 0]);
  });

  it('says where the fit is poor, and where there is nothing to fit', () => {
    // Invented: two resonances in one band.
    const wild: ComplexArray = { re: oneToTwo.map((f) => 50 + 40 * Math.sin(f / 5e7)), im: oneToTwo.map((f) => 90 * Math.cos(f / 4e7)) };
    const found = bodeFanoLimit(wild, oneToTwo);
    assert.equal(found.reflection, null);
    assert.match(found.reason ?? '', /not much like this load/);
    for (const re of [0, -1, NaN, Infinity]) {
      const none = bodeFanoLimit({ re: oneToTwo.map(() => re), im: oneToTwo.map(() => 1) }, oneToTwo);
      assert.deepEqual([none.model, none.reflection], [null, null]);
      assert.match(none.reason ?? '', /no positive resistance/);
    }
  });

  it('holds for a load beside its model as far as mismatch is a distance that no lossless network changes', () => {
    const noisy = loadOf(modelOf('parallel RC', 50, null, 5e-12), oneToTwo);
    noisy.re.forEach((value, k) => { noisy.re[k] = value * (1 + 0.1 * (-1) ** k); });
    const { reflection, certain, model } = bodeFanoLimit(noisy, oneToTwo);
    assert.ok(reflection && certain && model && model.fitError > 0.01);
    near(certain, (reflection - model.fitError) / (1 - reflection * model.fitError), 1e-12);
    const exact = bodeFanoLimit(loadOf(modelOf('parallel RC', 50, null, 5e-12), oneToTwo), oneToTwo);
    near(exact.certain, exact.reflection ?? 0, 1e-9);

    type Z = readonly [re: number, im: number];
    const mismatch = ([ar, ax]: Z, [br, bx]: Z) => Math.hypot(ar - br, ax - bx) / Math.hypot(ar + br, ax - bx);
    // A series reactance, then an inversion, as any lossless ladder is made of.
    const throughLossless = ([r, x]: Z): Z => [r / (r * r + (x + 0.7) ** 2), -(x + 0.7) / (r * r + (x + 0.7) ** 2)];
    const grid = [0.1, 1, 3].flatMap((re) => [-2, 0, 0.5].map((im): Z => [re, im]));
    for (const a of grid) {
      for (const b of grid) {
        near(mismatch(throughLossless(a), throughLossless(b)) + 1, mismatch(a, b) + 1, 1e-12);
        for (const c of grid) assert.ok(mismatch(a, c) <= (mismatch(a, b) + mismatch(b, c)) / (1 + mismatch(a, b) * mismatch(b, c)) + 1e-12);
      }
    }
  });

  it('keeps a near-perfect fit of noisy data, with its error', () => {
    const clean = loadOf(modelOf('parallel RC', 120, null, 1.5e-12), oneToTwo);
    const noisy: ComplexArray = { re: clean.re.map((value, k) => value * (1 + 0.02 * (-1) ** k)), im: clean.im };
    const model = fitLoad(noisy, oneToTwo);
    assert.equal(model?.form, 'parallel RC');
    assert.ok(model && model.fitError > 1e-3 && model.fitError < 0.02, String(model?.fitError));
    near(model.capacitanceF, 1.5e-12, 0.02);
  });

  // B5: the integral of ln(1/|Γ|) of a bare RC load is π/(RC), or π/(R0 C) for R ≤ R0: the area rule itself.
  for (const [r, share] of [[100, 1], [25, 0.5]] as const) {
    it(`the area under ln(1/|Γ|) of ${r} Ω ∥ 2 pF at 50 Ω is ${share} of π/(RC)`, () => {
      const model = modelOf('parallel RC', r, null, 2e-12);
      let area = 0;
      const steps = 200_000;
      // ω = tan(u) maps the half-axis to 0 … π/2; midpoints.
      for (let i = 0; i < steps; i++) {
        const u = ((i + 0.5) / steps) * (Math.PI / 2);
        const omega = 1e10 * Math.tan(u);
        const z = modelImpedance(model, omega / (2 * Math.PI));
        const ratio = Math.log(Math.hypot(z.re + 50, z.im) / Math.hypot(z.re - 50, z.im));
        area += (ratio * 1e10 * (Math.PI / 2 / steps)) / Math.cos(u) ** 2;
      }
      near(area / (Math.PI / (r * 2e-12)), share, 1e-4);
    });
  }
});
