import type { Fix, Severity } from '../../base/diagnostic';
import type { Located, Span } from '../../base/span';
import type { Phrase, PhraseContext } from './phrase';

/** Walks over a phrase from left to right; what it finds carries places in the document. */
export interface Scanner {
  readonly phrase: Phrase;
  readonly text: string;
  readonly context: PhraseContext;
  /** Offset in the phrase. */
  at: number;
}

export const scanner = (phrase: Phrase, context: PhraseContext): Scanner => ({ phrase, text: phrase.text, context, at: 0 });

/** Offsets of the phrase as a place in the document, without blanks at either end. */
export function spanOf(s: Scanner, start: number, end: number): Span {
  let [from, to] = [start, Math.max(start, end)];
  while (from < to && isBlank(s.text[to - 1])) to--;
  while (from < to && isBlank(s.text[from])) from++;
  return { start: s.phrase.at(from), end: s.phrase.at(to) };
}

const isBlank = (character: string): boolean => /[\s\u00a0]/.test(character);

export function skipBlanks(s: Scanner): void {
  while (s.at < s.text.length && isBlank(s.text[s.at])) s.at++;
}

export function atEnd(s: Scanner): boolean {
  skipBlanks(s);
  return s.at >= s.text.length;
}

/** Takes what the sticky pattern matches after blanks. */
export function take(s: Scanner, pattern: RegExp): RegExpExecArray | null {
  skipBlanks(s);
  pattern.lastIndex = s.at;
  const found = pattern.exec(s.text);
  if (found) s.at += found[0].length;
  return found;
}

export function peek(s: Scanner, pattern: RegExp): boolean {
  const { at } = s;
  const found = take(s, pattern) !== null;
  s.at = at;
  return found;
}

const wordPatterns = new Map<string, RegExp>();

/** Takes exactly these words (one blank or more between them), not as the beginning of longer ones. */
export function takeWord(s: Scanner, words: string): boolean {
  let pattern = wordPatterns.get(words);
  if (!pattern) {
    pattern = new RegExp(`${words.replace(/[.*+?^${}()|[\]\\]/g, '\\$&').replace(/ /g, '\\s+')}(?![\\p{L}\\d_])`, 'uy');
    wordPatterns.set(words, pattern);
  }
  return take(s, pattern) !== null;
}

/** The next word, for messages and look-ups; not taken. */
export function nextWord(s: Scanner): Located<string> | null {
  skipBlanks(s);
  const pattern = /[^\s,;()[\]]+/y;
  pattern.lastIndex = s.at;
  const found = pattern.exec(s.text);
  return found && { value: found[0], span: spanOf(s, s.at, s.at + found[0].length) };
}

export function complain(s: Scanner, code: string, message: string, span: Span, fixes: readonly Fix[] = [], severity: Severity = 'error'): void {
  s.context.report({ code, severity, message, span, ...(fixes.length > 0 && { fixes }) });
}

/** One fix that puts `text` in the place of `span`. */
export const replaceBy = (span: Span, text: string, preferred = true): Fix => ({ title: `Write «${text}»`, edits: [{ span, text }], preferred });

/** From here to the end of the phrase, without blanks around it. */
export function restSpan(s: Scanner): Span {
  skipBlanks(s);
  const end = s.text.trimEnd().length;
  return spanOf(s, Math.min(s.at, end), Math.max(end, s.at));
}

export const restText = (s: Scanner): string => s.text.slice(s.at).trim();

/** Complains about what is left over, once, and goes to the end. */
export function expectEnd(s: Scanner, hint = ''): void {
  if (atEnd(s)) return;
  complain(s, 'unexpected-words', `«${restText(s)}» does not belong here${hint && `; ${hint}`}.`, restSpan(s));
  s.at = s.text.length;
}
