import { decibels, returnLossDb } from '../network/figures';
import { impedanceOf } from '../network/immittance';
import type { Goal, GoalQuantity } from './goal';
import { aboveTotal, mismatchLossOf, settledReflection, vswrOf } from './reflectionFigures';
import type { Stress } from './ladderStress';
import type { Trace } from './sampler';
import { wantsLarge } from './verdict';

/** Quantities that have a value at every frequency of a goal, from one trace alone. */
export type PointQuantity = Exclude<GoalQuantity, 'rejection' | 'bandwidth' | 'parts' | 'yield'>;

export interface PointValues {
  /** In the goal's unit; may be infinite. NaN where it has no value, for the reason beside. */
  readonly values: Float64Array;
  readonly reasonOfNaN: string;
}

/** `element`: index of the stressed element (that of the load is the ladder's length); −1 for other quantities. */
export function pointValues(quantity: PointQuantity, goal: Goal, trace: Trace, element: number): PointValues {
  switch (quantity) {
    case 'return loss': return reflectionLike(trace, returnLossDb);
    case 'VSWR': return reflectionLike(trace, vswrOf);
    case 'reflection': return reflectionLike(trace, (magnitude) => magnitude);
    case 'mismatch loss': return reflectionLike(trace, mismatchLossOf);
    case 'gain': return { values: trace.gain().map(decibels), reasonOfNaN: gainUnknown };
    case 'insertion loss': return { values: trace.gain().map((ratio) => -decibels(ratio)), reasonOfNaN: gainUnknown };
    case 'efficiency': return { values: trace.efficiency().map((share) => inUnit(share, goal.unit)), reasonOfNaN: 'no power enters the ladder there' };
    case 'input resistance': return inputResistance(trace);
    case 'input reactance': return inputReactance(trace, goal);
    case 'voltage': return stressValues(trace, element, 'peakVoltageV');
    case 'current': return stressValues(trace, element, 'rmsCurrentA');
    case 'dissipation': return stressValues(trace, element, 'dissipationW');
  }
}

const gainUnknown = 'the gain has no value there';

function reflectionLike(trace: Trace, figure: (magnitude: number) => number): PointValues {
  const { re, im } = trace.reflection();
  return { values: re.map((value, k) => figure(settledReflection(Math.hypot(value, im[k])))), reasonOfNaN: aboveTotal };
}

/** A share (0 … 1) as %, dB or itself. */
export function inUnit(share: number, unit: string): number {
  return unit === '%' ? 100 * share : unit === 'dB' ? decibels(share) : share;
}

function inputResistance(trace: Trace): PointValues {
  return { values: impedanceOf(trace.input()).re, reasonOfNaN: 'the input resistance has no value there' };
}

/** An open has no sign of reactance: it counts as infinite on the side that the goal forbids. */
function inputReactance(trace: Trace, goal: Goal): PointValues {
  const { re, im } = impedanceOf(trace.input());
  const forbidden = wantsLarge(goal) ? -Infinity : Infinity;
  const values = im.map((value, k) => (Number.isFinite(re[k]) && Number.isFinite(value) ? value : forbidden));
  return { values, reasonOfNaN: 'the input reactance has no value there' };
}

function stressValues(trace: Trace, element: number, figure: keyof Stress): PointValues {
  return { values: trace.stress()[element][figure], reasonOfNaN: 'voltage and current have no value there' };
}
