import { casesOf } from '../casesOf';
import type { Goal, GoalResult } from '../goal';
import { codeCombinationsAtMost, codePointsAtMost, heldMarginsAtMost, wholeJudgementsAtLeast, wholeJudgementsAtMost } from '../limits';
import { isCondition } from '../marginDb';
import { placesOf } from '../place';
import type { Problem } from '../problem';
import { sampler, type Sampler } from '../sampler';
import { ladderAtCodes, type TunableCodes } from '../tunableCodes';
import { channelProblems, type ChannelProblem } from './channelProblems';
import { aimedGoals, judgeAtChannel, scoreOf, type ChannelScore } from './channelJudgement';
import { chooseCodes, marginOfExcess } from './chooseCodes';
import { codeMeter, type CodeMeter } from './codeMeter';
import { codeSpace, type CodeSpace } from './codeSpace';
import { searchCodes } from './searchCodes';

/** One channel with its codes, and everything judged with them. */
export interface TunedChannel {
  readonly channel: ChannelProblem;
  readonly codes: TunableCodes;
  readonly proved: boolean;
  /** The ladder at these codes. */
  readonly samples: Sampler;
  /** By goal of the channel's problem. */
  readonly results: readonly GoalResult[];
  readonly score: ChannelScore;
  /** The score with one tunable at the state before (−1) or after (1) its own; null where there is none. */
  stepScore(tunable: string, step: -1 | 1): ChannelScore | null;
}

/** Told now and then how much of the work is done, 0 … 1. */
export type OnProgress = (share: number) => void;

/** Combinations between two reports. */
const reportEvery = 4096;

const known = new WeakMap<Problem, readonly TunedChannel[]>();

/**
 * Every channel with its best codes. Only for a problem with tunables in its ladder, and with a ladder that is known. Worked out
 * once for each problem: what is shown beside its evaluation, at a marker for example, has the same codes.
 */
export function tuneChannels(problem: Problem, onProgress: OnProgress = () => undefined): readonly TunedChannel[] {
  const tuned = known.get(problem) ?? search(problem, onProgress);
  known.set(problem, tuned);
  return tuned;
}

/** Takes the codes of a problem that differs in nothing that codes depend on: in its sweep, say, or in how many builds are made. */
export function shareCodes(from: Problem, to: Problem): Problem {
  const tuned = known.get(from);
  if (tuned) known.set(to, tuned);
  return to;
}

/** What the search takes, in evaluations of one point: a lower bound, from the numbers of codes, channels and cases alone. */
export function tuningPoints(problem: Problem): number {
  const space = codeSpace(problem);
  return space.tunables.length === 0 ? 0 : space.count * (problem.channelsHz?.length ?? 0) * problem.cases.length;
}

/**
 * Takes the codes of every channel as found elsewhere, in a worker for example, so that they are not sought here again. Codes that do not belong to
 * the problem's channels and tunables are refused with a `RangeError`.
 */
export function giveCodes(problem: Problem, found: readonly { readonly frequencyHz: number; readonly codes: TunableCodes; readonly proved: boolean }[]): void {
  const space = codeSpace(problem);
  const channels = channelProblems(problem);
  if (channels.length !== found.length) throw new RangeError('codes of other channels');
  known.set(problem, channels.map((channel, at) => {
    const { frequencyHz, codes, proved } = found[at];
    const states = Int32Array.from(space.tunables, ({ name, states: own }) => own.findIndex(({ code }) => code === codes.get(name)));
    if (frequencyHz !== channel.frequencyHz || states.includes(-1)) throw new RangeError('codes of other channels or tunables');
    return tunedChannel(problem, space, channel, states, proved);
  }));
}

function search(problem: Problem, onProgress: OnProgress): readonly TunedChannel[] {
  const space = codeSpace(problem);
  const channels = channelProblems(problem);
  const tuned: TunedChannel[] = [];
  let previous: Int32Array | null = null;
  const add = (channel: ChannelProblem, states: Int32Array, proved: boolean): void => {
    tuned.push(tunedChannel(problem, space, channel, states, proved));
    previous = states;
  };
  if (isExhaustive(problem, space)) {
    const trials = Math.max(wholeJudgementsAtLeast, Math.floor(wholeJudgementsAtMost / channels.length));
    const together = Math.max(1, Math.floor(heldMarginsAtMost / space.count));
    for (let at = 0; at < channels.length; at += together) {
      const run = channels.slice(at, at + together);
      const meter = codeMeter(problem, space, run);
      excessesOfAll(meter, space, run.length, (share) => onProgress((at + share * run.length) / channels.length)).forEach((excesses, c) => {
        const goals = meter.others[c];
        const { states, proved } = chooseCodes(excesses, space, previous, goals.length === 0 ? null : {
          judge: (at) => judged(problem, space, run[c], at, goals), leastMissed: leastMissed(problem, run[c], goals), trials,
        });
        add(run[c], states, proved);
      });
    }
    return tuned;
  }
  for (const channel of channels) {
    const meter = codeMeter(problem, space, [channel]);
    const excess = new Float64Array(1);
    const score = (states: Int32Array): ChannelScore => {
      meter.measure(states, excess);
      const rest = judged(problem, space, channel, states, meter.others[0]);
      return { missed: rest.missed, marginDb: Math.min(rest.marginDb, marginOfExcess(excess[0])) };
    };
    const { states } = searchCodes(score, space, previous, Math.floor(codePointsAtMost / (channels.length * Math.max(1, meter.points))));
    add(channel, states, false);
    onProgress(tuned.length / channels.length);
  }
  return tuned;
}

function isExhaustive(problem: Problem, space: CodeSpace): boolean {
  if (space.count > codeCombinationsAtMost) return false;
  // At least one point a channel and case: enough to tell whether there would be far too many.
  return tuningPoints(problem) <= codePointsAtMost;
}

/** By channel: the excess of each combination. */
function excessesOfAll(meter: CodeMeter, space: CodeSpace, channels: number, onProgress: OnProgress): Float64Array[] {
  const excesses = Array.from({ length: channels }, () => new Float64Array(space.count));
  const states = new Int32Array(space.tunables.length);
  const now = new Float64Array(channels);
  for (let combination = 0; combination < space.count; combination++) {
    space.statesOf(combination, states);
    meter.measure(states, now);
    for (let c = 0; c < channels; c++) excesses[c][combination] = now[c];
    if (combination % reportEvery === 0) onProgress(combination / space.count);
  }
  return excesses;
}

const ladderAt = (problem: Problem, space: CodeSpace, states: Int32Array) => ladderAtCodes(problem, space.codesOf(states));

const judged = (problem: Problem, space: CodeSpace, channel: ChannelProblem, states: Int32Array, goals: readonly Goal[]): ChannelScore =>
  goals.length === 0 ? { missed: 0, marginDb: Infinity } : scoreOf(judgeAtChannel(channel, ladderAt(problem, space, states), goals).results);

/** Conditions that no code can meet, since a load or the source is not known where they are asked. */
function leastMissed(problem: Problem, channel: ChannelProblem, goals: readonly Goal[]): number {
  const conditions = goals.filter(isCondition);
  if (conditions.length === 0) return 0;
  const samples = sampler(channel.problem, ladderAtCodes(problem));
  const isBlind = (goal: Goal): boolean => {
    const places = placesOf(goal, channel.problem);
    const loads = goal.into ? [goal.into] : casesOf(goal, channel.problem);
    if (typeof places === 'string' || typeof loads === 'string') return true;
    return places.some((place) => loads.some((load) => {
      const { load: seen, source } = samples.trace(place, load);
      // Of a bandwidth only the middle must be known.
      return seen.known.every((known) => !known) || source.known.every((known) => !known) || (goal.quantity !== 'bandwidth' && (seen.known.includes(0) || source.known.includes(0)));
    }));
  };
  return conditions.filter(isBlind).length;
}

function tunedChannel(problem: Problem, space: CodeSpace, channel: ChannelProblem, states: Int32Array, proved: boolean): TunedChannel {
  const scoreAt = (at: Int32Array): ChannelScore => scoreOf(judgeAtChannel(channel, ladderAt(problem, space, at), aimedGoals(channel)).results);
  const { samples, results } = judgeAtChannel(channel, ladderAt(problem, space, states), aimedGoals(channel));
  return {
    channel, codes: space.codesOf(states), proved, samples, results: results.slice(0, channel.problem.goals.length), score: scoreOf(results),
    stepScore(tunable, step) {
      const t = space.tunables.findIndex(({ name }) => name === tunable);
      const at = states.slice();
      at[t] += step;
      return at[t] >= 0 && at[t] < space.tunables[t].states.length ? scoreAt(at) : null;
    },
  };
}
