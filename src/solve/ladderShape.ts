import { cascade } from '../network/cascade';
import type { Element, Orientation } from '../network/element';
import { impedanceOf } from '../network/immittance';
import { partImmittance } from '../network/partImmittance';
import type { TrialPoints } from './trialPoints';

/** A place in a ladder and the elements that may stand there, as tables over the points. */
export interface Slot {
  readonly orientation: Orientation;
  readonly count: number;
  /** Z (series) or Y (shunt) of item i at point k: index i·points + k. Always finite. Empty where `through`. */
  readonly re: Float64Array;
  readonly im: Float64Array;
  /** Where `through`: A, B, C, D of item i at point k, eight numbers from 8·(i·points + k) on; else empty. */
  readonly abcd: Float64Array;
  /** Which items are of one kind, so that their immittances lie on a curve: any small numbers. */
  readonly group: Uint8Array;
}

/** From the load on. */
export type Step =
  | { readonly form: 'slot'; readonly slot: number }
  /** A, B, C, D at point k: eight numbers from 8k on, source's side first, up to a factor that `LadderShape.power` holds. */
  | { readonly form: 'fixed'; readonly abcd: Float64Array };

/** Ladders that differ only in the item of each slot. */
export interface LadderShape {
  readonly steps: readonly Step[];
  readonly slots: readonly Slot[];
  /** 4·Rs·Re(V·I*) of the load at each point, times what the fixed elements' factors make of it: gain is this over |den|². */
  readonly power: Float64Array;
  /** How many ladders there are. */
  readonly size: number;
  /** No step gives power: then what is reflected and what arrives are together at most what was sent. */
  readonly passive: boolean;
}

/** An open in series or a short across, as a number that later arithmetic survives. */
const blocking = 1e12;

/**
 * Tables of what may stand in one place; `items` are all of the slot's orientation, `groups` says which are of a kind.
 * `unknown` is 1 for items that are not known at some point (their entries are 0).
 */
export function slotOf(orientation: Orientation, items: readonly Element[], groups: ArrayLike<number>, frequencyHz: Float64Array): Slot & { readonly unknown: Uint8Array } {
  const points = frequencyHz.length;
  const through = orientation === 'through';
  const re = new Float64Array(through ? 0 : items.length * points);
  const im = new Float64Array(through ? 0 : items.length * points);
  const abcd = new Float64Array(through ? 8 * items.length * points : 0);
  const unknown = new Uint8Array(items.length);
  items.forEach((item, i) => {
    const written = through ? writeThrough(item, frequencyHz, abcd, 8 * i * points) : writeImmittance(item, orientation, frequencyHz, re, im, i * points);
    if (!written) unknown[i] = 1;
  });
  return { orientation, count: items.length, re, im, abcd, group: Uint8Array.from(groups), unknown };
}

function writeImmittance(item: Element, orientation: 'series' | 'shunt', frequencyHz: Float64Array, re: Float64Array, im: Float64Array, from: number): boolean {
  if (item.form !== 'branch' || item.branch.form !== 'part') return writeFromCascade(item, orientation, frequencyHz, re, im, from);
  const z = partImmittance(item.branch.part, frequencyHz);
  const own = impedanceOf(orientation === 'series' ? z : { ...z, numerator: z.denominator, denominator: z.numerator });
  const factor = !item.pair ? 1 : orientation === 'series' ? 2 : 0.5;
  for (let k = 0; k < frequencyHz.length; k++) {
    if (z.known[k] === 0) return false;
    re[from + k] = finite(own.re[k] * factor);
    im[from + k] = finite(own.im[k] * factor);
  }
  return true;
}

/** Of a stub, or anything else whose matrix is that of one immittance. */
function writeFromCascade(item: Element, orientation: 'series' | 'shunt', frequencyHz: Float64Array, re: Float64Array, im: Float64Array, from: number): boolean {
  const { a, b, c, known } = cascade([item], frequencyHz);
  const entry = orientation === 'series' ? b : c;
  for (let k = 0; k < frequencyHz.length; k++) {
    if (known[k] === 0) return false;
    const size = a.re[k] * a.re[k] + a.im[k] * a.im[k];
    re[from + k] = finite(size === 0 ? Infinity : (entry.re[k] * a.re[k] + entry.im[k] * a.im[k]) / size);
    im[from + k] = finite(size === 0 ? 0 : (entry.im[k] * a.re[k] - entry.re[k] * a.im[k]) / size);
  }
  return true;
}

function writeThrough(item: Element, frequencyHz: Float64Array, abcd: Float64Array, from: number): boolean {
  const { a, b, c, d, scale, known } = cascade([item], frequencyHz);
  for (let k = 0; k < frequencyHz.length; k++) {
    const size = scale.re[k] * scale.re[k] + scale.im[k] * scale.im[k];
    if (known[k] === 0 || size === 0) return false;
    [a, b, c, d].forEach((entry, j) => {
      abcd[from + 8 * k + 2 * j] = (entry.re[k] * scale.re[k] + entry.im[k] * scale.im[k]) / size;
      abcd[from + 8 * k + 2 * j + 1] = (entry.im[k] * scale.re[k] - entry.re[k] * scale.im[k]) / size;
    });
  }
  return true;
}

const finite = (value: number): number => (Math.abs(value) < blocking ? value : value < 0 ? -blocking : blocking);

/** Puts together fixed elements and slots, load first. */
export function shapeOf(steps: readonly (Slot | readonly Element[])[], points: TrialPoints): LadderShape {
  const slots: Slot[] = [];
  const power = new Float64Array(points.count);
  let passive = true;
  for (let k = 0; k < points.count; k++) {
    power[k] = 4 * points.sourceRe[k] * (points.voltageRe[k] * points.currentRe[k] + points.voltageIm[k] * points.currentIm[k]);
  }
  const made = steps.map((step): Step => {
    if ('orientation' in step) {
      passive &&= step.re.every((value) => value >= 0);
      return { form: 'slot', slot: slots.push(step) - 1 };
    }
    passive &&= !step.some(({ form }) => form === 'block');
    return { form: 'fixed', abcd: fixedTable(step, points.frequencyHz, power) };
  });
  return { steps: made, slots, power, size: slots.reduce((product, { count }) => product * count, 1), passive };
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

/** The same ladders with fewer items: `keep` names those of each slot that stay. */
export function reducedShape(shape: LadderShape, keep: readonly Int32Array[], points: number): LadderShape {
  const slots = shape.slots.map((slot, s): Slot => {
    const pick = (from: Float64Array, width: number): Float64Array => {
      const into = new Float64Array(from.length === 0 ? 0 : keep[s].length * width);
      if (from.length > 0) keep[s].forEach((item, i) => into.set(from.subarray(item * width, (item + 1) * width), i * width));
      return into;
    };
    return {
      orientation: slot.orientation, count: keep[s].length, re: pick(slot.re, points), im: pick(slot.im, points), abcd: pick(slot.abcd, 8 * points),
      group: Uint8Array.from(keep[s], (item) => slot.group[item]),
    };
  });
  return { ...shape, slots, size: slots.reduce((product, { count }) => product * count, 1) };
}

/** Item of each slot of the ladder at `index`: the slot at the load counts slowest. */
export function choiceAt(shape: LadderShape, index: number, into: Int32Array = new Int32Array(shape.slots.length)): Int32Array {
  let rest = index;
  for (let s = shape.slots.length - 1; s >= 0; s--) {
    const { count } = shape.slots[s];
    into[s] = rest % count;
    rest = Math.floor(rest / count);
  }
  return into;
}

export function indexOf(shape: LadderShape, choice: Int32Array): number {
  let index = 0;
  for (let s = 0; s < shape.slots.length; s++) index = index * shape.slots[s].count + choice[s];
  return index;
}
