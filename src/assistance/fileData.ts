import type { DescriptionSyntax, ImpedanceSyntax } from '../description/syntax';
import type { Impedance } from '../network/impedance';
import type { NetworkData } from '../network/networkData';
import type { Problem } from '../study/problem';

/** What was read from a file, found through the places where the description names it; null where it is not known. */
export function fileData(syntax: DescriptionSyntax, problem: Problem, path: string): NetworkData | null {
  const cases = syntax.load?.cases ?? [];
  for (const { name, impedance } of cases) {
    const model = problem.cases.find((each) => each.name === (name?.value ?? null));
    const found = model && inImpedance(impedance, model.load, path);
    if (found) return found;
  }
  for (const { impedance, band } of syntax.sources) {
    const found = inImpedance(impedance, (band ? problem.source.byBand.get(band.value) : null) ?? problem.source.impedance, path);
    if (found) return found;
  }
  for (const { name, body } of syntax.ladder?.elements ?? []) {
    const element = problem.ladder.find((each) => each.name === name.value);
    if (body.form === 'block' && body.path.value === path && element?.form === 'block') return element.data;
  }
  for (const measured of syntax.measured) {
    const trace = problem.measured.find(({ upTo, caseName }) => upTo === (measured.upTo?.value ?? null) && caseName === (measured.caseName?.value ?? caseName));
    if (measured.path.value === path && trace?.data) return trace.data;
  }
  for (const { name, source } of syntax.families) {
    const members = problem.families.find((family) => family.name === name.value)?.members ?? [];
    if (source.form === 'files' && source.pattern.value === path && members.length === 1) return members[0].part.measured;
  }
  return null;
}

/** Both trees have the same shape where the model could make something of the text. */
function inImpedance(syntax: ImpedanceSyntax, model: Impedance, path: string): NetworkData | null {
  if (syntax.form === 'file') return syntax.path.value === path && model.form === 'file' ? model.data : null;
  if ((syntax.form === 'series' || syntax.form === 'parallel') && model.form === syntax.form) {
    for (const [at, member] of syntax.members.entries()) {
      const found = model.members[at] && inImpedance(member, model.members[at], path);
      if (found) return found;
    }
  }
  return null;
}
