import type { Complex } from '../network/complex';
import { responseOf, type Response } from './response';

export type ReactiveKind = 'inductor' | 'capacitor';

/** Two parts between load and source; `first` is the one at the load, the other has the other orientation. */
export interface TwoElementForm {
  readonly first: 'series' | 'shunt';
  /** From the load on. */
  readonly kinds: readonly [ReactiveKind, ReactiveKind];
}

/** All eight. */
export const twoElementForms: readonly TwoElementForm[] = (['series', 'shunt'] as const).flatMap((first) =>
  (['inductor', 'capacitor'] as const).flatMap((near) =>
    (['inductor', 'capacitor'] as const).map((far): TwoElementForm => ({ first, kinds: [near, far] }))));

export interface ReactivePart {
  readonly orientation: 'series' | 'shunt';
  readonly kind: ReactiveKind;
  /** H or F. */
  readonly value: number;
  /** Of the part itself: positive for an inductor. */
  readonly reactanceOhm: number;
}

/** From the load on. */
export interface TwoElementMatch {
  readonly form: TwoElementForm;
  readonly parts: readonly [ReactivePart, ReactivePart];
  readonly response: Response;
  /** Everything in series passes direct current. */
  readonly dcPath: boolean;
  /** Something in series does not. */
  readonly dcBlock: boolean;
}

export interface TwoElementAnswer {
  /** True where load and source match as they are. */
  readonly matched: boolean;
  /** Matches in which one of the two parts comes out as nothing at all. */
  readonly single: readonly ReactivePart[];
  /** One for each of the eight forms, in the order of `twoElementForms`. */
  readonly forms: readonly { readonly form: TwoElementForm; readonly matches: readonly TwoElementMatch[]; readonly reason: string | null }[];
}

/** Reactances below this share of the resistance beside them are none: what they change is far below |Γ| = 1e-9. */
const nothing = 1e-11;
/** Of a difference of two equal numbers. */
const roundings = 8 * Number.EPSILON;
/** Above 1 by this much is still 1: the border of what a form reaches, after rounding. */
const borderSlack = 1e-13;

/**
 * Every conjugate match of a load to a source (Ω, both with a positive real part) by two lossless parts at one frequency, in
 * closed form; |Γ| of the result is below 1e-9 (`closedForms.test.ts`).
 *
 * With the series part at the load: R² + X² = R/Gt for X = XL + X1, where Yt = 1/Zs* is what the source wants to see; the shunt
 * part makes up the susceptance. The other order is the same with admittances. After Pozar, Microwave Engineering, §5.1,
 * extended to complex sources; at the border of its reach (X = 0) the two solutions of an order are one.
 */
export function twoElementMatches(load: Complex, source: Complex, frequencyHz: number): TwoElementAnswer {
  const found: ReactivePart[][] = [];
  const reasons = { series: '', shunt: '' };
  if (load.re > 0 && source.re > 0 && Number.isFinite(load.re + load.im + source.re + source.im)) {
    const wanted: Complex = { re: source.re, im: -source.im };
    for (const first of ['series', 'shunt'] as const) {
      const [near, far] = first === 'series' ? [load, inverse(wanted)] : [inverse(load), wanted];
      const roots = rootsOf(near.re, far.re);
      for (const root of roots) {
        const size = near.re * near.re + root * root;
        const firstImmittance = tidied(root - near.im, near);
        const secondImmittance = tidied(far.im + root / size, far);
        found.push([
          ...partOf(first, firstImmittance, frequencyHz),
          ...partOf(first === 'series' ? 'shunt' : 'series', secondImmittance, frequencyHz),
        ]);
      }
      if (roots.length === 0) reasons[first] = beyondBorder(first, near.re, far.re);
    }
  } else {
    reasons.series = reasons.shunt = load.re > 0 ? 'the source has no positive resistance' : 'the load takes no power';
  }
  const single: ReactivePart[] = [];
  for (const [part, more] of found) {
    if (part && !more && !single.some((each) => each.orientation === part.orientation && each.kind === part.kind)) single.push(part);
  }
  const matches = found.flatMap(([near, far]) => (near && far ? [matchOf(near, far)] : []));
  return {
    matched: found.some((parts) => parts.length === 0),
    single,
    forms: twoElementForms.map((form) => {
      const own = matches.filter((match) => sameForm(match.form, form));
      return { form, matches: own, reason: own.length > 0 ? null : reasons[form.first] || wrongKinds(form, matches) };
    }),
  };
}

/** Solutions X of R² + X² = R/G for the total series reactance (or, exchanged, the shunt susceptance). */
function rootsOf(near: number, far: number): number[] {
  const product = near * far;
  if (product > 1 + borderSlack) return [];
  const root = Math.sqrt(Math.max(0, near * (1 / far - near)));
  return root <= nothing * near ? [0] : [root, -root];
}

/** The reactance beside it counts by its rounding alone: a share of a large one may well matter. */
const tidied = (value: number, beside: Complex): number =>
  (Math.abs(value) <= nothing * beside.re + roundings * Math.abs(beside.im) ? 0 : value);

function partOf(orientation: 'series' | 'shunt', immittance: number, frequencyHz: number): ReactivePart[] {
  if (immittance === 0) return [];
  return [reactivePart(orientation, orientation === 'series' ? immittance : -1 / immittance, frequencyHz)];
}

/** The inductor or capacitor with this reactance (not 0) at a frequency. */
export function reactivePart(orientation: 'series' | 'shunt', reactanceOhm: number, frequencyHz: number): ReactivePart {
  const omega = 2 * Math.PI * frequencyHz;
  return reactanceOhm > 0
    ? { orientation, kind: 'inductor', value: reactanceOhm / omega, reactanceOhm }
    : { orientation, kind: 'capacitor', value: -1 / (omega * reactanceOhm), reactanceOhm };
}

function matchOf(near: ReactivePart, far: ReactivePart): TwoElementMatch {
  const dcBlock = [near, far].some((part) => part.orientation === 'series' && part.kind === 'capacitor');
  return {
    form: { first: near.orientation, kinds: [near.kind, far.kind] },
    parts: [near, far], response: responseOf([near, far]), dcPath: !dcBlock, dcBlock,
  };
}

const sameForm = (a: TwoElementForm, b: TwoElementForm): boolean => a.first === b.first && a.kinds[0] === b.kinds[0] && a.kinds[1] === b.kinds[1];

function beyondBorder(first: 'series' | 'shunt', near: number, far: number): string {
  const three = (value: number): string => String(Number(value.toPrecision(3)));
  return first === 'series'
    ? `the load's resistance, ${three(near)} Ω, is above ${three(1 / far)} Ω, the most that a part across the source leaves of it`
    : `the load's parallel resistance, ${three(1 / near)} Ω, is below the source's series resistance, ${three(far)} Ω`;
}

function wrongKinds(form: TwoElementForm, matches: readonly TwoElementMatch[]): string {
  const others = matches.filter((match) => match.form.first === form.first).map((match) => describeForm(match.form));
  if (others.length === 0) return 'one part alone makes the match in this order';
  return `with this load that order takes ${[...new Set(others)].join(' or ')}`;
}

/** `series L, shunt C`: from the load on. */
export function describeForm({ first, kinds }: TwoElementForm): string {
  const letter = (kind: ReactiveKind): string => (kind === 'inductor' ? 'L' : 'C');
  return `${first} ${letter(kinds[0])}, ${first === 'series' ? 'shunt' : 'series'} ${letter(kinds[1])}`;
}

/** 1/z; z must not be 0. */
export function inverse({ re, im }: Complex): Complex {
  const size = re * re + im * im;
  return { re: re / size, im: -im / size };
}
