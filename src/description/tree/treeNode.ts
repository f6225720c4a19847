import type { Span } from '../../base/span';
import type { Phrase } from '../phrase/phrase';

/** What YAML says of a text, as read from the text itself: no numbers, no null, only phrases. */
export type TreeNode = ScalarNode | MappingNode | ListNode;

export type ScalarStyle = 'plain' | 'single' | 'double' | 'block';

export interface ScalarNode {
  readonly form: 'scalar';
  /** With its quotes or block header. */
  readonly span: Span;
  readonly phrase: Phrase;
  readonly style: ScalarStyle;
}

export interface TreeEntry {
  readonly key: ScalarNode;
  /** Null where nothing stands after the colon. */
  readonly value: TreeNode | null;
  readonly span: Span;
}

export interface MappingNode {
  readonly form: 'mapping';
  readonly span: Span;
  readonly entries: readonly TreeEntry[];
  /** In braces. */
  readonly flow: boolean;
}

export interface ListNode {
  readonly form: 'list';
  readonly span: Span;
  /** Null where nothing stands after the dash. */
  readonly items: readonly (TreeNode | null)[];
  /** Where each item stands; of one with nothing after its dash, the dash. */
  readonly itemSpans: readonly Span[];
  readonly flow: boolean;
}
