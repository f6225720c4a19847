import assert from 'node:assert/strict';
import fc from 'fast-check';
import { isSeriesName, nearestInSeries, nextInSeries, preferredSeries, seriesBetween, seriesNames } from '../../src/quantity/preferredSeries';

// IEC 60063, «Preferred number series for resistors and capacitors»; rows E1 to E7 of the checks. The lists of E24, E12 and E6
// stand in public reference pages; the finer ones follow the standard's formula with its one printed exception.
const e24 = '1.0 1.1 1.2 1.3 1.5 1.6 1.8 2.0 2.2 2.4 2.7 3.0 3.3 3.6 3.9 4.3 4.7 5.1 5.6 6.2 6.8 7.5 8.2 9.1';
const e48 = '1.00 1.05 1.10 1.15 1.21 1.27 1.33 1.40 1.47 1.54 1.62 1.69 1.78 1.87 1.96 2.05 2.15 2.26 2.37 2.49 2.61 2.74 2.87 3.01 3.16 3.32 3.48 3.65 3.83 4.02 4.22 4.42 4.64 4.87 5.11 5.36 5.62 5.90 6.19 6.49 6.81 7.15 7.50 7.87 8.25 8.66 9.09 9.53';
const onlyE96 = '1.02 1.07 1.13 1.18 1.24 1.30 1.37 1.43 1.50 1.58 1.65 1.74 1.82 1.91 2.00 2.10 2.21 2.32 2.43 2.55 2.67 2.80 2.94 3.09 3.24 3.40 3.57 3.74 3.92 4.12 4.32 4.53 4.75 4.99 5.23 5.49 5.76 6.04 6.34 6.65 6.98 7.32 7.68 8.06 8.45 8.87 9.31 9.76';
const onlyE192 = '1.01 1.04 1.06 1.09 1.11 1.14 1.17 1.20 1.23 1.26 1.29 1.32 1.35 1.38 1.42 1.45 1.49 1.52 1.56 1.60 1.64 1.67 1.72 1.76 1.80 1.84 1.89 1.93 1.98 2.03 2.08 2.13 2.18 2.23 2.29 2.34 2.40 2.46 2.52 2.58 2.64 2.71 2.77 2.84 2.91 2.98 3.05 3.12 3.20 3.28 3.36 3.44 3.52 3.61 3.70 3.79 3.88 3.97 4.07 4.17 4.27 4.37 4.48 4.59 4.70 4.81 4.93 5.05 5.17 5.30 5.42 5.56 5.69 5.83 5.97 6.12 6.26 6.42 6.57 6.73 6.90 7.06 7.23 7.41 7.59 7.77 7.96 8.16 8.35 8.56 8.76 8.98 9.20 9.42 9.65 9.88';
const numbers = (text: string) => text.split(' ').map(Number);
const sorted = (...lists: string[]) => lists.flatMap(numbers).sort((a, b) => a - b);

describe('preferred series', () => {
  it('are those of IEC 60063 (rows E1 to E5)', () => {
    assert.deepEqual(preferredSeries.E24, numbers(e24));
    assert.deepEqual(preferredSeries.E12, numbers(e24).filter((_, i) => i % 2 === 0));
    assert.deepEqual(preferredSeries.E6, [1, 1.5, 2.2, 3.3, 4.7, 6.8]);
    assert.deepEqual(preferredSeries.E3, [1, 2.2, 4.7]);
    assert.deepEqual(preferredSeries.E48, numbers(e48));
    assert.deepEqual(preferredSeries.E96, sorted(e48, onlyE96));
    assert.deepEqual(preferredSeries.E192, sorted(e48, onlyE96, onlyE192));
  });

  it('add up as listed (rows E3 to E5)', () => {
    const sum = (values: readonly number[]) => Math.round(values.reduce((total, value) => total + 100 * value, 0)) / 100;
    assert.deepEqual([sum(preferredSeries.E48), sum(preferredSeries.E96), sum(preferredSeries.E192)], [183.13, 370.7, 745.99]);
  });

  it('have one exception of rounding in E192 (row E2) and eight in E24 (row E1)', () => {
    assert.equal(preferredSeries.E192[185], 9.2);
    assert.equal(preferredSeries.E24.filter((value, i) => value !== Math.round(10 * 10 ** (i / 24)) / 10).length, 8);
  });

  for (const [value, series, expected] of [[4.77465, 'E24', 4.7], [477.465, 'E24', 470], [0.92277, 'E24', 0.91], [38.98, 'E12', 39], [46.14, 'E96', 46.4], [9.7, 'E6', 10], [2.89, 'E12', 2.7], [10.96, 'E12', 12], [10.95, 'E12', 10]] as const) {
    it(`nearest by ratio to ${value} in ${series} is ${expected} (rows E6, E7)`, () => assert.equal(nearestInSeries(value, series), expected));
  }

  it('know their names and no others', () => {
    assert.deepEqual(seriesNames, ['E3', 'E6', 'E12', 'E24', 'E48', 'E96', 'E192']);
    for (const name of ['E25', 'e24', 'E', 'constructor', '__proto__']) assert.ok(!isSeriesName(name), name);
  });

  it('between two values include both, exactly as one writes them', () => {
    assert.deepEqual(seriesBetween('E6', 1e-9, 10e-9), [1e-9, 1.5e-9, 2.2e-9, 3.3e-9, 4.7e-9, 6.8e-9, 10e-9]);
    assert.deepEqual(seriesBetween('E3', 5e-13, 4.7e-12), [1e-12, 2.2e-12, 4.7e-12]);
    assert.deepEqual(seriesBetween('E24', 1.25, 1.25), []);
    assert.deepEqual(seriesBetween('E24', 4.7, 4.7), [4.7]);
    for (const [min, max] of [[0, 1], [2, 1], [-1, 1], [NaN, 1], [1, Infinity]] as const) assert.deepEqual(seriesBetween('E24', min, max), []);
  });

  it('step past a value in either direction', () => {
    assert.equal(nextInSeries(4.7e-9, 'E24', 'up'), 5.1e-9);
    assert.equal(nextInSeries(4.7e-9, 'E24', 'down'), 4.3e-9);
    assert.equal(nextInSeries(4.8e-9, 'E24', 'down'), 4.7e-9);
    assert.equal(nextInSeries(9.1, 'E24', 'up'), 10);
    assert.equal(nextInSeries(1, 'E24', 'down'), 0.91);
    for (const value of [0, -1, NaN, Infinity]) assert.equal(nextInSeries(value, 'E24', 'up'), null);
  });

  it('go up and down again to the same value, and have nothing in between', () => {
    fc.assert(fc.property(fc.constantFrom(...seriesNames), fc.integer({ min: -14, max: 9 }), fc.nat(), (series, decade, pick) => {
      const mantissa = preferredSeries[series][pick % preferredSeries[series].length];
      const value = Number(`${mantissa}e${decade}`);
      const up = nextInSeries(value, series, 'up')!;
      assert.equal(nextInSeries(up, series, 'down'), value);
      assert.deepEqual(seriesBetween(series, value, up), [value, up]);
      assert.equal(nearestInSeries(value * 1.0001, series), value);
    }), { numRuns: 300 });
  });
});
