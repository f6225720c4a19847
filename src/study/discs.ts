import type { Complex } from '../network/complex';
import { impedanceOf } from '../network/immittance';
import type { Goal } from './goal';
import { middleOf, placesOf } from './place';
import type { Problem } from './problem';
import { reflectionOfMismatchLoss, reflectionOfReturnLoss, reflectionOfVswr } from './reflectionFigures';
import { sampleSource } from './sampleCase';
import { wantsLarge } from './verdict';

/** A region of the chart's plane, w = (Z − z0)/(Z + z0). */
export type Region =
  | { readonly form: 'inside' | 'outside'; readonly centre: Complex; readonly radius: number }
  /** The points w with Re(w · conj(normal)) ≤ offset; |normal| is 1. */
  | { readonly form: 'half-plane'; readonly normal: Complex; readonly offset: number };

/**
 * Where the power-wave reflection |(Z − Zs*)/(Z + Zs)| is at most ρ, on the chart against z0.
 *
 * With Z = z0(1 + w)/(1 − w) the ratio is (D* + C* w)/(C + D w), where C = z0 + Zs and D = z0 − Zs, so the border is the circle of
 * centre −C D*(1 − ρ²)/k and radius 4 z0 Rs ρ/|k|, k = |C|² − ρ²|D|². For ρ ≤ 1, all that a passive input can ask for,
 * k > 0 and the region is its inside; for ρ = |C|/|D| it is a half-plane, beyond that the outside of a circle.
 * A real Zs = z0 gives the circle of radius ρ around 0. Source: power waves, Kurokawa, IEEE Trans. MTT-13, 1965.
 */
export function reflectionRegion(rho: number, sourceOhm: Complex, z0Ohm: number): Region {
  const c: Complex = { re: z0Ohm + sourceOhm.re, im: sourceOhm.im };
  const d: Complex = { re: z0Ohm - sourceOhm.re, im: -sourceOhm.im };
  const cSquare = c.re * c.re + c.im * c.im;
  const dSquare = d.re * d.re + d.im * d.im;
  const cd: Complex = { re: c.re * d.re + c.im * d.im, im: c.im * d.re - c.re * d.im };
  const k = cSquare - rho * rho * dSquare;
  if (k === 0) {
    // 2 Re[conj(C D*)(1 − ρ²) w] + |D|² − ρ²|C|² ≤ 0
    const slope = 2 * (1 - rho * rho);
    const size = Math.hypot(cd.re, cd.im) * Math.abs(slope);
    const normal: Complex = { re: (cd.re * slope) / size, im: (cd.im * slope) / size };
    return { form: 'half-plane', normal, offset: (rho * rho * cSquare - dSquare) / size };
  }
  const factor = (rho * rho - 1) / k;
  const centre: Complex = { re: cd.re * factor + 0, im: cd.im * factor + 0 };
  return { form: k > 0 ? 'inside' : 'outside', centre, radius: (4 * z0Ohm * sourceOhm.re * rho) / Math.abs(k) };
}

/** What a goal asks of the input's reflection, drawn on the chart. */
export interface GoalDisc {
  /** Index in the problem's goals. */
  readonly goalIndex: number;
  /** The largest |Γ| allowed, or the smallest where `keepOut`. */
  readonly reflection: number;
  /** The region in which |Γ| is at most `reflection`, for the source at `frequencyHz`. */
  readonly region: Region;
  /** True where the goal wants the input outside of the region (`return loss <= 3 dB`). */
  readonly keepOut: boolean;
  /** Middle of the goal's first place: where the source's impedance was taken. */
  readonly frequencyHz: number;
}

/** One region for each goal on return loss, VSWR, reflection or mismatch loss that has one. */
export function goalDiscs(problem: Problem): readonly GoalDisc[] {
  return problem.goals.flatMap((goal, goalIndex) => {
    const reflection = reflectionLimit(goal);
    const places = placesOf(goal, problem);
    if (reflection === null || typeof places === 'string' || places.length === 0) return [];
    const frequencyHz = middleOf(places[0].frequencyHz);
    const source = sampleSource(problem.source, problem.bands, Float64Array.of(frequencyHz), places[0].band);
    if (!source.known[0]) return [];
    const { re, im } = impedanceOf(source);
    const growsWithReflection = goal.quantity !== 'return loss';
    return [{
      goalIndex, reflection, frequencyHz,
      region: reflectionRegion(reflection, { re: re[0], im: im[0] }, problem.z0Ohm),
      keepOut: wantsLarge(goal) === growsWithReflection,
    }];
  });
}

/** |Γ| at a goal's limit; null for goals on other things, and for limits that no |Γ| has. */
export function reflectionLimit(goal: Pick<Goal, 'quantity' | 'limit'>): number | null {
  if (goal.limit === null) return null;
  const limit = limitOf(goal.quantity, goal.limit);
  return limit !== null && limit >= 0 && Number.isFinite(limit) ? limit : null;
}

function limitOf(quantity: Goal['quantity'], limit: number): number | null {
  switch (quantity) {
    case 'return loss': return reflectionOfReturnLoss(limit);
    case 'VSWR': return reflectionOfVswr(limit);
    case 'reflection': return limit;
    case 'mismatch loss': return limit >= 0 ? reflectionOfMismatchLoss(limit) : null;
    default: return null;
  }
}
