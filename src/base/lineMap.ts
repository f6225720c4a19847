import type { Position } from './span';

/** Offsets to lines and back for one text. Line ends are LF, CR LF or a lone CR. */
export interface LineMap {
  readonly lineCount: number;
  positionAt(offset: number): Position;
  offsetAt(position: Position): number;
  /** Offsets of a line without its line end. */
  lineSpan(line: number): { start: number; end: number };
}

export function lineMap(text: string): LineMap {
  const starts = [0];
  const ends: number[] = [];
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code !== 10 && code !== 13) continue;
    ends.push(i);
    if (code === 13 && text.charCodeAt(i + 1) === 10) i++;
    starts.push(i + 1);
  }
  ends.push(text.length);
  const clampLine = (line: number) => Math.min(Math.max(line, 0), starts.length - 1);
  return {
    lineCount: starts.length,
    positionAt(offset) {
      const at = Math.min(Math.max(offset, 0), text.length);
      let low = 0;
      let high = starts.length - 1;
      while (low < high) {
        const middle = (low + high + 1) >> 1;
        if (starts[middle] <= at) low = middle;
        else high = middle - 1;
      }
      return { line: low, character: at - starts[low] };
    },
    offsetAt({ line, character }) {
      const row = clampLine(line);
      return Math.min(starts[row] + Math.max(character, 0), ends[row]);
    },
    lineSpan(line) {
      const row = clampLine(line);
      return { start: starts[row], end: ends[row] };
    },
  };
}
