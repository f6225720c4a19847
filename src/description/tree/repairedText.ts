import { applyEdits, type TextEdit } from '../../base/diagnostic';

/** A text with the repairs of YAML's traps in it, and the way back to the text as written. */
export interface RepairedText {
  readonly text: string;
  toOriginal(offset: number): number;
}

export function repairedText(original: string, edits: readonly TextEdit[]): RepairedText {
  if (edits.length === 0) return { text: original, toOriginal: (offset) => offset };
  const sorted = [...edits].sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end);
  return {
    text: applyEdits(original, sorted),
    toOriginal(offset) {
      let shift = 0;
      for (const edit of sorted) {
        const startThere = edit.span.start + shift;
        if (offset <= startThere) break;
        const endThere = startThere + edit.text.length;
        if (offset < endThere) return Math.min(edit.span.start + (offset - startThere), edit.span.end);
        shift += edit.text.length - (edit.span.end - edit.span.start);
      }
      return Math.min(Math.max(offset - shift, 0), original.length);
    },
  };
}
