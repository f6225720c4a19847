import type { Element } from '../network/element';
import { isPosition, positionsOf, type Form } from './forms';
import type { Item } from './positions';
import type { SolvedElement } from './solution';

/** A ladder of a form with one item in each position. */
export interface FilledForm {
  /** Load first. */
  readonly ladder: readonly Element[];
  /** The unknown ones, from the load on. */
  readonly solved: readonly SolvedElement[];
  /** Where each position stands in the ladder. */
  readonly places: readonly number[];
}

/** `items` by position, from the load on. Positions without a name get one by their kind, counted from the load. */
export function fillForm(form: Form, items: readonly Item[]): FilledForm {
  const counts = new Map<string, number>();
  const ladder: Element[] = [];
  const places: number[] = [];
  const filled: SolvedElement[] = [];
  for (const step of form.steps) {
    if (!isPosition(step)) {
      ladder.push(...step);
      continue;
    }
    const item = items[filled.length];
    const letter = item.part?.kind === 'capacitor' ? 'C' : item.part?.kind === 'resistor' ? 'R' : 'L';
    const number = (counts.get(letter) ?? 0) + 1;
    counts.set(letter, number);
    const name = step.name ?? `${letter}${number}`;
    const element: Element = { ...item.element, name };
    places.push(ladder.length);
    ladder.push(element);
    filled.push({ name, orientation: step.orientation, element, part: item.part, family: item.family, label: item.label });
  }
  return { ladder, places, solved: form.unknowns.map((each) => (typeof each === 'number' ? filled[each] : each)) };
}

/** The items that a choice of numbers means. */
export const itemsAt = (form: Form, choice: ArrayLike<number>): Item[] => positionsOf(form).map(({ items }, s) => items[choice[s]]);
