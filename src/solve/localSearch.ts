import { mersenne } from 'pure-rand/generator/mersenne';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import type { LadderShape } from './ladderShape';
import { localNodes, localStarts } from './limits';
import type { Trial } from './trial';

/**
 * Good ladders of a shape that is too large to be searched exactly: from some starts, always the same, one slot after the other
 * takes its best item until nothing gets better. `offer` gets every end that was reached; false ends it. Not a proof of anything.
 */
export function localSearch(shape: LadderShape, trial: Trial, offer: (choice: Int32Array) => boolean): number {
  const { slots } = shape;
  const generator = mersenne(1);
  let nodes = 0;
  for (let start = 0; start < localStarts && nodes < localNodes; start++) {
    const choice = Int32Array.from(slots, ({ count }) => uniformInt(generator, 0, count - 1));
    let best = trial.excess(choice, Infinity);
    for (let changed = true; changed && nodes < localNodes;) {
      changed = false;
      for (let s = 0; s < slots.length; s++) {
        const before = choice[s];
        let kept = before;
        for (let item = 0; item < slots[s].count; item++) {
          if (item === before) continue;
          choice[s] = item;
          const excess = trial.excess(choice, best);
          if (excess < best) {
            best = excess;
            kept = item;
          }
        }
        nodes += slots[s].count * slots.length;
        choice[s] = kept;
        changed ||= kept !== before;
      }
    }
    if (!offer(choice)) break;
  }
  return nodes;
}
