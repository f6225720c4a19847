/** Sweeps of the Jacobi method; eight variables need five or six. */
const sweepsAtMost = 30;

/**
 * Eigenvalues and eigenvectors of a symmetric n × n matrix (row by row, destroyed) by cyclic Jacobi rotations
 * (Golub & Van Loan, Matrix Computations, §8.5): accurate to rounding times the largest entry. Vector k stands in column k
 * of `vectors`: component i at i·n + k.
 */
export function symmetricEigen(n: number, matrix: Float64Array, values: Float64Array, vectors: Float64Array): void {
  for (let i = 0; i < n; i++) for (let k = 0; k < n; k++) vectors[i * n + k] = i === k ? 1 : 0;
  for (let sweep = 0; sweep < sweepsAtMost; sweep++) {
    let rotated = false;
    for (let p = 0; p < n - 1; p++) {
      for (let q = p + 1; q < n; q++) if (rotate(n, matrix, vectors, p, q)) rotated = true;
    }
    if (!rotated) break;
  }
  for (let i = 0; i < n; i++) values[i] = matrix[i * n + i];
}

/** Turns entry (p, q) to 0; false where it already adds nothing to the diagonal. */
function rotate(n: number, m: Float64Array, vectors: Float64Array, p: number, q: number): boolean {
  const off = m[p * n + q];
  const first = m[p * n + p];
  const last = m[q * n + q];
  if (Math.abs(off) <= Number.EPSILON * 0.1 * Math.sqrt(Math.abs(first * last)) || off === 0) return false;
  const theta = (last - first) / (2 * off);
  const t = (theta < 0 ? -1 : 1) / (Math.abs(theta) + Math.hypot(theta, 1));
  const c = 1 / Math.hypot(t, 1);
  const s = t * c;
  for (let i = 0; i < n; i++) {
    const a = m[i * n + p];
    const b = m[i * n + q];
    m[i * n + p] = c * a - s * b;
    m[i * n + q] = s * a + c * b;
  }
  for (let i = 0; i < n; i++) {
    const a = m[p * n + i];
    const b = m[q * n + i];
    m[p * n + i] = c * a - s * b;
    m[q * n + i] = s * a + c * b;
  }
  m[p * n + q] = 0;
  m[q * n + p] = 0;
  for (let i = 0; i < n; i++) {
    const a = vectors[i * n + p];
    const b = vectors[i * n + q];
    vectors[i * n + p] = c * a - s * b;
    vectors[i * n + q] = s * a + c * b;
  }
  return true;
}
