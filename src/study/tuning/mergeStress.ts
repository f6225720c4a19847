import type { StressFigures, WorstStress } from '../worstStress';

/** The worst over the channels; not known where it is not known at one of them. */
export function mergeStress(before: WorstStress, after: WorstStress): WorstStress {
  if (!before.elements || !before.load) return before;
  if (!after.elements || !after.load) return after;
  const others = after.elements;
  return { elements: before.elements.map((figures, at) => larger(figures, others[at])), load: larger(before.load, after.load), reason: null };
}

const larger = (a: StressFigures, b: StressFigures): StressFigures => ({
  peakVoltageV: Math.max(a.peakVoltageV, b.peakVoltageV), rmsCurrentA: Math.max(a.rmsCurrentA, b.rmsCurrentA), dissipationW: Math.max(a.dissipationW, b.dissipationW),
});
