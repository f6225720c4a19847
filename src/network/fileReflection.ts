import { complexArray, type ComplexArray } from './complex';
import { matrixOf } from './complexMatrix';
import { interpolateNetwork } from './interpolateNetwork';
import type { NetworkData } from './networkData';
import { renormalise } from './renormalise';

export interface FileReflection {
  readonly reflection: ComplexArray;
  /** Ω, what the reflection is against. */
  readonly referenceOhm: number;
  readonly known: Uint8Array;
  readonly reason: string | null;
}

/**
 * What one port of a file (from 1) shows with the others closed in their references, or its first two ports driven against
 * each other: Γ = (S11 − S12 − S21 + S22)/2 against 2·z0, which leaves the common mode closed; where the two have different
 * references, S is first taken against that of port 1. NaN and not known where the file has no such port, and outside of it
 * (Hz).
 */
export function fileReflection(data: NetworkData, port: number | 'differential', frequencyHz: Float64Array): FileReflection {
  const { ports, referenceOhm } = data;
  if (port === 'differential') {
    if (ports < 2) return nothing(data, frequencyHz, 'the file has one port, and two are driven differentially');
    return differentialReflection(data, frequencyHz);
  }
  if (!Number.isInteger(port) || port < 1 || port > ports) {
    return nothing(data, frequencyHz, ports === 1 ? `the file has one port, and no port ${port}` : `the file has ${ports} ports, and no port ${port}`);
  }
  const { sRe, sIm, known, reason } = interpolateNetwork(data, frequencyHz);
  const reflection = complexArray(frequencyHz.length);
  for (let k = 0; k < frequencyHz.length; k++) {
    const at = (k * ports + port - 1) * ports + port - 1;
    reflection.re[k] = sRe[at];
    reflection.im[k] = sIm[at];
  }
  return { reflection, referenceOhm: referenceOhm[port - 1], known, reason };
}

function differentialReflection(data: NetworkData, frequencyHz: Float64Array): FileReflection {
  const { ports, referenceOhm } = data;
  const interpolated = interpolateNetwork(data, frequencyHz);
  const known = interpolated.known.slice();
  let { reason } = interpolated;
  const common = Float64Array.from(referenceOhm, (own, i) => (i === 1 ? referenceOhm[0] : own));
  const alike = referenceOhm[0] === referenceOhm[1];
  const reflection = complexArray(frequencyHz.length);
  for (let k = 0; k < frequencyHz.length; k++) {
    const stated = matrixOf(ports, (row, column) => {
      const at = (k * ports + row) * ports + column;
      return { re: interpolated.sRe[at], im: interpolated.sIm[at] };
    });
    const s = alike || !known[k] ? stated : renormalise(stated, referenceOhm, common);
    if (s === null) {
      known[k] = 0;
      reason ??= 'the network has no scattering parameters against one reference';
    }
    reflection.re[k] = s === null ? NaN : (s[0][0].re - s[0][1].re - s[1][0].re + s[1][1].re) / 2;
    reflection.im[k] = s === null ? NaN : (s[0][0].im - s[0][1].im - s[1][0].im + s[1][1].im) / 2;
  }
  return { reflection, referenceOhm: 2 * referenceOhm[0], known, reason };
}

function nothing({ referenceOhm }: NetworkData, frequencyHz: Float64Array, reason: string): FileReflection {
  const reflection = complexArray(frequencyHz.length);
  reflection.re.fill(NaN);
  reflection.im.fill(NaN);
  return { reflection, referenceOhm: referenceOhm[0], known: new Uint8Array(frequencyHz.length), reason };
}
