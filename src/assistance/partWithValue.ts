import type { FiguresSyntax, PartSyntax } from '../description/syntax';
import type { Part } from '../network/part';
import type { Problem } from '../study/problem';
import { isSameValue, membersOf } from './familyMembers';

/**
 * The part of an element as it would be with another value: the family's member of that value where there is one (it may be
 * measured, or have figures of its own), with what the entry itself states of the part that stands there now.
 */
export function partWithValue(problem: Problem, now: Part, syntax: PartSyntax, value: number): Part {
  if (isSameValue(value, now.value)) return now;
  const family = problem.families.find(({ name }) => name === syntax.from?.value);
  const member = family && membersOf(family, now.kind).find(({ part }) => isSameValue(part.value, value))?.part;
  const { figures } = syntax;
  const base = member ?? { ...now, value, measured: null, eslH: scaledEslH(now, figures, value) };
  if (!member) return base;
  return {
    ...base,
    loss: figures.q || figures.esrOhm ? now.loss : base.loss,
    tolerance: figures.tolerance ? now.tolerance : base.tolerance,
    rating: figures.ratedVoltageV || figures.ratedCurrentA || figures.ratedPowerW ? now.rating : base.rating,
    srfHz: figures.srfHz ? now.srfHz : base.srfHz,
    eslH: figures.eslH ? now.eslH : figures.srfHz ? scaledEslH(now, figures, value) : base.eslH,
  };
}

/** A capacitor's SRF is an inductance in series, 1/((2π·SRF)²·C): with another C another one. */
const scaledEslH = (now: Part, { srfHz }: FiguresSyntax, value: number): number => (srfHz && now.kind === 'capacitor' ? (now.eslH * now.value) / value : now.eslH);
