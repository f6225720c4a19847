import type { Span } from '../base/span';
import type { Description } from '../description/description';
import { nameAt, namesIn, type NamedThing } from '../description/names';

/** The name that stands at an offset; a goal has none. */
export function nameAtOffset({ syntax }: Description, offset: number): NamedThing | null {
  return nameAt(namesIn(syntax).filter(({ kind }) => kind !== 'goal'), offset);
}

/** Where the name at an offset is defined; null where there is none, or none of that name. */
export function definitionAt(description: Description, offset: number): Span | null {
  return nameAtOffset(description, offset)?.definition ?? null;
}

/** Every place of the name at an offset, its definition among them, in the order of the text. */
export function referencesAt(description: Description, offset: number): Span[] {
  return placesOf(nameAtOffset(description, offset));
}

export function placesOf(thing: NamedThing | null): Span[] {
  if (!thing) return [];
  return [...(thing.definition ? [thing.definition] : []), ...thing.references].sort((a, b) => a.start - b.start);
}
