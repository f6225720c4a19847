import { boxTree, type BoxTree } from './boxTree';
import { prefixesOf, suffixesOf } from './halfLadders';
import type { LadderShape } from './ladderShape';
import { chunksOf, type Chunk, type ChunkedGroup } from './middleChunks';
import type { TrialPoints } from './trialPoints';

/** Finds the ladders of a shape that may have an excess up to a threshold, without looking at each. */
export interface MiddleSearch {
  /**
   * Calls `found` with every ladder whose excess is at most `most()` (asked anew for each suffix), and with some others.
   * Ends early where `found` returns false.
   */
  run(most: () => number, found: (choice: Int32Array) => boolean): void;
  /** Boxes, points and ladders looked at so far. */
  visited(): number;
}

/** Disks are widened by this share, which covers rounding. */
const slack = 1e-9;
const far = 1e14;
/** Fewer prefixes are not worth sorting out. */
const plantWhole = 3_000;

/**
 * The ladder is cut at a middle slot. What is fixed on the source's side and a threshold on |Γ|² leave a disk for the
 * immittance after the middle element, at each decisive point; the middle element adds start + x·step to that of the
 * load's side, so that each point leaves an interval of x, and all of them together a stretch of the catalogue. What the
 * middle element cannot change, and what has to be the same x at two points, is asked of a tree over the load's sides.
 *
 * Every rejection follows from «the excess at some point is above the threshold»; where the disk is a half-plane or the
 * outside of a circle, the point rejects nothing.
 */
export function middleSearch(shape: LadderShape, middle: number, points: TrialPoints, decisive: Int32Array): MiddleSearch {
  const at = shape.steps.findIndex((step) => step.form === 'slot' && step.slot === middle);
  const slot = shape.slots[middle];
  const series = slot.orientation === 'series';
  const size = decisive.length;
  const prefixes = prefixesOf(shape, at, points, decisive);
  const suffixes = suffixesOf(shape, at, points, decisive);
  const planes = planeOf(prefixes.state, prefixes.count * size, series);
  const groups = chunksOf(slot, points.count, decisive);
  let trees: readonly BoxTree[] = [];
  let treesFor = -1;
  const hits = new Int32Array(prefixes.count);
  const limits = limitsOf(shape, points, decisive);
  const gains = gainsOf(shape, points, decisive, prefixes.state, prefixes.count, series);

  const centreRe = new Float64Array(size);
  const centreIm = new Float64Array(size);
  const radius = new Float64Array(size);
  const gainCentreRe = new Float64Array(size);
  const gainCentreIm = new Float64Array(size);
  /** Radius² of the gain's disk times |I|² (series) or |V|² of the prefix; Infinity where no gain is asked. */
  const gainSquare = new Float64Array(size);
  const dimensions = dimensionsOf(size);
  const lower = new Float64Array(dimensions);
  const upper = new Float64Array(dimensions);
  const choice = new Int32Array(shape.slots.length);
  const prefixCounts = shape.slots.slice(0, middle).map(({ count }) => count);
  const suffixCounts = shape.slots.slice(middle + 1).map(({ count }) => count);
  let looked = 0;

  /** Disks of all decisive points for one suffix; false where one of them is empty. */
  function placeDisks(suffix: number, most: number): boolean {
    for (let d = 0; d < size; d++) {
      const limit = limits(d, most);
      const o = 8 * (suffix * size + d);
      const { rows } = suffixes;
      const [p, q] = series ? [0, 2] : [2, 0];
      const aRe = rows[o + p];
      const aIm = rows[o + p + 1];
      const bRe = rows[o + q];
      const bIm = rows[o + q + 1];
      const cRe = rows[o + 4 + p];
      const cIm = rows[o + 4 + p + 1];
      const dRe = rows[o + 4 + q];
      const dIm = rows[o + 4 + q + 1];
      const aa = aRe * aRe + aIm * aIm;
      const bottom = cRe * cRe + cIm * cIm - limit * aa;
      if (!(limit >= 0)) return false;
      if (gains !== null) {
        gainSquare[d] = gains.largest[d] === Infinity || !(aa > 0) ? Infinity : ((gains.largest[d] * most) / aa) * (1 + slack);
        gainCentreRe[d] = -(bRe * aRe + bIm * aIm) / aa;
        gainCentreIm[d] = -(bIm * aRe - bRe * aIm) / aa;
      }
      if (!(bottom > 0) || limit >= 1) {
        radius[d] = Infinity;
        continue;
      }
      centreRe[d] = -(cRe * dRe + cIm * dIm - limit * (aRe * bRe + aIm * bIm)) / bottom;
      centreIm[d] = -(cRe * dIm - cIm * dRe - limit * (aRe * bIm - aIm * bRe)) / bottom;
      const determinant = Math.hypot(cRe * bRe - cIm * bIm - aRe * dRe + aIm * dIm, cRe * bIm + cIm * bRe - aRe * dIm - aIm * dRe);
      radius[d] = ((Math.sqrt(limit) * determinant) / bottom) * (1 + slack) + 1e-12 * Math.hypot(centreRe[d], centreIm[d]);
      if (!(radius[d] < far)) radius[d] = Infinity;
    }
    return true;
  }

  /** The box in which prefixes must lie for some x of the chunk. */
  function placeBox(group: ChunkedGroup, chunk: Chunk): void {
    lower.fill(-Infinity);
    upper.fill(Infinity);
    const first = chunk.x[0];
    const last = chunk.x[chunk.x.length - 1];
    /** Ends of slope·x over the chunk. */
    const least = (slope: number): number => Math.min(slope * first, slope * last);
    const most = (slope: number): number => Math.max(slope * first, slope * last);
    let slope0 = 0;
    let offset0 = 0;
    let reach0 = Infinity;
    for (let d = 0; d < size; d++) {
      if (radius[d] === Infinity) continue;
      const uRe = group.directionRe[d];
      const uIm = group.directionIm[d];
      const u2 = uRe * uRe + uIm * uIm;
      const zRe = centreRe[d] - chunk.startRe[d];
      const zIm = centreIm[d] - chunk.startIm[d];
      const offsetRe = (zRe * uRe + zIm * uIm) / u2;
      const offsetIm = (zIm * uRe - zRe * uIm) / u2;
      const slopeRe = -(chunk.stepRe[d] * uRe + chunk.stepIm[d] * uIm) / u2;
      const slopeIm = -(chunk.stepIm[d] * uRe - chunk.stepRe[d] * uIm) / u2;
      const reach = (radius[d] + chunk.deviation[d]) / Math.sqrt(u2) + 1e-12 * (Math.abs(offsetRe) + Math.abs(offsetIm));
      const e = coordinateOf(d);
      if (e >= 0) {
        lower[e] = offsetIm + least(slopeIm) - reach;
        upper[e] = offsetIm + most(slopeIm) + reach;
      }
      if (d === 0) {
        lower[0] = offsetRe + least(slopeRe) - reach;
        upper[0] = offsetRe + most(slopeRe) + reach;
        slope0 = slopeRe;
        offset0 = offsetRe;
        reach0 = reach;
      } else if (d === 1) {
        const slope = slopeRe - slope0;
        const offset = offsetRe - offset0;
        lower[1] = offset + least(slope) - reach - reach0;
        upper[1] = offset + most(slope) + reach + reach0;
      }
    }
  }

  /** Items of the chunk that may follow this prefix: `first` to `last` (exclusive) of its order. */
  const stretch = { first: 0, last: 0 };
  function placeStretch(prefix: number, chunk: Chunk): boolean {
    const { startRe, startIm, stepRe, stepIm, deviation, x } = chunk;
    let low = x[0];
    let high = x[x.length - 1];
    for (let d = 0; d < size; d++) {
      const p = 2 * (prefix * size + d);
      const pRe = planes[p] + startRe[d];
      const pIm = planes[p + 1] + startIm[d];
      const step2 = stepRe[d] * stepRe[d] + stepIm[d] * stepIm[d];
      if (radius[d] !== Infinity) {
        const zRe = centreRe[d] - pRe;
        const zIm = centreIm[d] - pIm;
        const wIm = (zIm * stepRe[d] - zRe * stepIm[d]) / step2;
        const reach = radius[d] + deviation[d];
        const square = (reach * reach) / step2 - wIm * wIm;
        if (!(square >= 0)) return false;
        const w = (zRe * stepRe[d] + zIm * stepIm[d]) / step2;
        const root = Math.sqrt(square);
        const rounding = 1e-12 * (1 + Math.abs(w));
        if (w - root - rounding > low) low = w - root - rounding;
        if (w + root + rounding < high) high = w + root + rounding;
        if (!(low <= high)) return false;
      }
      if (gains !== null && gainSquare[d] !== Infinity) {
        const zRe = gainCentreRe[d] - pRe;
        const zIm = gainCentreIm[d] - pIm;
        const wIm = (zIm * stepRe[d] - zRe * stepIm[d]) / step2;
        const reach = Math.sqrt(gainSquare[d] * gains.inverse[prefix * size + d]) + deviation[d] + 1e-12 * (Math.abs(gainCentreRe[d]) + Math.abs(gainCentreIm[d]));
        const square = (reach * reach) / step2 - wIm * wIm;
        if (!(square >= 0)) return false;
        const w = (zRe * stepRe[d] + zIm * stepIm[d]) / step2;
        const root = Math.sqrt(square);
        const rounding = 1e-12 * (1 + Math.abs(w));
        if (w - root - rounding > low) low = w - root - rounding;
        if (w + root + rounding < high) high = w + root + rounding;
        if (!(low <= high)) return false;
      }
    }
    let first = 0;
    let end = x.length;
    while (first < end) {
      const half = (first + end) >> 1;
      if (x[half] < low) first = half + 1;
      else end = half;
    }
    let last = first;
    while (last < x.length && x[last] <= high) last++;
    stretch.first = first;
    stretch.last = last;
    return last > first;
  }

  function fill(index: number, counts: readonly number[], from: number): void {
    let rest = index;
    for (let s = counts.length - 1; s >= 0; s--) {
      choice[from + s] = rest % counts[s];
      rest = Math.floor(rest / counts[s]);
    }
  }

  /** Trees over those prefixes that are in some suffix's box at all. */
  function plant(most: number): void {
    const filtered = prefixes.count > plantWhole;
    trees = groups.map((group) => {
      const coordinates = coordinatesOf(group, planes, prefixes.count, size);
      if (!filtered) return boxTree(coordinates, prefixes.count, dimensions);
      const least = new Float64Array(dimensions).fill(Infinity);
      const largest = new Float64Array(dimensions).fill(-Infinity);
      for (let suffix = 0; suffix < suffixes.count; suffix++) {
        if (!placeDisks(suffix, most)) break;
        for (const chunk of group.chunks) {
          placeBox(group, chunk);
          for (let e = 0; e < dimensions; e++) {
            if (lower[e] < least[e]) least[e] = lower[e];
            if (upper[e] > largest[e]) largest[e] = upper[e];
          }
        }
      }
      return boxTree(coordinates, prefixes.count, dimensions, { least, largest });
    });
    treesFor = filtered ? most : Infinity;
  }

  return {
    run(most, found) {
      for (let suffix = 0; suffix < suffixes.count; suffix++) {
        const threshold = most();
        // No ladder has a negative excess: that is how one is told to stop.
        if (threshold < 0) return;
        if (!(threshold <= treesFor)) plant(threshold);
        if (!placeDisks(suffix, threshold)) return;
        fill(suffix, suffixCounts, middle + 1);
        for (let g = 0; g < groups.length; g++) {
          const group = groups[g];
          const tree = trees[g];
          for (const chunk of group.chunks) {
            placeBox(group, chunk);
            const before = tree.visited();
            const count = tree.find(lower, upper, hits);
            looked += tree.visited() - before;
            looked += count;
            for (let h = 0; h < count; h++) {
              const prefix = tree.order[hits[h]];
              if (!placeStretch(prefix, chunk)) continue;
              fill(prefix, prefixCounts, 0);
              const { first, last } = stretch;
              looked += last - first;
              for (let i = first; i < last; i++) {
                choice[middle] = chunk.items[i];
                if (!found(choice)) return;
              }
            }
          }
        }
      }
    },
    visited: () => looked,
  };
}

/**
 * Coordinates of a prefix in units of the group's step: 0 the real part at the first decisive point, 1 what it is more at the
 * second, then the imaginary parts at the first three, which the middle element does not change.
 */
const dimensionsOf = (decisive: number): number => 2 + Math.min(3, decisive);
const coordinateOf = (d: number): number => (d < 3 ? 2 + d : -1);

function coordinatesOf({ directionRe, directionIm }: ChunkedGroup, planes: Float64Array, count: number, size: number): Float64Array {
  const dimensions = dimensionsOf(size);
  const coordinates = new Float64Array(count * dimensions);
  for (let p = 0; p < count; p++) {
    for (let d = 0; d < Math.min(3, size); d++) {
      const re = planes[2 * (p * size + d)];
      const im = planes[2 * (p * size + d) + 1];
      const square = directionRe[d] * directionRe[d] + directionIm[d] * directionIm[d];
      const along = (re * directionRe[d] + im * directionIm[d]) / square;
      if (d === 0) coordinates[p * dimensions] = along;
      if (d === 1) coordinates[p * dimensions + 1] = along - coordinates[p * dimensions];
      coordinates[p * dimensions + coordinateOf(d)] = (im * directionRe[d] - re * directionIm[d]) / square;
    }
  }
  return coordinates;
}

/** V/I (series) or I/V (shunt) of each state; what has none is far away, outside of every disk. */
function planeOf(state: Float64Array, count: number, series: boolean): Float64Array {
  const planes = new Float64Array(2 * count);
  for (let i = 0; i < count; i++) {
    const [top, bottom] = series ? [4 * i, 4 * i + 2] : [4 * i + 2, 4 * i];
    const size = state[bottom] ** 2 + state[bottom + 1] ** 2;
    const re = (state[top] * state[bottom] + state[top + 1] * state[bottom + 1]) / size;
    const im = (state[top + 1] * state[bottom] - state[top] * state[bottom + 1]) / size;
    const finite = Math.abs(re) < far && Math.abs(im) < far;
    planes[2 * i] = finite ? re : far;
    planes[2 * i + 1] = finite ? im : far;
  }
  return planes;
}

/** The largest |Γ|² that decisive point d leaves at a threshold; a gain of g leaves 1 − g, as nothing gives power. */
function limitsOf(shape: LadderShape, points: TrialPoints, decisive: Int32Array): (d: number, most: number) => number {
  const { reflectionWeight, gainFloor } = points;
  return (d, most) => {
    const k = decisive[d];
    const byReflection = reflectionWeight[k] > 0 ? most / reflectionWeight[k] : Infinity;
    const byGain = gainFloor[k] > 0 && shape.passive ? 1 - gainFloor[k] / most : Infinity;
    return Math.min(byReflection, byGain) + 1e-15;
  };
}

interface Gains {
  /** Power over the gain asked for, at a threshold of 1; Infinity where none is asked. By decisive point. */
  readonly largest: Float64Array;
  /** 1/|I|² (series) or 1/|V|² of each prefix at each decisive point. */
  readonly inverse: Float64Array;
}

/** A gain of at least g is a disk too: |W + b/a|² ≤ 4 Rs PL/(g |a|² |I|²), with the prefix's own current. Null where none is asked. */
function gainsOf(shape: LadderShape, { gainFloor }: TrialPoints, decisive: Int32Array, state: Float64Array, count: number, series: boolean): Gains | null {
  const largest = Float64Array.from(decisive, (k) => (gainFloor[k] > 0 && shape.power[k] > 0 ? shape.power[k] / gainFloor[k] : Infinity));
  if (largest.every((value) => value === Infinity)) return null;
  const inverse = new Float64Array(count * decisive.length);
  const at = series ? 2 : 0;
  for (let i = 0; i < inverse.length; i++) inverse[i] = 1 / (state[4 * i + at] ** 2 + state[4 * i + at + 1] ** 2);
  return { largest, inverse };
}
