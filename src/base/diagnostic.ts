import type { Span } from './span';

export type Severity = 'error' | 'warning' | 'info';

/** Replaces `span` of the text by `text`. */
export interface TextEdit {
  readonly span: Span;
  readonly text: string;
}

/** One way to mend a mistake: all of its edits together, as one undo step. */
export interface Fix {
  readonly title: string;
  readonly edits: readonly TextEdit[];
  /** True where there is no doubt that this is what was meant. */
  readonly preferred?: boolean;
}

/**
 * One remark on a text, as data. `code` is stable (kebab-case, e.g. `unknown-key`): programs match on it and never on the
 * message. The message is one or two plain sentences, names the offending words, and says what would be right.
 */
export interface Diagnostic {
  readonly code: string;
  readonly severity: Severity;
  readonly message: string;
  readonly span: Span;
  readonly fixes?: readonly Fix[];
}

/** Where readers put what they find. */
export type Report = (diagnostic: Diagnostic) => void;

/** The text after `edits`, which must not overlap. */
export function applyEdits(text: string, edits: readonly TextEdit[]): string {
  const sorted = [...edits].sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end);
  let result = '';
  let at = 0;
  for (const edit of sorted) {
    if (edit.span.start < at) throw new RangeError('edits overlap');
    result += text.slice(at, edit.span.start) + edit.text;
    at = edit.span.end;
  }
  return result + text.slice(at);
}
