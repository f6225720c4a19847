import type { PartKind } from '../../network/part';
import type { Problem } from '../problem';
import { studiedLadder } from '../studiedLadder';
import { meterOf } from './meterOf';
import { valueAt } from './toleratedParts';
import { partsOfBuilds } from './tunedParts';

/** The worst of the builds in which every part lies at one end of its tolerance. The worst inside may be worse still. */
export interface WorstCorner {
  /** By part, from the load on; of a tuned part that at the channel where the margin is worst. */
  readonly values: readonly { readonly name: string; readonly kind: PartKind; readonly value: number }[];
  readonly marginDb: number;
  readonly caseName: string | null;
  /** False past `exactUpTo` parts: then the worst that going from corner to corner found. */
  readonly proved: boolean;
}

/** All corners are tried up to so many parts. */
export const exactUpTo = 20;

/** Corners tried between two looks at the clock, where nobody waits. */
const atOnce = 1 << 14;

/** The search for the worst corner, piece by piece: with many parts all corners take seconds. */
export interface CornerRun {
  /** Tries so many more corners; false where nothing is left to try. */
  more(corners: number): boolean;
  /** Until all have been tried, the worst that going from corner to corner found, or that was tried. */
  result(): WorstCorner;
}

/** Only where there is no `spreadObstacle`. Ties go to the first corner, parts at their lower end counting first. */
export function cornerRun(problem: Problem, ladder = studiedLadder(problem)): CornerRun {
  const parts = partsOfBuilds(problem, ladder);
  const meter = meterOf(problem, ladder, parts);
  const ends = parts.map((part) => [valueAt(part, -1), valueAt(part, 1)]);
  const values = new Float64Array(parts.length);
  const at = (corner: Uint8Array): number => {
    corner.forEach((end, i) => { values[i] = ends[i][end]; });
    meter.measure(values);
    return meter.worstDb;
  };
  const all = parts.length <= exactUpTo ? 2 ** parts.length : 0;
  const corner = new Uint8Array(parts.length);
  let tried = 0;
  let worst: Uint8Array | null = null;
  let least = Infinity;
  let guess: Uint8Array | null = null;
  return {
    more(corners) {
      for (const end = Math.min(all, tried + corners); tried < end; tried++) {
        for (let i = 0; i < parts.length; i++) corner[i] = (tried >> (parts.length - 1 - i)) & 1;
        const margin = at(corner);
        if (worst !== null && !(margin < least)) continue;
        least = margin;
        worst = corner.slice();
      }
      return tried < all;
    },
    result() {
      const proved = all > 0 && tried === all;
      if (!proved) guess ??= worstByFlips(parts.length, at);
      const chosen = proved || (worst && guess && at(worst) < at(guess)) ? worst : guess;
      const marginDb = at(chosen ?? corner.fill(0));
      const there = meter.valuesAtWorst ?? values;
      return { values: parts.map(({ name, part }, i) => ({ name, kind: part.kind, value: there[i] })), marginDb, caseName: meter.worstCase, proved };
    },
  };
}

/** All of it at once. */
export function worstCorner(problem: Problem, ladder = studiedLadder(problem)): WorstCorner {
  const run = cornerRun(problem, ladder);
  while (run.more(atOnce));
  return run.result();
}

/** From both extreme corners, one part after the other to its worse end, until nothing gets worse. */
function worstByFlips(count: number, at: (corner: Uint8Array) => number): Uint8Array {
  let worst = new Uint8Array(count);
  let least = Infinity;
  for (const start of [0, 1]) {
    const corner = new Uint8Array(count).fill(start);
    let margin = at(corner);
    for (let changed = true; changed;) {
      changed = false;
      for (let i = 0; i < count; i++) {
        corner[i] ^= 1;
        const flipped = at(corner);
        if (flipped < margin) {
          margin = flipped;
          changed = true;
        } else {
          corner[i] ^= 1;
        }
      }
    }
    if (margin < least) {
      least = margin;
      worst = corner.slice();
    }
  }
  return worst;
}
