import type { ChannelScore } from './channelJudgement';
import type { CodeSpace } from './codeSpace';

/** Margins nearer to each other than this, in dB, are equal. */
export const equalMarginsDb = 1e-9;

export const marginOfExcess = (excess: number): number => -10 * Math.log10(excess);

export interface Choice {
  readonly states: Int32Array;
  /** False where not every combination was looked at. */
  readonly proved: boolean;
}

/** Goals that |Γ| and gain do not decide. */
export interface Others {
  judge(states: Int32Array): ChannelScore;
  /** How many conditions every combination misses. */
  readonly leastMissed: number;
  /** How many combinations may be judged. */
  readonly trials: number;
}

/**
 * The best of all combinations at one channel: the fewest conditions missed, then the largest worst margin; of equal ones the
 * nearest to the codes of the channel before (`previous`), then the smallest. `excesses` are those of `CodeMeter` over the goals
 * that |Γ| and gain decide; where there are `others`, combinations are judged from the smallest excess up, until none that is
 * left could win.
 */
export function chooseCodes(excesses: Float64Array, space: CodeSpace, previous: Int32Array | null, others: Others | null): Choice {
  if (others === null) return { states: nearestOf(allSmallest(excesses), space, previous), proved: true };
  const boundsDb = excesses.map(marginOfExcess);
  const order = Uint32Array.from(boundsDb, (_, combination) => combination).sort((a, b) => compare(boundsDb[b], boundsDb[a]) || a - b);
  const judged: { readonly combination: number; readonly missed: number; readonly marginDb: number }[] = [];
  const states = new Int32Array(space.tunables.length);
  let missed = Infinity;
  let marginDb = -Infinity;
  let proved = true;
  for (const combination of order) {
    if (missed <= others.leastMissed && boundsDb[combination] < marginDb - equalMarginsDb) break;
    if (judged.length >= others.trials) {
      proved = false;
      break;
    }
    space.statesOf(combination, states);
    const score = others.judge(states);
    const found = { combination, missed: score.missed, marginDb: Math.min(score.marginDb, boundsDb[combination]) };
    judged.push(found);
    if (found.missed < missed || (found.missed === missed && found.marginDb > marginDb)) ({ missed, marginDb } = found);
  }
  const best = judged.filter((each) => each.missed === missed && !(each.marginDb < marginDb - equalMarginsDb)).map(({ combination }) => combination);
  return { states: nearestOf(best, space, previous), proved };
}

/** Infinite ones among them, whose difference is not a number. */
const compare = (a: number, b: number): number => (a === b ? 0 : a < b ? -1 : 1);

function allSmallest(excesses: Float64Array): number[] {
  let smallest = Infinity;
  for (let i = 0; i < excesses.length; i++) if (excesses[i] < smallest) smallest = excesses[i];
  const most = smallest * 10 ** (equalMarginsDb / 10);
  const found: number[] = [];
  for (let i = 0; i < excesses.length; i++) if (excesses[i] <= most) found.push(i);
  return found;
}

function nearestOf(combinations: readonly number[], space: CodeSpace, previous: Int32Array | null): Int32Array {
  const states = new Int32Array(space.tunables.length);
  const best = new Int32Array(space.tunables.length);
  let least = Infinity;
  let smallest = Infinity;
  for (const combination of combinations) {
    space.statesOf(combination, states);
    const distance = previous === null ? 0 : space.distance(states, previous);
    if (distance > least || (distance === least && combination > smallest)) continue;
    least = distance;
    smallest = combination;
    best.set(states);
  }
  return best;
}
