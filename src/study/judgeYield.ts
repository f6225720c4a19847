import type { Goal, GoalResult } from './goal';
import type { YieldAnswer } from './judgeGoal';
import { inUnit } from './pointQuantities';
import { judged, notKnown } from './verdict';

/** A goal on yield, from the share that the spread of builds found; that study is made elsewhere, and takes long. */
export function judgeYield(goal: Goal, answer: YieldAnswer): GoalResult {
  if (answer.yield == null) return notKnown(goal, answer.yieldReason ?? 'needs the spread of builds');
  return judged(goal, inUnit(answer.yield, goal.unit), null, null);
}
