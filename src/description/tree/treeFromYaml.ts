import { isMap, isScalar, isSeq, type Node, type Scalar } from 'yaml';
import type { Report } from '../../base/diagnostic';
import type { Span } from '../../base/span';
import type { RepairedText } from './repairedText';
import { scalarPhrase } from './scalarPhrase';
import type { ScalarNode, ScalarStyle, TreeEntry, TreeNode } from './treeNode';

/** YAML's nodes as ours, with places in the original text. Null for nothing, and for an alias. */
export function treeFromYaml(node: Node, repaired: RepairedText, report: Report): TreeNode | null {
  const span = nodeSpan(node, repaired);
  if (isScalar(node)) return isEmpty(node) ? null : scalarNode(node, repaired);
  if (isSeq(node)) {
    const items = node.items.map((item) => treeFromYaml(item as Node, repaired, report));
    return { form: 'list', span, flow: node.flow === true, items, itemSpans: items.map((item, i) => item?.span ?? emptyItemSpan(node.items[i] as Node | null, span, repaired)) };
  }
  if (!isMap(node)) return null;
  const entries: TreeEntry[] = [];
  for (const pair of node.items) {
    const keyNode = pair.key as Node | null;
    const valueNode = pair.value as Node | null;
    const value = valueNode ? treeFromYaml(valueNode, repaired, report) : null;
    if (!isScalar(keyNode) || !keyNode.range) {
      if (keyNode?.range) report({ code: 'complex-key', severity: 'error', message: 'A key is a word or a few, never a list or a mapping.', span: nodeSpan(keyNode, repaired) });
      continue;
    }
    const key = scalarNode(keyNode, repaired);
    entries.push({ key, value, span: { start: key.span.start, end: value ? value.span.end : key.span.end } });
  }
  return { form: 'mapping', span, flow: node.flow === true, entries };
}

/** The dash before nothing; the whole list where there is none (an empty item in brackets). */
function emptyItemSpan(node: Node | null, list: Span, repaired: RepairedText): Span {
  if (!node?.range) return list;
  const dash = repaired.text.lastIndexOf('-', node.range[0]);
  const start = repaired.toOriginal(Math.max(dash, 0));
  return dash >= 0 && start >= list.start && start < list.end ? { start, end: start + 1 } : list;
}

function nodeSpan(node: Node, repaired: RepairedText): Span {
  const [start, end] = node.range ?? [0, 0];
  // A block collection's range reaches to the next line with text; ours ends with its own last sign.
  const trimmed = start + repaired.text.slice(start, end).trimEnd().length;
  return { start: repaired.toOriginal(start), end: repaired.toOriginal(Math.max(start, trimmed)) };
}

const isEmpty = (node: Scalar): boolean => !node.range || (node.range[0] === node.range[1] && styleOf(node) === 'plain');

function styleOf(node: Scalar): ScalarStyle {
  if (node.type === 'QUOTE_DOUBLE') return 'double';
  if (node.type === 'QUOTE_SINGLE') return 'single';
  return node.type === 'BLOCK_FOLDED' || node.type === 'BLOCK_LITERAL' ? 'block' : 'plain';
}

function scalarNode(node: Scalar, repaired: RepairedText): ScalarNode {
  const [start, end] = node.range ?? [0, 0];
  const style = styleOf(node);
  const source = repaired.text.slice(start, end);
  const value = typeof node.value === 'string' ? node.value : style === 'plain' ? source : '';
  return { form: 'scalar', style, span: nodeSpan(node, repaired), phrase: scalarPhrase(value, source, start, style, repaired.toOriginal) };
}
