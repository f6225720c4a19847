import type { Element, Orientation } from '../network/element';
import type { Part, PartKind } from '../network/part';
import type { Choice, ValueRange } from '../study/unknown';
import { gridPerDecade, lengthsTried } from './limits';

/** Something that may stand in a position. */
export interface Item {
  readonly element: Element;
  readonly part: Part | null;
  readonly family: string | null;
  readonly label: string | null;
  /** Which pieces it is one of, and how many of them there are; null where that is not limited. */
  readonly stock: { readonly key: string; readonly count: number } | null;
  /** Where the value may be anything in a range: this item is one of a grid over it. */
  readonly range: ValueRange | null;
}

/** One unknown of a ladder. */
export interface Position {
  /** Null in a ladder that is found as a whole: named when its kinds are known. */
  readonly name: string | null;
  readonly orientation: Orientation;
  readonly items: readonly Item[];
  /** By item: which are of one kind and law. */
  readonly groups: readonly number[];
}

/** Everything that `choices` allow in one place: parts of catalogues one by one, of ranges a grid. */
export function positionOf(name: string | null, orientation: Orientation, choices: readonly Choice[], pair: boolean, end: 'open' | 'short' | null): Position {
  const items: Item[] = [];
  const groups: number[] = [];
  choices.forEach((choice, group) => {
    for (const item of itemsOf(name ?? '', orientation, choice, pair, end)) {
      items.push(item);
      // Measured parts follow no law that others follow.
      groups.push(item.part?.measured ? choices.length + group : group);
    }
  });
  return { name, orientation, items, groups };
}

function itemsOf(name: string, orientation: Orientation, choice: Choice, pair: boolean, end: 'open' | 'short' | null): Item[] {
  if (choice.form === 'catalogue') {
    return choice.parts.map((part, i): Item => {
      const count = choice.counts[i];
      return {
        element: branch(name, orientation, part, pair), part, family: choice.family, label: choice.labels[i],
        stock: count === null ? null : { key: `${choice.family} ${part.kind} ${part.value} ${choice.labels[i] ?? ''}`, count }, range: null,
      };
    });
  }
  const { range, template, kind } = choice;
  if (kind === 'line' || kind === 'stub') {
    return linear(range, lengthsTried).map((lengthM): Item => {
      const line = lineOfLength(template as Parameters<typeof lineOfLength>[0], lengthM);
      const element: Element = kind === 'line' ? { form: 'line', name, line } : { form: 'stub', name, end: end ?? 'open', line };
      return { element, part: null, family: null, label: null, stock: null, range };
    });
  }
  return logarithmic(range).map((value): Item => {
    const part = partOfValue(template as Part, kind, value);
    return { element: branch(name, orientation, part, pair), part, family: null, label: null, stock: null, range };
  });
}

const branch = (name: string, orientation: Orientation, part: Part, pair: boolean): Element =>
  ({ form: 'branch', name, orientation: orientation === 'shunt' ? 'shunt' : 'series', branch: { form: 'part', part }, pair });

/** The template's figures with another value. A capacitor's SRF is an inductance that goes with 1/C. */
export function partOfValue(template: Part, kind: PartKind, value: number): Part {
  return { ...template, kind, value };
}

/** Losses are stated for the whole line: they go with its length. */
export function lineOfLength(template: Extract<Element, { form: 'line' }>['line'], lengthM: number) {
  const share = template.lengthM > 0 ? lengthM / template.lengthM : 1;
  return { ...template, lengthM, conductorLossDb: template.conductorLossDb * share, dielectricLossDb: template.dielectricLossDb * share };
}

function linear({ min, max }: ValueRange, count: number): number[] {
  return max > min ? Array.from({ length: count }, (_, i) => min + ((max - min) * i) / (count - 1)) : [min];
}

function logarithmic({ min, max }: ValueRange): number[] {
  if (!(max > min)) return [min];
  const count = Math.max(3, Math.ceil(Math.log10(max / min) * gridPerDecade) + 1);
  return Array.from({ length: count }, (_, i) => min * (max / min) ** (i / (count - 1)));
}
