import type { NetworkData } from './networkData';

export interface InterpolatedNetwork {
  /** S at point k, row i, column j (from 0) stands at index (k·ports + i)·ports + j; NaN where not known. */
  readonly sRe: Float64Array;
  readonly sIm: Float64Array;
  readonly known: Uint8Array;
  readonly reason: string | null;
}

/** Frequencies within a few roundings of an end count as being on it. */
const roundingOfEnds = 1e-12;

/**
 * S between the points of a file: Lagrange's cubic through the four nearest points (two on either side, at the ends the first
 * or last four, so that it is continuous on any grid), linear with fewer than four; exact at the points. Nothing is made up
 * outside of them (Hz), nor where the values are too large for a finite result.
 */
export function interpolateNetwork(data: NetworkData, frequencyHz: Float64Array): InterpolatedNetwork {
  const entries = data.ports * data.ports;
  const sRe = new Float64Array(frequencyHz.length * entries).fill(NaN);
  const sIm = new Float64Array(frequencyHz.length * entries).fill(NaN);
  const known = new Uint8Array(frequencyHz.length);
  let outside = false;
  const points = data.frequencyHz;
  const [low, high] = [points[0], points[points.length - 1]];
  const weights = new Float64Array(4);
  frequencyHz.forEach((f, k) => {
    if (!(f >= low * (1 - roundingOfEnds) && f <= high * (1 + roundingOfEnds))) {
      outside = true;
      return;
    }
    const at = Math.min(Math.max(f, low), high);
    const { first, count } = neighbours(points, at);
    lagrangeWeights(points, first, count, at, weights);
    for (let entry = 0; entry < entries; entry++) {
      let re = 0;
      let im = 0;
      for (let i = 0; i < count; i++) {
        re += weights[i] * data.sRe[(first + i) * entries + entry];
        im += weights[i] * data.sIm[(first + i) * entries + entry];
      }
      if (!Number.isFinite(re) || !Number.isFinite(im)) {
        sRe.fill(NaN, k * entries, (k + 1) * entries);
        sIm.fill(NaN, k * entries, (k + 1) * entries);
        return;
      }
      sRe[k * entries + entry] = re;
      sIm[k * entries + entry] = im;
    }
    known[k] = 1;
  });
  const reason = outside ? `the file covers ${covered(low, high)}` : known.includes(0) ? 'the file\'s values are too large to compute with' : null;
  return { sRe, sIm, known, reason };
}

/** The four points around, fewer at short files: two then, or the only one. */
function neighbours(points: Float64Array, at: number): { first: number; count: number } {
  const count = points.length >= 4 ? 4 : Math.min(points.length, 2);
  let lower = 0;
  let upper = points.length - 1;
  while (upper - lower > 1) {
    const middle = (lower + upper) >> 1;
    if (points[middle] <= at) lower = middle;
    else upper = middle;
  }
  const first = Math.min(Math.max(lower - (count === 4 ? 1 : 0), 0), points.length - count);
  return { first, count };
}

function lagrangeWeights(points: Float64Array, first: number, count: number, at: number, weights: Float64Array): void {
  for (let i = 0; i < count; i++) {
    let weight = 1;
    for (let j = 0; j < count; j++) {
      if (j !== i) weight *= (at - points[first + j]) / (points[first + i] - points[first + j]);
    }
    weights[i] = weight;
  }
}

const covered = (low: number, high: number) => (low === high ? `only ${frequencyText(low)}` : `${frequencyText(low)} to ${frequencyText(high)}`);

function frequencyText(hz: number): string {
  const [divisor, unit] = hz >= 1e9 ? [1e9, 'GHz'] : hz >= 1e6 ? [1e6, 'MHz'] : hz >= 1e3 ? [1e3, 'kHz'] : [1, 'Hz'];
  return `${Number((hz / divisor).toPrecision(7))} ${unit}`;
}
