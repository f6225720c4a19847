import { bandResults } from '../bandResults';
import { elementTable } from '../elementTable';
import type { Evaluation } from '../evaluation';
import type { Goal, GoalResult } from '../goal';
import { judgeGoal } from '../judgeGoal';
import type { YieldAnswer } from '../judgeYield';
import { sweepPlace } from '../place';
import type { Problem } from '../problem';
import { sampler } from '../sampler';
import { stressedPlaces } from '../stressedPlaces';
import { traceCase } from '../traceCase';
import { ladderAtCodes, type TunableCodes } from '../tunableCodes';
import { notKnown } from '../verdict';
import { worstStress } from '../worstStress';
import { codesObstacle } from './bestCodes';
import { isJudgedOnce, nearestChannel } from './channelProblems';
import { mergeBands } from './mergeBands';
import { mergeStress } from './mergeStress';
import { tuneChannels, type TunedChannel } from './tuneChannels';

/**
 * The evaluation of a ladder with tunables: goals, bands and stress at every channel with that channel's best codes, the worst
 * of them in the end; traces and the elements' own values with the codes of the channel nearest to `markerHz`, of the middle
 * one without. Only where there is no `codesObstacle`.
 */
export function evaluateTuned(problem: Problem, answer: YieldAnswer, markerHz: number | null): Evaluation {
  const tuned = tuneChannels(problem);
  const channelsHz = Float64Array.from(tuned, ({ channel }) => channel.frequencyHz);
  const shown = markerHz === null ? (tuned.length - 1) >> 1 : nearestChannel(markerHz, channelsHz);
  const samples = sampler(problem, ladderAtCodes(problem, tuned[shown].codes));
  const goals = problem.goals.map((goal, g) => (isJudgedOnce(goal) ? judgeGoal(goal, samples, answer) : overChannels(goal, g, tuned)));
  const sweep = sweepPlace(problem);
  const stress = tuned.flatMap(({ samples: own }) => {
    const places = stressedPlaces(own);
    return places.length === 0 ? [] : [worstStress(own, places)];
  });
  return {
    frequencyHz: problem.sweepHz,
    traces: problem.cases.map((_, at) => traceCase(samples.trace(sweep, at), problem.z0Ohm)),
    bands: mergeBands(problem.bands, tuned.map(({ samples: own }) => bandResults(own))),
    goals,
    elements: elementTable(samples, stress.length === 0 ? undefined : stress.reduce(mergeStress)),
    ok: goals.every((goal) => goal.ok),
    tuning: { channelsHz, codes: tuned.map(({ codes }) => codes), proved: tuned.every(({ proved }) => proved), shown },
  };
}

/** A goal over the channels at which it is judged: the first at which it is not known, or the worst. */
function overChannels(goal: Goal, index: number, tuned: readonly TunedChannel[]): GoalResult {
  let worst: GoalResult | null = null;
  for (const { channel: { goalIndices }, results } of tuned) {
    const at = goalIndices.indexOf(index);
    if (at < 0) continue;
    const result = { ...results[at], goal };
    if (result.value === null && result.reason !== null) return result;
    if (worst === null || isWorse(result, worst)) worst = result;
  }
  return worst ?? notKnown(goal, 'no channel lies where it is judged');
}

function isWorse(a: GoalResult, b: GoalResult): boolean {
  if (a.ok !== b.ok) return b.ok;
  return marginOf(a) < marginOf(b);
}

/** A margin of null without a reason is infinite. */
const marginOf = ({ margin, ok }: GoalResult): number => margin ?? (ok ? Infinity : -Infinity);

/** The same evaluation as it looks with the codes of the channel nearest to a frequency: other traces, other values of tuned elements. */
export function showChannelAt(problem: Problem, evaluation: Evaluation, frequencyHz: number): Evaluation {
  const { tuning } = evaluation;
  const shown = tuning ? nearestChannel(frequencyHz, tuning.channelsHz) : -1;
  if (!tuning || shown === tuning.shown) return evaluation;
  const samples = sampler(problem, ladderAtCodes(problem, tuning.codes[shown]));
  const sweep = sweepPlace(problem);
  const none = { elements: null, load: null, reason: null };
  return {
    ...evaluation,
    traces: problem.cases.map((_, at) => traceCase(samples.trace(sweep, at), problem.z0Ohm)),
    elements: elementTable(samples, none).map((element, at) => {
      const { peakVoltageV, rmsCurrentA, dissipationW, reason } = evaluation.elements[at];
      return { ...element, peakVoltageV, rmsCurrentA, dissipationW, reason: element.reason ?? reason };
    }),
    tuning: { ...tuning, shown },
  };
}

/** The codes that stand at a frequency, those of the channel nearest to it; none where nothing is tuned or the ladder is not known. */
export function codesAt(problem: Problem, frequencyHz: number): TunableCodes | undefined {
  if (!problem.channelsHz || codesObstacle(problem) !== null) return undefined;
  return tuneChannels(problem)[nearestChannel(frequencyHz, problem.channelsHz)].codes;
}
