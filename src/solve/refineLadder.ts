import type { Element } from '../network/element';
import type { ValueRange } from '../study/unknown';
import { freeLadder } from './freeLadder';
import { minimax } from './minimax';
import type { TrialPoints } from './trialPoints';

/** One element of a ladder whose value may be anything in a range: Ω, H, F, or metres of a line or stub. */
export interface FreeValue {
  readonly elementIndex: number;
  readonly range: ValueRange;
}

export interface RefinedLadder {
  readonly ladder: readonly Element[];
  /** In the order of `free`. */
  readonly values: readonly number[];
  /** The largest excess in dB; below 0 where everything that is asked holds. Infinity where it cannot be told. */
  readonly worstDb: number;
  readonly evaluations: number;
}

/** A hundred-thousandth of |Γ|. */
const accuracyDb = 1e-4;
/** Of a range that reaches down to 0 the logarithm begins here, as a share of its end. */
const leastShare = 1e-6;

/**
 * Better values for the free elements of a ladder (load first), from those that stand there: a local least of the largest
 * excess over all points. Q, ESR, ESL and SRF of a part stay, a line's loss goes with its length. Never worse than the start
 * moved into the ranges.
 */
export function refineLadder(ladder: readonly Element[], free: readonly FreeValue[], points: TrialPoints): RefinedLadder {
  const ordered = [...free].sort((one, other) => one.elementIndex - other.elementIndex);
  const made = freeLadder(ladder, ordered.map(({ elementIndex }) => elementIndex), points);
  const into = made.free.map(({ logarithmic }) => (logarithmic ? Math.log : plain));
  const outOf = made.free.map(({ logarithmic }) => (logarithmic ? Math.exp : plain));
  const lower = Float64Array.from(ordered, ({ range }, i) => into[i](Math.max(range.min, made.free[i].logarithmic ? range.max * leastShare : 0)));
  const upper = Float64Array.from(ordered, ({ range }, i) => into[i](range.max));
  const start = Float64Array.from(made.free, ({ value }, i) => into[i](Math.max(value, Number.MIN_VALUE)));
  const values = new Float64Array(ordered.length);
  const { x, worst, evaluations } = minimax((at, excesses, wanted) => {
    for (let i = 0; i < values.length; i++) values[i] = outOf[i](at[i]);
    made.excessDb(values, excesses, wanted);
  }, { start, lower, upper, functionCount: made.functionCount, accuracy: accuracyDb });
  const result = [...ladder];
  const found = new Map<FreeValue, number>();
  ordered.forEach((each, i) => {
    const value = Math.min(Math.max(outOf[i](x[i]), each.range.min), each.range.max);
    result[each.elementIndex] = made.free[i].at(value);
    found.set(each, value);
  });
  return { ladder: result, values: free.map((each) => found.get(each) ?? NaN), worstDb: worst, evaluations };
}

const plain = (value: number): number => value;
