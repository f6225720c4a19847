import { cascade } from '../network/cascade';
import type { Element } from '../network/element';
import { SERIES, SHUNT, THROUGH } from '../network/runLadder';
import { freeElement, type FreeElement } from './freeElement';
import type { RestCheck, TrialPoints } from './trialPoints';
import { HEAD_WIDTH, OUTCOME_WIDTH, walkPoints } from './walkPoints';

/** A ladder with free values, made ready to be tried again and again. */
export interface FreeLadder {
  readonly free: readonly FreeElement[];
  /** One for each thing asked at a point. */
  readonly functionCount: number;
  /**
   * How much each misses its limit, in dB (below 0: holds), with these values; NaN where it cannot be told. `wanted` as in
   * `Functions`.
   */
  excessDb(values: Float64Array, into: Float64Array, wanted: Int32Array | null): void;
}

/** Ratios of powers are told apart from 0 down to here, so that a perfect match at one frequency is an ordinary least. */
const leastRatio = 1e-12;

const operationOf = { through: THROUGH, series: SERIES, shunt: SHUNT } as const;

/**
 * The formulas of `trial.ts` with tables that are rewritten with each value; |Γ|² and gain agree with it to rounding. `free`
 * names elements of the ladder (load first), in increasing order. Not for ladders with faulty or unsolved elements.
 */
export function freeLadder(ladder: readonly Element[], free: readonly number[], points: TrialPoints): FreeLadder {
  const { count, sourceRe, reflectionWeight, gainFloor } = points;
  const { power, steps } = stepsOf(ladder, free, points);
  const elements = steps.flatMap((step) => (step.form === 'free' ? [step.element] : []));
  const operations = Uint8Array.from(steps, (step) => (step.form === 'free' ? operationOf[step.element.orientation] : THROUGH));
  const written = new Float64Array(elements.length).fill(NaN);
  const outcome = new Float64Array(OUTCOME_WIDTH * count);
  const { rows, stride, offsets } = layOut(steps, points);
  const everywhere = Int32Array.from({ length: count }, (_, k) => k);
  const reflectionAt = everywhere.filter((k) => reflectionWeight[k] > 0);
  // Functions that stand at one point each: what is reflected there, then what arrives.
  const pointOf = Int32Array.of(...reflectionAt, ...everywhere.filter((k) => gainFloor[k] > 0));
  const reflections = reflectionAt.length;
  const some = new Int32Array(count);

  const top = (k: number): number => outcome[OUTCOME_WIDTH * k];
  const bottom = (k: number): number => outcome[OUTCOME_WIDTH * k + 1];
  const taken = (k: number): number => outcome[OUTCOME_WIDTH * k + 2];
  const gain = (k: number): number => (power[k] === 0 ? 0 : power[k] / bottom(k));

  /** As a ratio of powers; NaN where it cannot be told. */
  function restExcess(check: RestCheck, k: number, least: number): number {
    const arrived = power[k] / (4 * sourceRe[k]);
    switch (check.form) {
      case 'gain at most': return gain(k) / check.limit;
      case 'reflection at least': return (check.limit * bottom(k)) / top(k);
      case 'efficiency at least': return (check.limit * taken(k)) / arrived;
      case 'efficiency at most': return arrived / (check.limit * taken(k));
      case 'rejection at least': return (check.limit * gain(k)) / least;
      case 'rejection at most': return least / (check.limit * gain(k));
    }
  }

  function pointExcessDb(j: number): number {
    const k = pointOf[j];
    return inDb(j < reflections ? (top(k) / bottom(k)) * reflectionWeight[k] : (gainFloor[k] * bottom(k)) / power[k]);
  }

  /** Which points the wanted functions need: how many, listed in `some`; −1 where more than their own are needed. */
  function listPoints(wanted: Int32Array): number {
    if (wanted.length > count) return -1;
    for (let o = 0; o < wanted.length; o++) {
      if (wanted[o] >= pointOf.length) return -1;
      some[o] = pointOf[wanted[o]];
    }
    return wanted.length;
  }

  function walk(values: Float64Array, which: Int32Array, many: number): void {
    for (let i = 0; i < elements.length; i++) {
      if (values[i] === written[i]) continue;
      elements[i].write(values[i], which, many, rows, stride, offsets[i]);
      written[i] = which === everywhere ? values[i] : NaN;
    }
    walkPoints(which, many, operations, rows, stride, outcome);
  }

  return {
    free: elements,
    functionCount: pointOf.length + points.rest.reduce((sum, check) => sum + check.points.length, 0),
    excessDb(values, into, wanted) {
      const many = wanted === null ? -1 : listPoints(wanted);
      if (wanted !== null && many >= 0) {
        walk(values, some, many);
        for (let o = 0; o < many; o++) into[wanted[o]] = pointExcessDb(wanted[o]);
        return;
      }
      walk(values, everywhere, count);
      let j = 0;
      for (; j < pointOf.length; j++) into[j] = pointExcessDb(j);
      for (const check of points.rest) {
        let least = Infinity;
        if ('reference' in check) for (const k of check.reference) least = Math.min(least, gain(k));
        for (const k of check.points) into[j++] = inDb(restExcess(check, k, least));
      }
    },
  };
}

const decibelsPerNeper = 10 / Math.LN10;
const inDb = (ratio: number): number => decibelsPerNeper * Math.log(ratio + leastRatio);

type Step =
  | { readonly form: 'free'; readonly element: FreeElement }
  /** A, B, C, D of elements that stay, eight numbers a point, up to a factor that goes into the power. */
  | { readonly form: 'fixed'; readonly abcd: Float64Array };

/** Free elements one by one, those between them together. `power` is 4·Rs·Re(V·I*) of the load, times what the factors make of it. */
function stepsOf(ladder: readonly Element[], free: readonly number[], { count, frequencyHz, sourceRe, voltageRe, voltageIm, currentRe, currentIm }: TrialPoints) {
  const power = new Float64Array(count);
  for (let k = 0; k < count; k++) power[k] = 4 * sourceRe[k] * (voltageRe[k] * currentRe[k] + voltageIm[k] * currentIm[k]);
  const steps: Step[] = [];
  let from = 0;
  for (const index of [...free, ladder.length]) {
    if (index > from) steps.push({ form: 'fixed', abcd: fixedTable(ladder.slice(from, index), frequencyHz, power) });
    if (index < ladder.length) steps.push({ form: 'free', element: freeElement(ladder[index], frequencyHz) });
    from = index + 1;
  }
  return { power, steps };
}

function fixedTable(elements: readonly Element[], frequencyHz: Float64Array, power: Float64Array): Float64Array {
  const { a, b, c, d, scale } = cascade(elements, frequencyHz);
  const table = new Float64Array(8 * frequencyHz.length);
  for (let k = 0; k < frequencyHz.length; k++) {
    [a, b, c, d].forEach((entry, j) => {
      table[8 * k + 2 * j] = entry.re[k];
      table[8 * k + 2 * j + 1] = entry.im[k];
    });
    power[k] *= scale.re[k] ** 2 + scale.im[k] ** 2;
  }
  return table;
}

/** One row a point for `walkPoints`, the free elements' numbers still to be written. `offsets`: where in a row those stand. */
function layOut(steps: readonly Step[], points: TrialPoints) {
  const offsets: number[] = [];
  let stride = HEAD_WIDTH;
  const places = steps.map((step) => {
    const place = stride;
    if (step.form === 'free') offsets.push(place);
    stride += step.form === 'free' ? step.element.width : 8;
    return place;
  });
  const rows = new Float64Array(stride * points.count);
  for (let k = 0; k < points.count; k++) {
    rows.set([points.voltageRe[k], points.voltageIm[k], points.currentRe[k], points.currentIm[k], points.sourceRe[k], points.sourceIm[k]], k * stride);
    steps.forEach((step, s) => {
      if (step.form === 'fixed') rows.set(step.abcd.subarray(8 * k, 8 * k + 8), k * stride + places[s]);
    });
  }
  return { rows, stride, offsets };
}
