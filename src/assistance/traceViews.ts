import type { BandView, DiscView, MaskView, PointList, TraceView } from '../messages/panel';
import type { ComplexArray } from '../network/complex';
import { goalDiscs } from '../study/discs';
import type { CaseTrace, Evaluation } from '../study/evaluation';
import type { Goal, GoalResult } from '../study/goal';
import type { Problem } from '../study/problem';
import { goalTitle, isKnownResult } from './goalText';

/** Enough digits for a screen at any zoom, short enough to send at every keystroke. */
const rounded = (value: number, known: number): number | null => (known && Number.isFinite(value) ? Math.round(value * 1e5) / 1e5 : null);

const list = (values: Float64Array, known: Uint8Array): (number | null)[] => Array.from(values, (value, k) => rounded(value, known[k]));

const points = (values: ComplexArray, known: Uint8Array): PointList => ({ re: list(values.re, known), im: list(values.im, known) });

export function traceView(trace: CaseTrace): TraceView {
  const { re, im } = trace.reflection;
  const levels = Float64Array.from(re, (_, k) => 20 * Math.log10(Math.hypot(re[k], im[k])));
  return {
    caseName: trace.caseName ?? 'load',
    reflection: points(trace.chartReflection, trace.known),
    reflectionDb: list(levels, trace.known),
    gainDb: list(trace.gainDb, trace.known),
    reason: trace.reason,
  };
}

export function bandViews(problem: Problem): BandView[] {
  return problem.bands.map(({ name, frequencyHz, watch }) => ({ name, startHz: frequencyHz[0], stopHz: frequencyHz[frequencyHz.length - 1], watch }));
}

/** Goals on reflection as discs of the chart; those that ask to stay outside, or that reach beyond the chart, are not drawn. */
export function discViews(problem: Problem): DiscView[] {
  return goalDiscs(problem).flatMap(({ goalIndex, region, keepOut, reflection }) =>
    region.form === 'inside' && !keepOut && reflection < 1
      ? [{ centreRe: region.centre.re, centreIm: region.centre.im, radius: region.radius, label: goalTitle(problem.goals[goalIndex]) }]
      : []);
}

/** Goals on return loss and gain over the bands and ranges they are asked for. */
export function maskViews(problem: Problem, results: readonly GoalResult[]): MaskView[] {
  return results.flatMap((result, goalId) => {
    const { goal } = result;
    const level = maskLevel(goal);
    if (!level || goal.into !== null || !isKnownResult(result)) return [];
    return spansOf(goal, problem).map(([startHz, stopHz]) => ({ ...level, startHz, stopHz, ok: result.ok, goalId }));
  });
}

function maskLevel(goal: Goal): Pick<MaskView, 'plot' | 'side' | 'levelDb'> | null {
  if (goal.limit === null) return null;
  const least = goal.comparison === '>=' || goal.comparison === '>';
  switch (goal.quantity) {
    // Plots show reflection in dB, so a return loss stands at its negative.
    case 'return loss': return { plot: 'reflection', side: least ? 'at most' : 'at least', levelDb: -goal.limit };
    case 'reflection': return goal.limit > 0 ? { plot: 'reflection', side: least ? 'at least' : 'at most', levelDb: 20 * Math.log10(goal.limit) } : null;
    case 'VSWR': return goal.limit > 1 ? { plot: 'reflection', side: least ? 'at least' : 'at most', levelDb: 20 * Math.log10((goal.limit - 1) / (goal.limit + 1)) } : null;
    case 'gain': return { plot: 'gain', side: least ? 'at least' : 'at most', levelDb: goal.limit };
    case 'insertion loss': return { plot: 'gain', side: least ? 'at most' : 'at least', levelDb: -goal.limit };
    default: return null;
  }
}

function spansOf(goal: Goal, problem: Problem): [number, number][] {
  const ends = (frequencyHz: Float64Array): [number, number] => [frequencyHz[0], frequencyHz[frequencyHz.length - 1]];
  const { place } = goal;
  switch (place.form) {
    case 'bands': return problem.bands.filter((band) => !band.watch).map((band) => ends(band.frequencyHz));
    case 'band': return problem.bands.filter((band) => band.name === place.band).map((band) => ends(band.frequencyHz));
    case 'range': return [ends(place.frequencyHz)];
    case 'frequency': return [[place.frequencyHz, place.frequencyHz]];
    case 'harmonic': return problem.bands.filter((band) => band.name === place.band).map((band) => {
      const [start, stop] = ends(band.frequencyHz);
      return [start * place.order, stop * place.order];
    });
  }
}

export const sweepList = (evaluation: Evaluation): number[] => Array.from(evaluation.frequencyHz);
