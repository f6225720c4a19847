import { decisivePoints } from './limits';
import type { TrialPoints } from './trialPoints';

/** Points at which something is asked of |Γ| or of the gain. */
export const askedPoints = (points: TrialPoints): number[] =>
  Array.from({ length: points.count }, (_, k) => k).filter((k) => points.reflectionWeight[k] > 0 || points.gainFloor[k] > 0);

/** Ends of the runs of points, spread over the cases: where a match mostly breaks first. */
export function outerPoints(points: TrialPoints): Int32Array {
  const asked = new Set(askedPoints(points));
  const ends: number[] = [];
  points.starts.forEach((start, run) => {
    const own = Array.from({ length: (points.starts[run + 1] ?? points.count) - start }, (_, i) => start + i).filter((k) => asked.has(k));
    if (own.length > 0) ends.push(...(run % 2 === 0 ? [own[0], own[own.length - 1]] : [own[own.length - 1], own[0]]));
  });
  const distinct = [...new Set(ends)];
  if (distinct.length <= decisivePoints) return Int32Array.from(distinct);
  const spread = Array.from({ length: decisivePoints }, (_, i) => distinct[Math.round((i * (distinct.length - 1)) / (decisivePoints - 1))]);
  return Int32Array.from(new Set(spread));
}

/**
 * The points that reject most of some near misses: greedy, each next one for what is not rejected yet. `excess`: of every
 * ladder at every point (ladder·points + point).
 */
export function rejectingPoints(points: TrialPoints, excess: readonly Float64Array[], most: number): Int32Array {
  const chosen: number[] = [];
  const candidates = askedPoints(points);
  let left = excess.filter((ladder) => ladder.some((value) => value > most));
  while (chosen.length < Math.min(decisivePoints, candidates.length)) {
    let best = -1;
    let bestScore = -1;
    for (const k of candidates) {
      if (chosen.includes(k)) continue;
      let score = 0;
      for (const ladder of left) if (ladder[k] > most) score++;
      if (score > bestScore) {
        bestScore = score;
        best = k;
      }
    }
    // Where nothing is left to reject, the outer points are as good as any.
    if (bestScore <= 0) best = [...outerPoints(points), ...candidates].find((k) => !chosen.includes(k)) ?? best;
    chosen.push(best);
    left = left.filter((ladder) => !(ladder[best] > most));
  }
  return Int32Array.from(chosen);
}

/** All points, the decisive ones first, then those where near misses are worst. */
export function trialOrder(points: TrialPoints, decisive: Int32Array, excess: readonly Float64Array[]): Int32Array {
  const mean = new Float64Array(points.count);
  for (const ladder of excess) for (let k = 0; k < points.count; k++) mean[k] += Math.min(ladder[k], 1e6);
  const rest = Array.from({ length: points.count }, (_, k) => k).filter((k) => !decisive.includes(k));
  rest.sort((a, b) => mean[b] - mean[a] || a - b);
  return Int32Array.from([...decisive, ...rest]);
}
