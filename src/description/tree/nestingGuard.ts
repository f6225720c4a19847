import type { Diagnostic } from '../../base/diagnostic';
import { flowDepthAtMost, indentationAtMost, opensOnOneLineAtMost, textAtMost } from '../limits';

/** Says why a text cannot be handed to the YAML reader, which recurses: too long, or nested too deeply. */
export function nestingGuard(text: string): Diagnostic | null {
  if (text.length > textAtMost) {
    return refuse('text-too-long', `This text has more than ${textAtMost} characters; it is not read as a match description.`, 0, 0);
  }
  let depth = 0;
  let lineStart = true;
  let column = 0;
  let opens = 0;
  for (let i = 0; i < text.length; i++) {
    const char = text[i];
    if (char === '\n' || char === '\r') {
      lineStart = true;
      column = 0;
      opens = 0;
      continue;
    }
    if (char === ' ' || char === '\t') {
      if (lineStart) column++;
      continue;
    }
    const next = text[i + 1];
    const opener = (char === '-' || char === ':' || char === '?') && (next === undefined || next === ' ' || next === '\t' || next === '\n' || next === '\r');
    if (lineStart && column > indentationAtMost) return tooDeep(i);
    lineStart = false;
    if (opener && ++opens > opensOnOneLineAtMost) return tooDeep(i);
    if (char === ',') opens = 0;
    else if (char === '[' || char === '{') {
      if (++depth > flowDepthAtMost) return tooDeep(i);
      opens = 0;
    } else if (char === ']' || char === '}') {
      depth = Math.max(0, depth - 1);
      opens = 0;
    } else if (char === '#' && (i === 0 || /\s/.test(text[i - 1]))) {
      while (i + 1 < text.length && text[i + 1] !== '\n' && text[i + 1] !== '\r') i++;
    }
  }
  return null;
}

const tooDeep = (at: number) => refuse('nested-too-deeply', 'This is nested too deeply; a match description never is.', at, at + 1);

const refuse = (code: string, message: string, start: number, end: number): Diagnostic => ({ code, severity: 'error', message, span: { start, end } });
