import type { Located, Span } from '../base/span';
import { letUses } from './letUses';
import type { DescriptionSyntax, ElementSyntax, ImpedanceSyntax } from './syntax';

export type NameKind = 'band' | 'case' | 'family' | 'tunable' | 'element' | 'goal' | 'let';

/** One name of a description with every place where it stands. */
export interface NamedThing {
  readonly kind: NameKind;
  /** A goal's is its text. */
  readonly name: string;
  /** Null where the name is used and nowhere defined. */
  readonly definition: Span | null;
  /** Places of use, in the order of the text; the definition is not among them. */
  readonly references: readonly Span[];
}

interface Draft {
  readonly kind: NameKind;
  readonly name: string;
  definition: Span | null;
  readonly references: Span[];
}

/** Names with their definitions and uses, for go to definition, references, rename, outline and hover. */
export function namesIn(syntax: DescriptionSyntax): NamedThing[] {
  const found = new Map<string, Draft>();
  const thing = (kind: NameKind, name: string): Draft => {
    const key = `${kind} ${name}`;
    const known = found.get(key) ?? { kind, name, definition: null, references: [] };
    found.set(key, known);
    return known;
  };
  const define = (kind: NameKind, { value, span }: Located<string>): void => {
    const draft = thing(kind, value);
    if (draft.definition) draft.references.push(span);
    else draft.definition = span;
  };
  const use = (kind: NameKind, name: Located<string> | null): void => {
    if (name) thing(kind, name.value).references.push(name.span);
  };
  const impedance = (node: ImpedanceSyntax): void => {
    if (node.form === 'series' || node.form === 'parallel') node.members.forEach(impedance);
    if (node.form === 'table') node.rows.forEach((row) => impedance(row.impedance));
    if (node.form !== 'part') return;
    use('family', node.from);
    if (node.value.form === 'solve') node.value.solve.families.forEach((family) => use('family', family));
    if (node.value.form === 'tunable') use('tunable', node.value.name);
  };
  const element = ({ name, body }: ElementSyntax): void => {
    define('element', name);
    if (body.form === 'branch') impedance(body.branch);
  };
  syntax.bands.forEach((band) => define('band', band.name));
  for (const each of syntax.load?.cases ?? []) {
    if (each.name) define('case', each.name);
    impedance(each.impedance);
    each.fixture?.forEach(element);
  }
  syntax.fixture.forEach(element);
  syntax.ladder?.elements.forEach(element);
  syntax.ladder?.solve?.families.forEach((family) => use('family', family));
  syntax.families.forEach((family) => define('family', family.name));
  syntax.tunables.forEach((tunable) => define('tunable', tunable.name));
  syntax.lets.forEach((each) => define('let', each.name));
  for (const source of syntax.sources) {
    use('band', source.band);
    impedance(source.impedance);
  }
  use('band', syntax.channels?.band ?? null);
  for (const goal of syntax.goals) {
    define('goal', { value: goal.text, span: goal.span });
    if (goal.place.form === 'band' || goal.place.form === 'harmonic') use('band', goal.place.band);
    use('band', goal.against);
    use('case', goal.caseName);
    if (goal.elementName?.value !== 'load') use('element', goal.elementName);
    if (goal.into) impedance(goal.into);
  }
  for (const measured of syntax.measured) {
    use('element', measured.upTo);
    use('case', measured.caseName);
    measured.codes.forEach(({ tunable }) => use('tunable', tunable));
    measured.fixture?.forEach(element);
  }
  letUses(syntax.text, new Set(syntax.lets.map((each) => each.name.value))).forEach((name) => use('let', name));
  for (const draft of found.values()) draft.references.sort((a, b) => a.start - b.start);
  return [...found.values()];
}

/** The name that stands at an offset; null where none does. Of a goal and a name inside it, the name. */
export function nameAt(names: readonly NamedThing[], offset: number): NamedThing | null {
  const covers = (span: Span | null) => span !== null && span.start <= offset && offset <= span.end;
  const at = names.filter((name) => covers(name.definition) || name.references.some(covers));
  return at.find((name) => name.kind !== 'goal') ?? at[0] ?? null;
}
