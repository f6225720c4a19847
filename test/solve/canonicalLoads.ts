import type { Element } from '../../src/network/element';
import { idealPart, type PartKind } from '../../src/network/part';
import { blankPoints, type TrialPoints } from '../../src/solve/trialPoints';

/** Band edge of the normalised low-pass loads, and what 1 Ω stands for. Invented. */
export const edgeHz = 4e8;
export const unitOhm = 30;

/** Henry or farad of a normalised element value. */
export const henryOf = (g: number): number => (g * unitOhm) / (2 * Math.PI * edgeHz);
export const faradOf = (g: number): number => g / (2 * Math.PI * edgeHz * unitOhm);

export const branch = (orientation: 'series' | 'shunt', kind: PartKind, value: number): Element =>
  ({ form: 'branch', name: `${kind} ${orientation}`, orientation, pair: false, branch: { form: 'part', part: idealPart(kind, value) } });

/** From 0 to the edge, evenly in frequency; the lowest is not quite 0. */
export const lowPassBand = (count: number): Float64Array =>
  Float64Array.from({ length: count }, (_, k) => edgeHz * Math.max(k / (count - 1), 1e-6));

/**
 * A load of 1 Ω beside a capacitor of g1 seen from the wrong side: it is the source, and what the ladder is closed in is an
 * open, so that a resistor across it can be a free value. Of a lossless ladder |Γ| is the same from both sides.
 */
export function seenFromTheLoad(g1: number, frequencyHz: Float64Array): TrialPoints {
  const blank = blankPoints(frequencyHz.length);
  frequencyHz.forEach((f, k) => {
    const x = (g1 * f) / edgeHz;
    blank.sourceRe[k] = unitOhm / (1 + x * x);
    blank.sourceIm[k] = (-unitOhm * x) / (1 + x * x);
    blank.currentRe[k] = 0;
  });
  blank.reflectionWeight.fill(1);
  return { ...blank, frequencyHz, rest: [], starts: [0] };
}

/** The n − 1 elements after g1 and the resistor that closes them, resistor first; the values are g2 … gn and the resistance. */
export function ladderBackwards(values: readonly number[], resistance: number): Element[] {
  const elements = values.map((g, i) => (i % 2 === 0 ? branch('series', 'inductor', henryOf(g)) : branch('shunt', 'capacitor', faradOf(g))));
  return [branch('shunt', 'resistor', resistance * unitOhm), ...elements.reverse()];
}
