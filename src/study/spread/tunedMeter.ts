import type { Element } from '../../network/element';
import { judgeGoal } from '../judgeGoal';
import { isCondition } from '../marginDb';
import type { Problem } from '../problem';
import { sampler } from '../sampler';
import { aimedGoals } from '../tuning/channelJudgement';
import { isJudgedOnce } from '../tuning/channelProblems';
import type { TunedChannel } from '../tuning/tuneChannels';
import { marginMeter, type Meter } from './marginMeter';
import type { ToleratedPart } from './toleratedParts';
import { atChannel, setByCodes, tunedWith } from './tunedParts';

/**
 * Builds of a tuned ladder, each judged at every channel with the codes that are best without deviations: firmware has one
 * table for all boards. A tuned part deviates by the same share of its tolerance at every code, whatever that tolerance is there.
 */
export function tunedMeter(problem: Problem, ladder: readonly Element[], parts: readonly ToleratedPart[]): Meter {
  const tuned = tunedWith(problem, ladder);
  const set = setByCodes(problem);
  const nominal = sampler(problem, ladder);
  const isSomewhere = (g: number): boolean => tuned.some(({ channel }) => channel.goalIndices.includes(g));
  const once = problem.goals.map((goal, g) => goal.quantity === 'yield' || (isJudgedOnce(goal) ? judgeGoal(goal, nominal).ok : isSomewhere(g)));
  const isRanked = problem.goals.some((goal) => !isCondition(goal));
  const meters = tuned.map((each) => channelMeter(each, parts, set, problem.spread.distribution, isRanked));
  const holds = new Uint8Array(problem.goals.length);
  const there = new Float64Array(parts.length);
  let worstDb = Infinity;
  let worstCase: string | null = null;
  const valuesAtWorst = new Float64Array(parts.length);
  return {
    holds, valuesAtWorst,
    get worstDb() { return worstDb; },
    get worstCase() { return worstCase; },
    measure(values) {
      once.forEach((held, g) => { holds[g] = held ? 1 : 0; });
      worstDb = Infinity;
      worstCase = null;
      meters[0]?.valuesAt(values, valuesAtWorst);
      for (const { meter, goalIndices, hasMargin, valuesAt } of meters) {
        valuesAt(values, there);
        meter.measure(there);
        goalIndices.forEach((g, i) => { holds[g] &= meter.holds[i]; });
        if (!hasMargin || !(meter.worstDb < worstDb)) continue;
        worstDb = meter.worstDb;
        worstCase = meter.worstCase;
        valuesAtWorst.set(there);
      }
    },
  };
}

interface ChannelMeter {
  readonly meter: Meter;
  readonly goalIndices: readonly number[];
  /** False where no goal of the channel has a margin although others have: its gain is not to be compared with these. */
  readonly hasMargin: boolean;
  valuesAt(values: Float64Array, into: Float64Array): void;
}

function channelMeter(
  { channel, samples }: TunedChannel, parts: readonly ToleratedPart[], set: ReadonlySet<string>, distribution: Problem['spread']['distribution'], isRanked: boolean,
): ChannelMeter {
  const own = parts.map((part) => atChannel(part, samples.ladder[part.elementIndex], set.has(samples.ladder[part.elementIndex].name), distribution));
  const hasOwn = channel.problem.goals.some((goal) => !isCondition(goal));
  const goals = isRanked ? channel.problem.goals : aimedGoals(channel);
  return {
    meter: marginMeter({ ...channel.problem, goals }, samples.ladder, own.map(({ part }) => part)),
    goalIndices: channel.goalIndices,
    hasMargin: hasOwn || !isRanked,
    valuesAt(values, into) {
      own.forEach((each, i) => { into[i] = each.valueAt(values[i]); });
    },
  };
}
