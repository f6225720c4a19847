import type { Complex } from '../network/complex';
import type { Element, Orientation } from '../network/element';
import type { Part } from '../network/part';
import type { Response } from './response';
import type { Reach } from './formReach';

/** What was put in the place of one unknown, or of one position of a ladder that was found as a whole. */
export interface SolvedElement {
  readonly name: string;
  readonly orientation: Orientation;
  /** The element as it goes into the ladder: a branch with one part, `bridge`, `not fitted`, `line` or `stub`. */
  readonly element: Element;
  /** The part of a branch; null for all else. */
  readonly part: Part | null;
  /** The family it was taken from; null for a series, a continuous value, or nothing fitted. */
  readonly family: string | null;
  /** The drawer's designation, where the family's value alone does not say which part is meant; null otherwise. */
  readonly label: string | null;
}

/** One way to fill in what was unknown. */
export interface Solution {
  /** The unknown ones, from the load on. */
  readonly solved: readonly SolvedElement[];
  /** The whole ladder, load first. */
  readonly ladder: readonly Element[];
  /** The worst margin over all goals that are ranked in dB; without such goals the worst gain in dB (the aim then). −Infinity where nothing passes. */
  readonly marginDb: number;
  /** Goals without a margin in dB (parts, direct current, resistance, stress …) that it misses. */
  readonly conditionsMissed: number;
  /** Texts of the goals that it misses, in the order of the description. */
  readonly missedGoals: readonly string[];
  /** Every goal holds; a goal on yield by `yield`. */
  readonly holds: boolean;
  /** Share of some random builds that meet every other goal; null where no part has a tolerance. Not part of the proof. */
  readonly yield: number | null;
  /** |Γ| against the source, over the bands that are not watched and all cases. */
  readonly worstReflection: number;
  /** Transducer gain as a power ratio, over the same. */
  readonly worstGain: number;
  /** Fitted parts of the whole ladder. */
  readonly parts: number;
  readonly form: Response;
  /** Null where a block's file does not tell. */
  readonly dcPath: boolean | null;
  readonly dcBlock: boolean | null;
  /** True where nothing that exists can be better, among ladders with as many parts that miss as few conditions. */
  readonly proved: boolean;
  /** dB: no ladder with as many parts that misses as few conditions has a larger margin. Null where not proved. */
  readonly boundDb: number | null;
  /** Ladders, parts of ladders and boxes of ladders that were looked at for this answer. */
  readonly nodes: number;
}

/** A form or ladder that cannot make the match, and why. */
export interface OutOfReach {
  readonly form: string;
  readonly reason: string;
  /** For two elements: the loads that the form does match at that frequency, and where the load lies, on the chart against z0. */
  readonly reach?: { readonly region: Reach; readonly load: Complex };
}

export interface SolveResult {
  /** Best first, at most as many as asked for. Empty with a `reason`. */
  readonly solutions: readonly Solution[];
  /** The best with each number of fitted parts, fewest parts first. */
  readonly byParts: readonly Solution[];
  /** Why there is no solution. */
  readonly reason: string | null;
  /** What the person should be told about the answer, in whole sentences. */
  readonly hints: readonly string[];
  readonly outOfReach: readonly OutOfReach[];
}

export interface SolveOptions {
  /** How many solutions; 10. */
  readonly top?: number;
  /** Called now and then with the share done (0 … 1, never falling) and the best margin so far in dB; throw in it to stop. */
  readonly onProgress?: (share: number, bestMarginDb: number | null) => void;
}

/** How many solutions are given where nothing is said. */
export const defaultTop = 10;
