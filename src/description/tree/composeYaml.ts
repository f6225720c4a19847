import { Composer, Parser, type CST, type Document, type YAMLError } from 'yaml';
import { treeDepthAtMost } from '../limits';
import { visitTokens } from './visitTokens';

export interface Composed {
  readonly document: Document | null;
  readonly tokens: readonly CST.Token[];
  readonly errors: readonly YAMLError[];
  /** Where a second document begins. */
  readonly second: number | null;
  /** Where the text is nested too deeply to be read at all. */
  readonly tooDeep: number | null;
}

/** What the YAML reader makes of a text. Every scalar stays the text that it is; keys may stand twice (we report them). */
export function composeYaml(text: string): Composed {
  const tokens = [...new Parser().parse(text)];
  const tooDeep = deepToken(tokens);
  if (tooDeep !== null) return { document: null, tokens: [], errors: [], second: null, tooDeep };
  const composer = new Composer({ schema: 'failsafe', uniqueKeys: false, keepSourceTokens: true, prettyErrors: false, strict: true, version: '1.2', merge: false });
  const documents = [...composer.compose(tokens, true, text.length)];
  const later = documents[1] ? tokens.filter((token) => token.type === 'document')[1] : undefined;
  return { document: documents[0] ?? null, tokens, errors: documents[0]?.errors ?? [], second: later ? later.offset : null, tooDeep: null };
}

/** Where the tree of tokens gets deeper than the reader, which recurses, may go. */
function deepToken(tokens: readonly CST.Token[]): number | null {
  let found: number | null = null;
  visitTokens(tokens, (token, depth) => {
    if (depth > treeDepthAtMost) found ??= token.offset;
  });
  return found;
}
