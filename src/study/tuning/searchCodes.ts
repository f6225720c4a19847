import { codeSearchRounds, codeSearchStarts } from '../limits';
import type { ChannelScore } from './channelJudgement';
import { equalMarginsDb, type Choice } from './chooseCodes';
import type { CodeSpace } from './codeSpace';

/** A fraction whose multiples fill 0 … 1 evenly. */
const golden = (Math.sqrt(5) - 1) / 2;

/**
 * Good codes where there are too many combinations to try all: from several starts, the codes of the channel before first,
 * each tunable in turn takes its best code while the others stand, until none changes or `trials` are used up. Never proved.
 * Equal ones as in `chooseCodes`, among those that were met.
 */
export function searchCodes(score: (states: Int32Array) => ChannelScore, space: CodeSpace, previous: Int32Array | null, trials: number): Choice {
  const sizes = space.tunables.map(({ states }) => states.length);
  const known = new Map<string, ChannelScore>();
  let left = trials;
  const scoreAt = (states: Int32Array): ChannelScore => {
    const key = states.join(' ');
    const found = known.get(key);
    if (found) return found;
    left--;
    const made = score(states);
    known.set(key, made);
    return made;
  };
  let best = startAt(0, sizes, previous);
  let bestScore = scoreAt(best);
  const take = (states: Int32Array): void => {
    const found = scoreAt(states);
    if (!isBetter(found, states, bestScore, best, space, previous)) return;
    best = states.slice();
    bestScore = found;
  };
  for (let start = 0; start < codeSearchStarts && left > 0; start++) {
    const current = startAt(start, sizes, previous);
    for (let round = 0; round < codeSearchRounds && left > 0; round++) {
      let moved = false;
      for (let t = 0; t < sizes.length && left > 0; t++) {
        const before = current[t];
        let here = before;
        let hereScore = scoreAt(current);
        for (let state = 0; state < sizes[t] && left > 0; state++) {
          current[t] = state;
          const found = scoreAt(current);
          if (!leads(found, hereScore)) continue;
          here = state;
          hereScore = found;
        }
        current[t] = here;
        take(current);
        moved ||= here !== before;
      }
      if (!moved) break;
    }
  }
  return { states: best, proved: false };
}

/** The codes of the channel before, the first, the last, then scattered ones. */
function startAt(start: number, sizes: readonly number[], previous: Int32Array | null): Int32Array {
  if (start === 0 && previous !== null) return previous.slice();
  if (start <= 1) return new Int32Array(sizes.length);
  return Int32Array.from(sizes, (size, t) => (start === 2 ? size - 1 : Math.floor(size * (((start - 2) * golden + t * golden * golden) % 1))));
}

const leads = (a: ChannelScore, b: ChannelScore): boolean =>
  a.missed < b.missed || (a.missed === b.missed && a.marginDb > b.marginDb + equalMarginsDb);

function isBetter(a: ChannelScore, aStates: Int32Array, b: ChannelScore, bStates: Int32Array, space: CodeSpace, previous: Int32Array | null): boolean {
  if (leads(a, b)) return true;
  if (leads(b, a)) return false;
  const nearer = previous === null ? 0 : space.distance(aStates, previous) - space.distance(bStates, previous);
  return nearer < 0 || (nearer === 0 && space.combinationOf(aStates) < space.combinationOf(bStates));
}
