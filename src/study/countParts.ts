import type { Element } from '../network/element';
import type { Impedance } from '../network/impedance';

/**
 * Fitted parts of a ladder: each part of a branch counts, a pair counts double, a transformer and a block (a filter in one
 * case) count one each. Bridges, empty pads and what is printed on the board (lines, stubs) are no parts.
 */
export function countParts(ladder: readonly Element[]): number {
  return ladder.reduce((sum, element) => sum + partsOf(element), 0);
}

function partsOf(element: Element): number {
  switch (element.form) {
    case 'branch': return partsIn(element.branch) * (element.pair ? 2 : 1);
    case 'transformer':
    case 'block': return 1;
    case 'unsolved':
    case 'faulty': return 1;
    case 'bridge':
    case 'not fitted':
    case 'line':
    case 'stub': return 0;
  }
}

function partsIn(impedance: Impedance): number {
  switch (impedance.form) {
    case 'series':
    case 'parallel': return impedance.members.reduce((sum, member) => sum + partsIn(member), 0);
    case 'open':
    case 'short': return 0;
    default: return 1;
  }
}
