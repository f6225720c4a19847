import { add, complex, divide, magnitude, multiply, scale, subtract, type Complex } from '../complex';
import { identityPlus, solveMatrix, type ComplexMatrix } from '../complexMatrix';
import type { Parameter } from './options';

/**
 * One point of Y, Z, G or H data as S against real references (Ω), one a port. `normalised`: version 1 files state their data
 * divided (Z, h11, g22) or multiplied (Y, h22, g11) by the reference, version 2 in ohms and siemens. Relations: D. A. Frickey,
 * «Conversions between S, Z, Y, h, ABCD, and T parameters», IEEE Trans. MTT-42, 1994, 205–211, with real references. Null
 * where there is no finite scattering matrix.
 */
export function toScattering(parameter: Exclude<Parameter, 'S'>, data: ComplexMatrix, referenceOhm: readonly number[], normalised: boolean): ComplexMatrix | null {
  const scattering = convert(parameter, data, referenceOhm, normalised);
  return scattering !== null && scattering.every((row) => row.every(({ re, im }) => Number.isFinite(re) && Number.isFinite(im))) ? scattering : null;
}

function convert(parameter: Exclude<Parameter, 'S'>, data: ComplexMatrix, referenceOhm: readonly number[], normalised: boolean): ComplexMatrix | null {
  const root = referenceOhm.map(Math.sqrt);
  switch (parameter) {
    case 'Z': return cayley(normalised ? data : weigh(data, (i, j) => 1 / (root[i] * root[j])), 1);
    case 'Y': return cayley(normalised ? data : weigh(data, (i, j) => root[i] * root[j]), -1);
    case 'H': return hybrid(normalised ? data : weigh(data, (i, j) => [[1 / referenceOhm[0], root[1] / root[0]], [root[1] / root[0], referenceOhm[1]]][i][j]), 1);
    case 'G': return hybrid(normalised ? data : weigh(data, (i, j) => [[referenceOhm[0], root[0] / root[1]], [root[0] / root[1], 1 / referenceOhm[1]]][i][j]), -1);
  }
}

/** Entry by entry. */
const weigh = (data: ComplexMatrix, weight: (i: number, j: number) => number): ComplexMatrix => data.map((row, i) => row.map((value, j) => scale(value, weight(i, j))));

/** ±(m − 1)(m + 1)⁻¹, with m normalised; the two factors commute. Large files are of two ports: those by the closed form. */
const cayley = (m: ComplexMatrix, sign: 1 | -1): ComplexMatrix | null => (m.length === 2 ? cayleyOfTwo(m, sign) : cayleyOfAny(m, sign));

function cayleyOfTwo([[m11, m12], [m21, m22]]: ComplexMatrix, sign: 1 | -1): ComplexMatrix | null {
  const one = complex(1);
  const cross = multiply(m12, m21);
  const sum = subtract(multiply(add(m11, one), add(m22, one)), cross);
  if (!(magnitude(sum) > 0)) return null;
  const over = (value: Complex) => scale(divide(value, sum), sign);
  return [
    [over(subtract(multiply(subtract(m11, one), add(m22, one)), cross)), over(scale(m12, 2))],
    [over(scale(m21, 2)), over(subtract(multiply(add(m11, one), subtract(m22, one)), cross))],
  ];
}

const cayleyOfAny = (m: ComplexMatrix, sign: 1 | -1): ComplexMatrix | null =>
  solveMatrix(identityPlus(m, 1), identityPlus(m, -1))?.map((row) => row.map((value) => scale(value, sign))) ?? null;

/** S of normalised h; g is its dual, with all signs turned. */
function hybrid([[h11, h12], [h21, h22]]: ComplexMatrix, sign: 1 | -1): ComplexMatrix | null {
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
