import { contains, type Span } from '../../base/span';
import type { ScalarNode, TreeNode } from './treeNode';

export interface FoundScalar {
  readonly scalar: ScalarNode;
  /** Inside brackets or braces. */
  readonly flow: boolean;
}

/** The scalar that holds a span; null where none does. */
export function findScalar(node: TreeNode | null, span: Span, flow = false): FoundScalar | null {
  if (!node || !contains(node.span, span.start) || !contains(node.span, span.end)) return null;
  if (node.form === 'scalar') return { scalar: node, flow };
  const inner = flow || node.flow;
  const children = node.form === 'list' ? node.items : node.entries.flatMap((entry) => [entry.key, entry.value]);
  for (const child of children) {
    const found = findScalar(child, span, inner);
    if (found) return found;
  }
  return null;
}
