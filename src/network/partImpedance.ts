import type { ComplexArray } from './complex';
import { impedanceOf } from './immittance';
import type { Part } from './part';
import { partImmittance } from './partImmittance';

/**
 * The impedance of one part in Ω at each of `frequencyHz` (Hz, > 0): value, loss, ESL, SRF, or what was measured. Infinite
 * where a lossless coil stands exactly at its self-resonance; NaN where not `known` (outside a measured part's file).
 */
export function partImpedance(part: Part, frequencyHz: Float64Array): { impedance: ComplexArray; known: Uint8Array; reason: string | null } {
  const z = partImmittance(part, frequencyHz);
  return { impedance: impedanceOf(z), known: z.known, reason: z.reason };
}
