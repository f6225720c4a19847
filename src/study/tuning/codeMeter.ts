import type { Element } from '../../network/element';
import type { Goal } from '../goal';
import type { Problem } from '../problem';
import { excessOf } from '../spread/excess';
import { checkedPoints, joined, type CheckedPoints, type GoalCheck } from '../spread/goalChecks';
import { aimedGoals } from './channelJudgement';
import type { ChannelProblem } from './channelProblems';
import { codeKernel } from './codeKernel';
import type { CodeSpace } from './codeSpace';

/** Measures one combination of codes after the other, at several channels in one go. */
export interface CodeMeter {
  /** By channel: the goals that |Γ| and gain do not decide, so that a margin measured here is only a bound. */
  readonly others: readonly (readonly Goal[])[];
  /** Points at which the ladder is evaluated for all channels together. */
  readonly points: number;
  /**
   * How far each channel is from its worst limit among the goals that |Γ| and gain decide, as a ratio of powers: a margin of
   * −10 log10 of it. Infinite where one is not known.
   */
  measure(states: Int32Array, into: Float64Array): void;
  /** Another element in the place of one that no code sets. */
  setElement(index: number, element: Element): void;
}

export function codeMeter(problem: Problem, space: CodeSpace, channels: readonly ChannelProblem[]): CodeMeter {
  const own = channels.map((channel) => channelChecks(channel));
  const frequencyHz = Float64Array.from(own.flatMap(({ checked }) => [...checked.frequencyHz]));
  const kernel = codeKernel(problem, space, frequencyHz, joined(own.map(({ checked }) => checked.source)), joined(own.map(({ checked }) => checked.load)));
  const { reflectionMagnitude, gain } = kernel;
  const reflectionSquare = new Float64Array(frequencyHz.length);
  let start = 0;
  const views = own.map(({ checked }) => {
    const from = start;
    start += checked.frequencyHz.length;
    const { reflectionWeight, gainFloor, rest } = plainAndRest(checked);
    return { from, to: start, reflectionWeight, gainFloor, rest, reflections: reflectionSquare.subarray(from, start), gains: gain.subarray(from, start) };
  });
  return {
    others: own.map(({ others }) => others),
    points: frequencyHz.length,
    setElement: (index, element) => kernel.setElement(index, element),
    measure(states, into) {
      kernel.evaluate(states);
      for (let c = 0; c < views.length; c++) {
        const { from, to, reflectionWeight, gainFloor, rest, reflections, gains } = views[c];
        let worst = 0;
        for (let k = from; k < to; k++) {
          const square = reflectionMagnitude[k] * reflectionMagnitude[k];
          reflectionSquare[k] = square;
          const byReflection = square * reflectionWeight[k - from];
          if (!(byReflection <= worst)) worst = orInfinite(byReflection);
          if (gainFloor[k - from] === 0) continue;
          // A load that gives power back has a gain below 0, which meets nothing.
          const byGain = gain[k] > 0 ? gainFloor[k - from] / gain[k] : Infinity;
          if (byGain > worst) worst = byGain;
        }
        for (const check of rest) {
          const excess = excessOf(check, reflections, gains);
          if (!(excess <= worst)) worst = orInfinite(excess);
        }
        into[c] = worst;
      }
    },
  };
}

const orInfinite = (excess: number): number => (Number.isNaN(excess) ? Infinity : excess);

function channelChecks(channel: ChannelProblem): { readonly checked: CheckedPoints; readonly others: readonly Goal[] } {
  const goals = aimedGoals(channel);
  // A bandwidth is followed beyond its points, which takes a whole evaluation.
  const bandwidths = goals.filter(({ quantity }) => quantity === 'bandwidth');
  const rest = goals.filter(({ quantity }) => quantity !== 'bandwidth');
  const checked = checkedPoints({ ...channel.problem, goals: rest });
  return { checked, others: [...checked.others.map((index) => rest[index]), ...bandwidths] };
}

/** A largest |Γ| and a least gain are weights at points; all else stays a check. */
function plainAndRest({ checks, frequencyHz }: CheckedPoints): { readonly reflectionWeight: Float64Array; readonly gainFloor: Float64Array; readonly rest: readonly GoalCheck[] } {
  const reflectionWeight = new Float64Array(frequencyHz.length);
  const gainFloor = new Float64Array(frequencyHz.length);
  const rest = checks.filter(({ quantity, side, limit, points }) => {
    if (quantity === 'reflection' && side === 'at most' && limit > 0) {
      for (const k of points) reflectionWeight[k] = Math.max(reflectionWeight[k], 1 / limit);
      return false;
    }
    if (quantity === 'gain' && side === 'at least' && limit > 0) {
      for (const k of points) gainFloor[k] = Math.max(gainFloor[k], limit);
      return false;
    }
    return true;
  });
  return { reflectionWeight, gainFloor, rest };
}
