import type { YAMLError } from 'yaml';
import type { Diagnostic } from '../../base/diagnostic';
import type { Span } from '../../base/span';
import type { Composed } from './composeYaml';
import { lineAt } from './lineAt';
import { phraseEndOnLine } from './quotePhrase';
import type { RepairedText } from './repairedText';
import { yamlErrorText } from './yamlErrorText';

/** Told by `refusedFeatures` or by the count of documents. */
const toldElsewhere: ReadonlySet<string> = new Set(['BAD_ALIAS', 'ALIAS_PROPS', 'TAG_RESOLVE_FAILED', 'BAD_COLLECTION_TYPE', 'MULTIPLE_ANCHORS', 'MULTIPLE_TAGS', 'MULTIPLE_DOCS']);

/** One bad text makes thousands of errors, nearly all of them echoes. */
const errorsLookedAt = 500;

/** YAML's errors in our words, at most one a line; once it has lost the thread, what follows is only an echo. */
export function remainingErrors({ errors }: Composed, repaired: RepairedText, original: string): Diagnostic[] {
  const found: Diagnostic[] = [];
  const lines = new Set<number>();
  let lost = false;
  for (const error of errors.slice(0, errorsLookedAt)) {
    if (toldElsewhere.has(error.code) || /Missing closing|^Flow (sequence|map)/.test(error.message)) continue;
    const astray = /in YAML stream|at node end/.test(error.message);
    if (astray && lost) continue;
    lost ||= astray;
    const diagnostic = inOurWords(error, repaired, original);
    const line = lineAt(original, diagnostic.span.start).start;
    if (!lines.has(line)) found.push(diagnostic);
    lines.add(line);
  }
  return found;
}

function inOurWords(error: YAMLError, { text, toOriginal }: RepairedText, original: string): Diagnostic {
  const at = Math.min(toOriginal(error.pos[0]), original.length);
  const line = lineAt(original, at);
  const stated = Math.min(Math.max(toOriginal(error.pos[1]), at), line.start + line.text.length);
  const rest = lineAt(text, error.pos[0]);
  const later = rest.text.slice(error.pos[0] - rest.start);
  return { ...yamlErrorText(error, text.slice(Math.max(error.pos[0] - 200, 0), error.pos[0]), later), severity: 'error', span: stated - at > 1 ? { start: at, end: stated } : wider(original, at) };
}

/** From one character to the rest of its phrase, or to the white space before the line's first word. */
function wider(original: string, at: number): Span {
  if (!/[ \t]/.test(original[at] ?? '')) return { start: at, end: Math.max(phraseEndOnLine(original, at), at) };
  const line = lineAt(original, at);
  const indent = /^[ \t]*/.exec(line.text)?.[0].length ?? 0;
  return at < line.start + indent ? { start: line.start, end: line.start + indent } : { start: at, end: at + 1 };
}
