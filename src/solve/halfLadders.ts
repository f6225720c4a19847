import type { LadderShape, Step } from './ladderShape';
import type { TrialPoints } from './trialPoints';

/** Voltage and current of every way to fill the slots between the load and a step, at the decisive points. */
export interface Prefixes {
  readonly count: number;
  /** V and I of prefix p at decisive point d: four numbers from 4·(p·points + d) on. The slot at the load counts slowest. */
  readonly state: Float64Array;
}

/** From the load through the steps before `end`. */
export function prefixesOf(shape: LadderShape, end: number, points: TrialPoints, decisive: Int32Array): Prefixes {
  const size = decisive.length;
  let count = 1;
  let state = new Float64Array(4 * size);
  decisive.forEach((k, d) => state.set([points.voltageRe[k], points.voltageIm[k], points.currentRe[k], points.currentIm[k]], 4 * d));
  for (const step of shape.steps.slice(0, end)) {
    const { table, items } = readStep(shape, step);
    const next = new Float64Array(4 * size * count * items);
    for (let p = 0; p < count; p++) {
      for (let item = 0; item < items; item++) {
        for (let d = 0; d < size; d++) {
          const from = 4 * (p * size + d);
          const to = 4 * ((p * items + item) * size + d);
          table(item * points.count + decisive[d], state, from, next, to, applyToState);
        }
      }
    }
    state = next;
    count *= items;
  }
  return { count, state };
}

/** What the source's side makes of voltage and current after a step: den = a·V + b·I, num = a′·V + b′·I. */
export interface Suffixes {
  readonly count: number;
  /** a, b, a′, b′ of suffix s at decisive point d: eight numbers from 8·(s·points + d) on. The slot at the source counts fastest. */
  readonly rows: Float64Array;
}

/** From the source back through the steps after `start`. */
export function suffixesOf(shape: LadderShape, start: number, points: TrialPoints, decisive: Int32Array): Suffixes {
  const size = decisive.length;
  let count = 1;
  let rows = new Float64Array(8 * size);
  decisive.forEach((k, d) => rows.set([1, 0, points.sourceRe[k], points.sourceIm[k], 1, 0, -points.sourceRe[k], points.sourceIm[k]], 8 * d));
  for (const step of shape.steps.slice(start + 1).reverse()) {
    const { table, items } = readStep(shape, step);
    const next = new Float64Array(8 * size * count * items);
    for (let item = 0; item < items; item++) {
      for (let s = 0; s < count; s++) {
        for (let d = 0; d < size; d++) {
          const from = 8 * (s * size + d);
          const to = 8 * ((item * count + s) * size + d);
          table(item * points.count + decisive[d], rows, from, next, to, applyToRow);
          table(item * points.count + decisive[d], rows, from + 4, next, to + 4, applyToRow);
        }
      }
    }
    rows = next;
    count *= items;
  }
  return { count, rows };
}

/** Applies A, B, C, D (eight numbers) to the four numbers at `from`, into those at `to`. */
type Apply = (m: ArrayLike<number>, o: number, from: Float64Array, f: number, into: Float64Array, t: number) => void;

/** V = A·V + B·I, I = C·V + D·I. */
const applyToState: Apply = (m, o, s, f, into, t) => {
  into[t] = m[o] * s[f] - m[o + 1] * s[f + 1] + m[o + 2] * s[f + 2] - m[o + 3] * s[f + 3];
  into[t + 1] = m[o] * s[f + 1] + m[o + 1] * s[f] + m[o + 2] * s[f + 3] + m[o + 3] * s[f + 2];
  into[t + 2] = m[o + 4] * s[f] - m[o + 5] * s[f + 1] + m[o + 6] * s[f + 2] - m[o + 7] * s[f + 3];
  into[t + 3] = m[o + 4] * s[f + 1] + m[o + 5] * s[f] + m[o + 6] * s[f + 3] + m[o + 7] * s[f + 2];
};

/** (a, b) = (a·A + b·C, a·B + b·D). */
const applyToRow: Apply = (m, o, s, f, into, t) => {
  into[t] = m[o] * s[f] - m[o + 1] * s[f + 1] + m[o + 4] * s[f + 2] - m[o + 5] * s[f + 3];
  into[t + 1] = m[o] * s[f + 1] + m[o + 1] * s[f] + m[o + 4] * s[f + 3] + m[o + 5] * s[f + 2];
  into[t + 2] = m[o + 2] * s[f] - m[o + 3] * s[f + 1] + m[o + 6] * s[f + 2] - m[o + 7] * s[f + 3];
  into[t + 3] = m[o + 2] * s[f + 1] + m[o + 3] * s[f] + m[o + 6] * s[f + 3] + m[o + 7] * s[f + 2];
};

/** How many items a step has, and its matrix at `at` (item·points + point) applied. */
function readStep(shape: LadderShape, step: Step) {
  const slot = step.form === 'slot' ? shape.slots[step.slot] : null;
  const matrix = new Float64Array([1, 0, 0, 0, 0, 0, 1, 0]);
  const two = step.form === 'fixed' ? step.abcd : slot?.abcd;
  const at0 = slot?.orientation === 'series' ? 2 : 4;
  const table = (at: number, from: Float64Array, f: number, into: Float64Array, t: number, apply: Apply): void => {
    if (slot === null || slot.orientation === 'through') {
      apply(two as Float64Array, 8 * at, from, f, into, t);
      return;
    }
    matrix[at0] = slot.re[at];
    matrix[at0 + 1] = slot.im[at];
    apply(matrix, 0, from, f, into, t);
  };
  return { items: slot?.count ?? 1, table };
}
