import type { PartKind } from '../../network/part';
import type { Element } from '../../network/element';
import type { Tunable } from '../../study/problem';
import { tunableStatesAtMost } from '../limits';
import type { DescriptionSyntax, TunableSyntax } from '../syntax';
import { reportTwice } from './findName';
import { checkFigures, checkValue, makePart, mergeFigures } from './makePart';
import { problemAt, type Resolution, type ResolvedTunable } from './resolution';
import { resolvePart } from './resolvePart';

/** Tunables with their states by increasing code; null inside where none can be had, which has been reported. */
export function resolveTunables(syntaxes: readonly TunableSyntax[], resolution: Resolution): Map<string, ResolvedTunable> {
  reportTwice(syntaxes.map((tunable) => tunable.name), 'tunable', resolution.report);
  const tunables = new Map<string, ResolvedTunable>();
  for (const syntax of syntaxes) {
    if (tunables.has(syntax.name.value)) continue;
    const states = statesOf(syntax, resolution);
    const kind = states[0]?.part.kind;
    const tunable = kind ? { name: syntax.name.value, kind, states, elements: [] } : null;
    tunables.set(syntax.name.value, { syntax, tunable });
  }
  return tunables;
}

function statesOf(syntax: TunableSyntax, resolution: Resolution): Tunable['states'] {
  const { states, kind } = syntax;
  if (states.form === 'faulty') return [];
  if (states.form === 'linear') {
    if (!kind) {
      resolution.report(problemAt('kind-not-known', 'Nothing tells whether this is a resistor, an inductor or a capacitor; begin with the kind.', syntax.span));
      return [];
    }
    return linearStates(syntax, kind, states.bits, resolution);
  }
  const seen = new Set<number>();
  const read = states.rows.flatMap(({ code, part }) => {
    if (seen.has(code.value)) {
      resolution.report(problemAt('duplicate-code', `The code ${code.value} stands here twice.`, code.span));
      return [];
    }
    seen.add(code.value);
    const own = resolvePart({ ...part, figures: mergeFigures(part.figures, syntax.figures) }, resolution);
    return own ? [{ code: code.value, part: own, span: part.span }] : [];
  });
  const other = read.find((state) => state.part.kind !== read[0].part.kind);
  if (other) resolution.report(problemAt('kind-mismatch', `All values of a tunable part are of one kind; the first is ${read[0].part.kind === 'inductor' ? 'an' : 'a'} ${read[0].part.kind}.`, other.span));
  return read.filter((state) => state.part.kind === read[0].part.kind).map(({ code, part }) => ({ code, part })).sort((a, b) => a.code - b.code);
}

/** Code 0 is the first value, the last code the second one, evenly spaced. */
function linearStates(syntax: TunableSyntax, kind: PartKind, bits: number, resolution: Resolution): Tunable['states'] {
  const { states } = syntax;
  if (states.form !== 'linear') return [];
  const count = 2 ** bits;
  if (!Number.isInteger(bits) || bits < 1 || count > tunableStatesAtMost) {
    resolution.report(problemAt('out-of-range', `A tunable part has 1 to ${Math.log2(tunableStatesAtMost)} bits.`, syntax.span));
    return [];
  }
  const from = states.range.min;
  const to = states.range.max;
  if (!checkValue(kind, from.value, from.span, resolution) || !checkValue(kind, to.value, to.span, resolution)) return [];
  const figures = checkFigures(kind, syntax.figures, resolution);
  return Array.from({ length: count }, (_, code) => ({
    code, part: makePart(kind, from.value + ((to.value - from.value) * code) / (count - 1), figures),
  }));
}

/** Each tunable with the names of the elements that it sets. */
export function connectTunables(syntax: DescriptionSyntax, ladder: readonly Element[], resolution: Resolution): Tunable[] {
  const fitted = new Set(ladder.filter((element) => element.form === 'branch').map((element) => element.name));
  return [...resolution.tunables.values()].flatMap(({ tunable, syntax: { name } }): Tunable[] => {
    const elements = (syntax.ladder?.elements ?? []).filter(({ body, name: element }) =>
      fitted.has(element.value) && body.form === 'branch' && body.branch.form === 'part' && body.branch.value.form === 'tunable' && body.branch.value.name.value === name.value);
    return tunable ? [{ ...tunable, elements: elements.map((element) => element.name.value) }] : [];
  });
}
