import { scaleLinear } from 'd3-scale';
import { tag, textTag } from './svg';

export interface HistogramData {
  readonly bars: readonly { readonly fromDb: number; readonly toDb: number; readonly count: number }[];
  /** The worst corner; null where it has no margin. */
  readonly cornerDb: number | null;
}

export const histogramSize = { width: 540, height: 130 } as const;
/** So many widths of what builds reach the limit may lie beside it and still be drawn. */
const limitWithin = 2;
const area = { left: 12, right: 12, top: 18, bottom: 30 } as const;

/** Worst margins of builds, as the content of an SVG of `histogramSize`: bars, the limit at 0, the worst corner marked. */
export function histogramPicture({ bars, cornerDb }: HistogramData): string {
  if (bars.length === 0) return ' ';
  const data = [bars[0].fromDb, bars[bars.length - 1].toDb, ...(cornerDb === null ? [] : [cornerDb])];
  const [low, high] = [Math.min(...data), Math.max(...data)];
  // A limit far from every build would press them into a corner of the picture.
  const isNear = Math.min(Math.abs(low), Math.abs(high)) <= limitWithin * (high - low) || (low <= 0 && high >= 0);
  const ends = isNear ? [...data, 0] : data;
  const x = scaleLinear([Math.min(...ends), Math.max(...ends)], [area.left, histogramSize.width - area.right]).nice(8);
  const bottom = histogramSize.height - area.bottom;
  const y = scaleLinear([0, Math.max(...bars.map(({ count }) => count))], [bottom, area.top]);
  const columns = bars.filter(({ count }) => count > 0).map(({ fromDb, toDb, count }) =>
    tag('rect', { class: fromDb >= -1e-12 ? 'bar-held' : 'bar-missed', x: x(fromDb) + 0.5, y: y(count), width: Math.max(1, x(toDb) - x(fromDb) - 1), height: bottom - y(count) }));
  const axis = tag('line', { class: 'grid', x1: area.left, y1: bottom, x2: histogramSize.width - area.right, y2: bottom });
  const ticks = x.ticks(6).map((tick) => textTag({ class: 'scale', x: x(tick), y: bottom + 13, 'text-anchor': 'middle' }, String(tick).replace('-', '−')));
  const limit = isNear ? tag('line', { class: 'bar-limit', x1: x(0), y1: area.top - 4, x2: x(0), y2: bottom }) : '';
  const title = textTag({ class: 'scale', x: histogramSize.width / 2, y: histogramSize.height - 3, 'text-anchor': 'middle' }, isNear ? 'worst margin of a build, dB' : `worst margin of a build, dB; the limit at 0 lies to the ${low > 0 ? 'left' : 'right'}`);
  return columns.join('') + axis + ticks.join('') + limit + title + (cornerDb === null ? '' : cornerMark(x(cornerDb), bottom));
}

/** A pointed mark on the axis, with its name above it on the side that has room. */
function cornerMark(at: number, bottom: number): string {
  const right = at < histogramSize.width / 2;
  return tag('path', { class: 'corner-mark', d: `M${at} ${bottom}l-5 -10h10z` })
    + textTag({ class: 'designator', x: at + (right ? 8 : -8), y: bottom - 4, 'text-anchor': right ? 'start' : 'end' }, 'worst corner');
}
