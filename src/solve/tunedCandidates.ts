import type { Element } from '../network/element';
import type { Problem } from '../study/problem';
import { channelProblems, type ChannelProblem } from '../study/tuning/channelProblems';
import { codeMeter, type CodeMeter } from '../study/tuning/codeMeter';
import { codeSpace, type CodeSpace } from '../study/tuning/codeSpace';
import { isInStock, variantsOf, type Candidate, type CatalogueTask, type Variant } from './catalogueCandidates';
import { fillForm, itemsAt } from './fillForm';
import { positionsOf } from './forms';
import { distinct } from './freeCandidates';
import { tunedLocalPoints, tunedPointsAtMost, tunedStarts } from './limits';
import type { Item } from './positions';
import { refineTuned } from './refineTuned';
import { solutionOf, withLadder } from './solutionOf';
import { topList, type TopList } from './topList';

/** How far a ladder is from its worst limit over all channels, each with its own best codes, as a ratio of powers. */
export interface TunedMeter {
  /** Null where it is above `most`: then no more was looked at. */
  excess(items: readonly Item[], most: number): number | null;
  /** False where goals are asked that |Γ| and gain do not decide. */
  readonly decides: boolean;
  /** Evaluations of one point so far. */
  readonly points: () => number;
  /** The same for one ladder with all codes at one channel, about. */
  readonly pointsOfChannel: number;
}

/**
 * The best ladders for each number of parts where codes set some of the given parts: every ladder is judged at every channel with
 * that channel's best codes. All of them are tried, each channel and ladder only as far as it can still be among the best; past
 * `tunedPointsAtMost`, with values that may be anything, or with goals that |Γ| and gain do not decide, nothing is proved.
 */
export function tunedCandidates(problem: Problem, task: CatalogueTask): Candidate[] {
  const counts = [...new Set(task.forms.map(({ parts }) => parts))].sort((a, b) => a - b);
  const space = codeSpace(problem);
  const candidates: Candidate[] = [];
  counts.forEach((parts, step) => {
    const variants = task.forms.flatMap((form, order) => (form.parts === parts && positionsOf(form).every(({ items }) => items.length > 0) ? variantsOf(form, order, task.conditions) : []));
    const found: Candidate[] = [];
    for (const missed of [...new Set(variants.map((each) => each.missed))].sort((a, b) => a - b)) {
      const own = variants.filter((each) => each.missed === missed);
      found.push(...searchVariants(problem, space, own, missed, task, (share, best) => task.onProgress?.((step + share) / counts.length, best)));
      if (found.length >= task.size) break;
    }
    found.sort((a, b) => a.missed - b.missed || a.excess - b.excess);
    candidates.push(...found.slice(0, task.size));
  });
  return candidates;
}

function searchVariants(
  problem: Problem, space: CodeSpace, variants: readonly Variant[], missed: number, task: CatalogueTask, onProgress: (share: number, best: number | null) => void,
): Candidate[] {
  const meters = variants.map(({ form }) => tunedMeter(problem, space, form));
  const isFree = variants.some(({ form }) => positionsOf(form).some(({ items }) => items.some(({ range }) => range !== null)));
  const decides = meters.every((meter) => meter.decides) && !task.conditions.needValues;
  const ladders = variants.map(({ keep }) => keep.reduce((product, { length }) => product * length, 1));
  const work = variants.reduce((sum, _, v) => sum + ladders[v] * meters[v].pointsOfChannel, 0);
  // What a whole evaluation has to decide about is asked of more ladders than are wanted.
  const list = topList(decides ? task.size : 3 * task.size, missed);
  let done = 0;
  const offer = (v: number, index: number, choice: Int32Array): void => {
    const { form, keep } = variants[v];
    const items = itemsAt(form, choice.map((item, slot) => keep[slot][item]));
    if (!isInStock(items)) return;
    const excess = meters[v].excess(items, list.most);
    if (excess !== null) list.offer({ shape: v, index, choice: choice.slice(), excess, worstGain: 0, missed });
    if (++done % 64 === 0) onProgress(Math.min(1, done / ladders.reduce((sum, count) => sum + count, 0)), list.found[0]?.excess ?? null);
  };
  const all = work <= tunedPointsAtMost;
  variants.forEach(({ keep }, v) => (all ? tryEach(keep, (index, choice) => offer(v, index, choice)) : goOneByOne(keep, v, list, (index, choice) => offer(v, index, choice), meters[v])));
  const nodes = meters.reduce((sum, meter) => sum + meter.points(), 0);
  const found = list.found.map(({ shape, choice, excess }): Candidate => {
    const { form, order, keep } = variants[shape];
    const chosen = choice.map((item, s) => keep[s][item]);
    const items = itemsAt(form, chosen);
    const candidate: Candidate = { form, items, parts: form.parts, order: [order, ...chosen], excess, missed, worstGain: 0, nodes, proved: all && decides && !isFree };
    const refined = isFree ? refineTuned(candidate, meters[shape]) : candidate;
    return decides ? refined : judgedWhole(problem, refined);
  });
  return isFree ? distinct(found.sort((a, b) => a.missed - b.missed || a.excess - b.excess)) : found;
}

/** Every choice, the last slot fastest. */
function tryEach(keep: readonly Int32Array[], use: (index: number, choice: Int32Array) => void): void {
  const choice = new Int32Array(keep.length);
  const count = keep.reduce((product, { length }) => product * length, 1);
  for (let index = 0; index < count; index++) {
    let rest = index;
    for (let s = keep.length - 1; s >= 0; s--) {
      choice[s] = rest % keep[s].length;
      rest = Math.floor(rest / keep[s].length);
    }
    use(index, choice);
  }
}

/** From evenly spread starts, one slot after the other to the item that is best there, until nothing gets better. */
function goOneByOne(keep: readonly Int32Array[], v: number, list: TopList, use: (index: number, choice: Int32Array) => void, meter: TunedMeter): void {
  const until = meter.points() + tunedLocalPoints;
  const indexOf = (choice: Int32Array): number => keep.reduce((sum, { length }, s) => sum * length + choice[s], 0);
  const best = (): string => list.found.filter(({ shape }) => shape === v).map(({ index }) => index).join();
  for (let start = 0; start < tunedStarts; start++) {
    const choice = Int32Array.from(keep, ({ length }, s) => Math.floor((((start * (s + 1)) % tunedStarts) + 0.5) / tunedStarts * length));
    for (let changed = true; changed && meter.points() < until;) {
      const before = best();
      for (let s = 0; s < keep.length; s++) {
        for (let item = 0; item < keep[s].length && meter.points() < until; item++) {
          const tried = choice.slice();
          tried[s] = item;
          if (!list.found.some(({ shape, index }) => shape === v && index === indexOf(tried))) use(indexOf(tried), tried);
        }
        const top = list.found.find(({ shape }) => shape === v);
        if (top) choice.set(top.choice);
      }
      changed = best() !== before;
    }
  }
}

function judgedWhole(problem: Problem, candidate: Candidate): Candidate {
  const { solved, ladder } = fillForm(candidate.form, candidate.items);
  const { marginDb, conditionsMissed } = solutionOf(problem, solved, ladder, { proved: false, boundDb: null, nodes: 0 });
  return { ...candidate, excess: 10 ** (-marginDb / 10), missed: conditionsMissed, proved: false };
}

export function tunedMeter(problem: Problem, space: CodeSpace, form: Variant['form']): TunedMeter {
  const first = fillForm(form, positionsOf(form).map(({ items }) => items[0]));
  const own = withLadder(problem, first.ladder);
  const channels = channelProblems(own).map((channel) => channelMeter(own, space, channel, first.places));
  // The channel that ruled out the last ladder is the likeliest to rule out the next.
  const order = channels.map((_, c) => c);
  let points = 0;
  return {
    decides: channels.every(({ meter }) => meter.others.every((others) => others.length === 0)),
    points: () => points,
    pointsOfChannel: space.count * Math.max(1, ...channels.map(({ meter }) => meter.points)),
    excess(items, most) {
      const elements = items.map(({ element }) => element);
      let worst = 0;
      for (let at = 0; at < order.length; at++) {
        const channel = channels[order[at]];
        const { excess, tried } = channel.least(elements, worst);
        points += tried * channel.meter.points;
        if (excess > most) {
          order.unshift(...order.splice(at, 1));
          return null;
        }
        worst = Math.max(worst, excess);
      }
      return worst;
    },
  };
}

function channelMeter(problem: Problem, space: CodeSpace, channel: ChannelProblem, places: readonly number[]): { readonly meter: CodeMeter; least(elements: readonly Element[], enough: number): { excess: number; tried: number } } {
  const meter = codeMeter(problem, space, [channel]);
  const standing: (Element | null)[] = places.map(() => null);
  const states = new Int32Array(space.tunables.length);
  const excess = new Float64Array(1);
  let likely = 0;
  const at = (combination: number): number => {
    space.statesOf(combination, states);
    meter.measure(states, excess);
    return excess[0];
  };
  return {
    meter,
    /** The least excess over all codes; once it is no more than `enough`, others do not matter. */
    least(elements, enough) {
      elements.forEach((element, s) => {
        if (element === standing[s]) return;
        standing[s] = element;
        meter.setElement(places[s], element);
      });
      let best = at(likely);
      let tried = 1;
      for (let combination = 0; combination < space.count && best > enough; combination++, tried++) {
        const here = at(combination);
        if (here >= best) continue;
        best = here;
        likely = combination;
      }
      return { excess: best, tried };
    },
  };
}
