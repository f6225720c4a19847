import type { PartKind } from '../network/part';

/** A continuous range of values in Ω, H, F (or metres for a line's length), both ends included. */
export interface ValueRange {
  readonly min: number;
  readonly max: number;
}

/** What may be put in one place. */
export type Choice =
  | { readonly form: 'continuous'; readonly kind: PartKind | 'line' | 'stub'; readonly range: ValueRange; readonly template: import('../network/part').Part | import('../network/line').Line }
  /** One member of the problem's family of that name, or of a series that the entry itself names (then `family` is null). */
  | {
      readonly form: 'catalogue'; readonly kind: PartKind; readonly family: string | null; readonly parts: readonly import('../network/part').Part[];
      /** By part: the drawer's designation where the value alone means another part, and how many are at hand; null where unlimited. */
      readonly labels: readonly (string | null)[];
      readonly counts: readonly (number | null)[];
    };

/** One element of the ladder that is `solve`, or that solving again may reconsider. */
export interface Unknown {
  readonly elementIndex: number;
  readonly name: string;
  readonly choices: readonly Choice[];
  /** `or none`: may stay open (shunt) or be bridged (series). */
  readonly mayOmit: boolean;
  /** True where a value stands there now that `solve again` may change. */
  readonly reopened: boolean;
}

/** `ladder: solve …`: the whole ladder is to be found. */
export type LadderTask =
  | { readonly form: 'up to'; readonly elements: number; readonly choices: readonly Choice[] }
  | { readonly form: 'pi' | 'tee'; readonly q: number | null; readonly bandwidthHz: number | null; readonly choices: readonly Choice[] };
