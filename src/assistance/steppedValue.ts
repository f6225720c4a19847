import type { TextEdit } from '../base/diagnostic';
import { replaceInScalar, setElementPhrase, setElementValue } from '../description/edits';
import { kindOfDesignator } from '../description/phrase/readElementPhrase';
import { quantityOfKind } from '../description/phrase/readFigures';
import type { QuantityKind } from '../description/phrase/readQuantity';
import type { ElementSyntax, LineSyntax, PartSyntax, SolveSyntax } from '../description/syntax';
import type { PartKind } from '../network/part';
import { nextInSeries } from '../quantity/preferredSeries';
import type { FamilyMember } from '../study/problem';
import type { Assessment } from './assess';
import { isSameValue, membersOf, nextMember, unitOfKind, writeValue } from './familyMembers';
import { readTypedValue } from './typedValue';

export type ValueEdit = TextEdit[] | { refusal: string };

const kindOfUnit = { Ω: 'resistor', H: 'inductor', F: 'capacitor' } as const;
const kindOfQuantity = { resistance: 'resistor', inductance: 'inductor', capacitance: 'capacitor' } as const;

const refuse = (refusal: string) => ({ refusal });

function elementNamed({ description }: Assessment, elementId: string): ElementSyntax | null {
  return description.syntax.ladder?.elements.find(({ name }) => name.value === elementId) ?? null;
}

interface KnownPart {
  readonly part: PartSyntax;
  readonly value: Extract<PartSyntax['value'], { form: 'known' }>;
}

/** The single part of a ladder's element whose value stands there as a number; null for all others. */
export function knownPart(assessment: Assessment, elementId: string): KnownPart | null {
  const body = elementNamed(assessment, elementId)?.body;
  const part = body?.form === 'branch' && body.branch.form === 'part' ? body.branch : null;
  return part?.value.form === 'known' ? { part, value: part.value } : null;
}

/** Values that a part may take: those of the family after `from`; null where it names none, or one that is not known. */
export function familyValues({ model }: Assessment, { part, value }: KnownPart): readonly number[] | null {
  const family = part.from && model.problem?.families.find(({ name }) => name === part.from?.value);
  return family ? membersOf(family, kindOfUnit[value.unit]).map((member) => member.part.value) : null;
}

/** Puts the next value of its family, or of E24 where it names none, in the place of an element's. The rest of the phrase stays. */
export function steppedValue(assessment: Assessment, elementId: string, direction: 'up' | 'down'): ValueEdit {
  const element = elementNamed(assessment, elementId);
  if (!element) return refuse(`There is no element ${elementId} in the ladder.`);
  const { body } = element;
  if (body.form !== 'branch') return refuse(whyNoStep(element));
  if (body.branch.form !== 'part') return refuse(`${elementId} is a branch of several parts; change the one that is meant in the text.`);
  const part = body.branch;
  if (part.value.form !== 'known') return refuse(whyNoValue(elementId, part));
  if (isExpression(assessment, part)) return refuse(`${elementId} is worked out by an expression; change a value that stands in it.`);
  const kind = kindOfUnit[part.value.unit];
  const edges = direction === 'up' ? 'largest' : 'smallest';
  if (!part.from) {
    const next = nextInSeries(part.value.value, 'E24', direction);
    return next === null ? refuse(`${elementId} has no further value.`) : editPart(assessment, part, writeValue(kind, next), null);
  }
  const name = part.from.value;
  const family = assessment.model.problem?.families.find((candidate) => candidate.name === name);
  if (!family) return refuse(`The values of «${name}» are not known, so there is no next one.`);
  const member = nextMember(family, kind, part.value.value, direction);
  if (!member) return refuse(`«${name}» has no ${direction === 'up' ? 'larger' : 'smaller'} value: this is its ${edges}.`);
  return editPart(assessment, part, writeValue(kind, member.part.value), member);
}

const isExpression = ({ description }: Assessment, { value }: PartSyntax): boolean => description.syntax.text[value.span.start] === '=';

/** The new value, and with `part NAME` the new part's designation: both in one edit, since both may lie in one quoted scalar. */
function editPart({ description }: Assessment, part: PartSyntax, value: string, member: FamilyMember | null): TextEdit[] {
  const { text } = description.syntax;
  if (!part.label) return replaceInScalar(text, part.value.span, value);
  const between = text.slice(part.value.span.end, part.label.span.start);
  const rest = member?.label ? between + member.label : between.replace(/\s*part\s*$/, '');
  return replaceInScalar(text, { start: part.value.span.start, end: part.label.span.end }, value + rest);
}

function whyNoStep({ name, body }: ElementSyntax): string {
  switch (body.form) {
    case 'not fitted': return `${name.value} is not fitted; write a value first.`;
    case 'bridge': return `${name.value} is a bridge of 0 Ω; write a value first.`;
    case 'faulty': return `The value of ${name.value} cannot be read.`;
    case 'line': return `Lengths have no series of values; write the length of ${name.value}.`;
    case 'transformer': return `${name.value} has turns and no value that could be stepped.`;
    default: return `${name.value} is a file and has no value that could be stepped.`;
  }
}

function whyNoValue(name: string, { value }: PartSyntax): string {
  switch (value.form) {
    case 'solve': return `${name} has no value yet.`;
    case 'tunable': return `${name} is set by the codes of «${value.name.value}».`;
    case 'coil': return `${name} is a winding: its value follows from turns, diameter and length.`;
    default: return `The value of ${name} cannot be read.`;
  }
}

/**
 * Puts a value that a person typed in the place of an element's: `3.3 pF`, `3p3`; `not fitted` across the path, `0 Ω` in it;
 * a length for a line. Figures, `from` and comments stay.
 */
export function setValue(assessment: Assessment, elementId: string, typed: string): ValueEdit {
  const element = elementNamed(assessment, elementId);
  if (!element) return refuse(`There is no element ${elementId} in the ladder.`);
  const { syntax } = assessment.description;
  const text = typed.trim().replace(/\s+/g, ' ');
  const { body, keyword } = element;
  if (body.form === 'line') return setLength(assessment, elementId, body.line, text);
  if (keyword !== 'series' && keyword !== 'shunt') return refuse(`${elementId} has no single value; change it in the text.`);
  if (body.form === 'branch' && body.branch.form !== 'part') return refuse(`${elementId} is a branch of several parts; change the one that is meant in the text.`);
  const part = body.form === 'branch' && body.branch.form === 'part' ? body.branch : null;
  if (part?.value.form === 'tunable' || part?.value.form === 'coil') return refuse(whyNoValue(elementId, part));
  if (keyword === 'shunt' && text === 'not fitted') return setElementValue(syntax, elementId, text);
  if (keyword === 'series' && /^0 ?(Ω|\u2126|ohm)$/.test(text)) return setElementValue(syntax, elementId, '0 Ω');
  const kind = kindOf(assessment, element, part);
  const found = readTypedValue(text, kind ? [quantityOfKind(kind)] : ['resistance', 'inductance', 'capacitance']);
  if ('refusal' in found) return found;
  if (found.value === 0) return refuse(keyword === 'series' ? 'A bridge is 0 Ω; other values are above zero.' : 'Empty pads are «not fitted»; a value across the path is above zero.');
  if (!part || part.value.form === 'faulty') return setElementPhrase(syntax, elementId, found.text);
  const kindOfTyped = kindOfQuantity[found.kind as keyof typeof kindOfQuantity];
  if (part.value.form === 'solve') return setElementValue(syntax, elementId, found.text + fromClause(assessment, part.value.solve, kindOfTyped, found.value));
  const member = part.from ? memberWith(assessment, part.from.value, kindOfTyped, found.value) : null;
  return editPart(assessment, part, found.text, member);
}

function kindOf({ evaluation }: Assessment, element: ElementSyntax, part: PartSyntax | null): PartKind | null {
  const stated = part?.kind ?? kindOfDesignator(element.name.value);
  const studied = evaluation?.elements.find(({ name }) => name === element.name.value)?.kind;
  return stated ?? (studied !== undefined && studied in unitOfKind ? (studied as PartKind) : null);
}

/** ` from caps`: the one family that the unknown was to come from, or the first of several that holds the value. */
function fromClause(assessment: Assessment, { families }: SolveSyntax, kind: PartKind, value: number): string {
  const family = families.length === 1 ? families[0] : families.find(({ value: name }) => memberWith(assessment, name, kind, value) !== null);
  return family ? ` from ${family.value}` : '';
}

function memberWith({ model }: Assessment, name: string, kind: PartKind, value: number): FamilyMember | null {
  const family = model.problem?.families.find((candidate) => candidate.name === name);
  return (family && membersOf(family, kind).find(({ part }) => isSameValue(part.value, value))) ?? null;
}

function setLength(assessment: Assessment, elementId: string, { length }: LineSyntax, text: string): ValueEdit {
  const kinds: QuantityKind[] = length.form === 'electrical' ? ['angle', 'wavelengths'] : ['length'];
  const found = readTypedValue(text, kinds);
  if ('refusal' in found) return found;
  if (found.value === 0) return refuse(`The length of ${elementId} is above zero.`);
  const place = length.form === 'electrical' ? length.wavelengths.span : length.form === 'physical' ? length.lengthM.span : length.span;
  return replaceInScalar(assessment.description.syntax.text, place, found.text);
}
