import type { Cascade } from './cascade';
import type { Element } from './element';
import { elementAction } from './elementAbcd';
import { impedanceOf, type Immittance } from './immittance';
import type { Part } from './part';
import { partImmittance } from './partImmittance';
import type { PartModel } from './partModel';
import { SERIES, SHUNT, THROUGH } from './runLadder';

/** An element made ready for the inner loop. */
export interface KernelSlot {
  readonly element: Element;
  /** SERIES, SHUNT or THROUGH of `runLadder`; null where the element does nothing. */
  readonly operation: number | null;
  /**
   * Z (series), Y (shunt), or A, B, C, D: `width` numbers for each point. Infinite or NaN where the element lets nothing
   * through. A proportional part has the table of 1 H, 1 F or 1 Ω, and the value is a factor; of a part with a law it is
   * rewritten with each value.
   */
  readonly table: Float64Array;
  readonly width: 0 | 2 | 8;
  /** Where the element is a single part with a value to set. */
  readonly part: Part | null;
  /** Whether Z as a whole is L, 1/C or R times something. */
  readonly proportional: boolean;
  /** Null where every point is known. */
  readonly known: Uint8Array | null;
}

const NO_TABLE = new Float64Array(0);

export function kernelSlot(element: Element, frequencyHz: Float64Array): KernelSlot {
  const fixed = { element, part: null, proportional: false };
  if (element.form === 'bridge' || element.form === 'not fitted') {
    return { ...fixed, operation: null, table: NO_TABLE, width: 0, known: null };
  }
  if (element.form === 'branch' && element.branch.form === 'part' && element.branch.part.measured === null) {
    const { orientation, branch: { part } } = element;
    const proportional = isProportional(part);
    const unit = partImmittance(proportional ? { ...part, value: 1 } : part, frequencyHz);
    return { element, operation: operationOf(orientation), table: immittanceTable(unit, orientation), width: 2, part, proportional, known: null };
  }
  const action = elementAction(element, frequencyHz);
  if (action.form === 'through') {
    return { ...fixed, operation: THROUGH, table: entries(action.network), width: 8, known: action.network.known };
  }
  return { ...fixed, operation: operationOf(action.form), table: immittanceTable(action.z, action.form), width: 2, known: action.z.known };
}

const operationOf = (orientation: 'series' | 'shunt'): number => (orientation === 'series' ? SERIES : SHUNT);

/** ESR and ESL stay when the value changes. An SRF goes with it: its capacitance is proportional to 1/L. */
const isProportional = ({ loss, eslH }: Part): boolean => eslH === 0 && (loss.law !== 'resistance' || loss.resistanceOhm === 0);

/** The factor of a proportional part at a value. */
export function factorAt({ element, part }: KernelSlot, value: number): number {
  if (part === null || element.form !== 'branch') return 1;
  const legs = element.pair ? 2 : 1;
  const size = part.kind === 'capacitor' ? legs / value : legs * value;
  return element.orientation === 'series' ? size : 1 / size;
}

/** The element of a slot with another value in its part. */
export function withValue({ element, part }: KernelSlot, value: number): Element {
  if (part === null || element.form !== 'branch') return element;
  return { ...element, branch: { form: 'part', part: { ...part, value } } };
}

/** Z or Y at each point: re, im. */
function immittanceTable(z: Immittance, orientation: 'series' | 'shunt'): Float64Array {
  const { re, im } = impedanceOf(orientation === 'series' ? z : { ...z, numerator: z.denominator, denominator: z.numerator });
  const table = new Float64Array(2 * re.length);
  for (let k = 0; k < re.length; k++) {
    table[2 * k] = re[k];
    table[2 * k + 1] = im[k];
  }
  return table;
}

/** Z or Y at one frequency of a part with ESR or ESL, by `PartModel`; what has no finite value comes out as infinite or NaN. */
export function lawAt(model: PartModel, legs: number, shunt: boolean, frequencyHz: number, into: Float64Array, index: number): void {
  const omega = 2 * Math.PI * frequencyHz;
  const inverse = 1 / omega;
  const re = legs * (model.constantOhm + model.skinOhm * Math.sqrt(frequencyHz) + model.risingOhm * omega + model.fallingOhm * inverse);
  const im = legs * (omega * model.inductanceH - model.elastance * inverse);
  const across = (omega * model.acrossF) / legs;
  const ownSquared = re * re + im * im;
  if (shunt) {
    into[index] = re / ownSquared;
    into[index + 1] = across - im / ownSquared;
    return;
  }
  // Z/(1 + jωCp·Z)
  const dRe = 1 - across * im;
  const dIm = across * re;
  const squared = dRe * dRe + dIm * dIm;
  into[index] = re / squared;
  into[index + 1] = (im * dRe - re * dIm) / squared;
}

/** The true A, B, C, D at each point. */
function entries(network: Cascade): Float64Array {
  const length = network.known.length;
  const table = new Float64Array(8 * length);
  const { scale } = network;
  [network.a, network.b, network.c, network.d].forEach((entry, j) => {
    for (let k = 0; k < length; k++) {
      const squared = scale.re[k] * scale.re[k] + scale.im[k] * scale.im[k];
      table[8 * k + 2 * j] = (entry.re[k] * scale.re[k] + entry.im[k] * scale.im[k]) / squared;
      table[8 * k + 2 * j + 1] = (entry.im[k] * scale.re[k] - entry.re[k] * scale.im[k]) / squared;
    }
  });
  return table;
}
