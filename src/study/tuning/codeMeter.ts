import type { Element } from '../../network/element';
import { ladderKernel } from '../../network/ladderKernel';
import type { Goal } from '../goal';
import type { Problem, Tunable } from '../problem';
import { excessOf } from '../spread/excess';
import { checkedPoints, joined, type CheckedPoints, type GoalCheck } from '../spread/goalChecks';
import { ladderAtCodes } from '../tunableCodes';
import { aimedGoals } from './channelJudgement';
import type { ChannelProblem } from './channelProblems';
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
}

export function codeMeter(problem: Problem, space: CodeSpace, channels: readonly ChannelProblem[]): CodeMeter {
  const own = channels.map((channel) => channelChecks(channel));
  const frequencyHz = Float64Array.from(own.flatMap(({ checked }) => [...checked.frequencyHz]));
  const kernel = ladderKernel(ladderAtCodes(problem), frequencyHz, joined(own.map(({ checked }) => checked.source)), joined(own.map(({ checked }) => checked.load)));
  const knobs = space.tunables.map((tunable) => knobOf(problem, tunable));
  const current = new Int32Array(knobs.length).fill(-1);
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
    measure(states, into) {
      knobs.forEach(({ elementIndices, elements, sameLaw, tunable }, t) => {
        if (current[t] === states[t]) return;
        current[t] = states[t];
        elementIndices.forEach((index, i) => {
          if (sameLaw) kernel.setValue(index, tunable.states[states[t]].part.value);
          else kernel.setElement(index, elements[states[t]][i]);
        });
      });
      kernel.evaluate();
      for (let c = 0; c < views.length; c++) {
        const { from, to, reflectionWeight, gainFloor, rest, reflections, gains } = views[c];
        let worst = 0;
        for (let k = from; k < to; k++) {
          const square = reflectionMagnitude[k] * reflectionMagnitude[k];
          reflectionSquare[k] = square;
          const byReflection = square * reflectionWeight[k - from];
          if (!(byReflection <= worst)) worst = orInfinite(byReflection);
          const byGain = gainFloor[k - from] / gain[k];
          // No gain where none is asked for is 0/0, and is no matter.
          if (!(byGain <= worst) && gainFloor[k - from] > 0) worst = orInfinite(byGain);
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

interface Knob {
  readonly tunable: Tunable;
  readonly elementIndices: readonly number[];
  /** By state: the elements as they then are. */
  readonly elements: readonly (readonly Element[])[];
  /** True where states differ in nothing but their value. */
  readonly sameLaw: boolean;
}

function knobOf(problem: Problem, tunable: Tunable): Knob {
  const elementIndices = problem.ladder.flatMap((element, index) => (tunable.elements.includes(element.name) && element.form === 'branch' ? [index] : []));
  const elements = tunable.states.map(({ code }) => {
    const ladder = ladderAtCodes(problem, new Map([[tunable.name, code]]));
    return elementIndices.map((index) => ladder[index]);
  });
  const law = ({ part: { loss, eslH, srfHz } }: Tunable['states'][number]): string => JSON.stringify([loss, eslH, srfHz]);
  const sameLaw = tunable.states.every((state) => state.part.measured === null && law(state) === law(tunable.states[0]));
  return { tunable, elementIndices, elements, sameLaw };
}
