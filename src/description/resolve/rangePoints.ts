import { pointsAtMost } from '../limits';
import type { RangeSyntax } from '../syntax';

/** The points of a range: by its step, else so many evenly spaced with both ends. */
export function rangePoints(range: RangeSyntax, points: number): Float64Array {
  const from = range.min.value;
  const to = range.max.value;
  if (range.step && range.step.value > 0) {
    // A last step that rounding puts just beyond the end still counts.
    const count = Math.min(Math.floor((to - from) / range.step.value + 1e-9) + 1, pointsAtMost);
    return Float64Array.from({ length: Math.max(count, 1) }, (_, i) => Math.min(from + i * (range.step?.value ?? 0), to));
  }
  return evenPoints(from, to, range.points?.value ?? points);
}

export function evenPoints(from: number, to: number, points: number): Float64Array {
  if (!(to > from)) return Float64Array.of(from);
  const count = Math.min(Math.max(Math.round(points), 2), pointsAtMost);
  const made = Float64Array.from({ length: count }, (_, i) => from + ((to - from) * i) / (count - 1));
  made[count - 1] = to;
  return made;
}
