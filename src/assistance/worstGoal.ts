import type { GoalResult } from '../study/goal';
import { isPending } from '../study/judgeYield';
import { goalBar, goalDetail, goalMarginText, goalTitle, goalValueText } from './goalText';

/**
 * The goal with the least margin: one that is not known before one that is missed, that before one that holds. A condition
 * that is met and a count of parts that is kept have no margin worth a word: they come last. Null without goals.
 */
export function worstGoal(results: readonly GoalResult[]): GoalResult | null {
  let worst: GoalResult | null = null;
  let least = Infinity;
  for (const result of results.filter((each) => !isPending(each))) {
    const { goal, ok } = result;
    const isPlain = ok && (goal.comparison === null || goal.quantity === 'parts');
    const rank = (isPlain ? 20 : ok ? 10 : 0) + (goalBar(result) ?? -2);
    if (rank < least) {
      least = rank;
      worst = result;
    }
  }
  return worst;
}

/** The least margin in a few words, for a place as narrow as a status bar: `return loss 2.6 dB short`. */
export function worstGoalText(result: GoalResult): string {
  const subject = result.goal.elementName === null ? result.goal.quantity : `${result.goal.quantity} ${result.goal.elementName}`;
  const margin = goalMarginText(result) || goalValueText(result);
  return `${subject} ${margin}`;
}

/** The same in full: the goal, its value and where it is worst. */
export function worstGoalDetail(result: GoalResult): string {
  const detail = goalDetail(result);
  return `${goalTitle(result.goal)}: ${goalValueText(result)}${detail === '' ? '' : `, ${detail}`}`;
}
