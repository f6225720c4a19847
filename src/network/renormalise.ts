import { add, complex, scale } from './complex';
import { matrixOf, solveMatrix, transposed, type ComplexMatrix } from './complexMatrix';

/**
 * A scattering matrix against other real references (Ω, one a port), the network being the same. With x = √(R/R′) of a
 * port, its new waves are a′ = p·a + q·b and b′ = q·a + p·b, p and q = (x ± 1/x)/2, from V = √R(a + b) and I = (a − b)/√R
 * (Kurokawa, IEEE Trans. MTT-13, 1965); so S′ = (q + p·S)(p + q·S)⁻¹. Null where an active network has none.
 */
export function renormalise(s: ComplexMatrix, fromOhm: ArrayLike<number>, toOhm: ArrayLike<number>): ComplexMatrix | null {
  const ratio = s.map((_, port) => Math.sqrt(fromOhm[port] / toOhm[port]));
  const p = ratio.map((x) => (x + 1 / x) / 2);
  const q = ratio.map((x) => (x - 1 / x) / 2);
  const waves = (own: number[], other: number[]) => matrixOf(s.length, (row, column) => add(scale(s[row][column], own[row]), complex(row === column ? other[row] : 0)));
  const outgoing = waves(p, q);
  const incoming = waves(q, p);
  const solved = solveMatrix(transposed(incoming), transposed(outgoing));
  if (solved === null || !solved.flat().every(({ re, im }) => Number.isFinite(re) && Number.isFinite(im))) return null;
  return transposed(solved);
}
