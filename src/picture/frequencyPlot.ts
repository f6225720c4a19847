import { ticks } from 'd3-array';
import { scaleLinear, type ScaleLinear } from 'd3-scale';
import type { BandView, MaskView, TraceView } from '../messages/panel';
import { caseClass } from './smithChart';
import { polyline, tag, textTag } from './svg';

export interface PlotData {
  readonly plot: 'reflection' | 'gain';
  readonly frequencyHz: readonly number[];
  readonly traces: readonly TraceView[];
  /** What the traces would be with other values. */
  readonly previews?: readonly TraceView[];
  readonly bands: readonly BandView[];
  readonly masks: readonly MaskView[];
  readonly markerHz: number | null;
}

export const plotSize = { width: 540, height: 170 } as const;
const area = { left: 44, right: 24, top: 24, bottom: 26 } as const;
const deepest = { reflection: -40, gain: -30 } as const;
const shallowest = { reflection: -10, gain: -3 } as const;

/** Share of what is shown that stays free on both sides. */
const sideShare = 0.04;

/** The part of the sweep in which something is known, a band lies or the marker stands: the rest would be empty. */
export function shownSpan({ frequencyHz, traces, bands, markerHz }: Pick<PlotData, 'frequencyHz' | 'traces' | 'bands' | 'markerHz'>): readonly [number, number] {
  const [start, stop] = [frequencyHz[0], frequencyHz[frequencyHz.length - 1]];
  const known = frequencyHz.filter((_, k) => traces.some(({ reflectionDb, gainDb }) => (reflectionDb[k] ?? gainDb[k] ?? null) !== null));
  if (known.length === 0) return [start, stop];
  const within = [...bands.flatMap(({ startHz, stopHz }) => [startHz, stopHz]), ...(markerHz === null ? [] : [markerHz])].filter((hz) => hz >= start && hz <= stop);
  const [low, high] = [Math.min(known[0], ...within), Math.max(known[known.length - 1], ...within)];
  const side = sideShare * (high - low);
  return [Math.max(start, low - side), Math.min(stop, high + side)];
}

/** The frequency scale of a plot, shared with whoever drags the marker over it. Null without points. */
export function frequencyScale(frequencyHz: readonly number[], span: readonly [number, number] = [frequencyHz[0], frequencyHz[frequencyHz.length - 1]]): ScaleLinear<number, number> | null {
  if (frequencyHz.length === 0) return null;
  const [low, high] = span;
  const spread = high > low ? 0 : low * 0.05;
  return scaleLinear([low - spread, high + spread], [area.left, plotSize.width - area.right]);
}

/** The unit in which a sweep's frequencies are written: the largest that leaves its upper end at 1 or more. */
export function frequencyUnit(frequencyHz: readonly number[]): { readonly unit: string; readonly hz: number } {
  const high = frequencyHz[frequencyHz.length - 1] ?? 1;
  return high >= 3e9 ? { unit: 'GHz', hz: 1e9 } : high >= 1e6 ? { unit: 'MHz', hz: 1e6 } : high >= 1e3 ? { unit: 'kHz', hz: 1e3 } : { unit: 'Hz', hz: 1 };
}

/** One plot over frequency, as the content of an SVG of `plotSize`: bands shaded, goals as bars, a line for each case, the marker. */
export function frequencyPlot(data: PlotData): string {
  const x = frequencyScale(data.frequencyHz, shownSpan(data));
  const title = textTag({ class: 'plot-title', x: area.left, y: 14 }, data.plot === 'reflection' ? 'reflection, dB' : 'gain, dB');
  if (!x) return title;
  const y = levelScale(data);
  const bottom = plotSize.height - area.bottom;
  const unit = frequencyUnit(data.frequencyHz);
  const [low, high] = x.domain();
  const levels = y.ticks(5).map((level) =>
    tag('line', { class: 'grid', x1: area.left, y1: y(level), x2: plotSize.width - area.right, y2: y(level) })
    + textTag({ class: 'scale', x: area.left - 8, y: y(level) + 4, 'text-anchor': 'end' }, String(level).replace('-', '−')));
  const frequencies = ticks(low / unit.hz, high / unit.hz, 6).map((tick) =>
    textTag({ class: 'scale', x: x(tick * unit.hz), y: bottom + 18, 'text-anchor': 'middle' }, String(tick)));
  const inside = (hz: number) => Math.min(Math.max(x(hz), area.left), plotSize.width - area.right);
  const bands = data.bands.filter(({ startHz, stopHz }) => stopHz >= low && startHz <= high).map(({ startHz, stopHz, watch }) => {
    const width = Math.max(inside(stopHz) - inside(startHz), 2);
    return tag('rect', { class: `band${watch ? ' watched' : ''}`, x: inside(startHz) - (startHz === stopHz ? 1 : 0), y: area.top, width, height: bottom - area.top });
  });
  const key = data.plot === 'reflection' ? ('reflectionDb' as const) : ('gainDb' as const);
  const floor = y.domain()[0];
  const xs = data.frequencyHz.map((hz) => x(hz));
  const lines = [...data.traces, ...(data.previews ?? [])].map((trace, i) =>
    tag('path', { class: i < data.traces.length ? `trace ${caseClass(i)}` : 'preview', d: polyline(xs, trace[key].map((level) => (level === null ? null : y(Math.max(level, floor))))) }));
  const marker = data.markerHz === null || data.markerHz < low || data.markerHz > high ? ''
    : tag('line', { class: 'marker-line', x1: x(data.markerHz), y1: area.top, x2: x(data.markerHz), y2: bottom });
  return title + bands.join('') + levels.join('') + frequencies.join('') + lines.join('') + masksMarkup(data, x, y) + marker;
}

/** A bar at the limit, with a short foot on the side on which the trace may not be; dashed where the goal is missed. */
function masksMarkup({ masks, plot }: PlotData, x: ScaleLinear<number, number>, y: ScaleLinear<number, number>): string {
  const [low, high] = x.domain();
  const [floor] = y.domain();
  return masks.filter((mask) => mask.plot === plot && mask.stopHz >= low && mask.startHz <= high).map(({ side, levelDb, startHz, stopHz, ok, goalId }) => {
    const level = y(Math.max(levelDb, floor));
    const [from, to] = [x(Math.max(startHz, low)), x(Math.min(stopHz, high))];
    const middle = (from + to) / 2;
    const half = Math.max((to - from) / 2, 6);
    const foot = side === 'at most' ? -5 : 5;
    const sign = ok ? '' : textTag({ class: 'mask-sign', x: middle + half + 4, y: level + 4 }, '✗');
    return sign + tag('path', {
      class: `mask ${ok ? 'held' : 'missed'}`, 'data-goal': goalId,
      d: polyline([middle - half, middle - half, middle + half, middle + half], [level + foot, level, level, level + foot]),
    });
  }).join('');
}

/** From the deepest level that is worth a place up to 0, or a little above where a trace goes there. */
function levelScale({ plot, traces, masks }: PlotData): ScaleLinear<number, number> {
  let lowest: number = shallowest[plot];
  let highest = 0;
  const see = (level: number | null) => {
    if (level === null) return;
    lowest = Math.min(lowest, level);
    highest = Math.max(highest, level);
  };
  for (const trace of traces) (plot === 'reflection' ? trace.reflectionDb : trace.gainDb).forEach(see);
  for (const mask of masks) if (mask.plot === plot) see(mask.levelDb);
  return scaleLinear([Math.max(lowest, deepest[plot]), highest > 0.05 ? highest : 0], [plotSize.height - area.bottom, area.top]).nice(5);
}
