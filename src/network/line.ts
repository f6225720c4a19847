/**
 * A uniform line, already reduced to numbers: the same whether it came from an impedance and a length, an electrical
 * length, or a microstrip's geometry.
 */
export interface Line {
  /** Real characteristic impedance, the usual low-loss approximation. */
  readonly impedanceOhm: number;
  /** Physical length; with `velocityFactor` it gives the phase β·l = 2π f · lengthM / (velocityFactor · c). */
  readonly lengthM: number;
  readonly velocityFactor: number;
  /** One-way loss of the whole line at `lossAtHz` that grows with √f (conductor). */
  readonly conductorLossDb: number;
  /** One-way loss of the whole line at `lossAtHz` that grows with f (dielectric). */
  readonly dielectricLossDb: number;
  /** Where the two losses are stated; 1 where there are none. */
  readonly lossAtHz: number;
}
