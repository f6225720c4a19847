import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Element } from '../../src/network/element';
import type { Line } from '../../src/network/line';
import { idealPart } from '../../src/network/part';
import { bodeFanoReflection, equalRipple } from '../../src/solve/equalRipple';
import { freeLadder } from '../../src/solve/freeLadder';
import { shapeOf } from '../../src/solve/ladderShape';
import { refineLadder, type FreeValue } from '../../src/solve/refineLadder';
import { trialOf } from '../../src/solve/trial';
import { blankPoints, type TrialPoints } from '../../src/solve/trialPoints';
import { branch, edgeHz, faradOf, henryOf, ladderBackwards, lowPassBand, seenFromTheLoad, unitOhm } from './canonicalLoads';

const reflection = (worstDb: number): number => 10 ** (worstDb / 20);

function within(actual: number, expected: number, share: number): void {
  assert.ok(Math.abs(actual / expected - 1) <= share, `${actual} is not ${expected}`);
}

function valueOf(element: Element): number {
  assert.ok(element.form === 'branch' && element.branch.form === 'part');
  return element.branch.part.value;
}

/** Every part free, within a factor of what stands there. */
const allFree = (ladder: readonly Element[], factor: number): FreeValue[] =>
  ladder.map((element, elementIndex) => ({ elementIndex, range: { min: valueOf(element) / factor, max: valueOf(element) * factor } }));

/** The excess of a ladder as the catalogue search counts it, in dB. */
function trialDb(ladder: readonly Element[], points: TrialPoints): number {
  const order = Int32Array.from({ length: points.count }, (_, k) => k);
  return 10 * Math.log10(trialOf(shapeOf([ladder], points), points, order).excess(Int32Array.of(), Infinity));
}

describe('refining a match of a parallel RC load', () => {
  // Rows B8 (derived; equal ripple by Fano 1950 and Levy 1964 for n = 2, direct minimisation for n ≥ 3): the least of the
  // largest |Γ|, the load's own reactance counted.
  const least: readonly (readonly [qw: number, n: number, worst: number])[] = [
    [0.5, 2, 0.05572809], [1, 2, 0.1715729], [3, 2, 0.5194939],
    [0.5, 3, 0.02364766], [1, 3, 0.1096715], [3, 3, 0.4487005],
    [0.5, 4, 0.01330784], [1, 4, 0.08431455], [3, 4, 0.4150880],
  ];
  for (const [qw, n, worst] of least) {
    it(`of Q·w = ${qw} reaches the least maximum of n = ${n}, source resistance free`, () => {
      const start = ladderBackwards([0.8, 1.1, 0.9].slice(0, n - 1), 0.8);
      const { worstDb } = refineLadder(start, allFree(start, 30), seenFromTheLoad(qw, lowPassBand(401)));
      // 1e-4 dB and the printed digits are 1e-5; between 401 points a ripple hides less than that.
      within(reflection(worstDb), worst, 3e-5);
      assert.ok(reflection(worstDb) <= equalRipple(n, qw).largest * (1 + 1e-5));
    });
  }

  // Rows B8-g (derived): the elements of the optimum for n = 3.
  for (const [g1, g2, g3, g4] of [[1, 0.9577379, 0.7661904, 0.8412714], [2, 0.7539344, 1.380376, 0.5684605]]) {
    it(`of Q·w = ${g1} finds the elements of the optimum, fed from its source resistance`, () => {
      const frequencyHz = lowPassBand(401);
      const blank = blankPoints(frequencyHz.length);
      blank.sourceRe.fill(g4 * unitOhm);
      blank.reflectionWeight.fill(1);
      frequencyHz.forEach((f, k) => {
        blank.currentRe[k] = 1 / unitOhm;
        blank.currentIm[k] = (g1 * f) / edgeHz / unitOhm;
      });
      const start = [branch('series', 'inductor', henryOf(1.2)), branch('shunt', 'capacitor', faradOf(1.5))];
      const { values } = refineLadder(start, allFree(start, 20), { ...blank, frequencyHz, rest: [], starts: [0] });
      // The grid finds the inner ripple to (1/400)²/8 of its curvature.
      within(values[0], henryOf(g2), 1e-4);
      within(values[1], faradOf(g3), 1e-4);
    });
  }

  // Row B9 (Levy 1964): for n = 2 equal ripple is the optimum, and these are its elements.
  it('finds the elements of the double-tuned optimum', () => {
    const start = ladderBackwards([1], 1);
    const { values } = refineLadder(start, allFree(start, 30), seenFromTheLoad(1, lowPassBand(401)));
    // Only the two ends of the band are active, one fewer than fixes two values: near the least, |Γ| goes with the square of
    // what the values are off, and it is found to 1e-5.
    within(values[0], unitOhm / 1.414214, 1e-3);
    within(values[1], henryOf(0.5), 1e-3);
  });
});

describe('refining other loads', () => {
  it('does for a series RL load what it does for its dual', () => {
    // 1 Ω and g1 in series, g2 across, g3 in series, and 1/g4 as the source (B8-g turned over).
    const frequencyHz = lowPassBand(401);
    const blank = blankPoints(frequencyHz.length);
    blank.sourceRe.fill(unitOhm / 0.8412714);
    blank.reflectionWeight.fill(1);
    frequencyHz.forEach((f, k) => {
      blank.voltageRe[k] = unitOhm;
      blank.voltageIm[k] = (unitOhm * f) / edgeHz;
    });
    const start = [branch('shunt', 'capacitor', faradOf(0.5)), branch('series', 'inductor', henryOf(0.5))];
    const { worstDb, values } = refineLadder(start, allFree(start, 20), { ...blank, frequencyHz, rest: [], starts: [0] });
    within(reflection(worstDb), 0.1096715, 3e-5);
    within(values[0], faradOf(0.9577379), 1e-4);
    within(values[1], henryOf(0.7661904), 1e-4);
  });

  // A band-pass of as many resonators: f → (f/f0 − f0/f)/w (Matthaei, Young, Jones, §4.12), Q·w = 1. Its resonators need not
  // be tuned to the middle, so it may be better than the low-pass it comes from, but never than the limit.
  for (const [n, worst] of [[2, 0.1715729], [3, 0.1096715]]) {
    it(`reaches the least maximum with ${n} resonators`, () => {
      const w = 0.3;
      const frequencyHz = Float64Array.from({ length: 301 }, (_, k) => edgeHz * (w / 2) * (k / 150 - 1)).map((half) => half + Math.hypot(half, edgeHz));
      const low = frequencyHz.map((f) => ((f / edgeHz - edgeHz / f) / w) * edgeHz);
      const points = { ...seenFromTheLoad(1, low), frequencyHz };
      const resonator = (g: number, off: number): Element[] => [branch('series', 'inductor', henryOf(g / w) * off), branch('series', 'capacitor', faradOf(w / g))];
      const across = (g: number, off: number): Element[] => [branch('shunt', 'inductor', henryOf(w / g) * off), branch('shunt', 'capacitor', faradOf(g / w))];
      const start = [branch('shunt', 'resistor', unitOhm), ...(n === 3 ? across(0.9, 1.02) : []), ...resonator(0.8, 0.97)];
      const { worstDb } = refineLadder(start, allFree(start, 30), points);
      assert.ok(reflection(worstDb) <= worst * (1 + 3e-5), `${reflection(worstDb)}`);
      assert.ok(reflection(worstDb) >= bodeFanoReflection(1));
    });
  }

  it('finds a single-stub match exactly', () => {
    const line = (lengthM: number): Line => ({ impedanceOhm: 50, lengthM, velocityFactor: 0.7, conductorLossDb: 0, dielectricLossDb: 0, lossAtHz: 1 });
    const blank = blankPoints(1);
    // Pozar, Microwave Engineering, Example 5.2: 60 − j80 Ω at 2 GHz, 50 Ω lines, shorted stub: d = 0.110 λ and
    // l = 0.095 λ, or d = 0.260 λ and l = 0.405 λ; from memory.
    blank.sourceRe.fill(50);
    blank.voltageRe.fill(60);
    blank.voltageIm.fill(-80);
    blank.reflectionWeight.fill(1);
    const waveM = (0.7 * 299_792_458) / 2e9;
    const { worstDb, values } = refineLadder(
      [{ form: 'line', name: 'A', line: line(0.15 * waveM) }, { form: 'stub', name: 'B', end: 'short', line: line(0.13 * waveM) }],
      [{ elementIndex: 1, range: { min: 0, max: 0.25 * waveM } }, { elementIndex: 0, range: { min: 0, max: 0.5 * waveM } }],
      { ...blank, frequencyHz: Float64Array.of(2e9), rest: [], starts: [0] },
    );
    assert.ok(worstDb < -100, `${worstDb}`);
    // In the order asked for. Printed to three digits.
    assert.ok(Math.abs(values[1] / waveM - 0.110) < 6e-4, `${values[1] / waveM}`);
    assert.ok(Math.abs(values[0] / waveM - 0.095) < 6e-4, `${values[0] / waveM}`);
  });
});

/** Random ladders of parts with losses, lines and stubs, between fixed ones. */
const lossy = { loss: { law: 'constant q', q: 40 } } as const;
const items: readonly Element[] = [
  branch('series', 'inductor', 8e-9), branch('shunt', 'capacitor', 3e-12), branch('series', 'resistor', 5),
  { form: 'branch', name: 'L', orientation: 'shunt', pair: false, branch: { form: 'part', part: { ...idealPart('inductor', 12e-9), ...lossy, srfHz: 3e9 } } },
  { form: 'branch', name: 'C', orientation: 'series', pair: true, branch: { form: 'part', part: { ...idealPart('capacitor', 6e-12), loss: { law: 'resistance', resistanceOhm: 0.3 }, eslH: 4e-10 } } },
  { form: 'branch', name: 'S', orientation: 'series', pair: false, branch: { form: 'part', part: { ...idealPart('inductor', 5e-9), loss: { law: 'skin effect', q: 50, atHz: 1e9 } } } },
  { form: 'line', name: 'T', line: { impedanceOhm: 70, lengthM: 0.03, velocityFactor: 0.6, conductorLossDb: 0.2, dielectricLossDb: 0.1, lossAtHz: 1e9 } },
  { form: 'stub', name: 'O', end: 'open', line: { impedanceOhm: 60, lengthM: 0.02, velocityFactor: 0.6, conductorLossDb: 0.2, dielectricLossDb: 0, lossAtHz: 1e9 } },
  { form: 'stub', name: 'H', end: 'short', line: { impedanceOhm: 60, lengthM: 0.05, velocityFactor: 0.6, conductorLossDb: 0, dielectricLossDb: 0, lossAtHz: 1 } },
  { form: 'transformer', name: 'N', turnsSource: 2, turnsLoad: 3, windingH: 4e-8, coupling: 0.9 },
];
const freeFrom = items.length - 1;

function variousPoints(): TrialPoints {
  const blank = blankPoints(30);
  const frequencyHz = Float64Array.from({ length: 30 }, (_, k) => (k < 20 ? 7e8 + 1e7 * k : 2e9 + 2e7 * k));
  for (let k = 0; k < 30; k++) {
    blank.sourceRe[k] = 40 + k;
    blank.sourceIm[k] = 20 - 2 * k;
    blank.voltageRe[k] = 30;
    blank.voltageIm[k] = k - 40;
    blank.reflectionWeight[k] = k < 10 ? 4 : 0;
    blank.gainFloor[k] = k >= 5 && k < 20 ? 0.5 : 0;
  }
  const span = (from: number, to: number) => Array.from({ length: to - from }, (_, i) => from + i);
  return {
    ...blank, frequencyHz, starts: [0, 20],
    rest: [
      { form: 'rejection at least', points: span(20, 30), reference: span(0, 20), limit: 20 },
      { form: 'efficiency at least', points: span(0, 10), limit: 0.5 },
      { form: 'reflection at least', points: span(25, 30), limit: 0.3 },
      { form: 'gain at most', points: span(22, 24), limit: 0.2 },
    ],
  };
}

describe('a ladder with free values', () => {
  const someLadder = fc.array(fc.record({ item: fc.nat(freeFrom), scale: fc.double({ min: -1, max: 1, noNaN: true }), isFree: fc.boolean() }), { minLength: 1, maxLength: 7 });
  const sizeOf = (element: Element): number => (element.form === 'line' || element.form === 'stub' ? element.line.lengthM : valueOf(element));

  it('agrees with the ladder of the catalogue search at any values, in whole and in part', () => {
    const points = variousPoints();
    fc.assert(fc.property(someLadder, (picked) => {
      const ladder = picked.map(({ item }) => items[item]);
      const free = picked.flatMap(({ item, isFree }, i) => (isFree && item < freeFrom ? [i] : []));
      const made = freeLadder(ladder, free, points);
      const all = new Float64Array(made.functionCount);
      const some = new Float64Array(made.functionCount);
      const values = Float64Array.from(free, (i) => sizeOf(ladder[i]) * 10 ** picked[i].scale);
      made.excessDb(values.map((value) => value * 1.1), all, null);
      made.excessDb(values, some, Int32Array.of(3, 17));
      made.excessDb(values, all, null);
      assert.equal(some[3], all[3]);
      assert.equal(some[17], all[17]);
      const other = [...ladder];
      free.forEach((i, at) => { other[i] = made.free[at].at(values[at]); });
      const worst = Math.max(...all);
      // Both are plain sums of the same terms; a ladder of seven may cancel six digits of sixteen.
      assert.ok(Math.abs(worst - trialDb(other, points)) < 1e-7, `${worst} is not ${trialDb(other, points)}`);
    }), { numRuns: 500 });
  });

  it('comes out better, inside its ranges, with everything else as it was', () => {
    const points = variousPoints();
    fc.assert(fc.property(someLadder, (picked) => {
      const ladder = picked.map(({ item }) => items[item]);
      const free = picked.flatMap(({ item, isFree, scale }, i): FreeValue[] => {
        const size = item < freeFrom ? sizeOf(items[item]) : 0;
        return isFree && item < freeFrom ? [{ elementIndex: i, range: { min: size * (0.9 - 0.8 * Math.abs(scale)), max: size * (1.1 + 4 * Math.abs(scale)) } }] : [];
      });
      const refined = refineLadder(ladder, free, points);
      const before = trialDb(ladder, points);
      assert.ok(refined.worstDb <= before + 1e-7, `${refined.worstDb} is above ${before}`);
      assert.ok(Math.abs(trialDb(refined.ladder, points) - refined.worstDb) < 1e-7);
      refined.ladder.forEach((element, i) => {
        const at = free.findIndex(({ elementIndex }) => elementIndex === i);
        if (at < 0) {
          assert.equal(element, ladder[i]);
          return;
        }
        assert.equal(sizeOf(element), refined.values[at]);
        assert.ok(refined.values[at] >= free[at].range.min && refined.values[at] <= free[at].range.max);
        if (element.form === 'branch' && element.branch.form === 'part') {
          const old = ladder[i];
          assert.ok(old.form === 'branch' && old.branch.form === 'part');
          assert.deepEqual({ ...element.branch.part, value: 0 }, { ...old.branch.part, value: 0 });
        }
      });
    }), { numRuns: 100 });
  });

  it('refuses what has no value', () => {
    assert.throws(() => freeLadder([items[freeFrom]], [0], variousPoints()), TypeError);
  });
});
