import { lineMap } from '../base/lineMap';
import type { Span } from '../base/span';
import { keysAt, type KeyEntry } from '../description/keys';
import { goalConditions, goalWords } from '../description/phrase/goalQuantities';
import { kindOfDesignator } from '../description/phrase/readElementPhrase';
import { literalAt, literalValue } from '../quantity/literal';
import { nextInSeries } from '../quantity/preferredSeries';
import { writeQuantity } from '../quantity/printQuantity';
import { unitOf } from '../quantity/unit';
import type { Assessment } from './assess';

export interface Completion {
  readonly label: string;
  readonly detail: string;
  readonly documentation: string;
  readonly insertText: string;
  readonly snippet: boolean;
  /** What is replaced. */
  readonly span: Span;
}

/** What may stand at the offset, by the section and the words before it; works on any half-typed text. */
export function completionsAt(assessment: Assessment, offset: number): Completion[] {
  const { text } = assessment.description.syntax;
  const lines = lineMap(text);
  const { line } = lines.positionAt(offset);
  const { start } = lines.lineSpan(line);
  const before = text.slice(start, offset);
  if (/(?:^|\s)#/.test(before)) return [];
  const word = /[\p{L}\d_.-]*$/u.exec(before)![0];
  const span = { start: offset - word.length, end: offset };
  if (/^\w*$/.test(before)) return keyCompletions(keysAt('description'), span);
  const section = sectionAbove(text, start, before);
  if (/^\s*-\s+\w*$/.test(before)) {
    if (section === 'ladder' || section === 'fixture') return keyCompletions(keysAt('ladder entry'), span);
    if (section === 'goals') return goalCompletions(span);
    return [];
  }
  if (section === 'goals') return placeCompletions(assessment, before, span);
  return section === 'ladder' || section === 'load' || section === 'channels' ? phraseCompletions(assessment, section, before, span) : [];
}

const plain = (label: string, detail: string, span: Span): Completion => ({ label, detail, documentation: '', insertText: label, snippet: false, span });

const keyCompletions = (entries: readonly KeyEntry[], span: Span): Completion[] =>
  entries.map(({ name, text, snippet, example }) => ({ label: name, detail: '', documentation: `${text}\n\n\`\`\`yaml\n${example}\n\`\`\``, insertText: snippet, snippet: true, span }));

const goalCompletions = (span: Span): Completion[] => [
  ...goalWords.map(({ quantity, example }) => ({ ...plain(quantity, example, span), insertText: example })),
  ...goalConditions.map((condition) => plain(condition, 'condition', span)),
];

/** The key of the first level that the line lies under, or that stands on it. */
function sectionAbove(text: string, lineStart: number, before: string): string | null {
  const own = /^(\w+)\s*:/.exec(before);
  if (own) return own[1];
  const keys = [...text.slice(0, lineStart).matchAll(/^(\w+)\s*:/gm)];
  return keys.at(-1)?.[1] ?? null;
}

/** After `in`, `at 2 x`, `for`, `against`: names of the description. */
function placeCompletions({ description }: Assessment, before: string, span: Span): Completion[] {
  const bands = description.syntax.bands.map(({ name }) => plain(name.value, 'band', span));
  const cases = description.syntax.load?.cases.flatMap(({ name }) => (name ? [plain(name.value, 'load case', span)] : [])) ?? [];
  const elements = description.syntax.ladder?.elements.map(({ name }) => plain(name.value, 'element', span)) ?? [];
  if (/\s(?:in|against|x|×)\s+[^\s]*$/.test(before)) return bands;
  if (/\sfor\s+[^\s]*$/.test(before)) return cases;
  if (/(?:voltage|current|dissipation)\s+[^\s]*$/.test(before)) return [...elements, plain('load', 'the load', span)];
  return [];
}

function phraseCompletions({ description }: Assessment, section: string, before: string, span: Span): Completion[] {
  const { syntax } = description;
  const families = syntax.families.map(({ name }) => plain(name.value, 'family', span));
  if (section === 'channels') return syntax.bands.map(({ name }) => plain(name.value, 'band', span));
  if (/\bfrom\s+[^\s]*$/.test(before)) return [...families, plain('E24', 'preferred series', span), plain('E12', 'preferred series', span)];
  if (/\btunable\s+[^\s]*$/.test(before)) return syntax.tunables.map(({ name }) => plain(name.value, 'tunable', span));
  if (section === 'load') return ['open', 'short', 'gamma'].map((word) => plain(word, 'impedance', span));
  const entry = /^\s*-\s+(series|shunt)\s+([\p{L}][\p{L}\d_.-]*)\s*:\s*(.*)$/u.exec(before);
  if (!entry) return [];
  const [, orientation, name, phrase] = entry;
  if (phrase === '') return [plain('solve', 'to be found', span), plain('tunable', 'set by firmware', span), ...(orientation === 'shunt' ? [plain('not fitted', 'empty pads', span)] : [plain('0 Ω', 'a bridge', span)])];
  const kind = kindOfDesignator(name);
  const around = valuesAround(phrase, kind, span.end - phrase.length, span.end);
  return around.length > 0 ? around : figureCompletions(span);
}

/** E24 values around the number that is being typed, with the unit that it has or that its kind suggests. */
function valuesAround(phrase: string, kind: ReturnType<typeof kindOfDesignator>, start: number, end: number): Completion[] {
  const dimension = kind === 'resistor' ? 'resistance' : kind === 'capacitor' ? 'capacitance' : 'inductance';
  const literal = literalAt(phrase, 0, [dimension]);
  if (!literal || phrase.slice(literal.end).trim() !== '') return [];
  const usual = { resistance: { unit: 'Ω', scale: 1 }, capacitance: { unit: 'F', scale: 1e-12 }, inductance: { unit: 'H', scale: 1e-9 } }[dimension];
  const stated = literal.form === 'unit' && unitOf(literal.unit)?.dimension === dimension;
  const value = literalValue({ ...literal, form: stated ? 'unit' : 'bare' }) * (stated ? 1 : usual.scale);
  if (!(value > 0)) return [];
  const down = nextInSeries(value, 'E24', 'down');
  const up = nextInSeries(value, 'E24', 'up');
  const values = [value, down, up, up && nextInSeries(up, 'E24', 'up'), down && nextInSeries(down, 'E24', 'down')];
  return [...new Set(values.filter((candidate) => candidate !== null && candidate !== 0))].map((candidate) => plain(writeQuantity(Number(candidate!.toPrecision(6)), usual.unit), candidate === value ? 'with its unit' : 'E24', { start, end }));
}

const figures: readonly (readonly [string, string])[] = [
  ['from', 'one of a family'], ['±5 %', 'tolerance'], ['Q 35 @ 900 MHz', 'quality at a frequency'], ['ESR 0.1 Ω', 'loss'], ['ESL 0.35 nH', 'inductance in series'],
  ['SRF 7 GHz', 'self-resonance'], ['rated 50 V', 'limit'], ['fixed', 'not to be solved again'],
];

const figureCompletions = (span: Span): Completion[] => figures.map(([label, detail]) => plain(label, detail, span));
