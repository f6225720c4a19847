import type { Located } from '../base/span';
import type { ScalarNode, TreeNode } from './tree/treeNode';
import { yamlTree } from './tree/yamlTree';

/** Where names of `let` are used in the expressions of a text: after `=`, in parentheses or to the end of the phrase. */
export function letUses(text: string, names: ReadonlySet<string>): Located<string>[] {
  return names.size === 0 ? [] : scalarsOf(yamlTree(text).root).flatMap((scalar) => usesIn(scalar, names));
}

function usesIn({ phrase }: ScalarNode, names: ReadonlySet<string>): Located<string>[] {
  const found: Located<string>[] = [];
  for (const equals of phrase.text.matchAll(/(?<![<>=])=(?!=)\s*(\(?)/g)) {
    const start = equals.index + equals[0].length;
    const end = equals[1] === '(' ? closing(phrase.text, start) : phrase.text.length;
    for (const word of phrase.text.slice(start, end).matchAll(/[\p{L}_][\p{L}\d_]*/gu)) {
      const at = start + word.index;
      if (names.has(word[0])) found.push({ value: word[0], span: { start: phrase.at(at), end: phrase.at(at + word[0].length) } });
    }
  }
  return found;
}

/** Where the parenthesis that was opened before `start` is closed, else the end of the text. */
function closing(text: string, start: number): number {
  let depth = 1;
  for (let i = start; i < text.length; i++) {
    if (text[i] === '(') depth++;
    else if (text[i] === ')' && --depth === 0) return i;
  }
  return text.length;
}

function scalarsOf(node: TreeNode | null): ScalarNode[] {
  if (!node) return [];
  if (node.form === 'scalar') return [node];
  return node.form === 'list' ? node.items.flatMap(scalarsOf) : node.entries.flatMap(({ value }) => scalarsOf(value));
}
