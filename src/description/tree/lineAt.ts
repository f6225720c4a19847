/** A line of a text without its line end. */
export interface Line {
  readonly start: number;
  readonly text: string;
}

export function lineAt(text: string, offset: number): Line {
  let start = Math.min(Math.max(offset, 0), text.length);
  while (start > 0 && text[start - 1] !== '\n' && text[start - 1] !== '\r') start--;
  let end = start;
  while (end < text.length && text[end] !== '\n' && text[end] !== '\r') end++;
  return { start, text: text.slice(start, end) };
}
