import assert from 'node:assert/strict';
import fc from 'fast-check';
import { minimax } from '../../src/solve/minimax';
import type { Functions } from '../../src/solve/smoothMaximum';

type Formulas = (x: Float64Array) => readonly number[];

function solve(formulas: Formulas, start: readonly number[], options: { lower?: readonly number[]; upper?: readonly number[]; maxEvaluations?: number } = {}) {
  const functions: Functions = (x, into) => into.set(formulas(x));
  const { lower = start.map(() => -10), upper = start.map(() => 10) } = options;
  return minimax(functions, {
    start: Float64Array.from(start), lower: Float64Array.from(lower), upper: Float64Array.from(upper),
    functionCount: formulas(Float64Array.from(start)).length, maxEvaluations: options.maxEvaluations,
  });
}

/** The default accuracy is 1e-8 of the spread at the start, which is 10 to 1,000 here. */
function near(actual: number, expected: number, tolerance = 3e-6): void {
  assert.ok(Math.abs(actual - expected) <= tolerance, `${actual} is not ${expected}`);
}

const squares = (x: Float64Array) => x.map((value) => value * value);

describe('minimax of textbook problems', () => {
  // Charalambous & Bandler, «Non-linear minimax optimization as a sequence of least pth optimization», Int. J. Syst. Sci. 7,
  // 1976; from memory.
  it('finds 1.9522245 and 2 for Charalambous and Bandler', () => {
    const distance = (x: Float64Array) => (2 - x[0]) ** 2 + (2 - x[1]) ** 2;
    near(solve((x) => [x[0] ** 2 + x[1] ** 4, distance(x), 2 * Math.exp(x[1] - x[0])], [1, -0.1]).worst, 1.9522245);
    const third = solve((x) => [x[0] ** 4 + x[1] ** 2, distance(x), 2 * Math.exp(x[1] - x[0])], [1, -0.1]);
    near(third.worst, 2);
    near(third.x[0], 1);
    near(third.x[1], 1);
  });

  // Madsen, «An algorithm for minimax solution of overdetermined systems of non-linear equations», J. IMA 16, 1975; from memory.
  it('finds 0.6164324 for Madsen', () => {
    const both = (values: number[]) => values.flatMap((value) => [value, -value]);
    near(solve((x) => both([x[0] ** 2 + x[1] ** 2 + x[0] * x[1], Math.sin(x[0]), Math.cos(x[1])]), [3, 1]).worst, 0.6164324);
  });

  // Values of the collections of test problems of nonsmooth optimisation (Lukšan & Vlček, 2000), from memory; each is exact at
  // a point of small numbers.
  it('finds −3, 7.2, −√2, −1 and −44 for the problems called DEM, QL, LQ, Mifflin 1 and Rosen–Suzuki', () => {
    near(solve(([a, b]) => [5 * a + b, -5 * a + b, a * a + b * b + 4 * b], [1, 1]).worst, -3);
    near(solve(([a, b]) => [0, -4 * a - b + 4, -a - 2 * b + 6].map((more) => a * a + b * b + 10 * more), [-1, 5]).worst, 7.2);
    near(solve(([a, b]) => [-a - b, -a - b + a * a + b * b - 1], [-0.5, -0.5]).worst, -Math.SQRT2);
    near(solve(([a, b]) => [-a, -a + 20 * (a * a + b * b - 1)], [0.8, 0.6]).worst, -1);
    const suzuki: Formulas = (x) => {
      const [a, b, c, d] = x;
      const [aa, bb, cc, dd] = squares(x);
      const first = aa + bb + 2 * cc + dd - 5 * a - 5 * b - 21 * c + 7 * d;
      const more = [0, aa + bb + cc + dd + a - b + c - d - 8, aa + 2 * bb + cc + 2 * dd - a - d - 10, 2 * aa + bb + cc + 2 * a - b - d - 5];
      return more.map((each) => first + 10 * each);
    };
    near(solve(suzuki, [0, 0, 0, 0]).worst, -44);
  });

  // By hand: slope e − 1, error (e − (e − 1)·ln(e − 1))/2 − 1 with the sign turned, met at 0, ln(e − 1) and 1 (Powell,
  // Approximation Theory and Methods, on straight lines and convex functions).
  it('finds the best straight line to e^x on 0 … 1', () => {
    const places = [...Array.from({ length: 101 }, (_, i) => i / 100), Math.log(Math.E - 1)];
    const { worst, x } = solve(([c, m]) => places.flatMap((u) => [Math.exp(u) - c - m * u, c + m * u - Math.exp(u)]), [0, 0]);
    const slope = Math.E - 1;
    near(worst, Math.abs(1 - (Math.E - slope * Math.log(slope)) / 2));
    near(x[1], slope);
  });

  it('goes along the bent valley of Rosenbrock, taken as the larger of its two terms', () => {
    near(solve(([a, b]) => [10 * (b - a * a), -10 * (b - a * a), 1 - a, a - 1], [-1.2, 1]).worst, 0);
  });
});

describe('minimax of made problems', () => {
  /**
   * Convex quadratics around a point where the active ones are equal and their slopes, weighted, cancel: the least is known.
   * At a bound the weighted slope may point outwards.
   */
  const made = fc.record({
    n: fc.integer({ min: 1, max: 8 }),
    activeShare: fc.double({ min: 0, max: 1, noNaN: true }),
    idle: fc.integer({ min: 0, max: 30 }),
    bounded: fc.integer({ min: 0, max: 7 }),
    numbers: fc.infiniteStream(fc.double({ min: -1, max: 1, noNaN: true })),
  });

  it('reaches the least of any number of active functions, bounds in the way or not', () => {
    fc.assert(fc.property(made, ({ n, activeShare, idle, bounded, numbers }) => {
      const random = (): number => numbers.next().value as number;
      const many = (count: number) => Array.from({ length: count }, random);
      const active = 1 + Math.floor(activeShare * n);
      const least = many(n);
      const held = Math.min(bounded, n - 1);
      const slopes = Array.from({ length: active - 1 }, () => many(n));
      const weights = Array.from({ length: active }, () => 0.2 + Math.abs(random()));
      // The last slope balances the others; where a bound holds, it leaves something over.
      slopes.push(many(n).map((pull, i) => (-(i < held ? 0.1 + Math.abs(pull) : 0) - slopes.reduce((sum, g, j) => sum + weights[j] * g[i], 0)) / weights[active - 1]));
      for (let j = 0; j < idle; j++) slopes.push(many(n));
      const heights = slopes.map((_, j) => (j < active ? 0 : -0.1 - Math.abs(random())));
      const bends = slopes.map(() => many(n).map((value) => 0.1 + value * value));
      const turns = slopes.map(() => many(n));
      const { worst, x } = solve((at) => slopes.map((slope, j) => {
        let value = heights[j];
        let turned = 0;
        for (let i = 0; i < n; i++) {
          const d = at[i] - least[i];
          value += slope[i] * d + bends[j][i] * d * d;
          turned += turns[j][i] * d;
        }
        return value + turned * turned;
      }), least.map((value, i) => (i < held ? value : value + 1.5 * random())), {
        lower: least.map((value) => value - 2), upper: least.map((value, i) => (i < held ? value : value + 2)),
      });
      // 1e-8 of a spread of some ten.
      near(worst, 0, 1e-6);
      for (let i = 0; i < held; i++) near(x[i], least[i], 1e-3);
    }), { numRuns: 300 });
  });

  it('is never worse than the start, and stays in the box, whatever the functions', () => {
    fc.assert(fc.property(fc.array(fc.double({ min: -3, max: 3, noNaN: true }), { minLength: 2, maxLength: 4 }), fc.integer({ min: 1, max: 200 }), (start, maxEvaluations) => {
      const formulas: Formulas = (x) => [
        Math.log(Math.abs(x[0] - 1)), 1 / (x[1] - x[0]), Math.sqrt(x[1] + 1), Math.tan(3 * x[0]), x.reduce((sum, value) => sum + Math.cos(5 * value), 0),
      ];
      const before = Math.max(...formulas(Float64Array.from(start)).map((value) => (Number.isNaN(value) ? Infinity : value)));
      const { worst, x, evaluations } = solve(formulas, start, { lower: start.map(() => -3), upper: start.map(() => 3), maxEvaluations });
      assert.ok(worst <= before);
      assert.ok(x.every((value) => value >= -3 && value <= 3));
      assert.equal(worst, Math.max(...formulas(x).map((value) => (Number.isNaN(value) ? Infinity : value))));
      // The start, and one step along each variable for the scale, are always looked at.
      assert.ok(evaluations <= Math.max(maxEvaluations, 1 + x.length), `${evaluations}`);
    }), { numRuns: 500 });
  });
});

describe('minimax at its edges', () => {
  it('leaves flat functions alone', () => {
    const { x, worst } = solve(() => [3, 3, 3], [1, 2]);
    assert.deepEqual([...x, worst], [1, 2, 3]);
  });

  it('leaves the start alone where nothing can be told', () => {
    const { x, worst } = solve(() => [NaN, 1], [1, 2]);
    assert.deepEqual([...x, worst], [1, 2, Infinity]);
  });

  it('stops at a wall of NaN', () => {
    // 1/(x − 0.5) meets x² at 1.1974: x³ − x²/2 = 1.
    const { x } = solve(([a]) => [a > 0.5 ? -a : NaN, a > 0.5 ? 1 / (a - 0.5) : -Infinity, a * a], [0.9], { lower: [0], upper: [2] });
    near(x[0] ** 3 - x[0] ** 2 / 2, 1);
  });

  it('holds a variable whose bounds are equal', () => {
    const { x, worst } = solve(([a, b]) => [(a - b) ** 2 + a], [3, 2], { lower: [-10, 2], upper: [10, 2] });
    near(x[0], 1.5);
    assert.equal(x[1], 2);
    near(worst, 1.75);
  });

  it('leaves a saddle', () => {
    near(solve(([a, b]) => [a * a - b * b], [0, 0], { lower: [-1, -1], upper: [1, 1] }).worst, -1);
  });
});
