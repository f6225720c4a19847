import { cascade } from '../network/cascade';
import type { Element } from '../network/element';
import { freeElement, type FreeElement } from './freeElement';
import type { RestCheck, TrialPoints } from './trialPoints';

/** A ladder with free values, made ready to be tried again and again. */
export interface FreeLadder {
  readonly free: readonly FreeElement[];
  /** One for each thing asked at a point. */
  readonly functionCount: number;
  /** How much each misses its limit, in dB (below 0: holds), with these values; NaN where it cannot be told. `wanted` as in `Functions`. */
  excessDb(values: Float64Array, into: Float64Array, wanted: Int32Array | null): void;
}

/** Ratios of powers are told apart from 0 down to here, so that a perfect match at one frequency is an ordinary least. */
const leastRatio = 1e-12;

const THROUGH = 0;
const SERIES = 1;
const operationOf = { through: THROUGH, series: SERIES, shunt: 2 } as const;

/**
 * The formulas of `trial.ts` with tables that are rewritten with each value; |Γ|² and gain agree with it to rounding. `free`
 * names elements of the ladder (load first), in increasing order. Not for ladders with faulty or unsolved elements.
 */
export function freeLadder(ladder: readonly Element[], free: readonly number[], points: TrialPoints): FreeLadder {
  const { count, frequencyHz, sourceRe, sourceIm, reflectionWeight, gainFloor } = points;
  const voltageRe = points.voltageRe.slice();
  const voltageIm = points.voltageIm.slice();
  const currentRe = points.currentRe.slice();
  const currentIm = points.currentIm.slice();
  const power = new Float64Array(count);
  for (let k = 0; k < count; k++) power[k] = 4 * sourceRe[k] * (voltageRe[k] * currentRe[k] + voltageIm[k] * currentIm[k]);
  const elements: FreeElement[] = [];
  const operations: number[] = [];
  const tables: Float64Array[] = [];
  let from = 0;
  for (const index of [...free, ladder.length]) {
    if (index > from) addFixed(ladder.slice(from, index));
    if (index < ladder.length) {
      const element = freeElement(ladder[index], frequencyHz);
      elements.push(element);
      operations.push(operationOf[element.orientation]);
      tables.push(element.table);
    }
    from = index + 1;
  }
  const kinds = Uint8Array.from(operations);
  const written = new Float64Array(elements.length).fill(NaN);
  const everywhere = Int32Array.from({ length: count }, (_, k) => k);
  const reflectionAt = everywhere.filter((k) => reflectionWeight[k] > 0);
  const gainAt = everywhere.filter((k) => gainFloor[k] > 0);
  // Functions that stand at one point each: what is reflected there, then what arrives.
  const pointOf = Int32Array.of(...reflectionAt, ...gainAt);
  const some = new Int32Array(count);
  const top = new Float64Array(count);
  const bottom = new Float64Array(count);
  const taken = new Float64Array(count);

  /** Fixed elements at the load become part of it; others keep their matrix. Its factor goes into the power. */
  function addFixed(run: readonly Element[]): void {
    const { a, b, c, d, scale } = cascade(run, frequencyHz);
    const table = new Float64Array(8 * count);
    for (let k = 0; k < count; k++) {
      [a, b, c, d].forEach((entry, j) => {
        table[8 * k + 2 * j] = entry.re[k];
        table[8 * k + 2 * j + 1] = entry.im[k];
      });
      power[k] *= scale.re[k] ** 2 + scale.im[k] ** 2;
    }
    if (operations.length > 0) {
      operations.push(THROUGH);
      tables.push(table);
      return;
    }
    for (let k = 0; k < count; k++) {
      const state = passed(table, 8 * k, voltageRe[k], voltageIm[k], currentRe[k], currentIm[k]);
      [voltageRe[k], voltageIm[k], currentRe[k], currentIm[k]] = state;
    }
  }

  /** At the first `many` of `which`. */
  function run(which: Int32Array, many: number): void {
    const length = kinds.length;
    for (let o = 0; o < many; o++) {
      const k = which[o];
      let vRe = voltageRe[k];
      let vIm = voltageIm[k];
      let iRe = currentRe[k];
      let iIm = currentIm[k];
      for (let s = 0; s < length; s++) {
        const operation = kinds[s];
        const m = tables[s];
        if (operation === THROUGH) {
          const a = 8 * k;
          const oldRe = vRe;
          const oldIm = vIm;
          vRe = m[a] * oldRe - m[a + 1] * oldIm + m[a + 2] * iRe - m[a + 3] * iIm;
          vIm = m[a] * oldIm + m[a + 1] * oldRe + m[a + 2] * iIm + m[a + 3] * iRe;
          const nextRe = m[a + 4] * oldRe - m[a + 5] * oldIm + m[a + 6] * iRe - m[a + 7] * iIm;
          iIm = m[a + 4] * oldIm + m[a + 5] * oldRe + m[a + 6] * iIm + m[a + 7] * iRe;
          iRe = nextRe;
        } else if (operation === SERIES) {
          vRe += m[2 * k] * iRe - m[2 * k + 1] * iIm;
          vIm += m[2 * k] * iIm + m[2 * k + 1] * iRe;
        } else {
          iRe += m[2 * k] * vRe - m[2 * k + 1] * vIm;
          iIm += m[2 * k] * vIm + m[2 * k + 1] * vRe;
        }
      }
      const zRe = sourceRe[k];
      const zIm = sourceIm[k];
      const dRe = vRe + zRe * iRe - zIm * iIm;
      const dIm = vIm + zRe * iIm + zIm * iRe;
      const nRe = vRe - zRe * iRe - zIm * iIm;
      const nIm = vIm - zRe * iIm + zIm * iRe;
      top[k] = nRe * nRe + nIm * nIm;
      bottom[k] = dRe * dRe + dIm * dIm;
      taken[k] = vRe * iRe + vIm * iIm;
    }
  }

  const gain = (k: number): number => (power[k] === 0 ? 0 : power[k] / bottom[k]);

  /** As a ratio of powers; NaN where it cannot be told. */
  function restExcess(check: RestCheck, k: number, least: number): number {
    const arrived = power[k] / (4 * sourceRe[k]);
    switch (check.form) {
      case 'gain at most': return gain(k) / check.limit;
      case 'reflection at least': return (check.limit * bottom[k]) / top[k];
      case 'efficiency at least': return (check.limit * taken[k]) / arrived;
      case 'efficiency at most': return arrived / (check.limit * taken[k]);
      case 'rejection at least': return (check.limit * gain(k)) / least;
      case 'rejection at most': return least / (check.limit * gain(k));
    }
  }

  function pointExcessDb(j: number): number {
    const k = pointOf[j];
    return inDb(j < reflectionAt.length ? (top[k] / bottom[k]) * reflectionWeight[k] : (gainFloor[k] * bottom[k]) / power[k]);
  }

  /** Which points the wanted functions need: how many, listed in `some`; −1 where more than their own are needed. */
  function listPoints(wanted: Int32Array): number {
    let many = 0;
    for (let o = 0; o < wanted.length; o++) {
      if (wanted[o] >= pointOf.length) return -1;
      some[many++] = pointOf[wanted[o]];
    }
    return many;
  }

  function writeTables(values: Float64Array, which: Int32Array, many: number): void {
    for (let i = 0; i < elements.length; i++) {
      if (values[i] === written[i]) continue;
      elements[i].write(values[i], which, many);
      written[i] = which === everywhere ? values[i] : NaN;
    }
  }

  return {
    free: elements,
    functionCount: pointOf.length + points.rest.reduce((sum, check) => sum + check.points.length, 0),
    excessDb(values, into, wanted) {
      const many = wanted === null || wanted.length > count ? -1 : listPoints(wanted);
      if (wanted !== null && many >= 0) {
        writeTables(values, some, many);
        run(some, many);
        for (let o = 0; o < wanted.length; o++) into[wanted[o]] = pointExcessDb(wanted[o]);
        return;
      }
      writeTables(values, everywhere, count);
      run(everywhere, count);
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

/** Voltage and current after a matrix. The loop above has the same written out. */
function passed(m: Float64Array, o: number, vRe: number, vIm: number, iRe: number, iIm: number): readonly [number, number, number, number] {
  return [
    m[o] * vRe - m[o + 1] * vIm + m[o + 2] * iRe - m[o + 3] * iIm,
    m[o] * vIm + m[o + 1] * vRe + m[o + 2] * iIm + m[o + 3] * iRe,
    m[o + 4] * vRe - m[o + 5] * vIm + m[o + 6] * iRe - m[o + 7] * iIm,
    m[o + 4] * vIm + m[o + 5] * vRe + m[o + 6] * iIm + m[o + 7] * iRe,
  ];
}

const decibelsPerNeper = 10 / Math.LN10;
const inDb = (ratio: number): number => decibelsPerNeper * Math.log(ratio + leastRatio);
