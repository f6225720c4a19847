import { tag } from './svg';

export const barSize = { width: 132, height: 8 } as const;

/** A goal's margin as a bar from the limit's tick in the middle: to the right where it holds, to the left where not. */
export function goalBar(bar: number | null): string {
  const { width, height } = barSize;
  const middle = width / 2;
  const track = tag('rect', { class: 'bar-track', x: 0, y: 0, width, height });
  const tick = tag('line', { class: 'bar-limit', x1: middle, y1: 0, x2: middle, y2: height });
  if (bar === null) return track + tick;
  const length = Math.abs(bar) * (middle - 4);
  return track + tag('rect', { class: bar >= 0 ? 'bar-held' : 'bar-missed', x: bar >= 0 ? middle : middle - length, y: 1, width: length, height: height - 2 }) + tick;
}
