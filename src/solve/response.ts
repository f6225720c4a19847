import type { Element } from '../network/element';
import type { Impedance } from '../network/impedance';
import type { PartKind } from '../network/part';

/** What a ladder does far away from where it matches. */
export type Response = 'low-pass' | 'high-pass' | 'band-pass' | 'other';

interface Blocks {
  readonly atZero: boolean;
  readonly atInfinity: boolean;
}

/**
 * The response by structure. A capacitor in series or a coil across the path blocks at zero frequency, a coil in series or a
 * capacitor across it at infinity: one alone makes a high-pass or a low-pass, both a band-pass, neither is `other`.
 * Common practice of the trade, counted as transmission zeros.
 */
export function responseOf(parts: readonly { readonly orientation: 'series' | 'shunt'; readonly kind: PartKind }[]): Response {
  return nameOf(parts.map(({ orientation, kind }) => blocksOf(orientation, endsOfKind(kind))));
}

/** The same for a whole ladder. Lines count as wires; with stubs or files in the path the response is `other`. */
export function responseOfLadder(ladder: readonly Element[]): Response {
  const blocks: Blocks[] = [];
  for (const element of ladder) {
    switch (element.form) {
      case 'branch': blocks.push(blocksOf(element.orientation, endsOf(element.branch))); break;
      case 'transformer': if (element.windingH !== null) blocks.push({ atZero: true, atInfinity: element.coupling < 1 }); break;
      case 'bridge':
      case 'not fitted':
      case 'line': break;
      default: return 'other';
    }
  }
  return nameOf(blocks);
}

/** An impedance at its two ends of frequency: how far it is from a short (0) to an open (2). */
interface Ends {
  readonly zero: 0 | 1 | 2;
  readonly infinity: 0 | 1 | 2;
}

function endsOfKind(kind: PartKind): Ends {
  if (kind === 'inductor') return { zero: 0, infinity: 2 };
  return kind === 'capacitor' ? { zero: 2, infinity: 0 } : { zero: 1, infinity: 1 };
}

function endsOf(impedance: Impedance): Ends {
  switch (impedance.form) {
    case 'part': return endsOfKind(impedance.part.kind);
    case 'open': return { zero: 2, infinity: 2 };
    case 'short': return { zero: 0, infinity: 0 };
    case 'series':
    case 'parallel': {
      const ends = impedance.members.map(endsOf);
      const pick = impedance.form === 'series' ? Math.max : Math.min;
      const start = impedance.form === 'series' ? 0 : 2;
      const at = (end: keyof Ends) => ends.reduce<number>((value, each) => pick(value, each[end]), start) as 0 | 1 | 2;
      return { zero: at('zero'), infinity: at('infinity') };
    }
    default: return { zero: 1, infinity: 1 };
  }
}

function blocksOf(orientation: 'series' | 'shunt', { zero, infinity }: Ends): Blocks {
  const blocking = orientation === 'series' ? 2 : 0;
  return { atZero: zero === blocking, atInfinity: infinity === blocking };
}

function nameOf(blocks: readonly Blocks[]): Response {
  const atZero = blocks.some((each) => each.atZero);
  const atInfinity = blocks.some((each) => each.atInfinity);
  if (atZero) return atInfinity ? 'band-pass' : 'high-pass';
  return atInfinity ? 'low-pass' : 'other';
}
