import type { LadderRowView } from '../messages/panel';
import { tag } from './svg';

export const symbolSize = { width: 56, height: 44 } as const;

const spine = 36;
const middle = symbolSize.height / 2;

const wire = (x1: number, y1: number, x2: number, y2: number) => tag('line', { class: 'wire', x1, y1, x2, y2 });
const stroke = (d: string) => tag('path', { class: 'wire', d });
const dot = tag('circle', { class: 'node', cx: spine, cy: middle, r: 2.4 });

/**
 * One row of the ladder drawn from the load downwards: the path runs along `spine`, what hangs across it points to
 * the left. The content of an SVG of `symbolSize`; rows of that height join without a gap. Symbols are those of
 * common practice (shapes of IEC 60617: a box for a resistor, humps for a coil, two circles for a transformer).
 */
export function ladderSymbol({ symbol, orientation }: Pick<LadderRowView, 'symbol' | 'orientation'>): string {
  if (symbol === 'load') return tag('rect', { class: 'wire', x: spine - 7, y: middle - 10, width: 14, height: 16 }) + wire(spine, middle + 6, spine, symbolSize.height);
  if (symbol === 'source') return tag('circle', { class: 'wire', cx: spine, cy: middle, r: 8 }) + wire(spine, 0, spine, middle - 8);
  if (orientation === 'shunt') return wire(spine, 0, spine, symbolSize.height) + dot + across(symbol);
  return along(symbol);
}

function along(symbol: LadderRowView['symbol']): string {
  const ends = (gap: number) => wire(spine, 0, spine, middle - gap) + wire(spine, middle + gap, spine, symbolSize.height);
  switch (symbol) {
    case 'inductor': return ends(12) + stroke(`M${spine} ${middle - 12}a4 4 0 0 1 0 8a4 4 0 0 1 0 8a4 4 0 0 1 0 8`);
    case 'capacitor': return ends(3) + wire(spine - 11, middle - 3, spine + 11, middle - 3) + wire(spine - 11, middle + 3, spine + 11, middle + 3);
    case 'resistor': return ends(11) + tag('rect', { class: 'wire', x: spine - 5, y: middle - 11, width: 10, height: 22 });
    case 'line': return ends(13) + tag('rect', { class: 'wire filled', x: spine - 4, y: middle - 13, width: 8, height: 26 });
    case 'transformer': return ends(12) + [-5, 5].map((shift) => tag('circle', { class: 'wire', cx: spine, cy: middle + shift, r: 7 })).join('');
    case 'bridge': return wire(spine, 0, spine, symbolSize.height) + dot;
    case 'unsolved': return ends(9) + tag('circle', { class: 'wire dashed', cx: spine, cy: middle, r: 9 });
    default: return ends(10) + tag('rect', { class: 'wire', x: spine - 10, y: middle - 10, width: 20, height: 20 });
  }
}

function across(symbol: LadderRowView['symbol']): string {
  const ground = wire(6, middle - 7, 6, middle + 7);
  switch (symbol) {
    case 'inductor': return wire(spine, middle, 30, middle) + stroke(`M30 ${middle}a3 3 0 0 0 -6 0a3 3 0 0 0 -6 0a3 3 0 0 0 -6 0`) + wire(12, middle, 6, middle) + ground;
    case 'capacitor': return wire(spine, middle, 23, middle) + wire(23, middle - 9, 23, middle + 9) + wire(17, middle - 9, 17, middle + 9) + wire(17, middle, 6, middle) + ground;
    case 'resistor': return wire(spine, middle, 29, middle) + tag('rect', { class: 'wire', x: 12, y: middle - 5, width: 17, height: 10 }) + wire(12, middle, 6, middle) + ground;
    case 'stub open': return wire(spine, middle, 29, middle) + tag('rect', { class: 'wire filled', x: 7, y: middle - 4, width: 22, height: 8 });
    case 'stub short': return wire(spine, middle, 29, middle) + tag('rect', { class: 'wire filled', x: 9, y: middle - 4, width: 20, height: 8 }) + wire(9, middle, 6, middle) + ground;
    case 'open': return wire(spine, middle, 29, middle) + tag('circle', { class: 'wire', cx: 26, cy: middle, r: 2.6 }) + tag('circle', { class: 'wire', cx: 12, cy: middle, r: 2.6 }) + wire(9, middle, 6, middle) + ground;
    case 'unsolved': return wire(spine, middle, 29, middle) + tag('circle', { class: 'wire dashed', cx: 20, cy: middle, r: 9 }) + wire(11, middle, 6, middle) + ground;
    default: return wire(spine, middle, 30, middle) + tag('rect', { class: 'wire', x: 12, y: middle - 8, width: 18, height: 16 }) + wire(12, middle, 6, middle) + ground;
  }
}
