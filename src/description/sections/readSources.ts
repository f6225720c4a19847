import { bandsAtMost } from '../limits';
import { readSourcePhrase } from '../phrase/readSource';
import type { SourceSyntax } from '../syntax';
import type { TreeEntry } from '../tree/treeNode';
import { isTable, readImpedanceNode } from './readLoad';
import { atMost, expectScalar, located, reportShape, type SectionContext } from './sectionContext';

/** `source`: one impedance (`wants` before it: what the port should see), a table, or a mapping by band. */
export function readSources(entry: TreeEntry, context: SectionContext): SourceSyntax[] {
  const node = entry.value;
  if (!node || node.form === 'list') {
    reportShape(entry, 'an impedance, or a mapping by band', context);
    return [];
  }
  if (node.form === 'scalar') {
    const source = readSourcePhrase(node.phrase, context);
    return source ? [{ ...source, band: null, span: node.span }] : [];
  }
  if (isTable(node)) return [{ impedance: readImpedanceNode(node, context), wants: false, band: null, span: node.span }];
  return atMost(node.entries, bandsAtMost, 'bands', context).flatMap((each): SourceSyntax[] => {
    const phrase = expectScalar(each, context);
    const source = phrase && readSourcePhrase(phrase.phrase, context);
    return source ? [{ ...source, band: located(each.key), span: each.span }] : [];
  });
}
