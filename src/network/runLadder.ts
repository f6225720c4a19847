import { impedanceOf, type Immittance } from './immittance';

// What the inner loop does at one step. They stand here, as plain constants, for the loop's sake.
export const SERIES = 1;
export const SHUNT = 2;
export const THROUGH = 3;
/** A series element and the shunt one after it in one step: what most ladders consist of. */
export const SERIES_THEN_SHUNT = 4;

/** What closes a ladder at either end, one after the other for each point: V, I at the load; Zs; 4·Rs·Re(V·I*). */
export const END_WIDTH = 7;

/** |V + Zs·I|² outside of this is evaluated again in ratio form: opens, shorts, and ladders that run out of the number range. */
const LEAST_SQUARE = 1e-250;
const LARGEST_SQUARE = 1e250;

/** `length` may be more than there are points: the rest is a matched load that nobody looks at. */
export function endsOf(source: Immittance, load: Immittance, length: number): Float64Array {
  const ends = new Float64Array(END_WIDTH * length);
  const { re, im } = impedanceOf(source);
  const { numerator: n, denominator: d } = load;
  for (let k = 0; k < length; k++) {
    const row = k < load.known.length
      ? [n.re[k], n.im[k], d.re[k], d.im[k], re[k], im[k], 4 * re[k] * (n.re[k] * d.re[k] + n.im[k] * d.im[k])]
      : [1, 0, 1, 0, 1, 0, 4];
    ends.set(row, END_WIDTH * k);
  }
  return ends;
}

/** Voltages and currents of two points on their way through a two-port's matrix. */
const passing = new Float64Array(8);

/**
 * The inner loop of `ladderKernel`: points 2p and 2p + 1 together, (v, i) the one, (w, j) the other. Series and shunt steps
 * take one factor each and their Z or Y from `tables`, in order. Writes |Γ| and the transducer gain; points that do not
 * come out in plain numbers are left to `carefully`.
 */
export function runLadder(
  pairs: number, steps: Uint8Array, factors: Float64Array, tables: Float64Array, ends: Float64Array,
  magnitudes: Float64Array, gains: Float64Array, carefully: (point: number) => void,
): void {
  const count = steps.length;
  let t = 0;
  for (let p = 0; p < pairs; p++) {
    const end = 2 * END_WIDTH * p;
    let vRe = ends[end];
    let vIm = ends[end + 1];
    let iRe = ends[end + 2];
    let iIm = ends[end + 3];
    let wRe = ends[end + END_WIDTH];
    let wIm = ends[end + END_WIDTH + 1];
    let jRe = ends[end + END_WIDTH + 2];
    let jIm = ends[end + END_WIDTH + 3];
    for (let e = 0, next = 0; e < count; e++) {
      const step = steps[e];
      if (step !== SHUNT && step !== THROUGH) {
        const factor = factors[next++];
        const re = factor * tables[t];
        const im = factor * tables[t + 1];
        const otherRe = factor * tables[t + 2];
        const otherIm = factor * tables[t + 3];
        t += 4;
        vRe += re * iRe - im * iIm;
        vIm += re * iIm + im * iRe;
        wRe += otherRe * jRe - otherIm * jIm;
        wIm += otherRe * jIm + otherIm * jRe;
        if (step === SERIES) continue;
      }
      if (step !== THROUGH) {
        const factor = factors[next++];
        const re = factor * tables[t];
        const im = factor * tables[t + 1];
        const otherRe = factor * tables[t + 2];
        const otherIm = factor * tables[t + 3];
        t += 4;
        iRe += re * vRe - im * vIm;
        iIm += re * vIm + im * vRe;
        jRe += otherRe * wRe - otherIm * wIm;
        jIm += otherRe * wIm + otherIm * wRe;
      } else {
        // Rare, and through memory, so that the steps above keep the registers.
        passing[0] = vRe;
        passing[1] = vIm;
        passing[2] = iRe;
        passing[3] = iIm;
        passing[4] = wRe;
        passing[5] = wIm;
        passing[6] = jRe;
        passing[7] = jIm;
        pass(tables, t, 0);
        pass(tables, t + 8, 4);
        t += 16;
        vRe = passing[0];
        vIm = passing[1];
        iRe = passing[2];
        iIm = passing[3];
        wRe = passing[4];
        wIm = passing[5];
        jRe = passing[6];
        jIm = passing[7];
      }
    }
    close(ends, end, 2 * p, vRe, vIm, iRe, iIm, magnitudes, gains, carefully);
    close(ends, end + END_WIDTH, 2 * p + 1, wRe, wIm, jRe, jIm, magnitudes, gains, carefully);
  }
}

/** The matrix that stands at t, times what stands at o. */
function pass(tables: Float64Array, t: number, o: number): void {
  const vRe = passing[o];
  const vIm = passing[o + 1];
  const iRe = passing[o + 2];
  const iIm = passing[o + 3];
  passing[o] = tables[t] * vRe - tables[t + 1] * vIm + tables[t + 2] * iRe - tables[t + 3] * iIm;
  passing[o + 1] = tables[t] * vIm + tables[t + 1] * vRe + tables[t + 2] * iIm + tables[t + 3] * iRe;
  passing[o + 2] = tables[t + 4] * vRe - tables[t + 5] * vIm + tables[t + 6] * iRe - tables[t + 7] * iIm;
  passing[o + 3] = tables[t + 4] * vIm + tables[t + 5] * vRe + tables[t + 6] * iIm + tables[t + 7] * iRe;
}

/** |Γ| and gain from voltage and current at the source. */
function close(
  ends: Float64Array, end: number, point: number, vRe: number, vIm: number, iRe: number, iIm: number,
  magnitudes: Float64Array, gains: Float64Array, carefully: (point: number) => void,
): void {
  const zRe = ends[end + 4];
  const zIm = ends[end + 5];
  const bottomRe = vRe + zRe * iRe - zIm * iIm;
  const bottomIm = vIm + zRe * iIm + zIm * iRe;
  const bottom = bottomRe * bottomRe + bottomIm * bottomIm;
  if (bottom > LEAST_SQUARE && bottom < LARGEST_SQUARE) {
    const topRe = vRe - zRe * iRe - zIm * iIm;
    const topIm = vIm - zRe * iIm + zIm * iRe;
    const inverse = 1 / bottom;
    magnitudes[point] = Math.sqrt((topRe * topRe + topIm * topIm) * inverse);
    gains[point] = ends[end + 6] * inverse;
  } else {
    carefully(point);
  }
}
