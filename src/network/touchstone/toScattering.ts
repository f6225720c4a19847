import { add, complex, divide, magnitude, multiply, scale, subtract, type Complex } from '../complex';
import type { Parameter } from './options';

type Matrix = readonly (readonly Complex[])[];

/**
 * One point of Y, Z, G or H data as S against real references (Ω), one a port. `normalised`: version 1 files state their data
 * divided (Z, h11, g22) or multiplied (Y, h22, g11) by the reference, version 2 in ohms and siemens. Relations: D. A. Frickey,
 * «Conversions between S, Z, Y, h, ABCD, and T parameters», IEEE Trans. MTT-42, 1994, 205–211, with real references. Null
 * where there is no finite scattering matrix.
 */
export function toScattering(parameter: Exclude<Parameter, 'S'>, data: Matrix, referenceOhm: readonly number[], normalised: boolean): Matrix | null {
  const scattering = convert(parameter, data, referenceOhm, normalised);
  return scattering !== null && scattering.flat().every(({ re, im }) => Number.isFinite(re) && Number.isFinite(im)) ? scattering : null;
}

function convert(parameter: Exclude<Parameter, 'S'>, data: Matrix, referenceOhm: readonly number[], normalised: boolean): Matrix | null {
  const root = referenceOhm.map(Math.sqrt);
  switch (parameter) {
    case 'Z': return cayley(normalised ? data : weigh(data, (i, j) => 1 / (root[i] * root[j])), 1);
    case 'Y': return cayley(normalised ? data : weigh(data, (i, j) => root[i] * root[j]), -1);
    case 'H': return hybrid(normalised ? data : weigh(data, (i, j) => [[1 / referenceOhm[0], root[1] / root[0]], [root[1] / root[0], referenceOhm[1]]][i][j]), 1);
    case 'G': return hybrid(normalised ? data : weigh(data, (i, j) => [[referenceOhm[0], root[0] / root[1]], [root[0] / root[1], 1 / referenceOhm[1]]][i][j]), -1);
  }
}

const weigh = (data: Matrix, weight: (i: number, j: number) => number): Matrix => data.map((row, i) => row.map((value, j) => scale(value, weight(i, j))));

/** ±(m − 1)(m + 1)⁻¹, with m normalised. */
function cayley(m: Matrix, sign: 1 | -1): Matrix | null {
  const shifted = (by: number): Matrix => m.map((row, i) => row.map((value, j) => (i === j ? add(value, complex(by)) : value)));
  // (m − 1) and (m + 1)⁻¹ commute, so the system (m + 1) x = (m − 1) gives the same.
  return solve(shifted(1), shifted(-1))?.map((row) => row.map((value) => scale(value, sign))) ?? null;
}

/** Gauss with pivots for a few rows. */
function solve(left: Matrix, right: Matrix): Matrix | null {
  const a = left.map((row, i) => [...row, ...right[i]]);
  const size = left.length;
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let row = column + 1; row < size; row++) if (magnitude(a[row][column]) > magnitude(a[pivot][column])) pivot = row;
    [a[column], a[pivot]] = [a[pivot], a[column]];
    if (!(magnitude(a[column][column]) > 0)) return null;
    for (let row = 0; row < size; row++) {
      if (row === column) continue;
      const factor = divide(a[row][column], a[column][column]);
      for (let k = column; k < 2 * size; k++) a[row][k] = subtract(a[row][k], multiply(factor, a[column][k]));
    }
  }
  return a.map((row, i) => row.slice(size).map((value) => divide(value, row[i])));
}

/** S of normalised h; g is its dual, with all signs turned. */
function hybrid([[h11, h12], [h21, h22]]: Matrix, sign: 1 | -1): Matrix | null {
  const one = complex(1);
  const cross = multiply(h12, h21);
  const sum = subtract(multiply(add(one, h11), add(one, h22)), cross);
  if (!(magnitude(sum) > 0)) return null;
  const over = (value: Complex) => scale(divide(value, sum), sign);
  return [
    [over(subtract(multiply(subtract(h11, one), add(h22, one)), cross)), over(scale(h12, 2))],
    [over(scale(h21, -2)), over(add(multiply(add(one, h11), subtract(one, h22)), cross))],
  ];
}
