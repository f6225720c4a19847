import type { Goal, GoalResult } from './goal';
import { inUnit } from './pointQuantities';
import { judged, notKnown } from './verdict';

/** What a study of random builds found, for `yield` goals. */
export interface YieldAnswer {
  /** Share of builds that meet every other goal, 0 … 1; null where it is not known. */
  readonly yield?: number | null;
  /** Why it is not known, e.g. that no part has a tolerance. */
  readonly yieldReason?: string | null;
}

/** The reason while the spread of builds has not been studied. */
export const yieldIsPending = 'needs the spread of builds';

/** True for a goal on yield while its builds have not been studied: neither held nor missed yet. */
export const isPending = ({ goal, reason }: GoalResult): boolean => goal.quantity === 'yield' && reason === yieldIsPending;

/** A goal on yield, from the share that the spread of builds found; that study is made elsewhere, and takes long. */
export function judgeYield(goal: Goal, answer: YieldAnswer): GoalResult {
  if (answer.yield == null) return notKnown(goal, answer.yieldReason ?? yieldIsPending);
  return judged(goal, inUnit(answer.yield, goal.unit), null, null);
}
