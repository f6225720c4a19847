import { lineMap } from '../base/lineMap';
import type { Span } from '../base/span';
import type { Description } from '../description/description';

/** From each line that stands further out than those below it to the last of them; blank lines at the end stay outside. */
export function foldingSpans({ syntax: { text } }: Description): Span[] {
  const lines = lineMap(text);
  const found: Span[] = [];
  const open: { indent: number; start: number }[] = [];
  let lastEnd = 0;
  let lastLine = -1;
  const close = (indent: number) => {
    while (open.length > 0 && open[open.length - 1].indent >= indent) {
      const { start } = open.pop()!;
      if (lines.positionAt(start).line < lastLine) found.push({ start, end: lastEnd });
    }
  };
  for (let line = 0; line < lines.lineCount; line++) {
    const { start, end } = lines.lineSpan(line);
    const content = text.slice(start, end);
    const indent = content.search(/\S/);
    if (indent < 0) continue;
    // A list may stand as far left as its key.
    const depth = content[indent] === '-' ? indent + 1 : indent;
    if (content[indent] === '#') {
      // A comment ends nothing, and belongs to what it stands further in than; it may as well be about what follows.
      if (depth <= (open.at(-1)?.indent ?? depth)) continue;
    } else {
      close(depth);
      open.push({ indent: depth, start });
    }
    lastEnd = end;
    lastLine = line;
  }
  close(0);
  return found.sort((a, b) => a.start - b.start);
}
