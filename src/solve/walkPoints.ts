import { SERIES, THROUGH } from '../network/runLadder';

/** What each row begins with: V and I at the load's side, Zs. Then come the numbers of each step, two or eight. */
export const HEAD_WIDTH = 6;

/** Of the point k: |num|², |den|² and Re(V·I*) at 3k. */
export const OUTCOME_WIDTH = 3;

/**
 * Voltage and current from the load to the source at the first `count` of `points`, den = V + Zs·I, num = V − Zs*·I
 * (Kurokawa 1965). `operations` are SERIES, SHUNT and THROUGH; the row of point k begins at k·stride.
 */
export function walkPoints(points: Int32Array, count: number, operations: Uint8Array, rows: Float64Array, stride: number, outcome: Float64Array): void {
  const steps = operations.length;
  for (let o = 0; o < count; o++) {
    const row = points[o] * stride;
    let vRe = rows[row];
    let vIm = rows[row + 1];
    let iRe = rows[row + 2];
    let iIm = rows[row + 3];
    let t = row + HEAD_WIDTH;
    for (let s = 0; s < steps; s++) {
      const operation = operations[s];
      const re = rows[t];
      const im = rows[t + 1];
      if (operation === THROUGH) {
        const oldRe = vRe;
        const oldIm = vIm;
        vRe = re * oldRe - im * oldIm + rows[t + 2] * iRe - rows[t + 3] * iIm;
        vIm = re * oldIm + im * oldRe + rows[t + 2] * iIm + rows[t + 3] * iRe;
        const nextRe = rows[t + 4] * oldRe - rows[t + 5] * oldIm + rows[t + 6] * iRe - rows[t + 7] * iIm;
        iIm = rows[t + 4] * oldIm + rows[t + 5] * oldRe + rows[t + 6] * iIm + rows[t + 7] * iRe;
        iRe = nextRe;
        t += 8;
        continue;
      }
      t += 2;
      if (operation === SERIES) {
        vRe += re * iRe - im * iIm;
        vIm += re * iIm + im * iRe;
      } else {
        iRe += re * vRe - im * vIm;
        iIm += re * vIm + im * vRe;
      }
    }
    const zRe = rows[row + 4];
    const zIm = rows[row + 5];
    const dRe = vRe + zRe * iRe - zIm * iIm;
    const dIm = vIm + zRe * iIm + zIm * iRe;
    const nRe = vRe - zRe * iRe - zIm * iIm;
    const nIm = vIm - zRe * iIm + zIm * iRe;
    const to = points[o] * OUTCOME_WIDTH;
    outcome[to] = nRe * nRe + nIm * nIm;
    outcome[to + 1] = dRe * dRe + dIm * dIm;
    outcome[to + 2] = vRe * iRe + vIm * iIm;
  }
}
