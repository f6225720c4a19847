import { contours } from 'd3-contour';
import type { CoverageView } from '../messages/panel';
import { chartGrid, chartRadius, chartX, chartY } from './chartGrid';
import { placeLabels } from './placeLabels';
import { chartBox, caseClass } from './smithChart';
import { escapeText, round, tag, textTag } from './svg';

/** Stands for «no code helps», deep enough below every limit that it does not move the border. */
const deepestDb = -12;
/** Margins are cut here, so that the border lies between its two points and not beside a steep one. */
const highestDb = 12;

/**
 * The loads that some code brings to the goals, hatched, with the load cases, as the content of an SVG with `chartViewBox`. `id` keeps the
 * names of its patterns apart from those of other pictures on the page; `markRadius` is in the chart's units.
 */
export function coverageChart({ across, marginDb, cases }: CoverageView, id: string, markRadius = 5): string {
  const levels = marginDb.map((margin) => Math.min(Math.max(margin ?? deepestDb, deepestDb), highestDb));
  const [covered] = contours().size([across, across]).thresholds([0])(levels);
  const defs = tag('defs', {}, tag('pattern', { id: `${id}-hatch`, width: 7, height: 7, patternUnits: 'userSpaceOnUse', patternTransform: 'rotate(45)' }, tag('line', { class: 'hatch', x1: 0, y1: 0, x2: 0, y2: 7 }))
    + tag('clipPath', { id: `${id}-rim` }, tag('circle', { cx: 0, cy: 0, r: chartRadius })));
  // A grid point lies in the middle of its cell.
  const place = (cell: number): number => -1 + (2 * (cell - 0.5)) / (across - 1);
  const border = (covered?.coordinates ?? []).flat().map((ring) => `M${ring.map(([column, row]) => `${round(chartX(place(column)))} ${round(chartY(place(row)))}`).join('L')}Z`).join('');
  const region = border === '' ? '' : tag('g', { 'clip-path': `url(#${id}-rim)` },
    tag('path', { class: 'covered', d: border, fill: `url(#${id}-hatch)`, 'fill-rule': 'evenodd' }));
  const known = cases.flatMap(({ caseName, text, holds, reflection }, at) => (reflection ? [{ caseName, text, holds, reflection, at }] : []));
  const marks = known.map(({ caseName, text, holds, reflection: { re, im }, at }) => caseMark(chartX(re), chartY(im), holds, caseClass(at), `${caseName}: ${text}`, markRadius));
  const labels = placeLabels(known.map(({ caseName, reflection: { re, im } }) => ({ x: chartX(re), y: chartY(im), text: caseName })), chartBox, [])
    .map(({ x, y, anchor, text }) => textTag({ class: 'designator', x, y, 'text-anchor': anchor }, text));
  return defs + chartGrid() + region + marks.join('') + labels.join('');
}

/** A dot where the load is covered, a cross where it is not. */
function caseMark(x: number, y: number, holds: boolean, name: string, title: string, r: number): string {
  const content = tag('title', {}, escapeText(title));
  return holds ? tag('circle', { class: `marker-dot ${name}`, cx: x, cy: y, r }, content)
    : tag('path', { class: `case-cross ${name}`, d: `M${round(x - r)} ${round(y - r)}l${2 * r} ${2 * r}m0 ${-2 * r}l${-2 * r} ${2 * r}` }, content);
}
