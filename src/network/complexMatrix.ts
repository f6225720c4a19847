import { add, complex, divide, magnitude, multiply, subtract, type Complex } from './complex';

/** Row by row; a few rows only. */
export type ComplexMatrix = readonly (readonly Complex[])[];

export const matrixOf = (size: number, entry: (row: number, column: number) => Complex): Complex[][] =>
  Array.from({ length: size }, (_, row) => Array.from({ length: size }, (__, column) => entry(row, column)));

export const transposed = (m: ComplexMatrix): Complex[][] => matrixOf(m.length, (row, column) => m[column][row]);

export const identityPlus = (m: ComplexMatrix, factor: number): Complex[][] =>
  matrixOf(m.length, (row, column) => (row === column ? add(m[row][column], complex(factor)) : m[row][column]));

/** x of left · x = right by Gauss's elimination with pivots of the column; null where left is singular. */
export function solveMatrix(left: ComplexMatrix, right: ComplexMatrix): Complex[][] | null {
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
      for (let k = column; k < a[row].length; k++) a[row][k] = subtract(a[row][k], multiply(factor, a[column][k]));
    }
  }
  return a.map((row, i) => row.slice(size).map((value) => divide(value, row[i])));
}
