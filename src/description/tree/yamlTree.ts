import { Composer, isMap, isScalar, isSeq, Parser, type CST, type Document, type Node, type Scalar, type YAMLError } from 'yaml';
import type { Diagnostic, Report, TextEdit } from '../../base/diagnostic';
import { overlaps, type Span } from '../../base/span';
import { repairRoundsAtMost, repairsAtMost, yamlErrorsAtMost } from '../limits';
import { checkKeys } from './checkKeys';
import { joinFlowCommas } from './joinFlowCommas';
import { nestingGuard } from './nestingGuard';
import { refusedFeatures } from './refusedFeatures';
import { repairedText, type RepairedText } from './repairedText';
import { scalarPhrase } from './scalarPhrase';
import { silentComments } from './silentComments';
import { splitMissingSpace } from './splitMissingSpace';
import type { ScalarNode, ScalarStyle, TreeEntry, TreeNode } from './treeNode';
import { yamlErrorText } from './yamlErrorText';
import { lineAt, missingSpaceTrap, trapOnLine, type Trap } from './yamlTraps';

/** A text as YAML sees it, with everything that YAML (or we) cannot accept in it. */
export interface YamlTree {
  /** Null for an empty text and for one that is refused as a whole. */
  readonly root: TreeNode | null;
  readonly diagnostics: readonly Diagnostic[];
  /** False where YAML itself found the text wrong; `root` is then a guess. */
  readonly sound: boolean;
  /** Starts of the lines with errors of YAML that no repair took away. */
  readonly unexplained: readonly number[];
}

interface Composed {
  readonly document: Document | null;
  readonly tokens: readonly CST.Token[];
  readonly errors: readonly YAMLError[];
  /** Where a second document begins. */
  readonly second: number | null;
}

/** Told by `refusedFeatures` or by the count of documents. */
const toldElsewhere: ReadonlySet<string> = new Set(['BAD_ALIAS', 'ALIAS_PROPS', 'TAG_RESOLVE_FAILED', 'BAD_COLLECTION_TYPE', 'MULTIPLE_ANCHORS', 'MULTIPLE_TAGS', 'MULTIPLE_DOCS']);
const controlCharacters = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/g;

/**
 * Reads any text and never throws. Scalars keep their text and the way back to their places; keys and values are never
 * turned into numbers or null. Common traps of YAML are mended for the rest of the reading, and reported.
 */
export function yamlTree(text: string): YamlTree {
  const refusal = nestingGuard(text);
  if (refusal) return { root: null, diagnostics: [refusal], sound: false, unexplained: [] };
  const diagnostics: Diagnostic[] = [];
  for (const found of text.matchAll(controlCharacters)) {
    if (diagnostics.length >= yamlErrorsAtMost) break;
    diagnostics.push(error('control-character', 'A control character does not belong in a match description; delete it.', { start: found.index, end: found.index + 1 }));
  }
  const clean = text.replace(controlCharacters, ' ');
  let repaired = repairedText(clean, []);
  let composed = compose(repaired.text);
  const edits: TextEdit[] = [];
  for (let round = 0; round < repairRoundsAtMost; round++) {
    const traps = findTraps(repaired, composed).filter((trap) => addEdits(edits, trap, repaired));
    if (traps.length === 0) break;
    for (const trap of traps) diagnostics.push(inOriginal(trap.diagnostic, repaired));
    repaired = repairedText(clean, edits);
    if (nestingGuard(repaired.text)) return { root: null, diagnostics, sound: false, unexplained: [] };
    composed = compose(repaired.text);
  }
  const toOriginal = repaired.toOriginal;
  diagnostics.push(...refusedFeatures(composed.tokens, toOriginal));
  if (composed.second !== null) {
    const start = toOriginal(composed.second);
    diagnostics.push(error('yaml-documents', 'One file is one match description: several documents (---) are not read.', { start, end: Math.min(start + 3, text.length) }));
  }
  const sound = diagnostics.length === 0 && composed.errors.length === 0;
  const unexplained = addRemaining(diagnostics, composed.errors, repaired, text);
  const { contents } = composed.document ?? {};
  // A complex key is a mistake of its own only where YAML has nothing to say about its line.
  const complexKeys: Diagnostic[] = [];
  const root = contents ? treeNode(contents, repaired, (diagnostic) => complexKeys.push(diagnostic)) : null;
  diagnostics.push(...complexKeys.filter(({ span }) => !unexplained.includes(lineAt(text, span.start).start)));
  diagnostics.push(...silentComments(composed.tokens, repaired));
  const report = (diagnostic: Diagnostic) => void diagnostics.push(diagnostic);
  return { root: root && checkKeys(joinFlowCommas(splitMissingSpace(root, report), text, report), report), diagnostics, sound, unexplained };
}

const error = (code: string, message: string, span: Span): Diagnostic => ({ code, severity: 'error', message, span });

function compose(text: string): Composed {
  const tokens = [...new Parser().parse(text)];
  const composer = new Composer({ schema: 'failsafe', uniqueKeys: false, keepSourceTokens: true, prettyErrors: false, strict: true, version: '1.2', merge: false });
  const documents = [...composer.compose(tokens, true, text.length)];
  const errors = documents.slice(0, 1).flatMap((document) => document.errors);
  const later = documents[1] ? tokens.filter((token) => token.type === 'document')[1] : undefined;
  return { document: documents[0] ?? null, tokens, errors, second: later ? later.offset : null };
}

/** Traps behind the errors, at most one a line. */
function findTraps(repaired: RepairedText, composed: Composed): Trap[] {
  const { text } = repaired;
  const traps = new Map<number, Trap>();
  const offer = (offset: number, trap: Trap | null) => {
    const { start } = lineAt(text, offset);
    if (trap && !traps.has(start) && traps.size < repairsAtMost) traps.set(start, trap);
  };
  for (const { code, pos, message } of composed.errors.slice(0, repairsAtMost)) {
    const spaceMissing = code === 'MULTILINE_IMPLICIT_KEY' || /Implicit map keys need/.test(message);
    offer(pos[0], trapOnLine(text, pos[0], spaceMissing));
    if (spaceMissing) forEachLine(text, pos[0], pos[1], (line) => offer(line.start, missingSpaceTrap(line)));
  }
  const contents = composed.document?.contents;
  if (isScalar(contents) && contents.range) {
    forEachLine(text, contents.range[0], contents.range[1], (line) => offer(line.start, missingSpaceTrap(line)));
  }
  return [...traps.values()];
}

function forEachLine(text: string, start: number, end: number, visit: (line: { start: number; text: string }) => void): void {
  for (let at = start, count = 0; at <= end && count < repairsAtMost; count++) {
    const line = lineAt(text, at);
    visit(line);
    at = line.start + line.text.length + 1;
  }
}

/** Adds a trap's edits, in the original's offsets, where they touch none that are there. */
function addEdits(edits: TextEdit[], trap: Trap, repaired: RepairedText): boolean {
  const moved = trap.edits.map((edit) => editInOriginal(edit, repaired));
  const clash = moved.some((a) => edits.some((b) => overlaps(a.span, b.span) || a.span.start === b.span.start));
  if (clash || edits.length + moved.length > repairsAtMost * 4) return false;
  edits.push(...moved);
  return true;
}

const spanInOriginal = (span: Span, repaired: RepairedText): Span => ({ start: repaired.toOriginal(span.start), end: repaired.toOriginal(span.end) });
const editInOriginal = (edit: TextEdit, repaired: RepairedText): TextEdit => ({ span: spanInOriginal(edit.span, repaired), text: edit.text });

function inOriginal(diagnostic: Diagnostic, repaired: RepairedText): Diagnostic {
  return {
    ...diagnostic,
    span: spanInOriginal(diagnostic.span, repaired),
    fixes: diagnostic.fixes?.map((fix) => ({ ...fix, edits: fix.edits.map((edit) => editInOriginal(edit, repaired)) })),
  };
}

/** Errors that no trap explains, at most one a line: the first one is the cause, the others its echo. */
function addRemaining(diagnostics: Diagnostic[], errors: readonly YAMLError[], repaired: RepairedText, text: string): number[] {
  const unexplained: number[] = [];
  const told = new Set(diagnostics.map(({ span }) => lineAt(text, span.start).start));
  let count = 0;
  for (const found of errors) {
    if (toldElsewhere.has(found.code) || /Missing closing|^Flow (sequence|map)/.test(found.message)) continue;
    const start = Math.min(repaired.toOriginal(found.pos[0]), text.length);
    const line = lineAt(text, start).start;
    unexplained.push(line);
    if (told.has(line) || ++count > yamlErrorsAtMost) continue;
    told.add(line);
    const end = Math.min(Math.max(repaired.toOriginal(found.pos[1]), start), lineAt(text, start).start + lineAt(text, start).text.length);
    diagnostics.push({ ...yamlErrorText(found), severity: 'error', span: { start, end: Math.max(start, end) } });
  }
  return unexplained;
}

function treeNode(node: Node, repaired: RepairedText, report: Report): TreeNode | null {
  const span = nodeSpan(node, repaired);
  if (isScalar(node)) return isEmpty(node) ? null : scalarNode(node, repaired);
  if (isSeq(node)) {
    const items = node.items.map((item) => treeNode(item as Node, repaired, report));
    return { form: 'list', span, flow: node.flow === true, items, itemSpans: items.map((item, i) => item?.span ?? emptyItemSpan(node.items[i] as Node | null, span, repaired)) };
  }
  if (!isMap(node)) return null; // an alias, refused above
  const entries: TreeEntry[] = [];
  for (const pair of node.items) {
    const keyNode = pair.key as Node | null;
    const valueNode = pair.value as Node | null;
    const value = valueNode ? treeNode(valueNode, repaired, report) : null;
    if (!isScalar(keyNode) || !keyNode.range) {
      if (keyNode?.range) report(error('complex-key', 'A key is a word or a few, never a list or a mapping.', nodeSpan(keyNode, repaired)));
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
