import { casesAtMost, tableRowsAtMost } from '../limits';
import { checkPhraseName } from '../phrase/checkName';
import { readImpedancePhrase } from '../phrase/readImpedance';
import { readQuantityPhrase } from '../phrase/readQuantity';
import type { CaseSyntax, DescriptionSyntax, ImpedanceSyntax } from '../syntax';
import type { MappingNode, TreeEntry, TreeNode } from '../tree/treeNode';
import { readElements } from './readElements';
import { atMost, expectScalar, located, mistake, reportShape, type SectionContext } from './sectionContext';
import { reportUnknownKey } from './unknownKey';

/** `load`: one impedance, a table, or a mapping of cases. */
export function readLoad(entry: TreeEntry, context: SectionContext): DescriptionSyntax['load'] {
  const node = entry.value;
  if (!node || node.form === 'list') {
    reportShape(entry, 'an impedance, a file, or a mapping of cases', context);
    return null;
  }
  if (node.form === 'scalar' || isTable(node) || isCaseWithFile(node)) {
    return { span: node.span, cases: [readCase(null, node, context)] };
  }
  const cases = atMost(node.entries, casesAtMost, 'cases', context).flatMap((each): CaseSyntax[] => {
    const name = located(each.key);
    checkPhraseName(name, 'case', context);
    if (!each.value || each.value.form === 'list') {
      reportShape(each, 'an impedance or a file', context);
      return [{ name, span: each.span, impedance: { form: 'faulty', span: each.span }, fixture: null }];
    }
    return [readCase(name, each.value, context)];
  });
  if (cases.length === 0) context.report(mistake('missing-value', '«load» has no case.', node.span));
  return cases.length > 0 ? { span: node.span, cases } : null;
}

function readCase(name: CaseSyntax['name'], node: Exclude<TreeNode, { form: 'list' }>, context: SectionContext): CaseSyntax {
  const span = name ? { start: name.span.start, end: node.span.end } : node.span;
  if (node.form === 'scalar' || isTable(node)) return { name, span, impedance: readImpedanceNode(node, context), fixture: null };
  let impedance: ImpedanceSyntax | null = null;
  let fixture: CaseSyntax['fixture'] = null;
  for (const entry of node.entries) {
    const key = entry.key.phrase.text;
    if (key === 'file') {
      impedance = readCaseFile(entry, context);
    } else if (key === 'fixture') {
      if (entry.value?.form === 'list' || entry.value?.form === 'mapping') fixture = readElements(entry.value, context);
      else reportShape(entry, 'a list of elements', context);
    } else {
      reportUnknownKey(entry.key, 'case', context);
    }
  }
  if (!impedance) {
    context.report(mistake('missing-key', 'A case with keys of its own needs «file».', name?.span ?? node.span));
    impedance = { form: 'faulty', span };
  }
  return { name, span, impedance, fixture };
}

function readCaseFile(entry: TreeEntry, context: SectionContext): ImpedanceSyntax {
  const node = expectScalar(entry, context);
  const impedance: ImpedanceSyntax = node ? readImpedancePhrase(node.phrase, context, null) : { form: 'faulty', span: entry.span };
  if (impedance.form !== 'file' && impedance.form !== 'faulty') {
    context.report(mistake('not-a-file', 'A Touchstone file is expected after «file»; another impedance stands right after the name of the case.', impedance.span));
  }
  return impedance;
}

/** Names begin with a letter, so that a mapping whose keys all begin otherwise is a table by frequency. */
export const isTable = (node: MappingNode): boolean => node.entries.length > 0 && node.entries.every(({ key }) => /^[\d.+=(−-]/.test(key.phrase.text));

const isCaseWithFile = (node: MappingNode): boolean =>
  node.entries.some(({ key }) => key.phrase.text === 'file') && node.entries.every(({ key }) => key.phrase.text === 'file' || key.phrase.text === 'fixture');

/** An impedance phrase, or a table of them by frequency. */
export function readImpedanceNode(node: Exclude<TreeNode, { form: 'list' }>, context: SectionContext): ImpedanceSyntax {
  if (node.form === 'scalar') return readImpedancePhrase(node.phrase, context, null);
  const rows = atMost(node.entries, tableRowsAtMost, 'rows', context).flatMap((entry) => {
    const frequencyHz = readQuantityPhrase(entry.key.phrase, 'frequency', context);
    const phrase = expectScalar(entry, context);
    return frequencyHz && phrase ? [{ frequencyHz, impedance: readImpedancePhrase(phrase.phrase, context, null) }] : [];
  });
  return rows.length > 0 ? { form: 'table', rows, span: node.span } : { form: 'faulty', span: node.span };
}
