import type { Located } from '../base/span';
import type { FileReference } from './files';
import type { DescriptionSyntax, ElementSyntax, ImpedanceSyntax } from './syntax';

/** Every file that a description names, in the order of the text; a path that is named twice stands twice. */
export function fileReferences(syntax: DescriptionSyntax): FileReference[] {
  const found: FileReference[] = [];
  const add = ({ value, span }: Located<string>, kind: FileReference['kind']) => found.push({ path: value, span, kind, within: null });
  const impedance = (node: ImpedanceSyntax): void => {
    if (node.form === 'file') add(node.path, 'touchstone');
    else if (node.form === 'series' || node.form === 'parallel') node.members.forEach(impedance);
    else if (node.form === 'table') node.rows.forEach((row) => impedance(row.impedance));
  };
  const element = ({ body }: ElementSyntax): void => {
    if (body.form === 'block') add(body.path, 'touchstone');
    else if (body.form === 'branch') impedance(body.branch);
  };
  syntax.sources.forEach((source) => impedance(source.impedance));
  for (const { impedance: load, fixture } of syntax.load?.cases ?? []) {
    impedance(load);
    fixture?.forEach(element);
  }
  syntax.fixture.forEach(element);
  syntax.ladder?.elements.forEach(element);
  for (const { source } of syntax.families) {
    if (source.form === 'files') add(source.pattern, source.pattern.value.includes('*') ? 'pattern' : 'touchstone');
    else if (source.form === 'csv') add(source.path, 'csv');
  }
  syntax.goals.forEach((goal) => goal.into && impedance(goal.into));
  for (const measured of syntax.measured) {
    add(measured.path, 'touchstone');
    measured.fixture?.forEach(element);
  }
  return found.sort((a, b) => a.span.start - b.span.start);
}
