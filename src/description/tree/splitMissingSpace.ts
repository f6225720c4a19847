import type { Report } from '../../base/diagnostic';
import type { Phrase } from '../phrase/phrase';
import type { ScalarNode, TreeEntry, TreeNode } from './treeNode';

const words = /^(\p{L}[\p{L}\p{N}_ -]*):(?=[^\s:/\\])/u;

/**
 * Splits keys without a value at a colon that lacks its space (`{file:wet.s1p, …}`), and reports them. Inside braces YAML
 * itself sees nothing wrong there.
 */
export function splitMissingSpace(node: TreeNode, report: Report): TreeNode {
  if (node.form === 'list') return { ...node, items: node.items.map((item) => item && splitMissingSpace(item, report)) };
  if (node.form !== 'mapping') return node;
  return {
    ...node,
    entries: node.entries.map((entry) => {
      if (entry.value) return { ...entry, value: splitMissingSpace(entry.value, report) };
      return splitScalar(entry.key, report) ?? entry;
    }),
  };
}

/** `series L1:6.8 nH`, one plain phrase, as a key and its phrase; null where it is not of this form. */
export function splitScalar(scalar: ScalarNode, report: Report): TreeEntry | null {
  const found = scalar.style === 'plain' ? words.exec(scalar.phrase.text) : null;
  if (!found) return null;
  const colon = found[1].length;
  const at = scalar.phrase.at(colon);
  report({
    code: 'missing-space', severity: 'error', span: { start: at, end: at + 1 },
    message: `A space is missing after the colon of «${found[1]}»; without it YAML takes key and phrase as one word.`,
    fixes: [{ title: 'Insert a space', edits: [{ span: { start: at + 1, end: at + 1 }, text: ' ' }], preferred: true }],
  });
  const key = part(scalar, 0, colon);
  const value = part(scalar, colon + 1, scalar.phrase.text.length);
  return { key, value, span: scalar.span };
}

function part(scalar: ScalarNode, start: number, end: number): ScalarNode {
  const phrase: Phrase = { text: scalar.phrase.text.slice(start, end), at: (i) => scalar.phrase.at(start + i) };
  return { form: 'scalar', style: 'plain', phrase, span: { start: phrase.at(0), end: phrase.at(end - start) } };
}
