import type { ComplexArray } from './complex';

/**
 * ABCD matrices of a two-port at n frequencies, from the source's side (port 1) to the load's (port 2), with I2 leaving
 * port 2 (Pozar, Microwave Engineering, Table 4.1). The true matrix is (a, b, c, d) / scale, so that a series open or a
 * shunt short, whose own entries are infinite, is `scale` 0 with finite entries. Where `known` is 0 all hold NaN.
 */
export interface Cascade {
  readonly frequencyHz: Float64Array;
  readonly a: ComplexArray;
  /** Ω. */
  readonly b: ComplexArray;
  /** S. */
  readonly c: ComplexArray;
  readonly d: ComplexArray;
  readonly scale: ComplexArray;
  readonly known: Uint8Array;
  /** Why points are not known, in one short sentence; null where all are. */
  readonly reason: string | null;
}
