import { Parser, type CST } from 'yaml';
import type { TextEdit } from '../../base/diagnostic';
import { lineMap, type LineMap } from '../../base/lineMap';

/** Columns for each level. */
const step = 2;

interface Layout {
  readonly text: string;
  readonly lines: LineMap;
  /** New indentation by line, for lines on which an entry or a value begins. */
  readonly indents: Map<number, number>;
  /** Lines inside a phrase or brackets that began on an earlier line, with that line. */
  readonly continued: Map<number, number>;
  readonly edits: TextEdit[];
  /** The same edits by line, as far as they are within one. */
  readonly gaps: Map<number, TextEdit[]>;
}

/** The changes of white space that lay a text out; null where it is written in a way that is better left alone (`? key`). */
export function layoutEdits(text: string): TextEdit[] | null {
  const document = [...new Parser().parse(text)].find((token): token is CST.Document => token.type === 'document');
  if (document?.value?.type !== 'block-map') return null;
  const layout: Layout = { text, lines: lineMap(text), indents: new Map(), continued: new Map(), edits: [], gaps: new Map() };
  if (!layOutMap(document.value, 0, layout)) return null;
  layOutLines(layout);
  return layout.edits.filter((edit) => text.slice(edit.span.start, edit.span.end) !== edit.text);
}

const lineOf = (layout: Layout, offset: number) => layout.lines.positionAt(offset).line;

function layOutMap(map: CST.BlockMap, indent: number, layout: Layout): boolean {
  return map.items.every((item) => {
    if (item.explicitKey || !item.sep) return item.start.every((token) => token.type !== 'explicit-key-ind') && !item.key;
    if (!item.key || !('source' in item.key)) return false;
    beginOnLine(item.key.offset, indent, layout);
    const colon = item.sep.find((token) => token.type === 'map-value-ind');
    if (!colon) return false;
    const keyEnd = item.key.offset + item.key.source.length;
    gap(keyEnd, colon.offset, '', layout);
    return layOutValue(item.value, colon.offset + 1, indent, layout);
  });
}

function layOutList(list: CST.BlockSequence, indent: number, layout: Layout): boolean {
  return list.items.every((item) => {
    const dash = item.start.find((token) => token.type === 'seq-item-ind');
    if (!dash) return !item.value;
    beginOnLine(dash.offset, indent, layout);
    return layOutValue(item.value, dash.offset + 1, indent, layout);
  });
}

/** A value after its colon or dash, whose entry stands at `indent`. */
function layOutValue(value: CST.Token | undefined, after: number, indent: number, layout: Layout): boolean {
  if (!value) return true;
  if (lineOf(layout, value.offset) === lineOf(layout, after)) gap(after, value.offset, ' ', layout);
  if (value.type === 'block-map') return layOutMap(value, indent + step, layout);
  if (value.type === 'block-seq') return layOutList(value, indent + step, layout);
  beginOnLine(value.offset, indent + step, layout);
  const first = lineOf(layout, value.offset);
  const last = lineOf(layout, endOf(value));
  for (let line = first + 1; line <= last; line++) layout.continued.set(line, first);
  return true;
}

/** Where the text of a phrase or of brackets ends; a block of text ends before the line end that closes it. */
function endOf(token: CST.Token): number {
  if (token.type === 'flow-collection') {
    const last = token.items[token.items.length - 1];
    const inside = [last?.key, last?.value].map((each) => (each ? endOf(each) : 0));
    return Math.max(token.offset, ...inside, token.end[token.end.length - 1]?.offset ?? 0);
  }
  if (token.type === 'block-scalar') {
    const header = token.props.reduce((end, prop) => Math.max(end, 'source' in prop ? prop.offset + prop.source.length : end), token.offset);
    return Math.max(header + token.source.length - 1, header - 1);
  }
  return 'source' in token ? token.offset + token.source.length : token.offset;
}

/** Notes the new indentation of the line on which something begins, where nothing but white space (or what encloses it) stands before it. */
function beginOnLine(offset: number, indent: number, { text, lines, indents }: Layout): void {
  const { line, character } = lines.positionAt(offset);
  const { start } = lines.lineSpan(line);
  if (/^[ \t\ufeff]*$/.test(text.slice(start, start + character)) && !indents.has(line)) indents.set(line, indent);
}

/** Replaces white space between two offsets of one line; anything else there (a comment) is left alone. */
function gap(start: number, end: number, text: string, layout: Layout): void {
  if (/^[ \t]*$/.test(layout.text.slice(start, end))) layout.edits.push({ span: { start, end }, text });
}

function layOutLines(layout: Layout): void {
  const { text, lines, indents, continued, edits } = layout;
  for (const edit of edits) gapsOn(layout, lineOf(layout, edit.span.start)).push(edit);
  const next = nextEntries(layout);
  const contentEnd = text.trimEnd().length;
  let previous = -1;
  let emptyBefore = true;
  for (let line = 0; line < lines.lineCount; line++) {
    const { start, end } = lines.lineSpan(line);
    const content = text.slice(start, end);
    const from = continued.get(line);
    if (from !== undefined) {
      shiftContinued(line, from, layout);
      emptyBefore = false;
      previous = line;
      continue;
    }
    if (content.trim() === '' && !content.startsWith('\ufeff')) {
      // The last line of the text is empty where the one before it ends with a line end, as it should.
      const isLast = line === lines.lineCount - 1;
      if (isLast) edits.push({ span: { start, end }, text: '' });
      else if (emptyBefore || start >= contentEnd) edits.push({ span: { start, end: lines.lineSpan(line + 1).start }, text: '' });
      else edits.push({ span: { start, end }, text: '' });
      emptyBefore = true;
      continue;
    }
    emptyBefore = false;
    const isComment = content.trimStart().startsWith('#');
    const indent = indents.get(line) ?? (isComment ? commentIndent(line, previous, next[line + 1], layout) : null);
    if (indent !== null) setIndent(line, indent, layout);
    if (!isComment) {
      previous = line;
      moveComment(line, indent, layout);
    }
    if (!continued.has(line + 1)) trimEnd(line, layout);
    if (line === lines.lineCount - 1 && !continued.has(line)) edits.push({ span: { start: end, end }, text: /\r\n|\n|\r/.exec(text)?.[0] ?? '\n' });
  }
}

const indentOf = (layout: Layout, line: number): number => {
  const { start, end } = layout.lines.lineSpan(line);
  return /^[ \t]*/.exec(layout.text.slice(start, end))?.[0].length ?? 0;
};

/** The spaces that are set on one line. */
function gapsOn({ gaps }: Layout, line: number): TextEdit[] {
  const found = gaps.get(line) ?? [];
  gaps.set(line, found);
  return found;
}

/** For each line the next one below it that says something (no comment, nothing empty, not inside a phrase). */
function nextEntries({ text, lines, indents, continued }: Layout): Int32Array {
  const next = new Int32Array(lines.lineCount + 1).fill(lines.lineCount);
  for (let line = lines.lineCount - 1; line >= 0; line--) {
    const { start, end } = lines.lineSpan(line);
    const content = text.slice(start, end).trim();
    const says = indents.has(line) || (content !== '' && !content.startsWith('#') && !continued.has(line));
    next[line] = says ? line : next[line + 1];
  }
  return next;
}

function setIndent(line: number, indent: number, layout: Layout): void {
  const { start } = layout.lines.lineSpan(line);
  if (layout.text[start] === '\ufeff') return;
  const edit = { span: { start, end: start + indentOf(layout, line) }, text: ' '.repeat(indent) };
  layout.edits.push(edit);
  gapsOn(layout, line).push(edit);
}

/** A line inside a phrase keeps its place relative to the line on which the phrase begins. */
function shiftContinued(line: number, from: number, layout: Layout): void {
  const { start, end } = layout.lines.lineSpan(line);
  if (layout.text.slice(start, end).trim() === '') return;
  const indent = layout.indents.get(from) ?? 0;
  const old = indentOf(layout, line);
  const moved = Math.max(old + indent - indentOf(layout, from), indent + 1);
  if (moved !== old) layout.edits.push({ span: { start, end: start + old }, text: ' '.repeat(moved) });
}

/** A comment line goes with the neighbour at whose column it stood, else with the next line that says something. */
function commentIndent(line: number, previous: number, next: number, layout: Layout): number {
  const { indents, continued } = layout;
  const own = indentOf(layout, line);
  const begun = previous >= 0 ? continued.get(previous) ?? previous : -1;
  const after = indents.get(next);
  const before = indents.get(begun);
  if (after !== undefined && indentOf(layout, next) === own) return after;
  if (before !== undefined && indentOf(layout, begun) === own) return before;
  return after ?? 0;
}

/** A comment after a phrase stays at its column where the line still fits before it, else it follows after one space. */
function moveComment(line: number, indent: number | null, layout: Layout): void {
  const { text, lines, edits } = layout;
  const { start, end } = lines.lineSpan(line);
  const comment = commentStart(layout, start, end);
  if (comment === null) return;
  const gapStart = start + text.slice(start, comment).trimEnd().length;
  const shift = gapsOn(layout, line).filter((edit) => edit.span.end <= gapStart).reduce((sum, edit) => sum + edit.text.length - (edit.span.end - edit.span.start), 0);
  if (indent === null && shift === 0 && !text.slice(gapStart, comment).includes('\t')) return;
  const column = comment - start;
  const width = gapStart - start + shift;
  const edit = { span: { start: gapStart, end: comment }, text: ' '.repeat(Math.max(column - width, 1)) };
  edits.push(edit);
  gapsOn(layout, line).push(edit);
}

/** Where the comment of a line with an entry begins; null without one. Quotation marks are respected. */
function commentStart({ text }: Layout, start: number, end: number): number | null {
  let quote: string | null = null;
  for (let i = start; i < end; i++) {
    const char = text[i];
    const before = i > start ? text[i - 1] : ' ';
    if (quote) {
      if (quote === '"' && char === '\\') i++;
      else if (char === quote) quote = null;
    } else if ((char === '"' || char === "'") && /[\s:[{,]/.test(before)) quote = char;
    else if (char === '#' && /\s/.test(before)) return i;
  }
  return null;
}

function trimEnd(line: number, layout: Layout): void {
  const { text, lines, edits } = layout;
  const { start, end } = lines.lineSpan(line);
  const kept = text.slice(start, end).trimEnd().length;
  if (kept < end - start && !gapsOn(layout, line).some((edit) => edit.span.end > start + kept && edit.span.start < end)) edits.push({ span: { start: start + kept, end }, text: '' });
}
