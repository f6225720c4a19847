import { bandwidthBlockPoints, bandwidthFirstBlock, bandwidthPrecision, bandwidthReach, edgePoints } from './limits';

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
}

/** Distances from the middle, as natural logarithms of frequency: the last point that is inside and the first that is not. */
interface Crossing {
  readonly inside: number;
  readonly outside: number;
  /** True where the curve is not known at `outside`, rather than below the threshold. */
  readonly unknown: boolean;
}

/** The largest value met so far. */
interface Top {
  value: number;
  atHz: number;
}

/**
 * The span around `middleHz` in which a curve stays at or above a threshold without a break. Null where it is below it, or
 * not known, at the middle itself.
 *
 * Looked at in blocks of points outwards, each as wide (in octaves) as all before it, so that a gap narrower than a
 * thirty-second of its distance from the middle can be missed. Edges are then closed in on by dividing the bracket again
 * and again, to 1e-9 of the frequency.
 */
export function spanAround(curve: Curve, threshold: number, middleHz: number): SpanAround | null {
  if (!(curve(Float64Array.of(middleHz))[0] >= threshold)) return null;
  return { low: edge(curve, threshold, middleHz, -1), high: edge(curve, threshold, middleHz, 1) };
}

/**
 * The largest value of a curve around a middle, going outwards both ways until it is below the threshold or not known; then
 * by looking closer between the neighbours of the largest point, three times: a parabola's top is found to rounding.
 */
export function largestAround(curve: Curve, threshold: number, middleHz: number): number {
  const top: Top = { value: curve(Float64Array.of(middleHz))[0], atHz: middleHz };
  firstCrossing(curve, threshold, middleHz, -1, top);
  firstCrossing(curve, threshold, middleHz, 1, top);
  let reach = (2 * Math.max(Math.abs(Math.log(top.atHz / middleHz)), bandwidthFirstBlock)) / bandwidthBlockPoints;
  for (let round = 0; round < 3; round++, reach /= 8) {
    const centreHz = top.atHz;
    const offsets = Float64Array.from({ length: 2 * bandwidthBlockPoints + 1 }, (_, k) => reach * (k / bandwidthBlockPoints - 1));
    const around = offsets.map((offset) => centreHz * Math.exp(offset));
    raise(top, curve(around), around, around.length);
  }
  return top.value;
}

function edge(curve: Curve, threshold: number, middleHz: number, side: -1 | 1): Edge {
  let crossing = firstCrossing(curve, threshold, middleHz, side, null);
  if (crossing === null) return { frequencyHz: middleHz * Math.exp(side * Math.log(bandwidthReach)), end: 'far' };
  while (crossing.outside - crossing.inside > bandwidthPrecision) {
    const closer = firstOutside(curve, threshold, middleHz, side, crossing.inside, crossing.outside, edgePoints, null);
    // The far end of the bracket is outside by construction; only rounding of exp can make it look otherwise.
    if (closer === null) break;
    crossing = closer;
  }
  return { frequencyHz: middleHz * Math.exp(side * crossing.inside), end: crossing.unknown ? 'unknown' : 'crossed' };
}

function firstCrossing(curve: Curve, threshold: number, middleHz: number, side: -1 | 1, top: Top | null): Crossing | null {
  const reach = Math.log(bandwidthReach);
  let inside = 0;
  let end = bandwidthFirstBlock;
  while (inside < reach) {
    const found = firstOutside(curve, threshold, middleHz, side, inside, end, bandwidthBlockPoints, top);
    if (found !== null) return found;
    inside = end;
    end = Math.min(2 * end, reach);
  }
  return null;
}

function firstOutside(
  curve: Curve, threshold: number, middleHz: number, side: -1 | 1, from: number, to: number, points: number, top: Top | null,
): Crossing | null {
  const distances = Float64Array.from({ length: points }, (_, k) => from + ((to - from) * (k + 1)) / points);
  const frequencyHz = distances.map((distance) => middleHz * Math.exp(side * distance));
  const values = curve(frequencyHz);
  const first = values.findIndex((value) => !(value >= threshold));
  if (top) raise(top, values, frequencyHz, first < 0 ? points : first);
  if (first < 0) return null;
  return { inside: first === 0 ? from : distances[first - 1], outside: distances[first], unknown: Number.isNaN(values[first]) };
}

function raise(top: Top, values: Float64Array, frequencyHz: Float64Array, count: number): void {
  for (let k = 0; k < count; k++) {
    if (!(values[k] > top.value)) continue;
    top.value = values[k];
    top.atHz = frequencyHz[k];
  }
}
