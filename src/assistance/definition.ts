import { contains, type Span } from '../base/span';
import type { Description } from '../description/description';
import { namesIn, type NamedThing } from '../description/names';

/** The named thing on whose definition or use the offset lies; goals, which are named by their text, are none. */
export function nameAt({ syntax }: Description, offset: number): NamedThing | null {
  return namesIn(syntax).find(({ kind, definition, references }) =>
    kind !== 'goal' && [...(definition ? [definition] : []), ...references].some((span) => contains(span, offset))) ?? null;
}

/** Where the name at the offset is defined; null where there is no name or no definition. */
export const definitionAt = (description: Description, offset: number): Span | null => nameAt(description, offset)?.definition ?? null;

/** Every place of the name at the offset, its definition first. */
export function referencesAt(description: Description, offset: number): Span[] {
  const found = nameAt(description, offset);
  return found ? [...(found.definition ? [found.definition] : []), ...found.references] : [];
}
