import { throughElements } from '../../src/network/cascade';
import type { Complex } from '../../src/network/complex';
import type { Element } from '../../src/network/element';
import { powerWaveReflection } from '../../src/network/figures';
import { sampleImpedance } from '../../src/network/immittance';
import { idealPart } from '../../src/network/part';
import type { ReactivePart } from '../../src/solve/closedForms';

/** |Γ| against the source behind lossless parts, by the cascade that evaluates descriptions. */
export function mismatch(parts: readonly ReactivePart[], load: Complex, source: Complex, frequencyHz: number): number {
  const at = Float64Array.of(frequencyHz);
  const input = throughElements(elementsOf(parts), sampleImpedance({ form: 'constant', impedanceOhm: load }, at), at);
  const { re, im } = powerWaveReflection(input, sampleImpedance({ form: 'constant', impedanceOhm: source }, at));
  return Math.hypot(re[0], im[0]);
}

export const elementsOf = (parts: readonly ReactivePart[]): Element[] => parts.map(({ orientation, kind, value }, i) => ({
  form: 'branch', name: `X${i + 1}`, orientation, pair: false, branch: { form: 'part', part: idealPart(kind, value) },
}));
