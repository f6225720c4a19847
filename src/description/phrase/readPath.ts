import type { Located } from '../../base/span';
import { complain, replaceBy, skipBlanks, spanOf, take, type Scanner } from './scanner';

/** Ends a path may have. */
const pathPattern = /(?:[^\s,;|{}[\]"'][^,;|{}[\]"'\n]*?)?[^\s,;|{}[\]"'/\\]\.(?:s[1-9]\d?p|ts|csv|h|hpp|json)(?![\p{L}\d.])/iuy;

const words = /^(?:gamma|open|short|solve|pair|tunable|not|coil|microstrip|inductor|capacitor|resistor)\s/;

/** True where a file's path begins at the scanner, rather than a number or a word of the language. */
export function pathFollows(s: Scanner): boolean {
  const { at } = s;
  const found = take(s, pathPattern);
  s.at = at;
  return found !== null && !words.test(found[0]);
}

/** A path up to its extension, as written but checked: relative, `/` between folders. Null where there is none (not reported). */
export function pathAt(s: Scanner): Located<string> | null {
  skipBlanks(s);
  const start = s.at;
  const found = take(s, pathPattern);
  if (!found) return null;
  return checkedPath(s, found[0], start);
}

/** Any extension will do: up to the end of the phrase. */
export function wholePath(s: Scanner): Located<string> | null {
  skipBlanks(s);
  const start = s.at;
  const text = s.text.slice(start).trim();
  s.at = s.text.length;
  return text === '' ? null : checkedPath(s, text, start);
}

function checkedPath(s: Scanner, written: string, start: number): Located<string> {
  const span = spanOf(s, start, start + written.length);
  const slashed = written.replace(/\\/g, '/');
  if (slashed !== written) complain(s, 'backslash-in-path', 'Folders in a path are separated by «/» on every system.', span, [replaceBy(span, slashed)]);
  if (/^(?:\/|~|[A-Za-z]:)/.test(slashed) || /^[a-z][a-z\d+.-]*:\/\//i.test(slashed)) {
    complain(s, 'absolute-path', 'Paths are relative to the description, so that they hold on every machine.', span);
  }
  return { value: slashed, span };
}
