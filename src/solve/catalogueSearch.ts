import { askedPoints, outerPoints, rejectingPoints, trialOrder } from './decisivePoints';
import { indexOf, reducedShape, type LadderShape, type Slot } from './ladderShape';
import { nodesOfEvaluation, prefixesAtMost, prefixesAtOnce, searchNodes, suffixesAtMost, thinnedTo, tryAllUpTo } from './limits';
import { localSearch } from './localSearch';
import { middleSearch, type MiddleSearch } from './middleSearch';
import { topList, type Found, type TopList } from './topList';
import { trialOf, type Trial } from './trial';
import type { TrialPoints } from './trialPoints';

/** Ladders of the same rank but for their excess: as many parts, as few conditions missed by their kinds. */
export interface SearchTask {
  readonly shapes: readonly LadderShape[];
  readonly points: TrialPoints;
  /** How many are wanted. */
  readonly size: number;
  /** Conditions that a ladder misses (at least `leastMissed`); null where it must not be built at all (a part is out). */
  readonly missedOf: (shape: number, choice: Int32Array) => number | null;
  readonly leastMissed: number;
  /** True where `missedOf` evaluates the ladder. */
  readonly missedIsSlow: boolean;
  /** Called with the share done. */
  readonly onProgress?: (share: number, best: Found | null) => void;
  /** Nodes that may still be looked at. */
  readonly nodeLimit?: number;
  /** Up to so many ladders all are tried. */
  readonly tryAllUpTo?: number;
}

export interface SearchOutcome {
  /** Best first. */
  readonly found: readonly Found[];
  /** True where nothing that was not looked at can be better than what was found. */
  readonly proved: boolean;
  readonly nodes: number;
}

/** All ladders one by one, leaving each as soon as it is worse than what is wanted. */
export function tryAll(task: SearchTask, trials: readonly Trial[]): SearchOutcome {
  const state = stateOf(task, topList(task.size, task.leastMissed));
  for (let shape = 0; shape < task.shapes.length; shape++) {
    const { slots } = task.shapes[shape];
    const choice = new Int32Array(slots.length);
    do {
      state.nodes++;
      if (!state.consider(shape, trials[shape], choice, task.shapes[shape])) return { found: state.list.found, proved: false, nodes: state.nodes };
    } while (next(choice, slots));
  }
  return { found: state.list.found, proved: true, nodes: state.nodes };
}

/**
 * The best ladders of all shapes, exactly: the same as trying all, but for how long it takes. First a thinned catalogue gives
 * a threshold that the answer is known to meet; with it the whole one is searched (`middleSearch`). Ties go by the order of
 * shapes and items. Past the limit of nodes what was found is given as not proved.
 */
export function catalogueSearch(task: SearchTask): SearchOutcome {
  const { shapes, points } = task;
  const total = shapes.reduce((sum, { size }) => sum + size, 0);
  const plainOrder = Int32Array.from({ length: points.count }, (_, k) => k);
  const outer = outerPoints(points);
  const firstTrials = shapes.map((shape) => trialOf(shape, points, trialOrder(points, outer, [])));
  if (total <= Math.max(task.tryAllUpTo ?? tryAllUpTo, task.size)) return tryAll(task, firstTrials);
  if (outer.length === 0 || !shapes.every((shape) => canBeSearched(shape))) return searchLocally(task, firstTrials);
  const thinned = shapes.map((shape) => {
    const keep = shape.slots.map(({ group, count }) => thin(group, count, thinnedTo[Math.min(shape.slots.length, thinnedTo.length - 1)]));
    return { keep, shape: reducedShape(shape, keep, points.count) };
  });
  const cap = 1e3 * askedPoints(points).reduce((most, k) => Math.max(most, points.reflectionWeight[k], points.gainFloor[k]), 0);
  let nodes = 0;

  // Coarse: the items of the thinned shapes stand for those of the whole ones.
  const coarse = thinned.map(({ shape, keep }, s) => ({ ...pieceOf(shape, middleOf(shape), points, outer), whole: s, keep }));
  let coarseList = topList(task.size, task.leastMissed);
  for (let most = cap * 1e-11; ; most = most > cap ? Infinity : most * 2) {
    coarseList = topList(task.size, task.leastMissed, most);
    const state = stateOf(task, coarseList, nodes);
    const complete = coarse.every((piece) => runPiece(piece, state, firstTrials[piece.whole], shapes[piece.whole]));
    nodes = state.nodes;
    if (isFull(coarseList, task) || most === Infinity || !complete) break;
  }
  const near = nearMisses(task, firstTrials, coarseList.found);
  const threshold = isFull(coarseList, task) ? coarseList.most : cap;
  const decisive = near.length > 0 ? rejectingPoints(points, near, threshold) : outer;
  const order = near.length > 0 ? trialOrder(points, decisive, near) : plainOrder;
  const trials = shapes.map((shape) => trialOf(shape, points, order));

  for (let most = threshold; ; most = most > cap ? Infinity : most * 4) {
    const list = topList(task.size, task.leastMissed, most);
    const state = stateOf(task, list, nodes);
    let complete = true;
    let done = 0;
    for (let s = 0; s < shapes.length && complete; s++) {
      for (const { shape, keep, share } of pieces(shapes[s], points.count)) {
        const piece = { ...pieceOf(shape, middleOf(shape), points, decisive), whole: s, keep };
        complete &&= runPiece(piece, state, trials[s], shapes[s]);
        done += share * (shapes[s].size / total);
        task.onProgress?.(done, list.found[0] ?? null);
        if (!complete) break;
      }
    }
    nodes = state.nodes;
    if (!complete) return { found: list.found, proved: false, nodes };
    if (isFull(list, task) || most === Infinity) return { found: list.found, proved: true, nodes };
  }
}

/** Whether the tables of a shape, cut by kinds on the load's side, have a size that one can hold. */
function canBeSearched(shape: LadderShape): boolean {
  const middle = middleOf(shape);
  if (middle < 0) return shape.size <= prefixesAtMost;
  const largestKind = ({ group }: Slot): number => Math.max(...[...new Set(group)].map((each) => group.filter((own) => own === each).length));
  const prefixes = shape.slots.slice(0, middle).reduce((product, slot) => product * largestKind(slot), 1);
  const suffixes = shape.slots.slice(middle + 1).reduce((product, { count }) => product * count, 1);
  return prefixes <= prefixesAtMost && suffixes <= suffixesAtMost;
}

/** The best found, without a proof. */
function searchLocally(task: SearchTask, trials: readonly Trial[]): SearchOutcome {
  const list = topList(task.size, task.leastMissed);
  const state = stateOf(task, list);
  let goesOn = true;
  task.shapes.forEach((shape, s) => {
    if (!goesOn) return;
    state.nodes += localSearch(shape, trials[s], (choice) => (goesOn = known(list, shape, s, choice) || state.consider(s, trials[s], choice, shape)));
    goesOn &&= state.nodes < state.limit;
    task.onProgress?.((s + 1) / task.shapes.length, list.found[0] ?? null);
  });
  return { found: list.found, proved: false, nodes: state.nodes };
}

/** Several starts may end at one ladder. */
const known = (list: TopList, whole: LadderShape, shape: number, choice: Int32Array): boolean => {
  const index = indexOf(whole, choice);
  return list.found.some((each) => each.shape === shape && each.index === index);
};

/** Full with ladders that miss no more than the least: then none outside of the threshold can enter. */
const isFull = (list: TopList, task: SearchTask): boolean => list.full && list.found[list.found.length - 1].missed <= task.leastMissed;

interface State {
  readonly list: TopList;
  readonly limit: number;
  nodes: number;
  /** Tries a ladder and offers it; false where the limit of nodes is reached. */
  consider(shape: number, trial: Trial, choice: Int32Array, whole: LadderShape): boolean;
}

function stateOf(task: SearchTask, list: TopList, nodes = 0): State {
  const limit = task.nodeLimit ?? searchNodes;
  const state: State = {
    list, limit, nodes,
    consider(shape, trial, choice, whole) {
      const excess = trial.excess(choice, list.most);
      if (excess <= list.most) {
        const missed = task.missedOf(shape, choice);
        if (task.missedIsSlow) state.nodes += nodesOfEvaluation;
        if (missed !== null) list.offer({ shape, index: indexOf(whole, choice), choice: choice.slice(), excess, worstGain: trial.worstGain(choice), missed });
      }
      return state.nodes < limit;
    },
  };
  return state;
}

interface Piece {
  /** Null where there is no slot to cut at: then all are tried. */
  readonly search: MiddleSearch | null;
  /** The shape of the task that it is a part of, and the items of that shape which its own stand for. */
  readonly whole: number;
  readonly keep: readonly Int32Array[];
}

const pieceOf = (shape: LadderShape, middle: number, points: TrialPoints, decisive: Int32Array): Pick<Piece, 'search'> => ({
  search: middle < 0 ? null : middleSearch(shape, middle, points, decisive),
});

/** False where the limit of nodes is reached. */
function runPiece({ search, whole, keep }: Piece, state: State, trial: Trial, shape: LadderShape): boolean {
  const choice = new Int32Array(keep.length);
  let seen = search?.visited() ?? 0;
  let complete = true;
  const count = (): boolean => {
    const now = search?.visited() ?? 0;
    state.nodes += now - seen;
    seen = now;
    return state.nodes < state.limit;
  };
  const consider = (own: Int32Array): boolean => {
    for (let s = 0; s < keep.length; s++) choice[s] = keep[s][own[s]];
    complete = state.consider(whole, trial, choice, shape);
    return complete;
  };
  if (search) {
    search.run(() => {
      complete &&= count();
      // No ladder is below a negative excess: that ends it.
      return complete ? state.list.most : -1;
    }, consider);
    count();
    return complete;
  }
  const own = new Int32Array(keep.length);
  const sizes = keep.map(({ length }) => ({ count: length }));
  do {
    state.nodes++;
    if (!consider(own)) return false;
  } while (next(own, sizes));
  return true;
}

/** Every so-manyth of each group, the ends included. */
function thin(group: Uint8Array, count: number, wanted: number): Int32Array {
  const kept: number[] = [];
  for (const each of new Set(group)) {
    const own = Array.from({ length: count }, (_, i) => i).filter((i) => group[i] === each);
    const size = Math.min(wanted, own.length);
    for (let i = 0; i < size; i++) kept.push(own[size === 1 ? 0 : Math.round((i * (own.length - 1)) / (size - 1))]);
  }
  return Int32Array.from(kept.sort((a, b) => a - b));
}

/** The slot at which to cut: few on both sides, and a side of the source costs more than one of the load. */
function middleOf(shape: LadderShape): number {
  const counts = shape.slots.map(({ count }) => count);
  const product = (from: number, to: number): number => counts.slice(from, to).reduce((all, count) => all * count, 1);
  let best = -1;
  let least = Infinity;
  shape.slots.forEach(({ orientation, group }, m) => {
    if (orientation === 'through') return;
    const groups = new Set(group).size;
    const cost = product(0, m) * (1 + groups) + 16 * groups * product(m + 1, counts.length);
    if (cost < least) {
      least = cost;
      best = m;
    }
  });
  return best;
}

/** A shape cut by kinds on the load's side, until its tables are not too large. */
function* pieces(shape: LadderShape, points: number): Generator<{ shape: LadderShape; keep: readonly Int32Array[]; share: number }> {
  const all = shape.slots.map(({ count }) => Int32Array.from({ length: count }, (_, i) => i));
  yield* cutByKind(all, 0);
  function* cutByKind(keep: readonly Int32Array[], slot: number): Generator<{ shape: LadderShape; keep: readonly Int32Array[]; share: number }> {
    const middle = middleOf(shape);
    const prefixes = keep.slice(0, middle).reduce((product, items) => product * items.length, 1);
    if (prefixes <= prefixesAtOnce || slot >= middle) {
      const whole = keep.every((items, s) => items.length === shape.slots[s].count);
      const reduced = whole ? shape : reducedShape(shape, keep, points);
      yield { shape: reduced, keep, share: reduced.size / shape.size };
      return;
    }
    for (const group of new Set(shape.slots[slot].group)) {
      const own = keep[slot].filter((item) => shape.slots[slot].group[item] === group);
      yield* cutByKind(keep.map((items, s) => (s === slot ? own : items)), slot + 1);
    }
  }
}

/** Excess by point of ladders around the best of the thinned catalogue: each item a few places up and down. */
function nearMisses(task: SearchTask, trials: readonly Trial[], found: readonly Found[]): Float64Array[] {
  const excess: Float64Array[] = [];
  for (const { shape, choice } of found) {
    const { slots } = task.shapes[shape];
    for (let s = 0; s < slots.length; s++) {
      for (const step of [-3, -2, -1, 1, 2, 3]) {
        const moved = choice.slice();
        moved[s] += step;
        if (moved[s] < 0 || moved[s] >= slots[s].count) continue;
        const into = new Float64Array(task.points.count);
        trials[shape].excessByPoint(moved, into);
        excess.push(into);
      }
    }
  }
  return excess;
}

/** The next choice, the last slot fastest; false after the last. */
function next(choice: Int32Array, slots: readonly { count: number }[]): boolean {
  for (let s = slots.length - 1; s >= 0; s--) {
    if (++choice[s] < slots[s].count) return true;
    choice[s] = 0;
  }
  return false;
}
