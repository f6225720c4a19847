import { judgeBandwidth } from './bandwidth';
import { countParts } from './countParts';
import { directCurrent } from './directCurrent';
import type { Goal, GoalResult } from './goal';
import { judgePoints } from './judgePoints';
import { judgeYield, type YieldAnswer } from './judgeYield';
import { ladderObstacle } from './obstacles';
import { judgeRejection } from './rejection';
import type { Sampler } from './sampler';
import { judged, judgedCondition, notKnown } from './verdict';

/**
 * One goal against one ladder. A goal that cannot be told is missed, with the reason: while an element is unsolved or could
 * not be read no goal has a value.
 */
export function judgeGoal(goal: Goal, sampler: Sampler, answer: YieldAnswer = {}): GoalResult {
  const obstacle = ladderObstacle(sampler.ladder);
  if (obstacle) return notKnown(goal, obstacle);
  switch (goal.quantity) {
    case 'parts': return judged(goal, countParts(sampler.ladder), null, null);
    case 'yield': return judgeYield(goal, answer);
    case 'bandwidth': return judgeBandwidth(goal, sampler);
    case 'rejection': return judgeRejection(goal, sampler);
    case 'dc path':
    case 'dc block':
    case 'dc short at load': {
      const { met, reason } = directCurrent(goal.quantity, sampler.ladder);
      return met === null ? notKnown(goal, reason ?? 'not known') : judgedCondition(goal, met);
    }
    default: return judgePoints(goal.quantity, goal, sampler);
  }
}
