import type { Span } from '../../base/span';
import { elementsAtMost } from '../limits';
import { readElementKey } from '../phrase/readElementKey';
import { readElementPhrase } from '../phrase/readElementPhrase';
import type { ElementSyntax } from '../syntax';
import { splitScalar } from '../tree/splitMissingSpace';
import type { ListNode, MappingNode, TreeEntry, TreeNode } from '../tree/treeNode';
import { atMost, mistake, shapeOf, type SectionContext } from './sectionContext';

/** The entries of a ladder or a fixture: a list, or (reported) a mapping whose lines lack their dashes. */
export function readElements(node: ListNode | MappingNode, context: SectionContext): ElementSyntax[] {
  const read = node.form === 'list' ? readItems(node, context) : readBareEntries(node, context);
  const count = node.form === 'list' ? node.items.length : node.entries.length;
  return count > elementsAtMost ? [...read, placeholder('…', { start: node.span.end, end: node.span.end })] : read;
}

const readItems = (node: ListNode, context: SectionContext) =>
  atMost(node.items, elementsAtMost, 'elements', context).flatMap((item, i) => readItem(item, node.itemSpans[i], context));

function readBareEntries(node: MappingNode, context: SectionContext): ElementSyntax[] {
  reportMissingDashes(node, context);
  return atMost(node.entries, elementsAtMost, 'elements', context).flatMap((entry) => readEntry(entry, context));
}

function reportMissingDashes(node: MappingNode, context: SectionContext): void {
  const fixes = node.flow ? undefined : [{
    title: 'Put dashes before the elements', preferred: true,
    edits: node.entries.map(({ key }) => ({ span: { start: key.span.start, end: key.span.start }, text: '- ' })),
  }];
  const span: Span = node.entries[0]?.key.span ?? node.span;
  context.report(mistake('ladder-without-dashes', 'The elements are a list, from the load to the source: each line begins with a dash, as in «- series L1: 5.6 nH».', span, { fixes }));
}

function readItem(item: TreeNode | null, span: Span, context: SectionContext): ElementSyntax[] {
  if (!item) {
    context.report(mistake('missing-value', 'A dash without an element after it.', span));
    return [];
  }
  if (item.form === 'scalar') {
    const split = splitScalar(item, context.report);
    if (split) return readEntry(split, context);
    context.report(mistake('element-without-phrase', `«${shorten(item.phrase.text)}» is not an element: a key, a colon and a phrase are expected, as in «series L1: 5.6 nH».`, item.span));
    return [placeholder(shorten(item.phrase.text), item.span)];
  }
  if (item.form === 'list') {
    context.report(mistake('wrong-shape', `An element is one key and one phrase, not ${shapeOf(item)}.`, item.span));
    return [placeholder('list', item.span)];
  }
  const entries = item.entries.slice(0, elementsAtMost);
  entries.slice(1).forEach((entry) => reportSecondKey(entry, item, context));
  return entries.flatMap((entry) => readEntry(entry, context));
}

function reportSecondKey(entry: TreeEntry, item: MappingNode, context: SectionContext): void {
  const { start } = entry.key.span;
  const before = { start: start - 2, end: start };
  const mends = !item.flow && /[\n\r] *$/.test(context.text.slice(0, start)) && context.text.slice(before.start, before.end) === '  ';
  context.report(mistake('two-keys', 'Two keys in one entry: each element has a dash of its own.', entry.key.span, {
    fixes: mends ? [{ title: 'Begin a new entry', edits: [{ span: before, text: '- ' }], preferred: true }] : undefined,
  }));
}

function readEntry(entry: TreeEntry, context: SectionContext): ElementSyntax[] {
  const key = readElementKey(entry.key.phrase, context);
  if (!key) return [placeholder(shorten(entry.key.phrase.text.trim()), entry.span)];
  const base = { keyword: key.keyword, name: key.name, span: entry.span };
  if (entry.value?.form === 'scalar') {
    return [{ ...base, phrase: entry.value.span, body: readElementPhrase(key.keyword, key.name.value, entry.value.phrase, context) }];
  }
  const phrase = entry.value?.span ?? { start: entry.span.end, end: entry.span.end };
  const message = entry.value
    ? `An element holds one phrase, not ${shapeOf(entry.value)}; a phrase that starts with a bracket stands in quotes.`
    : `${key.name.value} has no value yet; write one, or «solve».`;
  context.report(mistake(entry.value ? 'wrong-shape' : 'missing-value', message, entry.value ? entry.value.span : entry.key.span));
  return [{ ...base, phrase, body: { form: 'faulty' } }];
}

/** Stands for an entry that cannot be read, so that nothing beyond it is taken for known. */
export function placeholder(name: string, span: Span): ElementSyntax {
  return { keyword: 'series', name: { value: name, span }, span, phrase: { start: span.end, end: span.end }, body: { form: 'faulty' } };
}

const shorten = (text: string) => (text.length > 40 ? `${text.slice(0, 39)}…` : text);
