import type { Element } from '../../network/element';
import type { Impedance } from '../../network/impedance';
import type { Problem } from '../problem';
import { placeOfBand, sweepPlace } from '../place';
import { sampler } from '../sampler';
import { middleLadder } from '../tuning/middleLadder';
import { traceCase } from '../traceCase';
import { randomBuilds } from './randomBuilds';
import { pairValue, toleratedParts, withPartValue } from './toleratedParts';

/** The first case's trace of one random build on the chart, thinned; null where not known. */
export interface CloudTrace {
  readonly re: readonly (number | null)[];
  readonly im: readonly (number | null)[];
}

const builds = 24;
const pointsAtMost = 61;

/** The traces of the first few random builds, for a cloud behind the chart's own: over the sweep, in the first case, against z0. */
export function toleranceCloud(problem: Problem, ladder = middleLadder(problem)): CloudTrace[] {
  const parts = toleratedParts(ladder);
  const draw = randomBuilds(parts, problem.spread);
  const values = new Float64Array(parts.length);
  const step = Math.max(1, Math.ceil(problem.sweepHz.length / pointsAtMost));
  const sweepHz = problem.sweepHz.filter((_, k) => k % step === 0);
  const place = sweepHz.length > 0 ? sweepPlace({ ...problem, sweepHz }) : placeOfBand(problem.bands[0]);
  return Array.from({ length: builds }, () => {
    draw(values);
    const built = ladder.map((element, at): Element => {
      if (element.form !== 'branch') return element;
      const own = parts.flatMap((part, i) => (part.elementIndex === at ? [{ ...part, value: values[i] }] : []));
      let branch: Impedance = element.branch;
      for (let i = 0; i < own.length; i += element.pair ? 2 : 1) {
        branch = withPartValue(branch, own[i].path, element.pair ? pairValue(own[i].part.kind, own[i].value, own[i + 1].value) : own[i].value);
      }
      return { ...element, branch };
    });
    const { chartReflection, known } = traceCase(sampler({ ...problem, sweepHz }, built).trace(place, 0), problem.z0Ohm);
    const list = (numbers: Float64Array) => Array.from(numbers, (value, k) => (known[k] ? Math.round(value * 1e4) / 1e4 : null));
    return { re: list(chartReflection.re), im: list(chartReflection.im) };
  });
}
