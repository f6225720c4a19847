import type { MarkerCaseView, MarkerView } from '../messages/panel';
import { printComplex, printPolar } from '../quantity/printComplex';
import { printQuantity } from '../quantity/printQuantity';
import type { Band, Problem } from '../study/problem';
import { impedancePath } from '../study/impedancePath';
import { markerReading, type MarkerReading } from '../study/markerReading';
import type { TunableCodes } from '../study/tunableCodes';
import { codesAt } from '../study/tuning/evaluateTuned';

/** Middle of the first band that is not watched: where the marker stands until someone moves it. */
export function defaultMarkerHz(problem: Problem): number | null {
  const band: Band | undefined = problem.bands.find((candidate) => !candidate.watch) ?? problem.bands[0];
  return band ? Math.sqrt(band.frequencyHz[0] * band.frequencyHz[band.frequencyHz.length - 1]) : null;
}

/** Everything at one frequency, each case with its way over the chart, tunables at the codes of that channel. Null where the frequency makes no sense. */
export function markerView(problem: Problem, frequencyHz: number): MarkerView | null {
  if (!(frequencyHz > 0) || !Number.isFinite(frequencyHz)) return null;
  const codes = codesAt(problem, frequencyHz);
  const readings = markerReading(problem, frequencyHz, codes);
  return {
    frequencyHz,
    text: printQuantity(frequencyHz, 'Hz', { digits: 6 }),
    cases: readings.map((reading, at) => caseView(problem, reading, at, frequencyHz, codes)),
  };
}

function caseView(problem: Problem, reading: MarkerReading, at: number, frequencyHz: number, codes: TunableCodes | undefined): MarkerCaseView {
  const path = impedancePath(problem, at, frequencyHz, codes);
  return {
    caseName: reading.caseName ?? 'load',
    text: markerText(reading),
    loadReflection: path.load,
    steps: path.steps.map(({ name, arc }) => ({ name, arc: { re: Array.from(arc.re), im: Array.from(arc.im) } })),
    inputReflection: reading.chartReflection,
  };
}

function markerText({ reflection, impedanceOhm, returnLossDb, reason }: MarkerReading): string {
  if (!reflection || !impedanceOhm) return reason ?? 'not known';
  const loss = returnLossDb === null || returnLossDb === Infinity ? '∞ dB' : printQuantity(returnLossDb, 'dB', { digits: 3 });
  // No figure is torn apart at the end of a line.
  return [`Γ ${printPolar(reflection)}`, printComplex(impedanceOhm, 'Ω'), loss].map((figure) => figure.replace(/ /g, '\u00a0')).join(' · ');
}
