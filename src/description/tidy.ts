import { applyEdits, type TextEdit } from '../base/diagnostic';
import { layoutEdits } from './tree/layoutEdits';
import type { TreeNode } from './tree/treeNode';
import { yamlTree } from './tree/yamlTree';

/**
 * The text in its canonical layout: two columns for each level, lists one level below their key, one space after a colon
 * and a dash, no more than one empty line at a time, no white space at line ends. Keys keep their order, phrases their
 * words, comments their text and, where they fit, their column. Only white space changes and never what the text means: a
 * text that YAML cannot read safely is returned as it is.
 */
export function tidy(text: string): { text: string; edits: TextEdit[] } {
  const unchanged = { text, edits: [] };
  const before = yamlTree(text);
  if (!before.sound || before.root?.form !== 'mapping') return unchanged;
  const edits = layoutEdits(text);
  if (!edits || edits.length === 0) return unchanged;
  const laid = applyEdits(text, edits);
  const after = yamlTree(laid);
  return after.sound && sameMeaning(before.root, after.root) ? { text: laid, edits } : unchanged;
}

/** True where two trees hold the same keys and phrases in the same order. */
export function sameMeaning(a: TreeNode | null, b: TreeNode | null): boolean {
  if (!a || !b) return a === b;
  if (a.form === 'scalar') return b.form === 'scalar' && a.phrase.text === b.phrase.text;
  if (a.form === 'list') return b.form === 'list' && a.items.length === b.items.length && a.items.every((item, i) => sameMeaning(item, b.items[i]));
  return b.form === 'mapping' && a.entries.length === b.entries.length
    && a.entries.every(({ key, value }, i) => key.phrase.text === b.entries[i].key.phrase.text && sameMeaning(value, b.entries[i].value));
}
