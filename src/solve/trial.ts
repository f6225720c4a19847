import type { LadderShape } from './ladderShape';
import { decisivePoints } from './limits';
import type { RestCheck, TrialPoints } from './trialPoints';

/** Tries one ladder of a shape after the other. */
export interface Trial {
  /**
   * The excess of the ladder with these items, or Infinity as soon as it is above `most`. What cannot be told (NaN) counts
   * as infinite.
   */
  excess(choice: Int32Array, most: number): number;
  /** The smallest gain over all points that ask for anything in their own discs; of the last ladder asked for here. */
  worstGain(choice: Int32Array): number;
  /** Excess at each point by itself, without `rest`. */
  excessByPoint(choice: Int32Array, into: Float64Array): void;
}

const THROUGH = 0;
const SERIES = 1;
const SHUNT = 2;
const operationOf = { through: THROUGH, series: SERIES, shunt: SHUNT } as const;

/**
 * The plain formula: voltage and current from the load to the source, point by point in `order`, den = V + Zs·I,
 * num = V − Zs*·I, |Γ|² = |num|²/|den|² (Kurokawa 1965), gain = 4·Rs·PL/|den|².
 */
export function trialOf(shape: LadderShape, points: TrialPoints, order: Int32Array): Trial {
  const { count } = points;
  const { sourceRe, sourceIm, voltageRe, voltageIm, currentRe, currentIm, reflectionWeight, gainFloor } = points;
  const { power, steps, slots } = shape;
  const length = steps.length;
  const operations = Uint8Array.from(steps, (step) => (step.form === 'fixed' ? THROUGH : operationOf[slots[step.slot].orientation]));
  const slotOfStep = Int32Array.from(steps, (step) => (step.form === 'slot' ? step.slot : -1));
  const tablesRe = steps.map((step, s) => (step.form === 'fixed' ? step.abcd : operations[s] === THROUGH ? slots[step.slot].abcd : slots[step.slot].re));
  const tablesIm = steps.map((step) => (step.form === 'slot' ? slots[step.slot].im : step.abcd));
  const asked = askedOrder(points, order);
  // What is passed elsewhere is at most 1 of what is sent, so that a rejection can be missed at one point already.
  const early = shape.passive
    ? points.rest.flatMap((check) => (check.form === 'rejection at least' ? [...new Set([check.points[0], check.points[check.points.length - 1]])].map((k) => ({ k, limit: check.limit })) : []))
    : [];
  const bases = new Int32Array(length);
  const at = new Float64Array(4);

  /** |num|², |den|² and Re(V·I*) at one point, into `at`. */
  function run(k: number): void {
    let vRe = voltageRe[k];
    let vIm = voltageIm[k];
    let iRe = currentRe[k];
    let iIm = currentIm[k];
    for (let s = 0; s < length; s++) {
      const operation = operations[s];
      if (operation === SERIES) {
        const re = tablesRe[s][bases[s] + k];
        const im = tablesIm[s][bases[s] + k];
        vRe += re * iRe - im * iIm;
        vIm += re * iIm + im * iRe;
      } else if (operation === SHUNT) {
        const re = tablesRe[s][bases[s] + k];
        const im = tablesIm[s][bases[s] + k];
        iRe += re * vRe - im * vIm;
        iIm += re * vIm + im * vRe;
      } else {
        const m = tablesRe[s];
        const o = 8 * (bases[s] + k);
        const oldRe = vRe;
        const oldIm = vIm;
        vRe = m[o] * oldRe - m[o + 1] * oldIm + m[o + 2] * iRe - m[o + 3] * iIm;
        vIm = m[o] * oldIm + m[o + 1] * oldRe + m[o + 2] * iIm + m[o + 3] * iRe;
        const cRe = m[o + 4] * oldRe - m[o + 5] * oldIm + m[o + 6] * iRe - m[o + 7] * iIm;
        iIm = m[o + 4] * oldIm + m[o + 5] * oldRe + m[o + 6] * iIm + m[o + 7] * iRe;
        iRe = cRe;
      }
    }
    const zRe = sourceRe[k];
    const zIm = sourceIm[k];
    const dRe = vRe + zRe * iRe - zIm * iIm;
    const dIm = vIm + zRe * iIm + zIm * iRe;
    const nRe = vRe - zRe * iRe - zIm * iIm;
    const nIm = vIm - zRe * iIm + zIm * iRe;
    at[0] = nRe * nRe + nIm * nIm;
    at[1] = dRe * dRe + dIm * dIm;
    at[2] = vRe * iRe + vIm * iIm;
  }

  function place(choice: Int32Array): void {
    for (let s = 0; s < length; s++) if (slotOfStep[s] >= 0) bases[s] = choice[slotOfStep[s]] * count;
  }

  function gainAt(k: number): number {
    run(k);
    return power[k] === 0 ? 0 : power[k] / at[1];
  }

  function restExcess(check: RestCheck): number {
    let worst = 0;
    let least = Infinity;
    if (check.form === 'rejection at least' || check.form === 'rejection at most') {
      for (const k of check.reference) least = smaller(least, gainAt(k));
    }
    for (const k of check.points) {
      const gain = gainAt(k);
      let e = NaN;
      switch (check.form) {
        case 'gain at most': e = gain / check.limit; break;
        case 'reflection at least': e = (check.limit * at[1]) / at[0]; break;
        case 'efficiency at least': e = (check.limit * at[2]) / (power[k] / (4 * sourceRe[k])); break;
        case 'efficiency at most': e = power[k] / (4 * sourceRe[k]) / (check.limit * at[2]); break;
        case 'rejection at least': e = (check.limit * gain) / least; break;
        case 'rejection at most': e = least / (check.limit * gain); break;
      }
      worst = larger(worst, e);
    }
    return worst;
  }

  return {
    excess(choice, most) {
      place(choice);
      let worst = 0;
      for (let o = 0; o < asked.length; o++) {
        if (o === decisivePoints) {
          for (const { k, limit } of early) if (limit * gainAt(k) > most * (1 + 1e-9)) return Infinity;
        }
        const k = asked[o];
        run(k);
        const reflection = (at[0] / at[1]) * reflectionWeight[k];
        if (!(reflection <= most)) return Infinity;
        if (reflection > worst) worst = reflection;
        if (gainFloor[k] === 0) continue;
        const gain = (gainFloor[k] * at[1]) / power[k];
        if (!(gain <= most)) return Infinity;
        if (gain > worst) worst = gain;
      }
      for (const check of points.rest) {
        worst = larger(worst, restExcess(check));
        if (!(worst <= most)) return Infinity;
      }
      return worst;
    },
    worstGain(choice) {
      place(choice);
      let least = Infinity;
      for (let o = 0; o < asked.length; o++) least = smaller(least, gainAt(asked[o]));
      return least;
    },
    excessByPoint(choice, into) {
      place(choice);
      for (let k = 0; k < count; k++) {
        run(k);
        const reflection = (at[0] / at[1]) * reflectionWeight[k];
        const gain = gainFloor[k] === 0 ? 0 : (gainFloor[k] * at[1]) / power[k];
        into[k] = larger(reflection, gain);
      }
    },
  };
}

/** Points with something to check in the plane, in the order to try them. */
function askedOrder(points: TrialPoints, order: Int32Array): Int32Array {
  return order.filter((k) => points.reflectionWeight[k] > 0 || points.gainFloor[k] > 0);
}

const larger = (a: number, b: number): number => (b > a || Number.isNaN(b) ? (Number.isNaN(b) ? Infinity : b) : a);
const smaller = (a: number, b: number): number => (b < a || Number.isNaN(b) ? (Number.isNaN(b) ? 0 : b) : a);
