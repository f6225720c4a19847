import { bisectCenter, extent, ticks } from 'd3-array';
import { scaleLinear, type ScaleLinear } from 'd3-scale';
import type { CodesView } from '../messages/panel';
import { frequencyUnit } from './frequencyPlot';
import { polyline, tag, textTag } from './svg';
import { elementClass } from './smithChart';

export type StairsData = Pick<CodesView, 'tunables' | 'channels' | 'shown'>;

const width = 540;
const area = { left: 44, right: 24, top: 4, bottom: 24 } as const;
const lane = { height: 64, title: 18, gap: 14 } as const;

export const stairsSize = ({ tunables }: Pick<StairsData, 'tunables'>): { readonly width: number; readonly height: number } =>
  ({ width, height: area.top + (tunables.length + 1) * (lane.height + lane.title + lane.gap) + area.bottom });

/** Where each channel begins and ends on the picture: half way to its neighbours. */
function edges(frequencyHz: readonly number[]): readonly number[] {
  const between = frequencyHz.slice(1).map((hz, i) => (hz + frequencyHz[i]) / 2);
  const [first, last] = [frequencyHz[0], frequencyHz[frequencyHz.length - 1]];
  const half = frequencyHz.length > 1 ? null : first * 0.01;
  return [half === null ? first - (between[0] - first) : first - half, ...between, half === null ? last + (last - between[between.length - 1]) : last + half];
}

function scaleOf(channels: StairsData['channels']): { readonly x: ScaleLinear<number, number>; readonly steps: readonly number[] } {
  const steps = edges(channels.map(({ frequencyHz }) => frequencyHz));
  return { x: scaleLinear([steps[0], steps[steps.length - 1]], [area.left, width - area.right]), steps };
}

/** Index of the channel at a place of the picture, in its own units. */
export function channelAt({ channels }: Pick<StairsData, 'channels'>, at: number): number {
  return bisectCenter(channels.map(({ frequencyHz }) => frequencyHz), scaleOf(channels).x.invert(at));
}

/** Codes over the channels, a lane for each tunable and one for the margin left, as the content of an SVG of `stairsSize`. */
export function codeStairs({ tunables, channels, shown }: StairsData): string {
  if (channels.length === 0) return ' ';
  const { x, steps } = scaleOf(channels);
  const topOf = (at: number): number => area.top + at * (lane.height + lane.title + lane.gap) + lane.title;
  const bottom = topOf(tunables.length) + lane.height;
  const chosen = channels[shown];
  const lanes = tunables.map(({ name, low, high }, t) => {
    const y = scaleLinear([low, Math.max(high, low + 1)], [topOf(t) + lane.height, topOf(t)]);
    const levels = channels.map(({ codes }) => codes[t]);
    return heading(topOf(t), `code of ${name}`, chosen && `${levels[shown]}`)
      + level(y(low), String(low)) + (high > low ? level(y(high), String(high)) : '')
      + tag('path', { class: `stairs ${elementClass(t)}`, d: stairs(steps.map((hz) => x(hz)), levels.map((code) => y(code))) });
  });
  return [...lanes, marginLane(channels, topOf(tunables.length), x, steps, chosen?.margin ?? ''), ...frequencies(x, bottom), chosen ? chosenMark(x(steps[shown]), x(steps[shown + 1]), topOf(0), bottom) : ''].join('');
}

function marginLane(channels: StairsData['channels'], top: number, x: ScaleLinear<number, number>, steps: readonly number[], chosen: string): string {
  const [least = 0, most = 0] = extent([0, ...channels.flatMap(({ marginDb }) => marginDb ?? [])]);
  const y = scaleLinear([Math.max(least, -30), Math.max(most, 1)], [top + lane.height, top]).nice(3);
  const bars = channels.map(({ marginDb, holds }, at) => {
    if (marginDb === null) return '';
    const to = y(Math.max(marginDb, y.domain()[0]));
    const gap = Math.min(1, 0.15 * (x(steps[at + 1]) - x(steps[at])));
    return tag('rect', { class: holds ? 'bar-held' : 'bar-missed', x: x(steps[at]) + gap / 2, y: Math.min(to, y(0)), width: x(steps[at + 1]) - x(steps[at]) - gap, height: Math.max(0.5, Math.abs(to - y(0))) });
  });
  return heading(top, 'margin, dB', chosen) + y.ticks(3).map((tick) => level(y(tick), String(tick).replace('-', '−'))).join('') + bars.join('')
    + tag('line', { class: 'bar-limit', x1: area.left, y1: y(0), x2: width - area.right, y2: y(0) });
}

const heading = (top: number, text: string, value: string | undefined): string =>
  textTag({ class: 'plot-title', x: area.left, y: top - 5 }, text)
  + (value === undefined ? '' : textTag({ class: 'designator', x: width - area.right, y: top - 5, 'text-anchor': 'end' }, value));

const level = (y: number, text: string): string =>
  tag('line', { class: 'grid', x1: area.left, y1: y, x2: width - area.right, y2: y }) + textTag({ class: 'scale', x: area.left - 8, y: y + 4, 'text-anchor': 'end' }, text);

/** A level for each step, joined by upright lines. */
const stairs = (xs: readonly number[], ys: readonly number[]): string => polyline(ys.flatMap((_, at) => [xs[at], xs[at + 1]]), ys.flatMap((y) => [y, y]));

function frequencies(x: ScaleLinear<number, number>, bottom: number): string[] {
  const [low, high] = x.domain();
  const { unit, hz } = frequencyUnit([low, high]);
  return ticks(low / hz, high / hz, 5).map((tick, at, all) =>
    textTag({ class: 'scale', x: x(tick * hz), y: bottom + 17, 'text-anchor': 'middle' }, at === all.length - 1 ? `${tick} ${unit}` : String(tick)));
}

const chosenMark = (from: number, to: number, top: number, bottom: number): string =>
  tag('rect', { class: 'chosen', x: (from + to) / 2 - Math.max(to - from, 4) / 2, y: top, width: Math.max(to - from, 4), height: bottom - top });
