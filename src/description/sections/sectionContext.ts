import type { Diagnostic } from '../../base/diagnostic';
import type { Located, Span } from '../../base/span';
import type { LetValue, PhraseContext } from '../phrase/phrase';
import type { ListNode, MappingNode, ScalarNode, TreeEntry, TreeNode } from '../tree/treeNode';

/** What the readers of the sections share: where to report, the names of `let`, and the text itself. */
export interface SectionContext extends PhraseContext {
  readonly text: string;
  readonly lets: ReadonlyMap<string, LetValue>;
}

export const mistake = (code: string, message: string, span: Span, more: Partial<Diagnostic> = {}): Diagnostic => ({ code, severity: 'error', message, span, ...more });

/** The text of a scalar without its quotes, with its place. */
export function located(node: ScalarNode): Located<string> {
  const { text } = node.phrase;
  const start = text.length - text.trimStart().length;
  const end = Math.max(start, text.trimEnd().length);
  return { value: text.trim(), span: { start: node.phrase.at(start), end: node.phrase.at(end) } };
}

/** The phrase after a key, or null after reporting what stands there instead. */
export function expectScalar(entry: TreeEntry, context: SectionContext): ScalarNode | null {
  if (entry.value?.form === 'scalar') return entry.value;
  reportShape(entry, 'a phrase', context);
  return null;
}

export function expectMapping(entry: TreeEntry, of: string, context: SectionContext): MappingNode | null {
  if (entry.value?.form === 'mapping') return entry.value;
  reportShape(entry, `lines of «${of}»`, context);
  return null;
}

export function expectList(entry: TreeEntry, of: string, context: SectionContext): ListNode | null {
  if (entry.value?.form === 'list') return entry.value;
  reportShape(entry, `a list, one line with a dash for each ${of}`, context);
  return null;
}

/** Reports that something else stands after a key than what it holds. */
export function reportShape(entry: TreeEntry, expected: string, context: SectionContext): void {
  const name = entry.key.phrase.text;
  if (!entry.value) {
    context.report(mistake('missing-value', `«${name}» has nothing after its colon; ${expected} is expected.`, entry.key.span));
    return;
  }
  const hint = entry.value.form !== 'scalar' && entry.value.flow ? ' A phrase that starts with a bracket or brace stands in quotes.' : '';
  context.report(mistake('wrong-shape', `«${name}» holds ${expected}, not ${shapeOf(entry.value)}.${hint}`, entry.value.span));
}

export function shapeOf(node: TreeNode): string {
  if (node.form === 'scalar') return 'a phrase';
  return node.form === 'list' ? 'a list' : 'a mapping of keys';
}

/** The first so many of a list; a mistake at the first one that is left out. */
export function atMost<T extends { readonly span: Span } | null>(items: readonly T[], limit: number, what: string, context: SectionContext): readonly T[] {
  if (items.length <= limit) return items;
  const first = items[limit];
  if (first) context.report(mistake('too-many', `More than ${limit} ${what}; those from here on are left out.`, first.span));
  return items.slice(0, limit);
}
