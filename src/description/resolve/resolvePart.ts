import { airCoil } from '../../network/airCoil';
import type { Part, PartKind } from '../../network/part';
import type { FiguresSyntax, PartSyntax } from '../syntax';
import { findName } from './findName';
import { familyMember } from './familyMember';
import { checkFigures, checkValue, makePart, mergeFigures, noFigures } from './makePart';
import { problemAt, type Resolution, type ResolvedFamily } from './resolution';

/** One part with a known value; null where it has none that can be used, which has been reported. */
export function resolvePart(syntax: PartSyntax, resolution: Resolution): Part | null {
  const named = partFamily(syntax, resolution);
  const kind = partKind(syntax, named, resolution);
  const family = named && (named.family.kind === kind || named.family.kind === 'mixed') ? named : null;
  const { value } = syntax;
  if (syntax.label && !syntax.from) {
    resolution.report(problemAt('part-without-family', `«part ${syntax.label.value}» picks a part out of a drawer, which «from FAMILY» has to name.`, syntax.label.span));
  }
  if (!kind || value.form === 'faulty') return null;
  if (value.form === 'solve' || value.form === 'tunable') {
    const word = value.form === 'solve' ? 'solve' : 'tunable';
    resolution.report(problemAt('unknown-inside', `«${word}» stands for the whole phrase of a ladder entry and not for a part inside another.`, value.span));
    return null;
  }
  const own = checkFigures(kind, syntax.figures, resolution);
  if (value.form === 'coil') {
    if (kind === 'inductor') return coilPart(value.coil, mergeFigures(own, family?.syntax.figures ?? noFigures), resolution);
    resolution.report(problemAt('kind-mismatch', `A winding is an inductor, not a ${kind}.`, value.span));
    return null;
  }
  if (!checkValue(kind, value.value, value.span, resolution)) return null;
  if (!family || !family.usable) return makePart(kind, value.value, mergeFigures(own, family?.syntax.figures ?? noFigures));
  const member = familyMember(syntax, kind, value.value, family, resolution);
  const figures = mergeFigures(own, member?.figures ?? family.syntax.figures);
  return makePart(kind, value.value, figures, member?.data ?? null);
}

/** The family after `from`; null without one, and where there is none of that name (reported). */
export function partFamily(syntax: PartSyntax, { families, report }: Resolution): ResolvedFamily | null {
  if (!syntax.from || !findName(syntax.from, [...families.keys()], 'family', report)) return null;
  return families.get(syntax.from.value) ?? null;
}

/** R, L or C: by the part's own words, else by its family; reported where neither tells, or where they differ. */
export function partKind(syntax: PartSyntax, family: ResolvedFamily | null, { report }: Resolution): PartKind | null {
  const familyKind = family && family.usable && family.family.kind !== 'mixed' ? family.family.kind : null;
  if (syntax.kind && familyKind && syntax.kind !== familyKind) {
    report(problemAt('kind-mismatch', `«${syntax.from?.value}» is a family of ${familyKind}s, and this is ${article(syntax.kind)}.`, syntax.from?.span ?? syntax.span));
    return syntax.kind;
  }
  const kind = syntax.kind ?? familyKind;
  if (!kind && syntax.value.form !== 'faulty') {
    report(problemAt('kind-not-known', 'Nothing tells whether this is a resistor, an inductor or a capacitor; write the unit.', syntax.span));
  }
  return kind;
}

const article = (kind: PartKind) => (kind === 'inductor' ? 'an inductor' : `a ${kind}`);

function coilPart(coil: { turns: number; diameterM: number; lengthM: number; wireM: number }, stated: FiguresSyntax, { middleHz }: Resolution): Part {
  const winding = airCoil(coil.turns, coil.diameterM, coil.lengthM, coil.wireM);
  const part = makePart('inductor', winding.inductanceH, stated);
  const srfHz = part.srfHz ?? (winding.selfCapacitanceF > 0 ? 1 / (2 * Math.PI * Math.sqrt(winding.inductanceH * winding.selfCapacitanceF)) : null);
  const q = winding.qAt(middleHz);
  const loss: Part['loss'] = part.loss.law === 'none' && q > 0 ? { law: 'skin effect', q, atHz: middleHz } : part.loss;
  return { ...part, srfHz, loss };
}
