import assert from 'node:assert/strict';
import { applyEdits, type Diagnostic } from '../../../src/base/diagnostic';
import { plainPhrase, type LetValue, type Phrase, type PhraseContext } from '../../../src/description/phrase/phrase';

export type Reader<T> = (phrase: Phrase, context: PhraseContext) => T;

/** Invented named values: 866.5 MHz and 0.3 pF. */
const lets: ReadonlyMap<string, LetValue> = new Map([
  ['f0', { value: 866.5e6, dimension: [0, 0, -1, 0] }],
  ['pad', { value: 0.3e-12, dimension: [-2, -1, 4, 2] }],
] as const);

/** A name at no place of its own. */
export const nameOf = (value: string) => ({ value, span: { start: 0, end: 0 } });

export function readPhrase<T>(reader: Reader<T>, text: string, { expressions = true, offset = 0 } = {}): { value: T; diagnostics: Diagnostic[] } {
  const diagnostics: Diagnostic[] = [];
  const value = reader(plainPhrase(text, offset), { report: (diagnostic) => diagnostics.push(diagnostic), lets, expressions });
  return { value, diagnostics };
}

/** What a phrase without a mistake says, without places and without what it does not state. */
export function clean<T>(reader: Reader<T>, text: string): unknown {
  const { value, diagnostics } = readPhrase(reader, text);
  assert.deepEqual(diagnostics.map(({ code, message }) => `${code}: ${message}`), [], `«${text}»`);
  return withoutPlaces(value);
}

export function withoutPlaces(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(withoutPlaces);
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value).filter(([key, entry]) => key !== 'span' && entry !== null && entry !== false && !(Array.isArray(entry) && entry.length === 0));
  // A quantity is its number, a located name its word.
  if ('value' in value && 'span' in value && Object.keys(value).length === 2) return withoutPlaces(value.value);
  return Object.fromEntries(entries.map(([key, entry]) => [key, withoutPlaces(entry)]).filter(([, entry]) => !isEmpty(entry)));
}

const isEmpty = (value: unknown) => typeof value === 'object' && value !== null && !Array.isArray(value) && Object.keys(value).length === 0;

/** Carets under what is wrong, then the code: `    ^^^ unit-case`. Several lines where there are several. */
export function checkCarets<T>(reader: Reader<T>, text: string, ...carets: readonly string[]): void {
  const { diagnostics } = readPhrase(reader, text);
  assert.deepEqual(diagnostics.map(({ code, span }) => `${' '.repeat(span.start)}${'^'.repeat(span.end - span.start)} ${code}`), carets, `«${text}»: ${diagnostics.map(({ message }) => message).join(' ')}`);
}

/** The text after the first fix, which must then read without a mistake. */
export function mended<T>(reader: Reader<T>, text: string): { code: string; text: string } {
  const { diagnostics } = readPhrase(reader, text);
  const [first] = diagnostics;
  const fix = first?.fixes?.[0];
  assert.ok(fix, `«${text}» has no fix: ${diagnostics.map(({ code, message }) => `${code}: ${message}`).join(' ')}`);
  const result = applyEdits(text, fix.edits);
  const again = readPhrase(reader, result);
  assert.deepEqual(again.diagnostics.map(({ code, message }) => `${code}: ${message}`), [], `«${text}» became «${result}»`);
  return { code: first.code, text: result };
}

/** Numbers and places of a diagnostic stand inside the text, whatever it is. */
export function assertPlaces(text: string, diagnostics: readonly Diagnostic[]): void {
  for (const { code, span, fixes = [] } of diagnostics) {
    for (const { start, end } of [span, ...fixes.flatMap((fix) => fix.edits.map((edit) => edit.span))]) assert.ok(start >= 0 && start <= end && end <= text.length, `${code} at ${start} to ${end} of «${text}»`);
  }
}
