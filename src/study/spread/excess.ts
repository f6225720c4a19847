import type { GoalCheck } from './goalChecks';

/** How far a check is from its limit as a ratio of powers: at most 1 where it holds. NaN where something is not known. */
export function excessOf({ quantity, side, limit, points, reference }: GoalCheck, reflectionSquare: Float64Array, gain: Float64Array): number {
  let least = Infinity;
  for (let i = 0; i < reference.length; i++) least = Math.min(least, gain[reference[i]]);
  let worst = 0;
  for (let i = 0; i < points.length; i++) {
    const k = points[i];
    const over = quantity === 'reflection' ? reflectionSquare[k] / limit : quantity === 'gain' ? gain[k] / limit : (gain[k] * limit) / least;
    // A rejection of at least so much is a gain of at most so little.
    const atMost = quantity === 'rejection' ? side === 'at least' : side === 'at most';
    const excess = atMost ? over : 1 / over;
    if (Number.isNaN(excess)) return NaN;
    if (excess > worst) worst = excess;
  }
  return worst;
}
