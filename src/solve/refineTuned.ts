import type { Element } from '../network/element';
import type { Candidate } from './catalogueCandidates';
import { gridPerDecade, tunedLeastStep } from './limits';
import { lineOfLength, partOfValue, type Item } from './positions';
import type { TunedMeter } from './tunedCandidates';

/** Values that may be anything, one after the other by ever smaller steps, until none is better: a compass search (Kolda, Lewis, Torczon, SIAM Review 45, 2003). Not proved. */
export function refineTuned(candidate: Candidate, meter: TunedMeter): Candidate {
  let { items, excess } = candidate;
  for (let step = 10 ** (0.5 / gridPerDecade) - 1; step > tunedLeastStep;) {
    let better = false;
    for (let s = 0; s < items.length; s++) {
      const { range } = items[s];
      if (range === null) continue;
      for (const factor of [1 + step, 1 / (1 + step)]) {
        const value = Math.min(Math.max(sizeOf(items[s]) * factor, range.min), range.max);
        const tried = items.map((item, i) => (i === s ? withSize(item, value) : item));
        const reached = meter.excess(tried, excess);
        if (reached === null || reached >= excess) continue;
        items = tried;
        excess = reached;
        better = true;
      }
    }
    if (!better) step /= 2;
  }
  return { ...candidate, items, excess, proved: false };
}

const sizeOf = ({ element, part }: Item): number => part?.value ?? (element.form === 'line' || element.form === 'stub' ? element.line.lengthM : 0);

function withSize(item: Item, value: number): Item {
  const { element, part } = item;
  if (part && element.form === 'branch') {
    const changed = partOfValue(part, part.kind, value);
    return { ...item, part: changed, element: { ...element, branch: { form: 'part', part: changed } } };
  }
  if (element.form !== 'line' && element.form !== 'stub') return item;
  return { ...item, element: { ...element, line: lineOfLength(element.line, value) } as Element };
}
