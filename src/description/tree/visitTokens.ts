import type { CST } from 'yaml';

/** Calls `visit` for every token of a concrete syntax tree, in the order of the text. */
export function visitTokens(tokens: readonly CST.Token[], visit: (token: CST.Token) => void): void {
  const walk = (token: CST.Token | null | undefined): void => {
    if (!token) return;
    visit(token);
    if ('start' in token) (Array.isArray(token.start) ? token.start : [token.start]).forEach(walk);
    if ('props' in token) token.props.forEach(walk);
    if ('items' in token) {
      for (const item of token.items) {
        item.start.forEach(walk);
        walk(item.key);
        item.sep?.forEach(walk);
        walk(item.value);
      }
    }
    if ('value' in token && typeof token.value === 'object') walk(token.value);
    if ('end' in token) token.end?.forEach(walk);
  };
  tokens.forEach(walk);
}
