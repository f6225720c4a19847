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

/** A goal on yield, from the share that the spread of builds found; that study is made elsewhere, and takes long. */
export function judgeYield(goal: Goal, answer: YieldAnswer): GoalResult {
  if (answer.yield == null) return notKnown(goal, answer.yieldReason ?? 'needs the spread of builds');
  return judged(goal, inUnit(answer.yield, goal.unit), null, null);
}
