import type { Element } from '../../network/element';
import { ladderDerivatives } from '../../network/ladderDerivative';
import { isCondition } from '../marginDb';
import type { Problem } from '../problem';
import { studiedLadder } from '../studiedLadder';
import { aimedGoals } from '../tuning/channelJudgement';
import { excessOf } from './excess';
import { marginMeter } from './marginMeter';
import { isTuned, tunedWith } from './tunedParts';

/** The change of value that a sensitivity is stated for. */
const changes = [0.01, -0.01];

/**
 * By element of the ladder: the larger loss of worst margin, in dB, for +1 % or −1 % of its value; 0 where neither loses. From
 * exact derivatives of the cascade, every point and goal to first order, so that it does not matter which of them is worst
 * now; with tunable parts over all channels, each with its codes. Null where an element has no one value, or where the margin
 * is not known. Goals that |Γ| and gain do not decide (stress, resistance, efficiency, bandwidth) are not in it.
 */
export function sensitivities(problem: Problem, ladder = studiedLadder(problem)): readonly (number | null)[] {
  const studies = marginsWithChanges(problem, ladder);
  const now = studies.reduce((least, study) => Math.min(least, study.now), Infinity);
  if (!Number.isFinite(now)) return ladder.map(() => null);
  return ladder.map((_, at) => {
    const losses = changes.map((_, i) => studies.reduce((most, { after }) => Math.max(most, now - (after[at]?.[i] ?? NaN)), 0));
    const loss = Math.max(...losses);
    return Number.isFinite(loss) ? loss : null;
  });
}

interface ChangedMargins {
  /** The worst margin in dB. */
  readonly now: number;
  /** By element: the same for each of the `changes`; null where it has no one value. */
  readonly after: readonly (readonly number[] | null)[];
}

function marginsWithChanges(problem: Problem, ladder: readonly Element[]): ChangedMargins[] {
  if (!isTuned(problem, ladder)) return [marginsOf(problem, ladder)];
  const isRanked = problem.goals.some((goal) => !isCondition(goal));
  return tunedWith(problem, ladder).flatMap(({ channel, samples }) => {
    const goals = isRanked ? channel.problem.goals : aimedGoals(channel);
    return goals.every(isCondition) ? [] : [marginsOf({ ...channel.problem, goals }, samples.ladder)];
  });
}

function marginsOf(problem: Problem, ladder: readonly Element[]): ChangedMargins {
  const meter = marginMeter(problem, ladder, []);
  meter.measure(new Float64Array(0));
  const { points, reflectionSquare, gain } = meter;
  const worst = (gamma2: Float64Array, passed: Float64Array): number =>
    points.checks.reduce((least, check) => Math.min(least, -10 * Math.log10(excessOf(check, gamma2, passed))), Infinity);
  const after = ladderDerivatives(ladder, points.frequencyHz, points.source, points.load).map((derivative) => derivative && changes.map((change) => worst(
    reflectionSquare.map((value, k) => Math.max(0, value + derivative.reflectionSquare[k] * change)),
    gain.map((value, k) => value * Math.exp(derivative.logGain[k] * change)),
  )));
  return { now: worst(reflectionSquare, gain), after };
}
