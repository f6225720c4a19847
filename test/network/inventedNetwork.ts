import type { Complex } from '../../src/network/complex';
import type { NetworkData } from '../../src/network/networkData';

/** A file's data from a function of frequency, row by row. */
export function networkData(ports: number, frequencies: readonly number[], s: (hz: number) => readonly Complex[], referenceOhm: readonly number[] = Array.from({ length: ports }, () => 50)): NetworkData {
  const values = frequencies.flatMap((hz) => [...s(hz)]);
  return {
    ports, frequencyHz: Float64Array.from(frequencies), referenceOhm: Float64Array.from(referenceOhm),
    sRe: Float64Array.from(values, ({ re }) => re), sIm: Float64Array.from(values, ({ im }) => im),
  };
}
