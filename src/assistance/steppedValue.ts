import type { TextEdit } from '../base/diagnostic';
import { replaceInScalar } from '../description/edits';
import { plainPhrase } from '../description/phrase/phrase';
import { kindOfDesignator } from '../description/phrase/readElementPhrase';
import { readPartPhrase } from '../description/phrase/readPart';
import type { PartSyntax } from '../description/syntax';
import { nextInSeries } from '../quantity/preferredSeries';
import { writeQuantity } from '../quantity/printQuantity';
import type { Assessment } from './assess';

export type ValueEdit = TextEdit[] | { readonly refusal: string };

interface KnownPart {
  readonly part: PartSyntax;
  readonly value: Extract<PartSyntax['value'], { form: 'known' }>;
}

/** The single part of a ladder's element whose value stands there as a number; null for all others. */
export function knownPart({ description }: Pick<Assessment, 'description'>, elementId: string): KnownPart | null {
  const body = description.syntax.ladder?.elements.find((entry) => entry.name.value === elementId)?.body;
  const part = body?.form === 'branch' && body.branch.form === 'part' ? body.branch : null;
  return part?.value.form === 'known' ? { part, value: part.value } : null;
}

/** Values that a part may take: those of the family after `from`, else null for the series E24. */
export function familyValues({ model }: Pick<Assessment, 'model'>, { part, value }: KnownPart): readonly number[] | null {
  const family = part.from && model.problem?.families.find(({ name }) => name === part.from!.value);
  if (!family) return null;
  const kind = value.unit === 'Ω' ? 'resistor' : value.unit === 'H' ? 'inductor' : 'capacitor';
  const values = family.members.filter((member) => member.part.kind === kind).map((member) => member.part.value);
  return [...new Set(values)].sort((a, b) => a - b);
}

/** Puts the next higher or lower value of the part's family, else of E24, in the value's place; all else stays. */
export function steppedValue(assessment: Assessment, elementId: string, direction: 'up' | 'down'): ValueEdit {
  const known = knownPart(assessment, elementId);
  if (!known) return { refusal: `${elementId} has no single value that could be stepped.` };
  const { value } = known.value;
  const values = familyValues(assessment, known);
  const next = values === null ? nextInSeries(value, 'E24', direction) : neighbour(values, value, direction);
  if (next === null) return { refusal: `${known.part.from?.value ?? 'E24'} has no ${direction === 'up' ? 'higher' : 'lower'} value.` };
  return replaceInScalar(assessment.description.syntax.text, known.value.span, writeQuantity(next, known.value.unit));
}

const roundings = 1e-9;

function neighbour(values: readonly number[], value: number, direction: 'up' | 'down'): number | null {
  return (direction === 'up' ? values.find((other) => other > value * (1 + roundings)) : values.findLast((other) => other < value * (1 - roundings))) ?? null;
}

/** Puts what a person typed (`3.3 pF`, `3p3`) in the value's place; or says why it is no value for this part. */
export function setValue(assessment: Assessment, elementId: string, text: string): ValueEdit {
  const known = knownPart(assessment, elementId);
  if (!known) return { refusal: `${elementId} has no single value that could be set.` };
  const kind = known.part.kind ?? kindOfDesignator(elementId);
  const complaints: string[] = [];
  const typed = readPartPhrase(plainPhrase(text.trim()), kind, { report: ({ message }) => complaints.push(message), lets: new Map(), expressions: false });
  if (complaints.length > 0 || typed.value.form !== 'known') return { refusal: complaints[0] ?? `«${text}» is no value.` };
  const { start, end } = typed.value.span;
  if (text.trim().slice(end) !== '' || start !== 0) return { refusal: 'Type the value alone; its figures stay as they stand in the description.' };
  return replaceInScalar(assessment.description.syntax.text, known.value.span, writeQuantity(typed.value.value, typed.value.unit));
}
