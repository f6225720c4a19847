/**
 * Points at which ladders are tried: frequency, load, source, and what is asked there. Each band, goal and load case has its
 * own points, one after the other; all arrays have `count` entries.
 *
 * What a ladder is ranked by is its excess e, a ratio of powers: the largest over all points of |Γ|²·`reflectionWeight` and
 * `gainFloor`/gain, and of `rest`. Its margin in dB is −10·log10 e.
 */
export interface TrialPoints {
  readonly count: number;
  readonly frequencyHz: Float64Array;
  readonly sourceRe: Float64Array;
  readonly sourceIm: Float64Array;
  /** Voltage and current at the load, up to a common factor. */
  readonly voltageRe: Float64Array;
  readonly voltageIm: Float64Array;
  readonly currentRe: Float64Array;
  readonly currentIm: Float64Array;
  /** 1/ρ² where |Γ| may be at most ρ; 0 where nothing is asked. */
  readonly reflectionWeight: Float64Array;
  /** The least gain, as a power ratio; 0 where nothing is asked. */
  readonly gainFloor: Float64Array;
  /** Asked besides: what is no disc in the plane of an immittance. */
  readonly rest: readonly RestCheck[];
  /** Starts of the runs of points that belong together (one place in one case). */
  readonly starts: readonly number[];
}

/** Each as a ratio of powers that wants to be small. */
export type RestCheck =
  /** gain/limit. */
  | { readonly form: 'gain at most'; readonly points: readonly number[]; readonly limit: number }
  /** limit/|Γ|², `limit` a square. */
  | { readonly form: 'reflection at least'; readonly points: readonly number[]; readonly limit: number }
  /** limit/efficiency, or efficiency/limit. */
  | { readonly form: 'efficiency at least' | 'efficiency at most'; readonly points: readonly number[]; readonly limit: number }
  /** limit·gain(points)/least gain(reference), or the inverse of that. */
  | { readonly form: 'rejection at least' | 'rejection at most'; readonly points: readonly number[]; readonly reference: readonly number[]; readonly limit: number };

/** Blank points: a matched 1 Ω load everywhere, nothing asked. */
export function blankPoints(count: number): Omit<TrialPoints, 'rest' | 'starts'> {
  const make = (value: number) => new Float64Array(count).fill(value);
  return {
    count, frequencyHz: make(0), sourceRe: make(1), sourceIm: make(0), voltageRe: make(1), voltageIm: make(0), currentRe: make(1), currentIm: make(0),
    reflectionWeight: make(0), gainFloor: make(0),
  };
}
