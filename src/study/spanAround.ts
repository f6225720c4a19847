import { bandwidthBlockPoints, bandwidthFirstBlock, bandwidthPrecision, bandwidthReach } from './limits';

/** Something over frequency, as samples: NaN where not known. */
export type Curve = (frequencyHz: Float64Array) => Float64Array;

export interface Edge {
  readonly frequencyHz: number;
  /** `crossed`: the curve goes below the threshold there. `unknown`: what is known ends there. `far`: not looked at further. */
  readonly end: 'crossed' | 'unknown' | 'far';
}

export interface SpanAround {
  readonly low: Edge;
  readonly high: Edge;
  /** Largest value met at the points looked at, and where. */
  readonly largest: number;
  readonly largestAtHz: number;
}

/**
 * The span around `middleHz` in which a curve stays at or above a threshold without a break. Null where it is below it, or
 * not known, at the middle itself.
 *
 * Looked at in blocks of points outwards, each as wide (in octaves) as all before it, so that a gap narrower than a
 * sixty-fourth of its distance from the middle can be missed. Edges are then closed in on by dividing the bracket again
 * and again: to 1e-10 of the frequency.
 */
export function spanAround(curve: Curve, threshold: number, middleHz: number): SpanAround | null {
  const atMiddle = curve(Float64Array.of(middleHz))[0];
  if (!(atMiddle >= threshold)) return null;
  const best = { value: atMiddle, atHz: middleHz };
  const low = edge(curve, threshold, middleHz, -1, best);
  const high = edge(curve, threshold, middleHz, 1, best);
  return { low, high, largest: best.value, largestAtHz: best.atHz };
}

function edge(curve: Curve, threshold: number, middleHz: number, side: -1 | 1, best: { value: number; atHz: number }): Edge {
  const reach = Math.log(bandwidthReach);
  let inside = 0;
  let width = bandwidthFirstBlock;
  while (inside < reach) {
    const end = Math.min(inside + width, reach);
    const found = firstOutside(curve, threshold, middleHz, side, inside, end, best);
    if (found !== null) return closeIn(curve, threshold, middleHz, side, found.before, found.at, best);
    inside = end;
    width = inside;
  }
  return { frequencyHz: middleHz * Math.exp(side * reach), end: 'far' };
}

/** Distances from the middle in nepers of frequency: the first looked at that is below or not known, and the one before it. */
function firstOutside(
  curve: Curve, threshold: number, middleHz: number, side: -1 | 1, from: number, to: number, best: { value: number; atHz: number },
): { before: number; at: number; unknown: boolean } | null {
  const distances = Float64Array.from({ length: bandwidthBlockPoints }, (_, k) => from + ((to - from) * (k + 1)) / bandwidthBlockPoints);
  const frequencyHz = distances.map((distance) => middleHz * Math.exp(side * distance));
  const values = curve(frequencyHz);
  for (let k = 0; k < values.length; k++) {
    if (!(values[k] >= threshold)) return { before: k === 0 ? from : distances[k - 1], at: distances[k], unknown: Number.isNaN(values[k]) };
    if (values[k] > best.value) {
      best.value = values[k];
      best.atHz = frequencyHz[k];
    }
  }
  return null;
}

function closeIn(
  curve: Curve, threshold: number, middleHz: number, side: -1 | 1, from: number, to: number, best: { value: number; atHz: number },
): Edge {
  let before = from;
  let at = to;
  let unknown = false;
  do {
    const found = firstOutside(curve, threshold, middleHz, side, before, at, best);
    // The far end of the bracket is outside by construction; only rounding of exp can make it look otherwise.
    if (found === null) break;
    ({ before, at, unknown } = found);
  } while (at - before > bandwidthPrecision);
  return { frequencyHz: middleHz * Math.exp(side * before), end: unknown ? 'unknown' : 'crossed' };
}
