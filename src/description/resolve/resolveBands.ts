import type { Band } from '../../study/problem';
import type { Located, Span } from '../../base/span';
import { bandPoints, sweepPoints } from '../limits';
import type { DescriptionSyntax, ImpedanceSyntax } from '../syntax';
import { reportTwice } from './findName';
import { evenPoints, rangePoints } from './rangePoints';
import { problemAt, type Resolution } from './resolution';

/** The bands that are stated; without any, the common span of the load's files as the band `all`. Empty where none can be had. */
export function resolveBands(syntax: DescriptionSyntax, resolution: Pick<Resolution, 'files' | 'report'>): Band[] {
  reportTwice(syntax.bands.map((band) => band.name), 'band', resolution.report);
  const seen = new Set<string>();
  const bands = syntax.bands.flatMap((band): Band[] => {
    if (seen.has(band.name.value)) return [];
    seen.add(band.name.value);
    const frequencyHz = band.range ? rangePoints(band.range, bandPoints) : band.frequencyHz ? Float64Array.of(band.frequencyHz.value) : null;
    return frequencyHz && frequencyHz[0] > 0 ? [{ name: band.name.value, frequencyHz, watch: band.watch }] : [];
  });
  if (bands.length > 0) return bands;
  if (syntax.bands.length === 0) return commonSpan(syntax, resolution);
  // Bands are stated and none can be read, which is reported. What the files cover may be looked at, but no goal is judged over it.
  return commonSpan(syntax, { ...resolution, report: () => undefined }).map((band) => ({ ...band, watch: true }));
}

function commonSpan(syntax: DescriptionSyntax, { files, report }: Pick<Resolution, 'files' | 'report'>): Band[] {
  if (!syntax.load) return [];
  const paths = syntax.load.cases.flatMap((each) => filesIn(each.impedance));
  const { span } = syntax.load;
  const place: Span = { start: span.start, end: Math.max(span.start, Math.min(span.end, lineEnd(syntax.text, span.start))) };
  if (paths.length === 0) {
    const faulty = syntax.load.cases.some((each) => each.impedance.form === 'faulty');
    if (!faulty) report(problemAt('no-bands', 'Without a Touchstone file as the load the description needs «bands».', place));
    return [];
  }
  let from = 0;
  let to = Infinity;
  let known = 0;
  for (const path of paths) {
    const file = files.get(path.value);
    if (file?.form !== 'touchstone') continue;
    const { frequencyHz } = file.data;
    const positive = frequencyHz.find((frequency) => frequency > 0) ?? Infinity;
    from = Math.max(from, positive);
    to = Math.min(to, frequencyHz[frequencyHz.length - 1]);
    known++;
  }
  if (known === 0) return [];
  if (from > to || !Number.isFinite(from)) {
    report(problemAt('no-common-span', 'The files of the load have no frequency in common; state «bands».', place));
    return [];
  }
  return [{ name: 'all', frequencyHz: evenPoints(from, to, bandPoints), watch: false }];
}

function filesIn(node: ImpedanceSyntax): Located<string>[] {
  if (node.form === 'file') return [node.path];
  if (node.form === 'series' || node.form === 'parallel') return node.members.flatMap(filesIn);
  return node.form === 'table' ? node.rows.flatMap((row) => filesIn(row.impedance)) : [];
}

function lineEnd(text: string, from: number): number {
  const end = text.slice(from).search(/[\n\r]/);
  return end < 0 ? text.length : from + end;
}

/** What is plotted; by default from the lowest edge of a band × 0.8 to the highest × 1.25. */
export function resolveSweep(syntax: DescriptionSyntax, bands: readonly Band[]): Float64Array {
  if (syntax.sweep && syntax.sweep.min.value > 0) return rangePoints(syntax.sweep, sweepPoints);
  const lowest = Math.min(...bands.map((band) => band.frequencyHz[0]));
  const highest = Math.max(...bands.map((band) => band.frequencyHz[band.frequencyHz.length - 1]));
  return evenPoints(lowest * 0.8, highest * 1.25, sweepPoints);
}

/** Geometric mean of a band's ends. */
export const middleOf = ({ frequencyHz }: Band): number => Math.sqrt(frequencyHz[0] * frequencyHz[frequencyHz.length - 1]);
