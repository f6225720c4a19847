import type { CST } from 'yaml';

/** Calls `visit` for every token of a concrete syntax tree with its depth, in the order of the text. Does not recurse: mistakes make deep trees. */
export function visitTokens(tokens: readonly CST.Token[], visit: (token: CST.Token, depth: number) => void): void {
  const waiting: { token: CST.Token; depth: number }[] = [];
  const add = (children: readonly (CST.Token | null | undefined)[], depth: number): void => {
    for (let i = children.length - 1; i >= 0; i--) {
      const token = children[i];
      if (token) waiting.push({ token, depth });
    }
  };
  add(tokens, 0);
  for (let next = waiting.pop(); next; next = waiting.pop()) {
    visit(next.token, next.depth);
    add(childrenOf(next.token), next.depth + 1);
  }
}

function childrenOf(token: CST.Token): (CST.Token | null | undefined)[] {
  const children: (CST.Token | null | undefined)[] = [];
  if ('start' in token) {
    if (Array.isArray(token.start)) for (const each of token.start) children.push(each);
    else children.push(token.start);
  }
  if ('props' in token) for (const each of token.props) children.push(each);
  if ('items' in token) {
    for (const item of token.items) {
      for (const each of item.start) children.push(each);
      children.push(item.key);
      for (const each of item.sep ?? []) children.push(each);
      children.push(item.value);
    }
  }
  if ('value' in token && typeof token.value === 'object') children.push(token.value);
  if ('end' in token) for (const each of token.end ?? []) children.push(each);
  return children;
}
