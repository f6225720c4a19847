import { decibels } from '../../network/figures';
import { isCondition } from '../marginDb';
import { ladderObstacle } from '../obstacles';
import type { Problem } from '../problem';
import { settledReflection } from '../reflectionFigures';
import { studiedLadder } from '../studiedLadder';
import type { TunableCodes } from '../tunableCodes';
import { usedTunables } from './codeSpace';
import { tuneChannels, type OnProgress, type TunedChannel } from './tuneChannels';

/** The best codes of one channel, what they leave, and what a wrong one costs. */
export interface ChannelCodes extends ChannelFigures {
  readonly steps: readonly CodeStep[];
}

/** The best codes of one channel, and what they leave. */
export interface ChannelFigures {
  readonly frequencyHz: number;
  /** By the tunable's name, in the order of the description. */
  readonly codes: TunableCodes;
  /**
   * The worst margin in dB over the goals judged at this channel and all cases, without any the worst gain; may be infinite.
   * Null, with a reason, where one of these goals is not known.
   */
  readonly marginDb: number | null;
  /** True where the margin is the gain, since no goal of this channel has a margin in dB. */
  readonly byGain: boolean;
  /** True where every goal judged at this channel holds. */
  readonly holds: boolean;
  /** Goals on other things (resistance, stress, bandwidth) that are missed at this channel. */
  readonly conditionsMissed: number;
  /** |Γ| at the channel, worst over the cases, and the least gain in dB (may be −∞); null where a case is not known there. */
  readonly worstReflection: number | null;
  readonly worstGainDb: number | null;
  /** True where every combination of codes was looked at. */
  readonly proved: boolean;
  readonly reason: string | null;
}

export interface CodeStep {
  readonly tunable: string;
  /** The margin with this tunable alone at its next lower or higher code; null where there is no such code, −∞ where not known. */
  readonly lowerDb: number | null;
  readonly higherDb: number | null;
}

/** Why there are no codes to choose: nothing is tuned, or the ladder is not known. */
export function codesObstacle(problem: Problem): string | null {
  if (usedTunables(problem).length === 0) return 'nothing in the ladder is set by a code';
  if (!problem.channelsHz?.length) return 'there is no channel';
  return ladderObstacle(studiedLadder(problem));
}

/**
 * The best codes of every channel, all tunables together: the fewest conditions missed, then the largest worst margin in dB
 * over all cases and the goals judged at the channel (`channelProblems` says which); equal to 1e-9 dB, the nearest to the codes
 * of the channel before (the sum of the differences), then the smallest. All combinations are tried where there are up to
 * `codeCombinationsAtMost` and the work stays below `codePointsAtMost`; past that the codes are good ones, not `proved`.
 * Only where there is no `codesObstacle`.
 */
export function bestCodes(problem: Problem, onProgress?: OnProgress): readonly ChannelCodes[] {
  return tuneChannels(problem, onProgress).map(channelCodes);
}

/** Why the margin of a channel is not known; null where it is. */
export function channelObstacle(tuned: TunedChannel): string | null {
  const blind = tuned.results.find(({ goal, value, reason }) => !isCondition(goal) && value === null && reason !== null);
  return blind?.reason ?? (isByGain(tuned) ? worstAt(tuned).reason : null);
}

const isByGain = ({ results }: TunedChannel): boolean => results.every(({ goal }) => isCondition(goal));

export const channelCodes = (tuned: TunedChannel): ChannelCodes => ({ ...channelFigures(tuned), steps: codeSteps(tuned) });

/** What each tunable's next codes would leave, the others standing. */
export function codeSteps({ channel: { problem }, stepScore }: TunedChannel): readonly CodeStep[] {
  return usedTunables(problem).map(({ name }) => ({ tunable: name, lowerDb: stepScore(name, -1)?.marginDb ?? null, higherDb: stepScore(name, 1)?.marginDb ?? null }));
}

export function channelFigures(tuned: TunedChannel): ChannelFigures {
  const { channel: { frequencyHz }, codes, proved, results, score } = tuned;
  const own = worstAt(tuned);
  const byGain = isByGain(tuned);
  const reason = channelObstacle(tuned);
  return {
    frequencyHz, codes, proved, byGain, holds: reason === null && results.every(({ ok }) => ok),
    marginDb: reason === null ? score.marginDb : null,
    conditionsMissed: score.missed,
    worstReflection: own.reflection, worstGainDb: own.gainDb,
    reason: reason ?? own.reason,
  };
}

/** The worst over the cases at the channel itself, with the source of the band that it lies in. */
function worstAt({ channel: { frequencyHz, problem }, samples }: TunedChannel): { reflection: number | null; gainDb: number | null; reason: string | null } {
  const band = problem.bands.find((each) => each.frequencyHz.length === 1 && each.frequencyHz[0] === frequencyHz)?.name ?? null;
  const place = { key: 'channel', frequencyHz: Float64Array.of(frequencyHz), band };
  let reflection = 0;
  let gainDb = Infinity;
  for (let at = 0; at < problem.cases.length; at++) {
    const trace = samples.trace(place, at);
    if (trace.reason !== null) return { reflection: null, gainDb: null, reason: trace.reason };
    const { re, im } = trace.reflection();
    reflection = Math.max(reflection, settledReflection(Math.hypot(re[0], im[0])));
    gainDb = Math.min(gainDb, decibels(trace.gain()[0]));
  }
  return { reflection, gainDb, reason: null };
}
