import { largerColumn } from '../network/abcdPoint';
import { elementAbcd, type Cascade } from '../network/cascade';
import type { Element } from '../network/element';
import type { Immittance } from '../network/immittance';
import { orientationOf } from './orientation';
import { peaksAlongLine } from './peaksAlongLine';

/**
 * What one element bears, at each frequency. For series elements the voltage across and the current through; for those
 * that hang across the path the voltage of the node and the current of the branch; for lines, transformers and blocks the
 * larger of both ends (of the whole length for a line). A `pair` states one of its two parts.
 */
export interface Stress {
  readonly peakVoltageV: Float64Array;
  readonly rmsCurrentA: Float64Array;
  readonly dissipationW: Float64Array;
}

/** Voltage and current behind some element, up to a factor that is common to both; largest of the two kept near 1. */
interface State {
  readonly vRe: Float64Array;
  readonly vIm: Float64Array;
  readonly iRe: Float64Array;
  readonly iIm: Float64Array;
}

interface Step {
  readonly before: State;
  readonly after: State;
  readonly abcd: Cascade;
  /** What the state behind the element was divided by to become `after`. */
  readonly divisor: Float64Array;
}

/**
 * The stress of each element of a ladder, from the load on, and last of the load, with `availableW` from the source.
 *
 * Voltages and currents go from the load to the source through the elements' ABCD matrices, up to a factor; the source,
 * V = E − Zs·I with |E|² = 4 Rs·P (rms), then fixes it. Nothing is inverted, so that opens, shorts and resonances are
 * ordinary numbers. Dissipation is Re V·I* of each element (for lines, transformers and blocks the power that enters less
 * the power that leaves), so that reflected power, all dissipations and the load's sum up to `availableW`; see the test
 * «power balance». NaN where not known. Source: any text on two-ports, e.g. Pozar, Microwave Engineering, §4.4.
 */
export function ladderStress(
  ladder: readonly Element[], load: Immittance, source: Immittance, frequencyHz: Float64Array, availableW: number,
): readonly Stress[] {
  const first = normalised(load.numerator.re, load.numerator.im, load.denominator.re, load.denominator.im);
  const steps: Step[] = [];
  let state = first.state;
  for (const element of ladder) {
    const step = walk(element, state, frequencyHz);
    steps.push(step);
    state = step.after;
  }
  let size = sizeAtSource(state, source, availableW);
  const stresses: Stress[] = [];
  for (let at = ladder.length - 1; at >= 0; at--) {
    const { abcd, divisor } = steps[at];
    const unit = size.map((value, k) => value / divisor[k]);
    const sizeBefore = unit.map((value, k) => value * Math.hypot(abcd.scale.re[k], abcd.scale.im[k]));
    stresses.push(stressOf(ladder[at], steps[at], unit, size, sizeBefore, frequencyHz));
    size = sizeBefore;
  }
  return [...stresses.reverse(), stressOfLoad(first.state, size)];
}

function normalised(vRe: Float64Array, vIm: Float64Array, iRe: Float64Array, iIm: Float64Array): { state: State; divisor: Float64Array } {
  const length = vRe.length;
  const state: State = {
    vRe: new Float64Array(length), vIm: new Float64Array(length), iRe: new Float64Array(length), iIm: new Float64Array(length),
  };
  const divisor = new Float64Array(length);
  for (let k = 0; k < length; k++) {
    const size = Math.max(Math.abs(vRe[k]), Math.abs(vIm[k]), Math.abs(iRe[k]), Math.abs(iIm[k]));
    divisor[k] = size;
    state.vRe[k] = vRe[k] / size;
    state.vIm[k] = vIm[k] / size;
    state.iRe[k] = iRe[k] / size;
    state.iIm[k] = iIm[k] / size;
  }
  return { state, divisor };
}

function walk(element: Element, before: State, frequencyHz: Float64Array): Step {
  const abcd = elementAbcd(element, frequencyHz);
  const { a, b, c, d } = abcd;
  const length = frequencyHz.length;
  const vRe = new Float64Array(length), vIm = new Float64Array(length), iRe = new Float64Array(length), iIm = new Float64Array(length);
  for (let k = 0; k < length; k++) {
    const xRe = before.vRe[k], xIm = before.vIm[k], yRe = before.iRe[k], yIm = before.iIm[k];
    vRe[k] = a.re[k] * xRe - a.im[k] * xIm + b.re[k] * yRe - b.im[k] * yIm;
    vIm[k] = a.re[k] * xIm + a.im[k] * xRe + b.re[k] * yIm + b.im[k] * yRe;
    iRe[k] = c.re[k] * xRe - c.im[k] * xIm + d.re[k] * yRe - d.im[k] * yIm;
    iIm[k] = c.re[k] * xIm + c.im[k] * xRe + d.re[k] * yIm + d.im[k] * yRe;
    // Nothing gets through, and what is behind has no say: an open in series with an open, a short across a short.
    if (vRe[k] === 0 && vIm[k] === 0 && iRe[k] === 0 && iIm[k] === 0) {
      const [v, i] = largerColumn(abcd, k);
      vRe[k] = v.re;
      vIm[k] = v.im;
      iRe[k] = i.re;
      iIm[k] = i.im;
    }
  }
  const { state, divisor } = normalised(vRe, vIm, iRe, iIm);
  return { before, after: state, abcd, divisor };
}

/** Factor between the state at the source and rms volts and amperes: E / |V + Zs·I|. */
function sizeAtSource(state: State, source: Immittance, availableW: number): Float64Array {
  const { numerator: n, denominator: d } = source;
  return state.vRe.map((vRe, k) => {
    const vIm = state.vIm[k], iRe = state.iRe[k], iIm = state.iIm[k];
    const dSquare = d.re[k] * d.re[k] + d.im[k] * d.im[k];
    const resistanceOhm = (n.re[k] * d.re[k] + n.im[k] * d.im[k]) / dSquare;
    const re = vRe * d.re[k] - vIm * d.im[k] + n.re[k] * iRe - n.im[k] * iIm;
    const im = vRe * d.im[k] + vIm * d.re[k] + n.re[k] * iIm + n.im[k] * iRe;
    return Math.sqrt((4 * resistanceOhm * availableW * dSquare) / (re * re + im * im));
  });
}

function stressOf(
  element: Element, step: Step, unit: Float64Array, sizeAfter: Float64Array, sizeBefore: Float64Array, frequencyHz: Float64Array,
): Stress {
  const parts = element.form === 'branch' && element.pair ? 2 : 1;
  switch (orientationOf(element)) {
    case 'series': return seriesStress(step, unit, sizeAfter, parts);
    case 'shunt': return shuntStress(step, unit, parts);
    case 'through': return throughStress(element, step, sizeAfter, sizeBefore, frequencyHz);
  }
}

const emptyStress = (length: number): Stress => ({
  peakVoltageV: new Float64Array(length), rmsCurrentA: new Float64Array(length), dissipationW: new Float64Array(length),
});

/** The matrix is [[s, Z·s], [0, s]] / s: in units of the state behind it, Z·s·I is the voltage across and s·I the current. */
function seriesStress({ before, after, abcd: { b, d } }: Step, unit: Float64Array, sizeAfter: Float64Array, parts: number): Stress {
  const stress = emptyStress(unit.length);
  for (let k = 0; k < unit.length; k++) {
    const current = Math.hypot(before.iRe[k], before.iIm[k]) * unit[k];
    const passed = Math.hypot(d.re[k], d.im[k]) * current;
    // An open takes all of the voltage, also where no current could flow behind it anyway.
    const open = d.re[k] === 0 && d.im[k] === 0;
    const across = open ? Math.hypot(after.vRe[k], after.vIm[k]) * sizeAfter[k] : Math.hypot(b.re[k], b.im[k]) * current;
    stress.peakVoltageV[k] = (Math.SQRT2 * across) / parts;
    stress.rmsCurrentA[k] = passed;
    stress.dissipationW[k] = (current * current * (b.re[k] * d.re[k] + b.im[k] * d.im[k])) / parts;
  }
  return stress;
}

/** The matrix is [[s, 0], [Y·s, s]] / s: in units of the state behind it, s·V is the node's voltage and Y·s·V the branch's current. */
function shuntStress({ before, abcd: { a, c } }: Step, unit: Float64Array, parts: number): Stress {
  const stress = emptyStress(unit.length);
  for (let k = 0; k < unit.length; k++) {
    const voltage = Math.hypot(before.vRe[k], before.vIm[k]) * unit[k];
    stress.peakVoltageV[k] = (Math.SQRT2 * Math.hypot(a.re[k], a.im[k]) * voltage) / parts;
    stress.rmsCurrentA[k] = Math.hypot(c.re[k], c.im[k]) * voltage;
    stress.dissipationW[k] = (voltage * voltage * (c.re[k] * a.re[k] + c.im[k] * a.im[k])) / parts;
  }
  return stress;
}

function throughStress(
  element: Element, { before, after }: Step, sizeAfter: Float64Array, sizeBefore: Float64Array, frequencyHz: Float64Array,
): Stress {
  const stress = emptyStress(sizeAfter.length);
  const lossless = element.form === 'transformer'
    || (element.form === 'line' && element.line.conductorLossDb === 0 && element.line.dielectricLossDb === 0);
  for (let k = 0; k < sizeAfter.length; k++) {
    let voltage = Math.max(Math.hypot(before.vRe[k], before.vIm[k]) * sizeBefore[k], Math.hypot(after.vRe[k], after.vIm[k]) * sizeAfter[k]);
    let current = Math.max(Math.hypot(before.iRe[k], before.iIm[k]) * sizeBefore[k], Math.hypot(after.iRe[k], after.iIm[k]) * sizeAfter[k]);
    if (element.form === 'line') {
      const inside = peaksAlongLine(element.line, frequencyHz[k], before.vRe[k], before.vIm[k], before.iRe[k], before.iIm[k]);
      voltage = Math.max(voltage, inside.voltage * sizeBefore[k]);
      current = Math.max(current, inside.current * sizeBefore[k]);
    }
    const leaving = (before.vRe[k] * before.iRe[k] + before.vIm[k] * before.iIm[k]) * sizeBefore[k] * sizeBefore[k];
    const entering = (after.vRe[k] * after.iRe[k] + after.vIm[k] * after.iIm[k]) * sizeAfter[k] * sizeAfter[k];
    stress.peakVoltageV[k] = Math.SQRT2 * voltage;
    stress.rmsCurrentA[k] = current;
    stress.dissipationW[k] = lossless && !Number.isNaN(entering) ? 0 : entering - leaving;
  }
  return stress;
}

function stressOfLoad(state: State, size: Float64Array): Stress {
  const stress = emptyStress(size.length);
  for (let k = 0; k < size.length; k++) {
    stress.peakVoltageV[k] = Math.SQRT2 * Math.hypot(state.vRe[k], state.vIm[k]) * size[k];
    stress.rmsCurrentA[k] = Math.hypot(state.iRe[k], state.iIm[k]) * size[k];
    stress.dissipationW[k] = (state.vRe[k] * state.iRe[k] + state.vIm[k] * state.iIm[k]) * size[k] * size[k];
  }
  return stress;
}
