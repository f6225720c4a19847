import { applyEdits, type TextEdit } from '../base/diagnostic';
import type { Description } from '../description/description';
import { namesIn, type NamedThing } from '../description/names';
import { readDescription } from '../description/readDescription';
import { isSeriesName } from '../quantity/preferredSeries';
import { nameAtOffset, placesOf } from './definition';

/**
 * Gives the name at an offset another one, wherever it stands. Refused, with the reason, where the new name is taken or
 * does not read as the same name in every place.
 */
export function renameEdits(description: Description, offset: number, newName: string): TextEdit[] | { refusal: string } {
  const thing = nameAtOffset(description, offset);
  if (!thing) return { refusal: 'There is no name here that could be changed.' };
  const name = newName.trim();
  if (name === '') return { refusal: 'A name has at least one letter.' };
  if (name === thing.name) return [];
  if (!/^[\p{L}_][\p{L}\d _.-]*$/u.test(name)) return { refusal: `«${name}» cannot be a name: names have letters, digits, - and _, and begin with a letter.` };
  if (thing.kind === 'family' && isSeriesName(name)) return { refusal: `${name} is a preferred series and cannot name a family.` };
  const taken = namesIn(description.syntax).some((other) => other.kind === thing.kind && other.name === name && other.definition !== null);
  if (taken) return { refusal: `There is another ${word(thing)} called «${name}».` };
  const edits = placesOf(thing).map((span) => ({ span, text: name }));
  return objection(description, thing, name, edits) ?? edits;
}

/** Reads the text as it would be: what the language says against the name is said there, once. */
function objection({ syntax }: Description, thing: NamedThing, name: string, edits: readonly TextEdit[]): { refusal: string } | null {
  // Expressions need not be worked out to see whether a name will do.
  const readAgain = (text: string) => readDescription(text, { expressions: false });
  const before = readAgain(syntax.text).diagnostics.filter(({ severity }) => severity === 'error');
  const renamed = readAgain(applyEdits(syntax.text, edits));
  const after = renamed.diagnostics.filter(({ severity }) => severity === 'error');
  if (after.length > before.length) {
    const known = new Set(before.map(({ message }) => message));
    return { refusal: (after.find(({ message }) => !known.has(message)) ?? after[0]).message };
  }
  const same = namesIn(renamed.syntax).find((other) => other.kind === thing.kind && other.name === name);
  return placesOf(same ?? null).length === edits.length ? null : { refusal: `«${name}» would not be read as the name of this ${word(thing)} everywhere.` };
}

const word = ({ kind }: NamedThing): string => (kind === 'let' ? 'named value' : kind);
