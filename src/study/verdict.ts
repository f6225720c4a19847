import type { Goal, GoalResult } from './goal';

/** A goal that has no value: it is missed, with the reason. */
export function notKnown(goal: Goal, reason: string, frequencyHz: number | null = null, caseName: string | null = null): GoalResult {
  return { goal, ok: false, value: null, margin: null, frequencyHz, caseName, reason };
}

/**
 * A goal against its worst value (in its own unit, infinite allowed). Compared as plain numbers, without any tolerance:
 * exactly at the limit `>=` and `<=` hold while `>` and `<` do not. Infinite values and margins are null without a reason.
 */
export function judged(goal: Goal, value: number, frequencyHz: number | null, caseName: string | null): GoalResult {
  const limit = goal.limit ?? 0;
  const margin = wantsLarge(goal) ? value - limit : limit - value;
  return { goal, ok: holds(goal, value), value: finite(value), margin: finite(margin), frequencyHz, caseName, reason: null };
}

/** A condition without a value: 1 where met, 0 where not; the margin is 1 or −1. */
export function judgedCondition(goal: Goal, met: boolean): GoalResult {
  return { goal, ok: met, value: met ? 1 : 0, margin: met ? 1 : -1, frequencyHz: null, caseName: null, reason: null };
}

/** True for goals that set a lower limit. */
export const wantsLarge = (goal: Goal): boolean => goal.comparison === '>=' || goal.comparison === '>';

export function holds(goal: Goal, value: number): boolean {
  const limit = goal.limit ?? 0;
  switch (goal.comparison) {
    case '>=': return value >= limit;
    case '>': return value > limit;
    case '<=': return value <= limit;
    case '<': return value < limit;
    case null: return value > 0;
  }
}

const finite = (value: number): number | null => (Number.isFinite(value) ? value : null);
