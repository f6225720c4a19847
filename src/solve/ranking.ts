import { compareRounded } from './topList';

/** A ladder that was found, with what it is ranked by. */
export interface Ranked {
  /** Conditions missed. */
  readonly missed: number;
  /** Ratio of powers: at most 1 where every ranked goal holds. */
  readonly excess: number;
  readonly worstGain: number;
  readonly parts: number;
  /** Order of forms and items. */
  readonly order: readonly number[];
}

/** Excess below this is a match: |Γ| of 1e-9, what remains is rounding. */
export const exactExcess = 1e-18;

/**
 * Fewest conditions missed; where every goal holds, fewer parts; the larger margin; more gain; the order of the families.
 * `byDefault`: there is no goal that could hold, the margin alone counts.
 */
export function compareRanked(a: Ranked, b: Ranked, byDefault: boolean): number {
  if (a.missed !== b.missed) return a.missed - b.missed;
  const holds = (each: Ranked): boolean => !byDefault && each.missed === 0 && each.excess <= 1;
  if (holds(a) !== holds(b)) return holds(a) ? -1 : 1;
  if (holds(a) && a.parts !== b.parts) return a.parts - b.parts;
  const margin = compareRounded(Math.max(a.excess, exactExcess), Math.max(b.excess, exactExcess));
  return margin || compareRounded(b.worstGain, a.worstGain) || compareOrder(a.order, b.order);
}

function compareOrder(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < Math.min(a.length, b.length); i++) if (a[i] !== b[i]) return a[i] - b[i];
  return a.length - b.length;
}
