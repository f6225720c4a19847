import type { Element } from '../../network/element';
import type { Impedance } from '../../network/impedance';
import type { Part, Tolerance } from '../../network/part';

/** One part whose value may differ from what is printed on it. Each of the two of a `pair` is one. */
export interface ToleratedPart {
  readonly elementIndex: number;
  /** `L1`; with its number where the element has several parts: `trap 2`, `L3 leg 2`. */
  readonly name: string;
  /** Where it stands in a branch of several parts: the members to go down; empty for a single part. */
  readonly path: readonly number[];
  readonly part: Part;
  readonly tolerance: Tolerance;
}

/** Every part of a ladder that has a tolerance, from the load on. A measured part is what was measured: exact. */
export function toleratedParts(ladder: readonly Element[]): readonly ToleratedPart[] {
  return ladder.flatMap((element, elementIndex) => {
    if (element.form !== 'branch') return [];
    const found = partsOf(element.branch, []);
    const legs = element.pair ? [1, 2] : [1];
    return found.flatMap(({ part, path, number }) => {
      if (!part.tolerance || part.measured || (part.tolerance.up === 0 && part.tolerance.down === 0)) return [];
      const { tolerance } = part;
      return legs.map((leg): ToleratedPart => ({
        elementIndex, path, part, tolerance,
        name: [element.name, found.length > 1 ? String(number) : '', element.pair ? `leg ${leg}` : ''].filter((text) => text !== '').join(' '),
      }));
    });
  });
}

function partsOf(impedance: Impedance, path: readonly number[]): { part: Part; path: readonly number[]; number: number }[] {
  const walk = (at: Impedance, way: readonly number[]): { part: Part; path: readonly number[] }[] => {
    if (at.form === 'part') return [{ part: at.part, path: way }];
    return at.form === 'series' || at.form === 'parallel' ? at.members.flatMap((member, i) => walk(member, [...way, i])) : [];
  };
  return walk(impedance, path).map((found, i) => ({ ...found, number: i + 1 }));
}

/** The value at a deviation from −1 (the lowest allowed) to 1 (the highest), linear on each side; Ω, H, F. Never 0 or below. */
export function valueAt({ part, tolerance }: Pick<ToleratedPart, 'part' | 'tolerance'>, deviation: number): number {
  const side = deviation >= 0 ? tolerance.up : tolerance.down;
  const shift = deviation * side * (tolerance.form === 'relative' ? part.value : 1);
  return Math.max(part.value + shift, part.value * 1e-6);
}

/** What stands in the ladder for the two parts of a pair: the one value that, twice, is as much as both. */
export const pairValue = (kind: Part['kind'], one: number, other: number): number => (kind === 'capacitor' ? 2 / (1 / one + 1 / other) : (one + other) / 2);

/** A branch with another value for the part at `path`. */
export function withPartValue(impedance: Impedance, path: readonly number[], value: number): Impedance {
  if (impedance.form === 'part') return { form: 'part', part: { ...impedance.part, value } };
  if (impedance.form !== 'series' && impedance.form !== 'parallel') return impedance;
  const [at, ...rest] = path;
  return { form: impedance.form, members: impedance.members.map((member, i) => (i === at ? withPartValue(member, rest, value) : member)) };
}
