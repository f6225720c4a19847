import type { Element } from '../../network/element';
import type { Goal, GoalResult } from '../goal';
import { judgeGoal } from '../judgeGoal';
import { isCondition, marginDb } from '../marginDb';
import { sampler, type Sampler } from '../sampler';
import type { ChannelProblem } from './channelProblems';

/** How good one ladder is at one channel. */
export interface ChannelScore {
  /** Goals among the conditions (`isCondition`) that it misses. */
  readonly missed: number;
  /** The worst margin in dB over the other goals; −∞ where one of them is not known. */
  readonly marginDb: number;
}

/** What counts where no goal of a channel has a margin in dB: the gain there, whose margin against 0 dB it is itself. */
export function gainAim(frequencyHz: number): Goal {
  return {
    text: 'gain', line: 0, quantity: 'gain', comparison: '>=', limit: 0, unit: 'dB', place: { form: 'frequency', frequencyHz },
    caseName: null, into: null, against: null, elementName: null, bandwidthDropDb: null,
  };
}

/** The goals that rank codes at a channel: its own, and the gain where none of these has a margin in dB. */
export function aimedGoals({ problem, frequencyHz }: ChannelProblem): readonly Goal[] {
  return problem.goals.every(isCondition) ? [...problem.goals, gainAim(frequencyHz)] : problem.goals;
}

/** A ladder judged at one channel by some goals, each evaluated as a whole. */
export function judgeAtChannel({ problem }: ChannelProblem, ladder: readonly Element[], goals: readonly Goal[]): { readonly samples: Sampler; readonly results: readonly GoalResult[] } {
  const samples = sampler(problem, ladder);
  return { samples, results: goals.map((goal) => judgeGoal(goal, samples)) };
}

export function scoreOf(results: readonly GoalResult[]): ChannelScore {
  let missed = 0;
  let worstDb = Infinity;
  for (const result of results) {
    if (isCondition(result.goal)) missed += result.ok ? 0 : 1;
    else worstDb = Math.min(worstDb, marginDb(result) ?? -Infinity);
  }
  return { missed, marginDb: worstDb };
}
