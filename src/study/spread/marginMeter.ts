import type { Element } from '../../network/element';
import type { Impedance } from '../../network/impedance';
import { ladderKernel } from '../../network/ladderKernel';
import type { Part } from '../../network/part';
import { judgeGoal } from '../judgeGoal';
import type { Goal } from '../goal';
import { isCondition, marginDb } from '../marginDb';
import type { Problem } from '../problem';
import { sampler } from '../sampler';
import { bandwidthHolds } from './bandwidthOnPoints';
import { excessOf } from './excess';
import { checkedPoints, type CheckedPoints } from './goalChecks';
import { pairValue, withPartValue, type ToleratedPart } from './toleratedParts';

/** Measures a ladder again and again with other values of its tolerated parts. */
export interface Meter {
  /** Of the last measurement, by goal: 1 where it holds. Yield goals always do. */
  readonly holds: Uint8Array;
  /** Of the last measurement, in dB, over the goals that are ranked; without any, the worst gain in dB. */
  readonly worstDb: number;
  /** The case in which that is; null for a single load. */
  readonly worstCase: string | null;
  /** Of a tuned ladder: the values of the parts at the channel that is worst. */
  readonly valuesAtWorst?: Float64Array;
  /** `values` in the order of the tolerated parts. */
  measure(values: Float64Array): void;
}

/** The meter of one ladder, with what it saw. */
export interface MarginMeter extends Meter {
  readonly points: CheckedPoints;
  /** |Γ|² and gain at each point of `points`, of the last measurement. */
  readonly reflectionSquare: Float64Array;
  readonly gain: Float64Array;
}

const byStructure: ReadonlySet<Goal['quantity']> = new Set(['parts', 'dc path', 'dc block', 'dc short at load']);

export function marginMeter(problem: Problem, ladder: readonly Element[], parts: readonly ToleratedPart[]): MarginMeter {
  const points = checkedPoints(problem);
  const kernel = ladderKernel(ladder, points.frequencyHz, points.source, points.load);
  const count = points.frequencyHz.length;
  const reflectionSquare = new Float64Array(count);
  const holds = new Uint8Array(problem.goals.length).fill(1);
  // What an element's parts are set by: the indices of its values.
  const byElement = new Map<number, number[]>();
  parts.forEach(({ elementIndex }, i) => byElement.set(elementIndex, [...(byElement.get(elementIndex) ?? []), i]));
  const current: Element[] = [...ladder];
  // What no value changes is judged once: structure, and goals that are not known for want of data.
  const nominal = sampler(problem, ladder);
  const fixed = points.others.map((goalIndex) => ({ goalIndex, result: judgeGoal(problem.goals[goalIndex], nominal) }))
    .filter(({ result: { goal, value, reason } }) => byStructure.has(goal.quantity) || (value === null && reason !== null));
  const others = points.others.filter((goalIndex) => !fixed.some((each) => each.goalIndex === goalIndex));
  const needElements = others.length > 0;
  let worstDb = Infinity;
  let worstCase: string | null = null;

  function place(values: Float64Array): void {
    for (const [at, own] of byElement) {
      const element = ladder[at];
      if (element.form !== 'branch') continue;
      if (element.branch.form === 'part') {
        const { kind } = element.branch.part;
        const value = element.pair ? pairValue(kind, values[own[0]], values[own[1]]) : values[own[0]];
        kernel.setValue(at, value);
        if (needElements) current[at] = { ...element, branch: { form: 'part', part: { ...element.branch.part, value } as Part } };
        continue;
      }
      let branch: Impedance = element.branch;
      // Legs of a pair of branches stand one after the other: the same path twice.
      for (let i = 0; i < own.length; i += element.pair ? 2 : 1) {
        const { path, part } = parts[own[i]];
        branch = withPartValue(branch, path, element.pair ? pairValue(part.kind, values[own[i]], values[own[i + 1]]) : values[own[i]]);
      }
      current[at] = { ...element, branch };
      kernel.setElement(at, current[at]);
    }
  }

  function see(margin: number, caseName: string | null): void {
    if (margin < worstDb || Number.isNaN(margin)) {
      worstDb = Number.isNaN(margin) ? -Infinity : margin;
      worstCase = caseName;
    }
  }

  return {
    points, holds, reflectionSquare,
    get worstDb() { return worstDb; },
    get worstCase() { return worstCase; },
    get gain() { return kernel.gain; },
    measure(values) {
      place(values);
      kernel.evaluate();
      for (let k = 0; k < count; k++) reflectionSquare[k] = kernel.reflectionMagnitude[k] ** 2;
      worstDb = Infinity;
      worstCase = null;
      holds.fill(1);
      for (const check of points.checks) {
        const excess = excessOf(check, reflectionSquare, kernel.gain);
        if (check.goalIndex >= 0 && !(excess <= 1)) holds[check.goalIndex] = 0;
        see(-10 * Math.log10(excess), check.caseName);
      }
      for (const check of points.bandwidths) {
        if (!bandwidthHolds(check, points.frequencyHz, reflectionSquare, kernel.gain)) holds[check.goalIndex] = 0;
      }
      for (const { goalIndex, result } of fixed) {
        holds[goalIndex] = result.ok ? 1 : 0;
        if (!isCondition(result.goal)) see(-Infinity, result.caseName);
      }
      if (!needElements) return;
      const samples = sampler(problem, current);
      for (const goalIndex of others) {
        const result = judgeGoal(problem.goals[goalIndex], samples);
        holds[goalIndex] = result.ok ? 1 : 0;
        const margin = marginDb(result);
        if (margin !== null) see(margin, result.caseName);
      }
    },
  };
}
