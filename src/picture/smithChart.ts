import type { BandView, DiscView, LadderRowView, MarkerCaseView, MarkerView, PointList, TraceView } from '../messages/panel';
import { chartGrid, chartRadius, chartX, chartY, conductanceCircle, resistanceCircle } from './chartGrid';
import { placeLabels } from './placeLabels';
import { escapeText, polyline, tag, textTag } from './svg';

export interface ChartData {
  readonly frequencyHz: readonly number[];
  readonly traces: readonly TraceView[];
  /** What the traces would be with other values. */
  readonly previews?: readonly TraceView[];
  readonly bands: readonly BandView[];
  /** Traces of builds with tolerances, behind the others. */
  readonly cloud?: readonly PointList[];
  readonly discs: readonly DiscView[];
  readonly limits: readonly DiscView[];
  readonly marker: MarkerView | null;
  /** Tells which way each element turns. */
  readonly ladder: readonly LadderRowView[];
}

const margin = 14;
export const chartBox = { x: -chartRadius - margin, y: -chartRadius - margin, width: 2 * (chartRadius + margin), height: 2 * (chartRadius + margin) };

export const chartViewBox = `${chartBox.x} ${chartBox.y} ${chartBox.width} ${chartBox.height}`;

/** Styles for six cases and seven elements repeat after that: by position, never by kind. */
export const caseClass = (index: number): string => `case-${index % 6}`;
export const elementClass = (index: number): string => `element-${index % 7}`;

/**
 * Everything on the chart against z0, as the content of an SVG with `chartViewBox`: grid, the goals' discs, each case's
 * trace (thick in the bands), the first case's way from the load through each element at the marker. Class names only.
 */
export function smithChart(data: ChartData): string {
  const first = data.marker?.cases[0] ?? null;
  return [
    chartGrid(),
    tag('g', { class: 'discs' }, [...data.discs.map((disc) => discMarkup('disc', disc)), ...data.limits.map((limit) => discMarkup('limit', limit))].join('') || ' '),
    ...(data.cloud ?? []).map((reflection) => traceLine('cloud', reflection)),
    tag('g', { class: 'guides', 'aria-hidden': 'true' }, first ? guides(first, data.ladder) : ' '),
    tag('g', { class: 'traces' }, data.traces.map((trace, i) => traceMarkup(trace, i, data)).join('') || ' '),
    ...(data.previews ?? []).map(({ reflection }) => traceLine('preview', reflection)),
    tag('g', { class: 'path' }, first ? pathMarkup(first, data) : ' '),
    tag('g', { class: 'markers' }, (data.marker?.cases ?? []).map((reading, i) => inputDot(reading, i)).join('') || ' '),
  ].join('');
}

function discMarkup(name: 'disc' | 'limit', { centreRe, centreIm, radius, label }: DiscView): string {
  return tag('circle', { class: name, cx: chartX(centreRe), cy: chartY(centreIm), r: radius * chartRadius }, tag('title', {}, escapeText(label)));
}

function traceMarkup({ caseName, reflection }: TraceView, index: number, { frequencyHz, bands }: ChartData): string {
  const xs = reflection.re.map((re) => (re === null ? null : chartX(re)));
  const ys = reflection.im.map((im) => (im === null ? null : chartY(im)));
  const inBands = bands.map(({ startHz, stopHz, watch }) => {
    const keep = frequencyHz.map((f) => f >= startHz && f <= stopHz);
    const data = polyline(xs.map((x, k) => (keep[k] ? x : null)), ys.map((y, k) => (keep[k] ? y : null)));
    return data === '' ? '' : tag('path', { class: `trace in-band${watch ? ' watched' : ''} ${caseClass(index)}`, d: data });
  });
  return tag('g', { 'data-case': index }, tag('path', { class: `trace ${caseClass(index)}`, d: polyline(xs, ys) }, tag('title', {}, escapeText(caseName))) + inBands.join(''));
}

function traceLine(name: 'preview' | 'cloud', { re, im }: PointList): string {
  return tag('path', { class: name, d: polyline(re.map((x) => (x === null ? null : chartX(x))), im.map((y) => (y === null ? null : chartY(y)))) });
}

/** Dotted circles along which the elements move the point, so that the eye finds the arcs' law. */
function guides({ loadReflection, steps }: MarkerCaseView, ladder: readonly LadderRowView[]): string {
  let before = loadReflection;
  const circles: string[] = [];
  for (const { name, arc } of steps) {
    const orientation = ladder.find((row) => row.id === name)?.orientation;
    const circle = before && (orientation === 'series' ? resistanceCircle(before) : orientation === 'shunt' ? conductanceCircle(before) : null);
    if (circle) circles.push(tag('circle', { class: 'guide', ...circle }));
    before = { re: arc.re[arc.re.length - 1], im: arc.im[arc.im.length - 1] };
  }
  return circles.join('') || ' ';
}

function pathMarkup({ loadReflection, steps }: MarkerCaseView, data: ChartData): string {
  if (!loadReflection) return ' ';
  const arcs = steps.map(({ name, arc }, i) =>
    tag('path', { class: `arc ${elementClass(i)}`, 'data-element': name, d: polyline(arc.re.map(chartX), arc.im.map(chartY)) }, tag('title', {}, escapeText(name))));
  const ends = [{ name: 'load', re: loadReflection.re, im: loadReflection.im }, ...steps.map(({ name, arc }) => ({ name, re: arc.re[arc.re.length - 1], im: arc.im[arc.im.length - 1] }))];
  const dots = ends.slice(0, -1).map(({ re, im, name }) => tag('circle', { class: 'joint', 'data-element': name, cx: chartX(re), cy: chartY(im), r: 3.6 }));
  const obstacles = [...steps.flatMap(({ arc }) => arc.re.map((re, k) => ({ x: chartX(re), y: chartY(arc.im[k]) }))), ...tracePoints(data)];
  const labels = placeLabels(ends.map(({ name, re, im }) => ({ x: chartX(re), y: chartY(im), text: name })), chartBox, obstacles)
    .map(({ x, y, anchor, text }) => textTag({ class: 'designator', x, y, 'text-anchor': anchor }, text));
  return arcs.join('') + dots.join('') + labels.join('');
}

const tracePoints = ({ traces }: ChartData) =>
  traces.flatMap(({ reflection }) => reflection.re.flatMap((re, k) => (k % 4 === 0 && re !== null ? [{ x: chartX(re), y: chartY(reflection.im[k] ?? 0) }] : [])));

function inputDot({ inputReflection, caseName }: MarkerCaseView, index: number): string {
  if (!inputReflection) return '';
  return tag('circle', { class: `marker-dot ${caseClass(index)}`, cx: chartX(inputReflection.re), cy: chartY(inputReflection.im), r: index === 0 ? 5 : 4 }, tag('title', {}, escapeText(caseName)));
}

/** Index of the sweep point whose trace lies nearest to a place of the chart (in its units); null where nothing is drawn. */
export function nearestTracePoint(data: Pick<ChartData, 'traces'>, x: number, y: number): { readonly index: number; readonly distance: number } | null {
  let best: { index: number; distance: number } | null = null;
  for (const { reflection } of data.traces) {
    reflection.re.forEach((re, index) => {
      const im = reflection.im[index];
      if (re === null || im === null) return;
      const distance = Math.hypot(chartX(re) - x, chartY(im) - y);
      if (!best || distance < best.distance) best = { index, distance };
    });
  }
  return best;
}

/** What a person who cannot see the chart is told of it. */
export function chartSummary({ marker, traces }: Pick<ChartData, 'marker' | 'traces'>): string {
  const names = traces.map(({ caseName }) => caseName).join(', ');
  const readings = (marker?.cases ?? []).map(({ caseName, text }) => `${caseName}: ${text}`).join('; ');
  return `Smith chart with the reflection trace of ${names}.${marker ? ` At ${marker.text}, ${readings}.` : ''}`;
}
