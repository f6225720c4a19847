import { catalogueSearch, type SearchOutcome } from './catalogueSearch';
import type { Conditions } from './conditions';
import { fillForm, itemsAt } from './fillForm';
import { isPosition, positionsOf, type Form } from './forms';
import { reducedShape, shapeOf, slotOf, type LadderShape, type Slot } from './ladderShape';
import type { Item, Position } from './positions';
import type { Ranked } from './ranking';
import type { TrialPoints } from './trialPoints';

/** A ladder that was found and how. */
export interface Candidate extends Ranked {
  readonly form: Form;
  /** What stands in each position. */
  readonly items: readonly Item[];
  readonly proved: boolean;
  readonly nodes: number;
}

export interface CatalogueTask {
  readonly forms: readonly Form[];
  readonly points: TrialPoints;
  readonly conditions: Conditions;
  /** How many are wanted for each number of parts. */
  readonly size: number;
  readonly nodeLimit: number;
  readonly onProgress?: (share: number, bestExcess: number | null) => void;
}

/** A form with fewer items: those of some kinds, which decide what conditions it misses. */
export interface Variant {
  readonly form: Form;
  readonly order: number;
  readonly keep: readonly Int32Array[];
  readonly missed: number;
}

/**
 * The best ladders for each number of parts, of all forms and kinds. Forms are searched by what they miss: only where there
 * are not enough of those that miss least are others asked.
 */
export function catalogueCandidates(task: CatalogueTask): Candidate[] {
  const { forms, points, size } = task;
  const slots = slotTable(points);
  const usable = forms.map((form) => withKnownItems(form, slots)).filter((form) => positionsOf(form).every(({ items }) => items.length > 0));
  const candidates: Candidate[] = [];
  const counts = [...new Set(usable.map(({ parts }) => parts))].sort((a, b) => a - b);
  let left = task.nodeLimit;
  counts.forEach((parts, step) => {
    const variants = usable.flatMap((form, order) => (form.parts === parts ? variantsOf(form, order, task.conditions) : []));
    const found: Candidate[] = [];
    for (const missed of [...new Set(variants.map((each) => each.missed))].sort((a, b) => a - b)) {
      const own = variants.filter((each) => each.missed === missed);
      const outcome = searchVariants(own, missed, slots, { ...task, nodeLimit: left }, (share, best) => task.onProgress?.((step + share) / counts.length, best));
      left = Math.max(0, left - outcome.nodes);
      found.push(...outcome.found.map((each): Candidate => {
        const { form, order, keep } = own[each.shape];
        const choice = each.choice.map((item, s) => keep[s][item]);
        const { excess, worstGain, missed: reached } = each;
        return { excess, worstGain, missed: reached, form, parts, items: itemsAt(form, choice), order: [order, ...choice], proved: outcome.proved, nodes: outcome.nodes };
      }));
      if (found.filter((each) => each.missed <= missed).length >= size) break;
    }
    found.sort((a, b) => a.missed - b.missed);
    candidates.push(...found.slice(0, size));
  });
  return candidates;
}

interface SlotTable {
  of(position: Position): Slot & { readonly unknown: Uint8Array };
  readonly points: TrialPoints;
}

/** Positions that are shared between forms are tabulated once. */
function slotTable(points: TrialPoints): SlotTable {
  const made = new Map<Position, Slot & { readonly unknown: Uint8Array }>();
  return {
    points,
    of(position) {
      const found = made.get(position);
      if (found) return found;
      const slot = slotOf(position.orientation, position.items.map(({ element }) => element), position.groups, points.frequencyHz);
      made.set(position, slot);
      return slot;
    },
  };
}

const reduced = new WeakMap<Position, Position>();

/** Parts that are not known at some point (a measured one beyond its file) cannot be told to hold anything: they are left out. */
function withKnownItems(form: Form, slots: SlotTable): Form {
  const steps = form.steps.map((step) => {
    if (!isPosition(step)) return step;
    const { unknown } = slots.of(step);
    if (!unknown.includes(1)) return step;
    const known = (_: unknown, i: number): boolean => unknown[i] === 0;
    const kept = reduced.get(step) ?? { ...step, items: step.items.filter(known), groups: step.groups.filter(known) };
    reduced.set(step, kept);
    return kept;
  });
  return { ...form, steps };
}

/** The form as a whole where its kinds make no difference to the conditions, else cut by them. */
export function variantsOf(form: Form, order: number, conditions: Conditions): Variant[] {
  const positions = positionsOf(form);
  const groups = positions.map(({ groups: own }) => [...new Set(own)]);
  const combinations = groups.reduce<number[][]>((all, own) => all.flatMap((each) => own.map((group) => [...each, group])), [[]]);
  const missed = combinations.map((kinds) =>
    conditions.structureMissed(fillForm(form, positions.map(({ items, groups: own }, s) => items[own.indexOf(kinds[s])])).ladder));
  if (new Set(missed).size === 1) {
    return [{ form, order, missed: missed[0], keep: positions.map(({ items }) => Int32Array.from(items, (_, i) => i)) }];
  }
  return combinations.map((kinds, c) => ({
    form, order, missed: missed[c],
    keep: positions.map(({ groups: own }, s) => Int32Array.from([...own.keys()].filter((i) => own[i] === kinds[s]))),
  }));
}

function searchVariants(
  variants: readonly Variant[], missed: number, slots: SlotTable, task: CatalogueTask, onProgress: (share: number, bestExcess: number | null) => void,
): SearchOutcome {
  const { points, conditions } = task;
  const shapes = variants.map(({ form, keep }): LadderShape => {
    const shape = shapeOf(form.steps.map((step) => (isPosition(step) ? slots.of(step) : step)), points);
    return keep.every((items, s) => items.length === shape.slots[s].count) ? shape : reducedShape(shape, keep, points.count);
  });
  const limited = variants.map(({ form, keep }) => positionsOf(form).some(({ items }, s) => keep[s].some((item) => items[item].stock !== null)));
  return catalogueSearch({
    shapes, points, size: task.size, leastMissed: missed, missedIsSlow: conditions.needValues, nodeLimit: task.nodeLimit,
    onProgress: (share, best) => onProgress(share, best?.excess ?? null),
    missedOf(s, choice) {
      if (!limited[s] && !conditions.needValues) return missed;
      const { form, keep } = variants[s];
      const items = itemsAt(form, choice.map((item, slot) => keep[slot][item]));
      if (limited[s] && !isInStock(items)) return null;
      return conditions.needValues ? missed + conditions.valuesMissed(fillForm(form, items).ladder) : missed;
    },
  });
}

/** A part that is out is not chosen again; a pair takes two. */
export function isInStock(items: readonly Item[]): boolean {
  const used = new Map<string, number>();
  for (const { stock, element } of items) {
    if (!stock) continue;
    const taken = (used.get(stock.key) ?? 0) + (element.form === 'branch' && element.pair ? 2 : 1);
    if (taken > stock.count) return false;
    used.set(stock.key, taken);
  }
  return true;
}

