import type { Report } from '../../base/diagnostic';

/**
 * One scalar of a description: its text without quotes or block-style indentation, and the way back from an offset in it
 * to an offset in the document.
 */
export interface Phrase {
  readonly text: string;
  at(offset: number): number;
}

/** The whole of `text` as a phrase that starts at `offset` of the document. */
export const plainPhrase = (text: string, offset = 0): Phrase => ({ text, at: (i) => offset + i });

/** Exponents of Ω-based units: a value's dimension as powers of metre, kilogram, second, ampere. */
export type DimensionVector = readonly [metre: number, kilogram: number, second: number, ampere: number];

/** A named value of `let`, in SI units. */
export interface LetValue {
  readonly value: number;
  readonly dimension: DimensionVector;
}

/** What reading a phrase may know and where it reports. */
export interface PhraseContext {
  readonly report: Report;
  /** Names defined by `let` before this place. */
  readonly lets: ReadonlyMap<string, LetValue>;
  /** False in an untrusted workspace: an expression is then an error that says so. */
  readonly expressions: boolean;
}
