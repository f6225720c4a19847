import assert from 'node:assert/strict';
import fc from 'fast-check';
import { symmetricEigen } from '../../src/solve/symmetricEigen';
import { modelAt, trustStep } from '../../src/solve/trustStep';

/** Nothing so small that its own digits are cut off. */
const number = fc.double({ min: -1, max: 1, noNaN: true }).map((value) => (Math.abs(value) < 1e-200 ? 0 : value));

/** Symmetric matrices of 1 to 8 rows, definite or not, with a gradient and points to compare with. */
const models = fc.integer({ min: 1, max: 8 }).chain((n) => fc.record({
  n: fc.constant(n),
  entries: fc.array(number, { minLength: n * n, maxLength: n * n }),
  gradient: fc.array(number, { minLength: n, maxLength: n }).map((values) => Float64Array.from(values)),
  lift: number.map((value) => 1.5 + 2.5 * value),
  radius: fc.double({ min: 0.01, max: 3, noNaN: true }),
  room: fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 2 * n, maxLength: 2 * n }),
  others: fc.array(fc.array(number, { minLength: n, maxLength: n }), { minLength: 30, maxLength: 30 }),
}));

function symmetric(n: number, entries: readonly number[], lift: number): Float64Array {
  return Float64Array.from({ length: n * n }, (_, at) => {
    const [i, k] = [Math.floor(at / n), at % n];
    return entries[Math.min(i, k) * n + Math.max(i, k)] + (i === k ? lift : 0);
  });
}

const length = (step: ArrayLike<number>): number => Math.hypot(...Array.from(step));

describe('a step of a quadratic model', () => {
  it('is the best within the radius where no bound is in the way', () => {
    fc.assert(fc.property(models, ({ n, entries, gradient, lift, radius, others }) => {
      const hessian = symmetric(n, entries, lift);
      const far = new Float64Array(n).fill(10);
      const step = new Float64Array(n);
      const promised = trustStep({ gradient, hessian, low: far.map((x) => -x), high: far }, radius, step);
      assert.ok(length(step) <= radius * (1 + 1e-12));
      assert.ok(Math.abs(promised + modelAt(gradient, hessian, step)) <= 1e-12);
      for (const other of others) {
        const size = Math.max(length(other), 1e-9);
        for (const share of [0.3, 0.7, 0.998]) {
          const value = modelAt(gradient, hessian, Float64Array.from(other, (x) => (x / size) * radius * share));
          assert.ok(-promised <= value + 3e-3 * Math.abs(value) + 1e-12, `${value} is below ${-promised}`);
        }
      }
    }), { numRuns: 1000 });
  });

  it('stays in its box and always gains what there is to gain straight downhill', () => {
    fc.assert(fc.property(models, ({ n, entries, gradient, lift, radius, room }) => {
      const hessian = symmetric(n, entries, lift);
      const low = Float64Array.from({ length: n }, (_, i) => (room[i] < 0.2 ? 0 : -room[i]));
      const high = Float64Array.from({ length: n }, (_, i) => (room[n + i] < 0.2 ? 0 : room[n + i]));
      const step = new Float64Array(n);
      const promised = trustStep({ gradient, hessian, low, high }, radius, step);
      assert.ok(length(step) <= radius * (1 + 1e-12));
      // One rounding beyond a bound is brought back by whoever takes the step.
      step.forEach((value, i) => assert.ok(value >= low[i] - 1e-12 && value <= high[i] + 1e-12, `${value} leaves ${low[i]} … ${high[i]}`));
      const pull = gradient.map((g, i) => ((g > 0 && low[i] === 0) || (g < 0 && high[i] === 0) ? 0 : -g));
      const way = pull.map((each) => each / (length(pull) || 1));
      let most = radius;
      way.forEach((w, i) => { most = Math.min(most, w < 0 ? low[i] / w : w > 0 ? high[i] / w : most); });
      for (const share of [0.1, 0.3, 0.5, 0.8, 1]) {
        assert.ok(promised >= -modelAt(gradient, hessian, way.map((w) => w * most * share)) - 1e-12);
      }
    }), { numRuns: 1000 });
  });

  it('leaves a saddle along its lowest curvature', () => {
    const step = new Float64Array(2);
    const far = Float64Array.of(5, 5);
    const promised = trustStep({ gradient: new Float64Array(2), hessian: Float64Array.of(1, 2, 2, 1), low: far.map((x) => -x), high: far }, 0.5, step);
    // Curvatures 3 and −1.
    assert.ok(Math.abs(promised - 0.125) < 1e-12);
    assert.ok(Math.abs(step[0] + step[1]) < 1e-12);
  });
});

describe('eigenvalues of a symmetric matrix', () => {
  it('give the matrix back', () => {
    fc.assert(fc.property(models, ({ n, entries }) => {
      const matrix = symmetric(n, entries, 0);
      const values = new Float64Array(n);
      const vectors = new Float64Array(n * n);
      symmetricEigen(n, matrix.slice(), values, vectors);
      for (let i = 0; i < n; i++) {
        for (let k = 0; k < n; k++) {
          let entry = 0;
          let product = 0;
          for (let v = 0; v < n; v++) {
            entry += vectors[i * n + v] * values[v] * vectors[k * n + v];
            product += vectors[i * n + v] * vectors[k * n + v];
          }
          // Entries up to 1, some rotations of n = 8: rounding times a hundred.
          assert.ok(Math.abs(entry - matrix[i * n + k]) < 3e-14);
          assert.ok(Math.abs(product - (i === k ? 1 : 0)) < 3e-14);
        }
      }
    }), { numRuns: 1000 });
  });
});
