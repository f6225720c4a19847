import type { TextEdit } from '../base/diagnostic';
import type { Span } from '../base/span';
import type { Phrase } from './phrase/phrase';
import type { DescriptionSyntax, ElementSyntax, PartSyntax } from './syntax';
import { findScalar } from './tree/findScalar';
import { yamlTree } from './tree/yamlTree';
import { escapeFor, isPlainSafe, writeScalar } from './writeScalar';

/**
 * Edits of a description's text that touch nothing they need not: comments, layout and the rest of a phrase stay. All of
 * them are for the text that `syntax` was read from, and together are one undo step.
 */

/** One entry of a ladder: `series L1` and `6.8 nH from coils`. */
export interface LadderEntry {
  readonly key: string;
  readonly phrase: string;
}

/** Replaces the text at `span`, which lies inside one scalar; puts the scalar into quotes where the new text asks for it. */
export function replaceInScalar(text: string, span: Span, replacement: string): TextEdit[] {
  const found = findScalar(yamlTree(text).root, span);
  if (!found) return [{ span, text: replacement }];
  const { scalar, flow } = found;
  const before = phraseSide(scalar.phrase, span.start, 'before');
  const after = phraseSide(scalar.phrase, span.end, 'after');
  const whole = before + replacement + after;
  if (scalar.style === 'plain' && !isPlainSafe(whole, flow)) return [{ span: scalar.span, text: writeScalar(whole, flow) }];
  return [{ span, text: escapeFor(replacement, scalar.style) }];
}

/** What a scalar's phrase says on one side of an offset of the document. */
function phraseSide(phrase: Phrase, offset: number, side: 'before' | 'after'): string {
  let cut = 0;
  while (cut < phrase.text.length && phrase.at(cut) < offset) cut++;
  return side === 'before' ? phrase.text.slice(0, cut) : phrase.text.slice(cut);
}

/** Replaces a whole scalar, key or value, by a phrase. */
export function replaceScalar(text: string, span: Span, phrase: string): TextEdit[] {
  const found = findScalar(yamlTree(text).root, span);
  return [{ span: found?.scalar.span ?? span, text: writeScalar(phrase, found?.flow ?? false) }];
}

/** Replaces all that stands after an element's colon. Empty where the ladder has no element of that name. */
export function setElementPhrase(syntax: DescriptionSyntax, elementName: string, phrase: string): TextEdit[] {
  const element = elementOf(syntax, elementName);
  if (!element) return [];
  if (element.phrase.start < element.phrase.end) return replaceScalar(syntax.text, element.phrase, phrase);
  // Nothing stands there yet: after the colon that follows the name.
  const colon = syntax.text.indexOf(':', element.name.span.end);
  const at = colon < 0 ? element.span.end : colon + 1;
  return [{ span: { start: at, end: at }, text: ` ${writeScalar(phrase, false)}` }];
}

/**
 * Puts a value (`6.8 nH`, `6.8 nH from coils`, `not fitted`, `0 Ω`) in the place of an element's value or `solve`. Figures
 * that stand after it stay; so does the family after `from` where the new value names none or the same one.
 */
export function setElementValue(syntax: DescriptionSyntax, elementName: string, value: string): TextEdit[] {
  const element = elementOf(syntax, elementName);
  if (!element) return [];
  const { body } = element;
  const open = /^(not fitted|0\s*(Ω|ohm)s?)$/u.test(value.trim());
  if (body.form === 'line' && !open) {
    const { length } = body.line;
    const place = length.form === 'solve' ? length.span : length.form === 'physical' ? length.lengthM.span : null;
    return place ? replaceInScalar(syntax.text, place, value) : setElementPhrase(syntax, elementName, value);
  }
  if (body.form !== 'branch' || body.branch.form !== 'part' || open || body.branch.value.form === 'faulty') return setElementPhrase(syntax, elementName, value);
  return setPartValue(syntax, body.branch, value);
}

function setPartValue(syntax: DescriptionSyntax, part: PartSyntax, value: string): TextEdit[] {
  const [, number, family] = /^(.*?)(?:\s+from\s+(.+))?$/u.exec(value.trim()) ?? [value, value, undefined];
  const edits: TextEdit[] = [];
  const solving = part.value.form === 'solve';
  if (!part.from || solving) {
    edits.push(...replaceInScalar(syntax.text, part.value.span, value.trim()));
  } else {
    edits.push(...replaceInScalar(syntax.text, part.value.span, number));
    if (family && family !== part.from.value) edits.push(...replaceInScalar(syntax.text, part.from.span, family));
  }
  return edits;
}

const elementOf = (syntax: DescriptionSyntax, name: string): ElementSyntax | undefined => syntax.ladder?.elements.find((element) => element.name.value === name);

/** Writes a whole ladder in the place of `ladder: solve …`; a comment on its line stays there. Empty where the ladder is not to be solved. */
export function insertElements(syntax: DescriptionSyntax, entries: readonly LadderEntry[]): TextEdit[] {
  const { ladder, text } = syntax;
  if (!ladder?.solve || entries.length === 0) return [];
  const { root } = yamlTree(text);
  if (root?.form === 'mapping' && root.flow) {
    const list = entries.map(({ key, phrase }) => `{${writeScalar(key, true)}: ${writeScalar(phrase, true)}}`).join(', ');
    return [{ span: ladder.span, text: `[${list}]` }];
  }
  const lineEnd = /\r\n|\n|\r/.exec(text)?.[0] ?? '\n';
  const indent = ' '.repeat(listIndent(syntax));
  const lines = entries.map(({ key, phrase }) => `${lineEnd}${indent}- ${writeScalar(key, false)}: ${writeScalar(phrase, false)}`).join('');
  const colon = text.indexOf(':', ladder.keySpan.end) + 1;
  const rest = /^[^\n\r]*/.exec(text.slice(ladder.span.end))?.[0] ?? '';
  const endOfLine = ladder.span.end + rest.length;
  if (rest.trim() === '') return [{ span: { start: colon, end: endOfLine }, text: lines }];
  return [{ span: { start: colon, end: ladder.span.end }, text: '' }, { span: { start: endOfLine, end: endOfLine }, text: lines }];
}

/** The column at which the dashes of the text's own lists stand, else two. */
function listIndent(syntax: DescriptionSyntax): number {
  const list = /^(\w+):[ \t]*(?:#.*)?\r?\n([ ]*)- /m.exec(syntax.text);
  return list ? list[2].length : 2;
}
