import { complexArray, type ComplexArray } from './complex';
import { interpolateNetwork } from './interpolateNetwork';
import type { NetworkData } from './networkData';

export interface FileReflection {
  readonly reflection: ComplexArray;
  readonly referenceOhm: number;
  readonly known: Uint8Array;
  readonly reason: string | null;
}

/**
 * What one port of a file shows with the others closed in their references, or its first two ports driven against each
 * other: Γ = (S11 − S12 − S21 + S22)/2 against 2·z0, which leaves the common mode closed. Not known where the file has no
 * such port, and outside of it.
 */
export function fileReflection(data: NetworkData, port: number | 'differential', frequencyHz: Float64Array): FileReflection {
  const nothing = (reason: string): FileReflection => {
    const reflection = complexArray(frequencyHz.length);
    reflection.re.fill(NaN);
    reflection.im.fill(NaN);
    return { reflection, referenceOhm: data.referenceOhm[0], known: new Uint8Array(frequencyHz.length), reason };
  };
  const { ports, referenceOhm } = data;
  if (port === 'differential') {
    if (ports < 2) return nothing('the file has one port, and two are driven differentially');
    if (referenceOhm[0] !== referenceOhm[1]) return nothing('the two ports have different references');
  } else if (port < 1 || port > ports) {
    return nothing(`the file has ${ports === 1 ? 'one port' : `${ports} ports`}, no port ${port}`);
  }
  const { sRe, sIm, known, reason } = interpolateNetwork(data, frequencyHz);
  const reflection = complexArray(frequencyHz.length);
  const pick = (values: Float64Array, k: number) => {
    const at = k * ports * ports;
    if (port !== 'differential') return values[at + (port - 1) * ports + port - 1];
    return (values[at] - values[at + 1] - values[at + ports] + values[at + ports + 1]) / 2;
  };
  for (let k = 0; k < frequencyHz.length; k++) {
    reflection.re[k] = pick(sRe, k);
    reflection.im[k] = pick(sIm, k);
  }
  return { reflection, referenceOhm: port === 'differential' ? 2 * referenceOhm[0] : referenceOhm[port - 1], known, reason };
}
