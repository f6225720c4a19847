import { casesOf } from './casesOf';
import type { Goal, GoalResult } from './goal';
import { middleOf, placesOf } from './place';
import type { Sampler, Trace } from './sampler';
import { largestAround, spanAround, type Curve, type Edge, type SpanAround } from './spanAround';
import { holds, judged, notKnown, wantsLarge } from './verdict';
import { worseOf, type Worst } from './worst';

/** Return loss of 10 dB as |Γ|². */
const tenDecibels = 0.1;

interface Bandwidth {
  readonly value: number;
  /** What the value is a lower bound for; null where it is exact. */
  readonly atLeast: string | null;
}

/**
 * Bandwidth in Hz: the unbroken span around the band's middle (geometric mean of its ends) in which the return loss is at
 * least 10 dB; or, `at N dB`, in which the gain is within N dB of its largest value there. 0 where the middle itself is
 * outside. Edges are found to 1e-9 of the frequency, far beyond the points of the band, within what is known of load and
 * ladder; where an edge is not reached, the value is a lower bound and the reason says so: enough for a lower limit that
 * it meets, never enough for an upper one.
 */
export function judgeBandwidth(goal: Goal, sampler: Sampler): GoalResult {
  const places = placesOf(goal, sampler.problem);
  if (typeof places === 'string') return notKnown(goal, places);
  const loads = goal.into ? [goal.into] : casesOf(goal, sampler.problem);
  if (typeof loads === 'string') return notKnown(goal, loads);
  const smallIsBad = wantsLarge(goal);
  let worst: Worst | null = null;
  let bound: string | null = null;
  for (const place of places) {
    const middleHz = middleOf(place.frequencyHz);
    for (const load of loads) {
      const traceAt = (frequencyHz: Float64Array): Trace => sampler.trace({ key: null, frequencyHz, band: place.band }, load);
      const middle = traceAt(Float64Array.of(middleHz));
      if (middle.reason !== null) return notKnown(goal, middle.reason, middleHz, middle.caseName);
      const found = bandwidthAround(goal, middleHz, traceAt);
      const before: Worst | null = worst;
      worst = worseOf(worst, { value: found.value, frequencyHz: middleHz, caseName: middle.caseName }, smallIsBad);
      if (smallIsBad ? worst !== before : found.atLeast !== null) bound = found.atLeast;
    }
  }
  if (!worst) return notKnown(goal, 'there is no frequency to judge it at');
  const result = judged(goal, worst.value, worst.frequencyHz, worst.caseName);
  return bound === null ? result : { ...result, ok: smallIsBad && holds(goal, worst.value), reason: bound };
}

function bandwidthAround(goal: Goal, middleHz: number, traceAt: (frequencyHz: Float64Array) => Trace): Bandwidth {
  if (goal.bandwidthDropDb === null) {
    const matched: Curve = (frequencyHz) => blank(traceAt(frequencyHz), ({ re, im }, k) => -(re[k] * re[k] + im[k] * im[k]));
    return widthOf(spanAround(matched, -tenDecibels, middleHz));
  }
  const gain: Curve = (frequencyHz) => {
    const trace = traceAt(frequencyHz);
    return trace.gain().map((value, k) => (trace.known[k] ? value : NaN));
  };
  // The peak is the largest gain met before it has fallen by the drop from its value at the middle.
  const share = 10 ** (-goal.bandwidthDropDb / 10);
  const atMiddle = gain(Float64Array.of(middleHz))[0];
  if (atMiddle === 0) return { value: 0, atLeast: null };
  return widthOf(spanAround(gain, share * largestAround(gain, share * atMiddle, middleHz), middleHz));
}

function widthOf(span: SpanAround | null): Bandwidth {
  if (span === null) return { value: 0, atLeast: null };
  const open = [span.low, span.high].filter((edge) => edge.end !== 'crossed');
  const atLeast = open.length > 0 ? `at least this: ${open.map(endText).join(' and ')}` : null;
  return { value: span.high.frequencyHz - span.low.frequencyHz, atLeast };
}

function endText(edge: Edge): string {
  const megahertz = Number((edge.frequencyHz / 1e6).toPrecision(6));
  return edge.end === 'unknown' ? `what is known ends at ${megahertz} MHz` : `it was followed as far as ${megahertz} MHz`;
}

function blank(trace: Trace, value: (reflection: { re: Float64Array; im: Float64Array }, k: number) => number): Float64Array {
  const reflection = trace.reflection();
  return Float64Array.from(trace.known, (known, k) => (known ? value(reflection, k) : NaN));
}
