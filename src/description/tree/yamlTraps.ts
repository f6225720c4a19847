import type { Diagnostic, TextEdit } from '../../base/diagnostic';
import { lineAt, type Line } from './lineAt';
import { phraseEndOnLine, quotePhrase } from './quotePhrase';

/** A trap of YAML found on a line: what to say, and the edits that mend it. */
export interface Trap {
  readonly diagnostic: Diagnostic;
  readonly edits: readonly TextEdit[];
}

/** Key, colon and phrase of a line, as far as its text alone tells. */
interface KeyLine {
  readonly indent: string;
  readonly key: string;
  readonly colon: number;
  readonly value: number;
}

const keyLine = /^([ \t]*)((?:- +)*)([^\s:#'"[\]{},-][^:#'"[\]{},]*):([ \t]+|$)/;
const missingSpace = /^([ \t]*(?:- +)*)(\p{L}[\p{L}\p{N}_ -]*):(?=[^\s:/\\])/u;
const listKeys = /^(ladder|fixture|goals|measured)$/;

/**
 * The trap that explains why YAML cannot read a line, with the edits that make it readable; null where none of the known
 * ones does. `spaceMissing`: the error may come from a colon without a space after it.
 */
export function trapOnLine(text: string, offset: number, spaceMissing: boolean): Trap | null {
  const line = lineAt(text, offset);
  return tabTrap(line) ?? (spaceMissing ? missingSpaceTrap(line) : null) ?? phraseTrap(text, line);
}

/** `series L1:6.8 nH` on a line, where nothing says that it is a phrase. */
export function missingSpaceTrap(line: Line): Trap | null {
  const found = missingSpace.exec(line.text);
  if (!found) return null;
  const colon = line.start + found[1].length + found[2].length;
  const edits = [{ span: { start: colon + 1, end: colon + 1 }, text: ' ' }];
  return trap('missing-space', `A space is missing after the colon of «${found[2]}»; without it YAML takes key and phrase as one word.`, colon, colon + 1, 'Insert a space', edits);
}

function tabTrap(line: Line): Trap | null {
  const indent = /^[ \t]*/.exec(line.text)?.[0] ?? '';
  if (!indent.includes('\t')) return null;
  const edits: TextEdit[] = [];
  for (let i = 0; i < indent.length; i++) {
    if (indent[i] === '\t') edits.push({ span: { start: line.start + i, end: line.start + i + 1 }, text: '  ' });
  }
  return trap('tab', 'YAML does not allow a tab as indentation; use spaces.', edits[0].span.start, line.start + indent.length, 'Replace tabs by spaces', edits);
}

function phraseTrap(text: string, line: Line): Trap | null {
  const parts = splitKeyLine(line);
  if (!parts || parts.value >= line.start + line.text.length) return null;
  const end = phraseEndOnLine(text, parts.value);
  const phrase = text.slice(parts.value, end);
  if (phrase === '') return null;
  const quoted = quotePhrase(text, parts.value, end);
  if (/^-(\s|$)/.test(phrase)) {
    if (listKeys.test(parts.key)) {
      const edits = [{ span: { start: parts.value, end: parts.value }, text: `\n${parts.indent}  ` }];
      return trap('list-on-key-line', `The list of «${parts.key}» begins on a line of its own.`, parts.value, end, 'Begin the list on a new line', edits);
    }
    return trap('phrase-start', 'A phrase that starts with a dash and a space is a list to YAML; put it in quotes, or leave no space after the minus sign.', parts.value, end, 'Put the phrase in quotes', quoted);
  }
  if (/^[|>]/.test(phrase) && !/^[|>][+-]?\d?[+-]?$/.test(phrase)) {
    return trap('phrase-start', `A phrase that starts with «${phrase[0]}» begins a block of text in YAML; put it in quotes.`, parts.value, end, 'Put the phrase in quotes', quoted);
  }
  if (/^[@`%]/.test(phrase)) {
    return trap('phrase-start', `A phrase cannot start with «${phrase[0]}» in YAML; put it in quotes.`, parts.value, end, 'Put the phrase in quotes', quoted);
  }
  if (/^[[{][^\n]*[\]}]\s*[^\s\]},]/.test(phrase) && !/[\]}]$/.test(phrase)) {
    return trap('text-after-bracket', 'A phrase that starts with a bracket is a list to YAML and ends with it; put the whole phrase in quotes.', parts.value, end, 'Put the phrase in quotes', quoted);
  }
  const colon = /^[^'"[{|>&*!].*?(:)(\s|$)/.exec(phrase);
  if (colon) {
    const at = parts.value + colon[0].length - 1 - colon[2].length;
    return trap('second-colon', 'A second colon with a space after it: YAML takes it for another key. Put the phrase in quotes, or begin a new line.', at, at + 1, 'Put the phrase in quotes', quoted);
  }
  return null;
}

function splitKeyLine(line: Line): KeyLine | null {
  const found = keyLine.exec(line.text);
  if (!found) return null;
  const colon = line.start + found[1].length + found[2].length + found[3].length;
  return { indent: found[1], key: found[3].trim(), colon, value: colon + 1 + found[4].length };
}

function trap(code: string, message: string, start: number, end: number, title: string, edits: readonly TextEdit[]): Trap {
  return { diagnostic: { code, severity: 'error', message, span: { start, end }, fixes: [{ title, edits, preferred: true }] }, edits };
}
