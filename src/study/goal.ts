import type { Impedance } from '../network/impedance';

/** Quantities with a number to compare, as they are written in a description. */
export type GoalQuantity =
  | 'return loss' | 'VSWR' | 'reflection' | 'mismatch loss' | 'gain' | 'insertion loss' | 'efficiency' | 'rejection'
  | 'input resistance' | 'input reactance' | 'bandwidth' | 'voltage' | 'current' | 'dissipation' | 'parts' | 'yield';

/** Conditions without a value. */
export type GoalCondition = 'dc path' | 'dc block' | 'dc short at load';

export type Comparison = '>=' | '<=' | '>' | '<';

export type GoalPlace =
  /** Every band that is not watched. */
  | { readonly form: 'bands' }
  | { readonly form: 'band'; readonly band: string }
  | { readonly form: 'range'; readonly frequencyHz: Float64Array }
  | { readonly form: 'frequency'; readonly frequencyHz: number }
  /** `at N x BAND`: at N times each point of the band. */
  | { readonly form: 'harmonic'; readonly order: number; readonly band: string };

export interface Goal {
  /** As the person wrote it. */
  readonly text: string;
  /** From 1. */
  readonly line: number;
  readonly quantity: GoalQuantity | GoalCondition;
  /** Null for conditions. */
  readonly comparison: Comparison | null;
  /** In `unit`; null for conditions. */
  readonly limit: number | null;
  /** `dB`, `Ω`, `Hz`, `V`, `A`, `W`, `%`, or empty for pure numbers (VSWR, reflection, parts, conditions). */
  readonly unit: string;
  readonly place: GoalPlace;
  /** Only this case; null for every one. */
  readonly caseName: string | null;
  /** Judges the ladder with this load instead (for rejection: only at the points asked for). */
  readonly into: Impedance | null;
  /** Reference band of a rejection; null for the rule's own. */
  readonly against: string | null;
  /** The element of a voltage, current or dissipation; `load` counts. */
  readonly elementName: string | null;
  /** For `bandwidth at 3 dB`: that loss of gain; null for return loss of at least 10 dB. */
  readonly bandwidthDropDb: number | null;
}

/** How one goal came out. Numbers are in the goal's own unit. */
export interface GoalResult {
  readonly goal: Goal;
  readonly ok: boolean;
  /** Worst value. Null with a `reason`: not known. Null without: infinite. For conditions: 1 where met, 0 where not. */
  readonly value: number | null;
  /** Positive where the goal holds. Null with a `reason`: not known. Null without: infinite. */
  readonly margin: number | null;
  /** Where it is worst; null where the quantity has no frequency. */
  readonly frequencyHz: number | null;
  /** The case in which it is worst. */
  readonly caseName: string | null;
  readonly reason: string | null;
}
