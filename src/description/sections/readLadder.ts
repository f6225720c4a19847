import { readLadderSolvePhrase } from '../phrase/readLadderSolve';
import type { DescriptionSyntax } from '../syntax';
import type { TreeEntry } from '../tree/treeNode';
import { placeholder, readElements } from './readElements';
import { reportShape, type SectionContext } from './sectionContext';

/** `ladder`: a list of elements, or `solve …` for all of it. */
export function readLadder(entry: TreeEntry, context: SectionContext): DescriptionSyntax['ladder'] {
  const node = entry.value;
  const keySpan = entry.key.span;
  if (!node) {
    reportShape(entry, 'a list of elements, from the load to the source, or «solve …»', context);
    return null;
  }
  if (node.form === 'scalar') {
    const solve = readLadderSolvePhrase(node.phrase, context);
    return { span: node.span, keySpan, elements: solve ? [] : [placeholder('ladder', node.span)], solve };
  }
  return { span: node.span, keySpan, elements: readElements(node, context), solve: null };
}
