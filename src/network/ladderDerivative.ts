import { elementAbcd } from './cascade';
import type { Complex, ComplexArray } from './complex';
import type { Element } from './element';
import type { Immittance } from './immittance';
import type { Part } from './part';
import { partModel } from './partModel';

/** How |Γ|² and gain change with one element's value, at n points. */
export interface LadderDerivative {
  /** d|Γ|²/d ln(value). */
  readonly reflectionSquare: Float64Array;
  /** d ln(gain)/d ln(value). */
  readonly logGain: Float64Array;
}

/**
 * Exact derivatives of the cascade for every single part of a ladder (load first), by element; null for what has no one
 * value (lines, blocks, branches of several parts, measured parts). NaN where an element lets nothing through.
 *
 * With num = V − Zs*·I and den = V + Zs·I at the source, a change dZ in series adds a·I·dZ to den, where I flows before the
 * element and (a, b) is the row that the source's side makes of V and I after it; a change dY across adds b·V·dY. The adjoint
 * method, after S. W. Director, R. A. Rohrer, IEEE Trans. CT-16, 1969; held to differences in `ladderDerivative.test.ts`.
 */
export function ladderDerivatives(elements: readonly Element[], frequencyHz: Float64Array, source: Immittance, load: Immittance): readonly (LadderDerivative | null)[] {
  const matrices = elements.map((element) => elementAbcd(element, frequencyHz));
  const results = elements.map((element): { reflectionSquare: Float64Array; logGain: Float64Array } | null =>
    (singlePart(element) ? { reflectionSquare: new Float64Array(frequencyHz.length), logGain: new Float64Array(frequencyHz.length) } : null));
  for (let k = 0; k < frequencyHz.length; k++) {
    const states: [Complex, Complex][] = [];
    let v = at(load.numerator, k);
    let i = at(load.denominator, k);
    for (const { a, b, c, d, scale } of matrices) {
      states.push([v, i]);
      const s = at(scale, k);
      [v, i] = [over(plus(times(at(a, k), v), times(at(b, k), i)), s), over(plus(times(at(c, k), v), times(at(d, k), i)), s)];
    }
    const zs = over(at(source.numerator, k), at(source.denominator, k));
    const den = plus(v, times(zs, i));
    const num = plus(v, times({ re: -zs.re, im: zs.im }, i));
    const size = den.re ** 2 + den.im ** 2;
    const gamma2 = (num.re ** 2 + num.im ** 2) / size;
    let denRow: [Complex, Complex] = [{ re: 1, im: 0 }, zs];
    let numRow: [Complex, Complex] = [{ re: 1, im: 0 }, { re: -zs.re, im: zs.im }];
    for (let e = elements.length - 1; e >= 0; e--) {
      const { a, b, c, d, scale } = matrices[e];
      const result = results[e];
      const element = elements[e];
      if (result && element.form === 'branch' && element.branch.form === 'part') {
        const series = element.orientation === 'series';
        const change = changeOf(element.branch.part, frequencyHz[k], series, element.pair);
        const push = times(change, states[e][series ? 1 : 0]);
        const dDen = times(denRow[series ? 0 : 1], push);
        const dNum = times(numRow[series ? 0 : 1], push);
        const dSize = 2 * (den.re * dDen.re + den.im * dDen.im);
        result.reflectionSquare[k] = (2 * (num.re * dNum.re + num.im * dNum.im)) / size - (gamma2 * dSize) / size;
        result.logGain[k] = -dSize / size;
      }
      const s = at(scale, k);
      const through = ([x, y]: [Complex, Complex]): [Complex, Complex] =>
        [over(plus(times(x, at(a, k)), times(y, at(c, k))), s), over(plus(times(x, at(b, k)), times(y, at(d, k))), s)];
      denRow = through(denRow);
      numRow = through(numRow);
    }
  }
  return results;
}

const singlePart = (element: Element): boolean => element.form === 'branch' && element.branch.form === 'part' && element.branch.part.measured === null;

/** dZ (series) or dY (shunt) by d ln(value). */
function changeOf(part: Part, frequencyHz: number, series: boolean, pair: boolean): Complex {
  const { constantOhm, skinOhm, risingOhm, fallingOhm, inductanceH, elastance, acrossF } = partModel(part);
  const omega = 2 * Math.PI * frequencyHz;
  const lossy = skinOhm * Math.sqrt(frequencyHz) + risingOhm * omega + fallingOhm / omega;
  const bare: Complex = { re: constantOhm + lossy, im: omega * inductanceH - elastance / omega };
  // What goes with the value, or its inverse; ESR and ESL stay.
  const bareChange: Complex = part.kind === 'inductor' ? { re: lossy, im: omega * inductanceH }
    : part.kind === 'capacitor' ? { re: -lossy, im: elastance / omega } : { re: part.value, im: 0 };
  // Z = z/(1 + jωC z), and the C that an SRF implies goes with 1/value.
  const across: Complex = { re: 0, im: omega * acrossF };
  const bottom = plus({ re: 1, im: 0 }, times(across, bare));
  const impedance = over(bare, bottom);
  const change = over(plus(bareChange, times(across, times(bare, bare))), times(bottom, bottom));
  const legs = pair ? 2 : 1;
  if (series) return { re: change.re * legs, im: change.im * legs };
  const y = over(change, times(impedance, impedance));
  return { re: -y.re / legs, im: -y.im / legs };
}

const at = ({ re, im }: ComplexArray, k: number): Complex => ({ re: re[k], im: im[k] });
const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
function over(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
}
