import type { Slot } from './ladderShape';

/** Items of the middle slot whose immittances lie nearly on a line: z ≈ start + x·step at every point asked for, x mostly from 0 to 1. */
export interface Chunk {
  /** Items by increasing x. */
  readonly items: Int32Array;
  readonly x: Float64Array;
  /** By decisive point. */
  readonly startRe: Float64Array;
  readonly startIm: Float64Array;
  readonly stepRe: Float64Array;
  readonly stepIm: Float64Array;
  /** No item is further than this from the line. */
  readonly deviation: Float64Array;
}

/** Items of one kind, from which the coordinates of the box query take their directions. */
export interface ChunkedGroup {
  readonly group: number;
  /** Step of the whole group at each decisive point: what its immittance does as its value goes from one end to the other. */
  readonly directionRe: Float64Array;
  readonly directionIm: Float64Array;
  readonly chunks: readonly Chunk[];
}

/** A chunk may bend by this share of the distance between its items. */
const bend = 0.05;

/**
 * Cuts each group of a slot's items into chunks: in most cases (a value with a Q law, ESR or ESL in one direction) the whole
 * group is one; with self-resonance, or measured, the chunks get as short as they must.
 */
export function chunksOf(slot: Slot, points: number, decisive: Int32Array): ChunkedGroup[] {
  return [...new Set(slot.group)].sort((a, b) => a - b).map((group) => {
    const own = [...slot.group.keys()].filter((i) => slot.group[i] === group);
    const middle = decisive[0];
    // By the tangent's order at one point; the angle that a reactance over ± infinity makes is monotone through a resonance.
    const place = (i: number): number => slot.im[i * points + middle];
    own.sort((a, b) => place(a) - place(b) || a - b);
    const items = Int32Array.from(own);
    const whole = chunkOf(slot, points, decisive, items);
    return { group, directionRe: whole.stepRe, directionIm: whole.stepIm, chunks: cut(slot, points, decisive, items) };
  });
}

function cut(slot: Slot, points: number, decisive: Int32Array, items: Int32Array): Chunk[] {
  const chunk = chunkOf(slot, points, decisive, items);
  if (items.length <= 2 || isStraight(chunk)) return [chunk];
  const half = (items.length + 1) >> 1;
  return [...cut(slot, points, decisive, items.slice(0, half)), ...cut(slot, points, decisive, items.slice(half))];
}

function isStraight({ x, deviation, stepRe, stepIm }: Chunk): boolean {
  let closest = 1;
  for (let i = 1; i < x.length; i++) closest = Math.min(closest, x[i] - x[i - 1]);
  return deviation.every((value, d) => value <= Math.max(1e-12, bend * closest) * Math.hypot(stepRe[d], stepIm[d]));
}

function chunkOf(slot: Slot, points: number, decisive: Int32Array, items: Int32Array): Chunk {
  const size = decisive.length;
  const make = (): Float64Array => new Float64Array(size);
  const chunk = { startRe: make(), startIm: make(), stepRe: make(), stepIm: make(), deviation: make() };
  const first = items[0] * points;
  const last = items[items.length - 1] * points;
  for (let d = 0; d < size; d++) {
    const k = decisive[d];
    chunk.startRe[d] = slot.re[first + k];
    chunk.startIm[d] = slot.im[first + k];
    chunk.stepRe[d] = slot.re[last + k] - chunk.startRe[d];
    chunk.stepIm[d] = slot.im[last + k] - chunk.startIm[d];
    // One item, or several that are equal: any direction serves.
    if (chunk.stepRe[d] === 0 && chunk.stepIm[d] === 0) chunk.stepIm[d] = 1;
  }
  const square = chunk.stepRe[0] ** 2 + chunk.stepIm[0] ** 2;
  const x = Float64Array.from(items, (item) => {
    const re = slot.re[item * points + decisive[0]] - chunk.startRe[0];
    const im = slot.im[item * points + decisive[0]] - chunk.startIm[0];
    return (re * chunk.stepRe[0] + im * chunk.stepIm[0]) / square;
  });
  const order = [...x.keys()].sort((a, b) => x[a] - x[b] || a - b);
  const sortedItems = Int32Array.from(order, (i) => items[i]);
  const sortedX = Float64Array.from(order, (i) => x[i]);
  for (let d = 0; d < size; d++) {
    sortedItems.forEach((item, i) => {
      const at = item * points + decisive[d];
      const re = slot.re[at] - chunk.startRe[d] - sortedX[i] * chunk.stepRe[d];
      const im = slot.im[at] - chunk.startIm[d] - sortedX[i] * chunk.stepIm[d];
      chunk.deviation[d] = Math.max(chunk.deviation[d], Math.hypot(re, im));
    });
  }
  return { items: sortedItems, x: sortedX, ...chunk };
}
