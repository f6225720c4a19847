import type { Report } from '../../base/diagnostic';
import type { Span } from '../../base/span';
import { plainPhrase } from '../phrase/phrase';
import { quotePhrase } from './quotePhrase';
import type { ListNode, MappingNode, ScalarNode, TreeEntry, TreeNode } from './treeNode';

/** Keys that may stand inside braces with nothing after them, while one types. */
const knownKeys = /^(file|fixture|header|json|symbol)$/;

/**
 * Joins what commas cut apart inside brackets and braces: `{a: 50 Ω, 11 mm}` is the key `a` with the phrase `50 Ω` and
 * the key `11 mm` with nothing to YAML. Reported; the joined phrase is read on.
 */
export function joinFlowCommas(node: TreeNode, text: string, report: Report): TreeNode {
  if (node.form === 'list') return joinInList(node, text, report);
  return node.form === 'mapping' ? joinInMapping(node, text, report) : node;
}

function joinInList(list: ListNode, text: string, report: Report): ListNode {
  const items: (TreeNode | null)[] = [];
  const itemSpans: Span[] = [];
  for (let i = 0; i < list.items.length; i++) {
    const item = list.items[i];
    let end = i;
    const entry = list.flow && item?.form === 'mapping' && item.entries.length === 1 ? item.entries[0] : null;
    if (entry?.value && isPlain(entry.value)) while (isPlain(list.items[end + 1])) end++;
    if (item && entry && end > i) {
      const joined = join(entry, list.items[end] as TreeNode, text, report);
      items.push({ ...(item as MappingNode), entries: [joined], span: joined.span });
      itemSpans.push(joined.span);
      i = end;
    } else {
      items.push(item && joinFlowCommas(item, text, report));
      itemSpans.push(list.itemSpans[i]);
    }
  }
  return { ...list, items, itemSpans };
}

function joinInMapping(mapping: MappingNode, text: string, report: Report): MappingNode {
  const entries: TreeEntry[] = [];
  for (let i = 0; i < mapping.entries.length; i++) {
    const entry = mapping.entries[i];
    let end = i;
    if (mapping.flow && entry.value && isPlain(entry.value)) {
      while (mapping.entries[end + 1]?.value === null && !knownKeys.test(mapping.entries[end + 1].key.phrase.text)) end++;
    }
    if (end > i) entries.push(join(entry, mapping.entries[end].key, text, report));
    else entries.push(entry.value ? { ...entry, value: joinFlowCommas(entry.value, text, report) } : entry);
    i = end;
  }
  return { ...mapping, entries };
}

const isPlain = (node: TreeNode | null | undefined): node is ScalarNode => node?.form === 'scalar' && node.style === 'plain';

function join(entry: TreeEntry, last: TreeNode, text: string, report: Report): TreeEntry {
  const start = (entry.value as ScalarNode).span.start;
  const end = last.span.end;
  report({
    code: 'flow-comma', severity: 'error', span: { start, end },
    message: 'Inside brackets or braces a comma ends the phrase; put a phrase with commas in quotes.',
    fixes: [{ title: 'Put the phrase in quotes', edits: quotePhrase(text, start, end), preferred: true }],
  });
  const value: ScalarNode = { form: 'scalar', style: 'plain', span: { start, end }, phrase: plainPhrase(text.slice(start, end).replace(/[\n\r]/g, ' '), start) };
  return { key: entry.key, value, span: { start: entry.span.start, end } };
}
