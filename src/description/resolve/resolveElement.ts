import type { Element, Orientation } from '../../network/element';
import type { Impedance } from '../../network/impedance';
import type { Choice } from '../../study/unknown';
import { kindOfDesignator } from '../phrase/readElementPhrase';
import type { ElementSyntax, ImpedanceSyntax, LineSyntax, PartSyntax } from '../syntax';
import { findName } from './findName';
import { checkFigures } from './makePart';
import { problemAt, type Resolution } from './resolution';
import { resolveFile } from './resolveFile';
import { resolveImpedance } from './resolveImpedance';
import { resolveLine } from './resolveLine';
import { partFamily, partKind } from './resolvePart';
import { familyChoices, lineChoices, partChoices } from './unknownChoices';

export interface ResolvedElement {
  readonly element: Element;
  /** What may be put here: of a `solve`, or (with `known`) of a value that solving again may change. */
  readonly choices: readonly Choice[] | null;
  readonly mayOmit: boolean;
  readonly known: boolean;
}

/** Which entries may be unknown or tunable: those of the ladder; a fixture is what it is. */
export type ElementPlace = 'ladder' | 'fixture';

export function resolveElement(syntax: ElementSyntax, place: ElementPlace, resolution: Resolution): ResolvedElement {
  const name = syntax.name.value;
  const { body, keyword } = syntax;
  const plain = (element: Element): ResolvedElement => ({ element, choices: null, mayOmit: false, known: true });
  const faulty = (reason: string): ResolvedElement => plain({ form: 'faulty', name, orientation: orientationOf(syntax), reason });
  switch (body.form) {
    case 'faulty':
      return faulty('it could not be read');
    case 'bridge':
      return plain({ form: 'bridge', name, orientation: 'series' });
    case 'not fitted':
      return plain({ form: 'not fitted', name, orientation: 'shunt', kind: kindOfDesignator(name) });
    case 'block': {
      const { data, reason } = resolveFile(body.path, resolution);
      if (!data) return faulty(reason);
      if (data.ports === 2) return plain({ form: 'block', name, data, reversed: body.reversed });
      resolution.report(problemAt('port', `A block needs a file with two ports; ${body.path.value} has ${data.ports}.`, body.path.span));
      return faulty('its file has not two ports');
    }
    case 'transformer':
      return resolveTransformer(name, body, resolution) ?? faulty('it could not be read');
    case 'line':
      return resolveLineElement(name, keyword, body.line, place, resolution) ?? faulty('it could not be read');
    case 'branch':
      return resolveBranch(syntax, body, place, resolution) ?? faulty('it could not be read');
  }
}

type Body<F> = Extract<ElementSyntax['body'], { form: F }>;

function resolveTransformer(name: string, body: Body<'transformer'>, { report }: Resolution): ResolvedElement | null {
  const { turnsSource, turnsLoad, windingH, coupling } = body;
  if (!(turnsSource > 0 && turnsLoad > 0)) return null;
  if (windingH && !(windingH.value > 0)) {
    report(problemAt('not-positive', 'The inductance of a winding is above zero.', windingH.span));
    return null;
  }
  if (coupling && !(coupling.value > 0 && coupling.value <= 1)) {
    report(problemAt('coupling', 'A coupling factor is above 0 and at most 1.', coupling.span));
    return null;
  }
  return {
    element: { form: 'transformer', name, turnsSource, turnsLoad, windingH: windingH?.value ?? null, coupling: coupling?.value ?? 1 },
    choices: null, mayOmit: false, known: true,
  };
}

function resolveLineElement(name: string, keyword: ElementSyntax['keyword'], line: LineSyntax, place: ElementPlace, resolution: Resolution): ResolvedElement | null {
  const kind = keyword === 'line' ? 'line' : 'stub';
  if (line.length.form === 'solve') {
    if (place === 'fixture') return reportUnknownInFixture(line.length.span, resolution);
    const range = line.length.range;
    const middle = range ? Math.sqrt(Math.max(range.min.value, 1e-6) * range.max.value) : 0.01;
    const template = resolveLine(line, resolution, middle);
    if (!template) return null;
    const element: Element = kind === 'line'
      ? { form: 'unsolved', name, orientation: 'through', kind }
      : { form: 'unsolved', name, orientation: 'shunt', kind, end: keyword === 'stub open' ? 'open' : 'short' };
    return { element, choices: lineChoices(kind, range, template, resolution), mayOmit: false, known: false };
  }
  const made = resolveLine(line, resolution);
  if (!made) return null;
  const element: Element = kind === 'line' ? { form: 'line', name, line: made } : { form: 'stub', name, end: keyword === 'stub open' ? 'open' : 'short', line: made };
  return { element, choices: null, mayOmit: false, known: true };
}

function resolveBranch(syntax: ElementSyntax, body: Body<'branch'>, place: ElementPlace, resolution: Resolution): ResolvedElement | null {
  const name = syntax.name.value;
  const orientation = syntax.keyword === 'shunt' ? 'shunt' : 'series';
  const { branch, pair } = body;
  if (branch.form === 'part' && branch.value.form === 'solve') {
    if (place === 'fixture') return reportUnknownInFixture(branch.value.span, resolution);
    const { solve } = branch.value;
    const figures = branch.kind ? checkFigures(branch.kind, branch.figures, resolution) : branch.figures;
    const choices = partChoices(solve, branch.kind, figures, resolution);
    if (choices.length === 0) return null;
    const kinds = new Set(choices.map((choice) => choice.kind));
    const kind = kinds.size === 1 ? choices[0].kind : null;
    return { element: { form: 'unsolved', name, orientation, kind, ...(pair ? { pair } : {}) }, choices, mayOmit: solve.orNone, known: false };
  }
  if (branch.form === 'part' && branch.value.form === 'tunable') return resolveTunableBranch(name, orientation, pair, branch, place, resolution);
  const misplaced = misplacedInBranch(branch);
  if (misplaced) {
    resolution.report(problemAt('not-a-part', 'A ladder entry holds parts (R, L, C), not the impedance of a port; a file in the path is a «block».', misplaced.span));
    return null;
  }
  const impedance = resolveImpedance(branch, resolution);
  if (hasUnknown(impedance)) return null;
  const element: Element = { form: 'branch', name, orientation, branch: impedance, pair };
  return { element, choices: branch.form === 'part' ? reopenedChoices(branch, resolution) : null, mayOmit: false, known: true };
}

/** What solving again may put in the place of a value with `from FAMILY` that is not marked `fixed`. */
function reopenedChoices(part: PartSyntax, resolution: Resolution): readonly Choice[] | null {
  if (!part.from || part.fixed || part.label) return null;
  const quiet = { ...resolution, report: () => undefined };
  const family = partFamily(part, quiet);
  const kind = partKind(part, family, quiet);
  const choices = family?.usable && kind ? familyChoices(family, kind, null, part.figures) : [];
  return choices.length > 0 ? choices : null;
}

function resolveTunableBranch(
  name: string, orientation: 'series' | 'shunt', pair: boolean, branch: PartSyntax, place: ElementPlace, resolution: Resolution,
): ResolvedElement | null {
  if (branch.value.form !== 'tunable') return null;
  if (place === 'fixture') return reportUnknownInFixture(branch.value.span, resolution);
  if (!findName(branch.value.name, [...resolution.tunables.keys()], 'tunable', resolution.report)) return null;
  const tunable = resolution.tunables.get(branch.value.name.value)?.tunable;
  if (!tunable) return null;
  if (Object.values(branch.figures).some((figure) => figure !== null)) {
    resolution.report(problemAt('figures-of-tunable', 'The figures of a tunable part are stated under «tunables».', branch.span));
  }
  const kind = kindOfDesignator(name);
  if (kind && kind !== tunable.kind) {
    resolution.report(problemAt('kind-mismatch', `«${tunable.name}» is a tunable ${tunable.kind}, and ${name} stands for ${kind === 'inductor' ? 'an' : 'a'} ${kind}.`, branch.value.name.span));
    return null;
  }
  const element: Element = { form: 'branch', name, orientation, branch: { form: 'part', part: tunable.states[0].part }, pair };
  return { element, choices: null, mayOmit: false, known: true };
}

function reportUnknownInFixture(span: { start: number; end: number }, { report }: Resolution): null {
  report(problemAt('unknown-in-fixture', 'A fixture is known: it can be neither solved nor tuned.', span));
  return null;
}

function misplacedInBranch(node: ImpedanceSyntax): ImpedanceSyntax | null {
  if (node.form === 'series' || node.form === 'parallel') return node.members.map(misplacedInBranch).find((found) => found !== null) ?? null;
  return node.form === 'part' || node.form === 'faulty' ? null : node;
}

function hasUnknown(impedance: Impedance): boolean {
  if (impedance.form === 'series' || impedance.form === 'parallel') return impedance.members.some(hasUnknown);
  return impedance.form === 'unknown';
}

function orientationOf({ keyword }: ElementSyntax): Orientation {
  if (keyword === 'series') return 'series';
  return keyword === 'shunt' || keyword === 'stub open' || keyword === 'stub short' ? 'shunt' : 'through';
}
