import type { Report } from '../../base/diagnostic';
import type { TreeEntry, TreeNode } from './treeNode';

/** The tree with each key at most once and without merge keys; what was taken out is reported. */
export function checkKeys(node: TreeNode, report: Report): TreeNode {
  if (node.form === 'list') return { ...node, items: node.items.map((item) => item && checkKeys(item, report)) };
  if (node.form !== 'mapping') return node;
  const seen = new Set<string>();
  const entries: TreeEntry[] = [];
  for (const entry of node.entries) {
    const { text } = entry.key.phrase;
    if (text === '<<' && entry.key.style === 'plain') {
      report({ code: 'yaml-merge', severity: 'error', span: entry.key.span, message: 'Merge keys (<<) are not part of a match description; write the entries out.' });
      continue;
    }
    if (seen.has(text)) {
      report({ code: 'duplicate-key', severity: 'error', span: entry.key.span, message: `«${text}» stands here twice; only the first one counts.` });
      continue;
    }
    seen.add(text);
    entries.push(entry.value ? { ...entry, value: checkKeys(entry.value, report) } : entry);
  }
  return { ...node, entries };
}
