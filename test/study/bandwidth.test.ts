import assert from 'node:assert/strict';
import type { Goal } from '../../src/study/goal';
import type { Problem } from '../../src/study/problem';
import { largestAround, spanAround } from '../../src/study/spanAround';
import { band, capacitor, evenly, fileOf, goalOf, inductor, judge, near, ohms, onePort, points, problemOf, resistor, series, shunt } from './problems';

const f0 = 100e6;
const omega0 = 2 * Math.PI * f0;

/** R, L and C in series, resonant at f0, with X = Q·R·(f/f0 − f0/f). */
const resonator = (resistanceOhm: number, q: number) => ({
  form: 'series' as const,
  members: [resistor(resistanceOhm), inductor((q * resistanceOhm) / omega0), capacitor(1 / (q * resistanceOhm * omega0))],
});

/** f1 and f2 with f2/f0 − f0/f2 = u = f0/f1 − f1/f0: f2 − f1 = u·f0 exactly. */
const widthAtSpread = (u: number) => u * f0;

const place: Partial<Goal> = { place: { form: 'band', band: 'spot' }, unit: 'Hz' };
const around = (load: Problem['cases'][number]['load'], more: Parameters<typeof problemOf>[0] = {}): Problem =>
  problemOf({ load, bands: [band('spot', points(f0))], ...more });

describe('bandwidth', () => {
  for (const q of [0.8, 5, 40, 1000]) {
    it(`10 dB of return loss, series resonator of Q ${q} on its own resistance`, () => {
      // |Γ|² = x²/(4 + x²) = 0.1 with x = Q·u: x = 2/3.
      near(judge(around(resonator(50, q)), goalOf('bandwidth', '>=', 1, place)).value, widthAtSpread(2 / 3 / q), 1e-6);
    });
    it(`3 dB of gain, series resonator of Q ${q} on its own resistance`, () => {
      // Gain 4/(4 + x²) falls to g at x = 2·√(1/g − 1).
      const x = 2 * Math.sqrt(10 ** 0.3 - 1);
      near(judge(around(resonator(50, q)), goalOf('bandwidth', '>=', 1, { ...place, bandwidthDropDb: 3 })).value, widthAtSpread(x / q), 1e-6);
    });
  }

  it('gain is taken against its own largest value, also where that lies beside the middle', () => {
    // Q is that of a load of 20 Ω, so 70 Ω in all: x against 70 Ω.
    const q = 30;
    const x = (70 / 20) * Math.sqrt(10 ** 0.3 - 1);
    const beside = around(resonator(20, q), { bands: [band('spot', points(f0 * 1.01))] });
    near(judge(beside, goalOf('bandwidth', '>=', 1, { ...place, bandwidthDropDb: 3 })).value, widthAtSpread(x / q), 1e-6);
  });

  it('the middle is the geometric mean of the band\'s ends', () => {
    const wide = around(resonator(50, 5), { bands: [band('spot', points(f0 / 1.02, f0 * 1.02))] });
    const result = judge(wide, goalOf('bandwidth', '>=', 1e6, place));
    near(result.frequencyHz, f0, 1e-12);
    assert.equal(result.ok, true);
  });

  it('a middle that is not matched has none: 0', () => {
    const result = judge(around(ohms(500)), goalOf('bandwidth', '>=', 1e6, place));
    assert.deepEqual([result.ok, result.value, result.margin, result.reason], [false, 0, -1e6, null]);
  });

  it('a load that takes no power has none in gain', () => {
    const result = judge(around({ form: 'short' }), goalOf('bandwidth', '<=', 1e6, { ...place, bandwidthDropDb: 3 }));
    assert.deepEqual([result.ok, result.value, result.reason], [true, 0, null]);
  });

  it('the worst case and the worst band', () => {
    const problem = problemOf({ load: { calm: resonator(50, 5), sharp: resonator(50, 50) }, bands: [band('spot', points(f0))] });
    const result = judge(problem, goalOf('bandwidth', '>=', 1, { unit: 'Hz' }));
    assert.equal(result.caseName, 'sharp');
    near(result.value, widthAtSpread(2 / 3 / 50), 1e-6);
    assert.equal(judge(problem, goalOf('bandwidth', '<=', 1e9, { unit: 'Hz' })).caseName, 'calm');
  });

  describe('where the data end inside the span', () => {
    const file = fileOf(onePort(evenly(0.9 * f0, 1.3 * f0, 41), () => ({ re: 0.1, im: 0 })));
    it('the value is a lower bound, and enough for a lower limit that it meets', () => {
      const result = judge(around(file), goalOf('bandwidth', '>=', 30e6, place));
      near(result.value, 0.4 * f0, 1e-8);
      assert.equal(result.ok, true);
      assert.match(result.reason!, /at least.*ends at 90 MHz.*ends at 130 MHz/);
    });
    it('it is not enough for a limit beyond it, nor for an upper limit', () => {
      assert.equal(judge(around(file), goalOf('bandwidth', '>=', 60e6, place)).ok, false);
      assert.equal(judge(around(file), goalOf('bandwidth', '<=', 60e6, place)).ok, false);
    });
    it('at a middle outside of the data it is not known', () => {
      const outside = around(file, { bands: [band('spot', points(2 * f0))] });
      const result = judge(outside, goalOf('bandwidth', '>=', 1, place));
      assert.deepEqual([result.ok, result.value], [false, null]);
      assert.match(result.reason!, /^load: /);
    });
  });

  it('a match at every frequency is followed far and called a lower bound', () => {
    const result = judge(around(ohms(50)), goalOf('bandwidth', '>=', 1e6, place));
    assert.equal(result.ok, true);
    assert.match(result.reason!, /followed as far as 1 MHz and it was followed as far as 10000 MHz/);
  });

  it('a match down to low frequencies with an edge above', () => {
    const lowPass = around(ohms(50), { ladder: [shunt('C1', capacitor(20e-12)), series('L1', inductor(1e-9))] });
    const result = judge(lowPass, goalOf('bandwidth', '>=', 1e6, place));
    assert.match(result.reason!, /at least/);
    assert.equal(result.ok, true);
  });
});

describe('the span around a middle', () => {
  const bump = (frequencyHz: Float64Array) => frequencyHz.map((f) => 1 - Math.abs(f - 1000));
  it('ends where the curve crosses the threshold', () => {
    const span = spanAround(bump, 0, 1000.4)!;
    near(span.low.frequencyHz, 999, 1e-9);
    near(span.high.frequencyHz, 1001, 1e-9);
    assert.deepEqual([span.low.end, span.high.end], ['crossed', 'crossed']);
  });
  it('does not jump a gap', () => {
    // Good on both sides of a gap that is a tenth of its distance wide.
    const gap = (frequencyHz: Float64Array) => frequencyHz.map((f) => (f > 1500 && f < 1550 ? -1 : 1));
    near(spanAround(gap, 0, 1000)!.high.frequencyHz, 1500, 1e-9);
  });
  it('holds where the curve only touches the threshold', () => {
    const flat = spanAround((f) => f.map((each) => (each > 999 && each < 1001 ? 0 : -1)), 0, 1000)!;
    near(flat.low.frequencyHz, 999, 1e-8);
    near(flat.high.frequencyHz, 1001, 1e-8);
  });
  it('finds the top of a narrow hill that lies beside the middle', () => {
    const hill = (f: Float64Array) => f.map((each) => 1 / (1 + ((each - 1010) / 20) ** 2));
    near(largestAround(hill, 0.2, 1000), 1, 1e-9);
    // Beyond a fall below the threshold there may be more; it does not count.
    near(largestAround((f) => f.map((each) => (each > 1100 ? 5 : each > 1050 ? 0 : 1)), 0.5, 1000), 1, 1e-12);
  });
  it('is null where the middle is below, or not known', () => {
    assert.equal(spanAround(bump, 0, 2000), null);
    assert.equal(spanAround((f) => f.map(() => NaN), 0, 1000), null);
  });
});
