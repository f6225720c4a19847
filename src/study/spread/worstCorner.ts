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
export const exactUpTo = 16;

/** Only where there is no `spreadObstacle`. Ties go to the first corner, parts at their lower end counting first. */
export function worstCorner(problem: Problem, ladder = studiedLadder(problem)): WorstCorner {
  const parts = partsOfBuilds(problem, ladder);
  const meter = meterOf(problem, ladder, parts);
  const ends = parts.map((part) => [valueAt(part, -1), valueAt(part, 1)]);
  const values = new Float64Array(parts.length);
  const at = (corner: Uint8Array): number => {
    corner.forEach((end, i) => { values[i] = ends[i][end]; });
    meter.measure(values);
    return meter.worstDb;
  };
  const proved = parts.length <= exactUpTo;
  const worst = proved ? worstOfAll(parts.length, at) : worstByFlips(parts.length, at);
  const marginDb = at(worst);
  const there = meter.valuesAtWorst ?? values;
  return { values: parts.map(({ name, part }, i) => ({ name, kind: part.kind, value: there[i] })), marginDb, caseName: meter.worstCase, proved };
}

function worstOfAll(count: number, at: (corner: Uint8Array) => number): Uint8Array {
  const corner = new Uint8Array(count);
  let worst = corner.slice();
  let least = Infinity;
  for (let number = 0; number < 2 ** count; number++) {
    for (let i = 0; i < count; i++) corner[i] = (number >> (count - 1 - i)) & 1;
    const margin = at(corner);
    if (margin < least) {
      least = margin;
      worst = corner.slice();
    }
  }
  return worst;
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
