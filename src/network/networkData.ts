/**
 * A measured or simulated n-port, as read from a Touchstone file: power-wave-free scattering parameters against real
 * reference resistances, one per port.
 */
export interface NetworkData {
  readonly ports: number;
  /** Strictly increasing. */
  readonly frequencyHz: Float64Array;
  /** One real, positive reference per port. */
  readonly referenceOhm: Float64Array;
  /** S at point k, row i, column j (from 0) stands at index (k·ports + i)·ports + j. */
  readonly sRe: Float64Array;
  readonly sIm: Float64Array;
}
