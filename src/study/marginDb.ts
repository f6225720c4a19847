import { decibels, returnLossDb } from '../network/figures';
import type { Goal, GoalResult } from './goal';
import { reflectionOfMismatchLoss, reflectionOfVswr } from './reflectionFigures';
import { wantsLarge } from './verdict';

/** True for goals that ladders are not ranked by in dB: resistance, bandwidth, stress, parts, yield, direct current. */
export const isCondition = (goal: Pick<Goal, 'quantity'>): boolean => !ranked.has(goal.quantity);

const ranked: ReadonlySet<Goal['quantity']> = new Set([
  'return loss', 'VSWR', 'reflection', 'mismatch loss', 'gain', 'insertion loss', 'efficiency', 'rejection',
]);

/**
 * A goal's margin in dB, for ranking: VSWR, reflection and mismatch loss as the return loss that they amount to, efficiency
 * as 10 log10 of the share. Positive where the goal holds; may be infinite. Null for conditions and where not known.
 */
export function marginDb(result: GoalResult): number | null {
  const { goal } = result;
  if (isCondition(goal) || goal.limit === null || (result.value === null && result.reason !== null)) return null;
  const value = valueInDb(goal, result.value ?? infiniteValue(goal, result.ok));
  const limit = valueInDb(goal, goal.limit);
  if (value === limit) return 0;
  return wantsLarge(goal) === growsInDb(goal) ? value - limit : limit - value;
}

/** False where a larger value is a smaller return loss. */
const growsInDb = (goal: Goal): boolean => goal.quantity !== 'VSWR' && goal.quantity !== 'reflection' && goal.quantity !== 'mismatch loss';

/** What a null without a reason stands for: infinity, on the side that the outcome tells. */
const infiniteValue = (goal: Goal, ok: boolean): number => (ok === wantsLarge(goal) ? Infinity : -Infinity);

function valueInDb(goal: Goal, value: number): number {
  switch (goal.quantity) {
    case 'VSWR': return returnLossDb(reflectionOfVswr(value));
    case 'reflection': return returnLossDb(value);
    case 'mismatch loss': return returnLossDb(reflectionOfMismatchLoss(value));
    case 'efficiency': return goal.unit === '%' ? decibels(value / 100) : goal.unit === 'dB' ? value : decibels(value);
    default: return value;
  }
}
