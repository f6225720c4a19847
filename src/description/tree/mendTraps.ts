import { isScalar } from 'yaml';
import type { Diagnostic, TextEdit } from '../../base/diagnostic';
import { overlaps, type Span } from '../../base/span';
import { repairsAtMost } from '../limits';
import type { Composed } from './composeYaml';
import { lineAt, type Line } from './lineAt';
import type { RepairedText } from './repairedText';
import { missingSpaceTrap, trapOnLine, type Trap } from './yamlTraps';

/**
 * Mends the traps behind YAML's errors: adds their edits, in the original's offsets, to `edits`, and returns what to say
 * about them. Empty where nothing more can be mended.
 */
export function mendTraps(repaired: RepairedText, composed: Composed, edits: TextEdit[]): Diagnostic[] {
  return findTraps(repaired.text, composed)
    .filter((trap) => addEdits(edits, trap.edits.map((edit) => editInOriginal(edit, repaired))))
    .map((trap) => inOriginal(trap.diagnostic, repaired));
}

/** Traps behind the errors, at most one a line. */
function findTraps(text: string, composed: Composed): Trap[] {
  const traps = new Map<number, Trap>();
  const offer = (offset: number, trap: Trap | null) => {
    const { start } = lineAt(text, offset);
    if (trap && !traps.has(start) && traps.size < repairsAtMost) traps.set(start, trap);
  };
  for (const { code, pos, message } of composed.errors.slice(0, repairsAtMost)) {
    const spaceMissing = code === 'MULTILINE_IMPLICIT_KEY' || /Implicit map keys need/.test(message);
    offer(pos[0], trapOnLine(text, pos[0], spaceMissing));
    if (spaceMissing) forEachLine(text, pos[0], pos[1], (line) => offer(line.start, missingSpaceTrap(line)));
  }
  const contents = composed.document?.contents;
  if (isScalar(contents) && contents.range) {
    forEachLine(text, contents.range[0], contents.range[1], (line) => offer(line.start, missingSpaceTrap(line)));
  }
  return [...traps.values()];
}

function forEachLine(text: string, start: number, end: number, visit: (line: Line) => void): void {
  for (let at = start, count = 0; at <= end && count < repairsAtMost; count++) {
    const line = lineAt(text, at);
    visit(line);
    at = line.start + line.text.length + 1;
  }
}

/** Adds edits where they touch none that are there; says whether it did. */
export function addEdits(edits: TextEdit[], more: readonly TextEdit[]): boolean {
  const clash = more.some((a) => edits.some((b) => overlaps(a.span, b.span) || a.span.start === b.span.start));
  if (clash || edits.length + more.length > repairsAtMost * 4) return false;
  edits.push(...more);
  return true;
}

const spanInOriginal = (span: Span, repaired: RepairedText): Span => ({ start: repaired.toOriginal(span.start), end: repaired.toOriginal(span.end) });
const editInOriginal = (edit: TextEdit, repaired: RepairedText): TextEdit => ({ span: spanInOriginal(edit.span, repaired), text: edit.text });

function inOriginal(diagnostic: Diagnostic, repaired: RepairedText): Diagnostic {
  return {
    ...diagnostic,
    span: spanInOriginal(diagnostic.span, repaired),
    fixes: diagnostic.fixes?.map((fix) => ({ ...fix, edits: fix.edits.map((edit) => editInOriginal(edit, repaired)) })),
  };
}
