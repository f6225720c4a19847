import type { BandwidthCheck } from './goalChecks';

const tenDecibels = 0.1;

/**
 * Whether a goal on bandwidth holds, from |Γ|² or the gain at its points; edges between two points by a straight line, which is
 * some 1e-4 of the bandwidth off at most. Points that are not known (NaN) end what is known: the span is then at least so wide,
 * which is enough for a lower limit and never for an upper one.
 */
export function bandwidthHolds({ points, middle, share, side, limitHz }: BandwidthCheck, frequencyHz: Float64Array, reflectionSquare: Float64Array, gain: Float64Array): boolean {
  const level = (i: number): number => (share === null ? -reflectionSquare[points[i]] : gain[points[i]]);
  const threshold = share === null ? -tenDecibels : share * largestAround(level, share, middle, points.length);
  if (!(level(middle) >= threshold)) return side === 'at most' && !Number.isNaN(level(middle));
  let open = false;
  const edge = (direction: 1 | -1): number => {
    for (let i = middle + direction; i >= 0 && i < points.length; i += direction) {
      if (Number.isNaN(level(i))) {
        open = true;
        return frequencyHz[points[i - direction]];
      }
      if (level(i) >= threshold) continue;
      const inside = level(i - direction);
      const part = (inside - threshold) / (inside - level(i));
      return frequencyHz[points[i - direction]] + part * (frequencyHz[points[i]] - frequencyHz[points[i - direction]]);
    }
    return frequencyHz[points[direction > 0 ? points.length - 1 : 0]];
  };
  const width = edge(1) - edge(-1);
  return side === 'at least' ? width >= limitHz : width <= limitHz && !open;
}

/** The largest value met before it has fallen by the share from its value at the middle. */
function largestAround(level: (i: number) => number, share: number, middle: number, count: number): number {
  const least = share * level(middle);
  let largest = level(middle);
  for (const direction of [1, -1]) {
    for (let i = middle + direction; i >= 0 && i < count && level(i) >= least; i += direction) largest = Math.max(largest, level(i));
  }
  return largest;
}
