import type { Diagnostic, TextEdit } from '../../base/diagnostic';
import { contains, overlaps, type Span } from '../../base/span';
import { diagnosticsAtMost, repairRoundsAtMost, skippedCharactersAtMost, skippedLinesAtMost, yamlErrorsAtMost } from '../limits';
import { checkKeys } from './checkKeys';
import { composeYaml, type Composed } from './composeYaml';
import { joinFlowCommas } from './joinFlowCommas';
import { lineAt } from './lineAt';
import { mendTraps } from './mendTraps';
import { nestingGuard } from './nestingGuard';
import { refusedFeatures } from './refusedFeatures';
import { remainingErrors } from './remainingErrors';
import { repairedText, type RepairedText } from './repairedText';
import { silentComments } from './silentComments';
import { skippedLines } from './skippedLines';
import { splitMissingSpace } from './splitMissingSpace';
import { treeFromYaml } from './treeFromYaml';
import type { TreeNode } from './treeNode';

/** A text as YAML sees it, with everything that YAML (or we) cannot accept in it. */
export interface YamlTree {
  /** Null for an empty text and for one that is refused as a whole. */
  readonly root: TreeNode | null;
  readonly diagnostics: readonly Diagnostic[];
  /** False where YAML itself found the text wrong; `root` is then a guess. */
  readonly sound: boolean;
  /** Starts of the lines that no repair made readable. */
  readonly unexplained: readonly number[];
}

interface Reading {
  readonly repaired: RepairedText;
  readonly composed: Composed;
}

const controlCharacters = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/g;

/**
 * Reads any text and never throws. Scalars keep their text and the way back to their places; keys and values are never
 * turned into numbers or null. Common traps of YAML are mended for the rest of the reading, and reported; a line that
 * stays unreadable is left out, so that the others count.
 */
export function yamlTree(text: string): YamlTree {
  const refusal = nestingGuard(text);
  if (refusal) return { root: null, diagnostics: [refusal], sound: false, unexplained: [] };
  const diagnostics: Diagnostic[] = controlCharactersIn(text);
  const clean = text.replace(controlCharacters, ' ');
  const edits: TextEdit[] = [];
  let reading = read(clean, edits);
  for (let round = 0; round < repairRoundsAtMost; round++) {
    const told = mendTraps(reading.repaired, reading.composed, edits);
    if (told.length === 0) break;
    diagnostics.push(...told);
    reading = read(clean, edits);
  }
  if (reading.composed.tooDeep !== null) {
    const start = Math.min(reading.repaired.toOriginal(reading.composed.tooDeep), text.length);
    diagnostics.push(error('nested-too-deeply', 'This is nested too deeply; a match description never is.', { start, end: Math.min(start + 1, text.length) }));
    return { root: null, diagnostics, sound: false, unexplained: [] };
  }
  const skipped = skipLines(clean, edits, reading);
  reading = skipped.reading;
  const { repaired, composed } = reading;
  const { toOriginal } = repaired;
  diagnostics.push(...refusedFeatures(composed, toOriginal));
  if (composed.second !== null) {
    const start = toOriginal(composed.second);
    diagnostics.push(error('yaml-documents', 'One file is one match description: several documents (---) are not read.', { start, end: Math.min(start + 3, text.length) }));
  }
  const told = new Set(diagnostics.map(({ span }) => lineAt(text, span.start).start));
  const rest = [...skipped.told, ...remainingErrors(composed, repaired, text)].filter(({ span }) => !told.has(lineAt(text, span.start).start)).slice(0, yamlErrorsAtMost);
  const sound = diagnostics.length === 0 && rest.length === 0 && composed.errors.length === 0;
  diagnostics.push(...rest);
  const unexplained = rest.map(({ span }) => lineAt(text, span.start).start);
  // A complex key is a mistake of its own only where YAML has nothing to say about its line.
  const complexKeys: Diagnostic[] = [];
  const contents = composed.document?.contents;
  const root = contents ? treeFromYaml(contents, repaired, (diagnostic) => { if (complexKeys.length < diagnosticsAtMost) complexKeys.push(diagnostic); }) : null;
  diagnostics.push(...complexKeys.filter(({ span }) => !unexplained.includes(lineAt(text, span.start).start)));
  diagnostics.push(...silentComments(composed.tokens, repaired));
  const report = (diagnostic: Diagnostic) => void diagnostics.push(diagnostic);
  return { root: root && checkKeys(joinFlowCommas(splitMissingSpace(root, report), text, report), report), diagnostics, sound, unexplained };
}

const error = (code: string, message: string, span: Span): Diagnostic => ({ code, severity: 'error', message, span });

function controlCharactersIn(text: string): Diagnostic[] {
  // What a reader of bytes puts where they are no UTF-8. One place is enough to tell: the rest of the file has the same cause.
  const lost = text.indexOf('\ufffd');
  const notUtf8 = lost < 0 ? [] : [error('not-utf8', 'What stands here is not UTF-8; save the file as UTF-8, then write the character again.', { start: lost, end: lost + 1 })];
  const control = [...text.matchAll(controlCharacters)].slice(0, yamlErrorsAtMost)
    .map((found) => error('control-character', 'A control character does not belong in a match description; delete it.', { start: found.index, end: found.index + 1 }));
  return [...notUtf8, ...control];
}

function read(clean: string, edits: readonly TextEdit[]): Reading {
  const repaired = repairedText(clean, edits);
  return { repaired, composed: composeYaml(repaired.text) };
}

/** Leaves out the lines at which YAML fails, as long as that makes its errors fewer. */
function skipLines(clean: string, mended: readonly TextEdit[], first: Reading): { reading: Reading; told: Diagnostic[] } {
  const told: Diagnostic[] = [];
  let edits = mended;
  let reading = first;
  const rounds = Math.min(skippedLinesAtMost, Math.floor(skippedCharactersAtMost / Math.max(clean.length, 1)));
  for (let round = 0; round < rounds; round++) {
    const { repaired, composed } = reading;
    const better = skippedLines(composed, repaired, clean).map((edit) => {
      const others = edits.filter((other) => !overlaps(other.span, edit.span) && !contains(edit.span, other.span.start));
      return { edits: [...others, edit], reading: read(clean, [...others, edit]) };
    }).find((each) => each.reading.composed.tooDeep === null && each.reading.composed.errors.length < composed.errors.length);
    if (!better) break;
    const unclosed = refusedFeatures(composed, repaired.toOriginal).filter(({ code }) => code.startsWith('unclosed-'));
    told.push(...[...unclosed, ...remainingErrors(composed, repaired, clean)].slice(0, 1));
    ({ edits, reading } = better);
  }
  return { reading, told };
}
