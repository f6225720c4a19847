import { measuredAtMost } from '../limits';
import { readMeasuredPhrase } from '../phrase/readMeasured';
import type { MeasuredSyntax } from '../syntax';
import type { TreeEntry, TreeNode } from '../tree/treeNode';
import { readElements } from './readElements';
import { atMost, expectList, expectScalar, located, mistake, reportShape, type SectionContext } from './sectionContext';

/** `measured`: what the analyser saw at the source end, of the finished ladder or of a step of building. */
export function readMeasured(entry: TreeEntry, context: SectionContext): MeasuredSyntax[] {
  const list = expectList(entry, 'measurement', context);
  return atMost(list?.items ?? [], measuredAtMost, 'measurements', context).flatMap((item, i): MeasuredSyntax[] => {
    if (item) return readItem(item, context);
    context.report(mistake('missing-value', 'A dash without a measurement after it.', list?.itemSpans[i] ?? entry.key.span));
    return [];
  });
}

function readItem(item: TreeNode, context: SectionContext): MeasuredSyntax[] {
  if (item.form === 'scalar') {
    const read = readMeasuredPhrase(null, item.phrase, context);
    return read ? [{ ...read, fixture: null }] : [];
  }
  if (item.form === 'list') {
    context.report(mistake('wrong-shape', 'A measurement is a file, or the name of an element and a file.', item.span));
    return [];
  }
  let found: Omit<MeasuredSyntax, 'fixture'> | null = null;
  let fixture: MeasuredSyntax['fixture'] = null;
  let files = 0;
  for (const entry of item.entries) {
    if (entry.key.phrase.text === 'fixture') {
      if (entry.value?.form === 'list' || entry.value?.form === 'mapping') fixture = readElements(entry.value, context);
      else reportShape(entry, 'a list of elements', context);
    } else if (++files > 1) {
      context.report(mistake('two-keys', 'Two keys in one entry: each measurement has a dash of its own.', entry.key.span));
    } else {
      const phrase = expectScalar(entry, context);
      const name = entry.key.phrase.text === 'file' ? null : located(entry.key);
      found = phrase && readMeasuredPhrase(name, phrase.phrase, context);
    }
  }
  if (files === 0) context.report(mistake('missing-key', 'A measurement needs its file: «file: finished.s1p», or the name of an element before the file.', item.span));
  return found ? [{ ...found, span: item.span, fixture }] : [];
}
