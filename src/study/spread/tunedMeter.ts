import type { Element } from '../../network/element';
import { judgeGoal } from '../judgeGoal';
import { isCondition } from '../marginDb';
import type { Problem } from '../problem';
import { sampler } from '../sampler';
import { aimedGoals } from '../tuning/channelJudgement';
import { isJudgedOnce } from '../tuning/channelProblems';
import { tuneChannels, type TunedChannel } from '../tuning/tuneChannels';
import { marginMeter, type Meter } from './marginMeter';
import { valueAt, type ToleratedPart } from './toleratedParts';

/**
 * Builds of a tuned ladder, each judged at every channel with the codes that are best without deviations: firmware has one
 * table for all boards. A tuned part deviates by the same share of its tolerance at every code.
 */
export function tunedMeter(problem: Problem, ladder: readonly Element[], parts: readonly ToleratedPart[]): Meter {
  const tuned = tuneChannels({ ...problem, ladder });
  const nominal = sampler(problem, ladder);
  const isSomewhere = (g: number): boolean => tuned.some(({ channel }) => channel.goalIndices.includes(g));
  const once = problem.goals.map((goal, g) => goal.quantity === 'yield' || (isJudgedOnce(goal) ? judgeGoal(goal, nominal).ok : isSomewhere(g)));
  const isRanked = problem.goals.some((goal) => !isCondition(goal));
  const meters = tuned.map((each) => channelMeter(each, ladder, parts, isRanked));
  const holds = new Uint8Array(problem.goals.length);
  const there = new Float64Array(parts.length);
  let worstDb = Infinity;
  let worstCase: string | null = null;
  return {
    holds,
    get worstDb() { return worstDb; },
    get worstCase() { return worstCase; },
    measure(values) {
      once.forEach((held, g) => { holds[g] = held ? 1 : 0; });
      worstDb = Infinity;
      worstCase = null;
      for (const { meter, goalIndices, hasMargin, valuesAt } of meters) {
        valuesAt(values, there);
        meter.measure(there);
        goalIndices.forEach((g, i) => { holds[g] &= meter.holds[i]; });
        if (!hasMargin || !(meter.worstDb < worstDb)) continue;
        worstDb = meter.worstDb;
        worstCase = meter.worstCase;
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

function channelMeter({ channel, samples }: TunedChannel, ladder: readonly Element[], parts: readonly ToleratedPart[], isRanked: boolean): ChannelMeter {
  const own = parts.map((part): ToleratedPart => {
    const element = samples.ladder[part.elementIndex];
    const before = ladder[part.elementIndex];
    if (element === before || element.form !== 'branch' || element.branch.form !== 'part') return part;
    return { ...part, part: element.branch.part, tolerance: element.branch.part.tolerance ?? part.tolerance };
  });
  const hasOwn = channel.problem.goals.some((goal) => !isCondition(goal));
  const goals = isRanked ? channel.problem.goals : aimedGoals(channel);
  return {
    meter: marginMeter({ ...channel.problem, goals }, samples.ladder, own),
    goalIndices: channel.goalIndices,
    hasMargin: hasOwn || !isRanked,
    valuesAt(values, into) {
      for (let i = 0; i < parts.length; i++) into[i] = own[i] === parts[i] ? values[i] : valueAt(own[i], deviationOf(parts[i], values[i]));
    },
  };
}

/** What `valueAt` made a value from. */
function deviationOf({ part, tolerance }: ToleratedPart, value: number): number {
  const shift = value - part.value;
  const side = (shift >= 0 ? tolerance.up : tolerance.down) * (tolerance.form === 'relative' ? part.value : 1);
  return side === 0 ? 0 : shift / side;
}
