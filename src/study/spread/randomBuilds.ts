import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { mersenne } from 'pure-rand/generator/mersenne';
import type { SpreadSettings } from '../problem';
import { valueAt, type ToleratedPart } from './toleratedParts';

/** Three standard deviations are the tolerance. */
const sigmas = 3;

/**
 * Values of the tolerated parts for one board after the other: the same for the same seed, on every machine, however many are
 * asked for at a time. Uniform within the tolerance, or normal with the tolerance at three sigma; where it is not the same
 * both ways, each side has its own width and half of the boards. Mersenne twister: Matsumoto, Nishimura, ACM TOMACS 8, 1998.
 */
export function randomBuilds(parts: readonly ToleratedPart[], { distribution, seed }: Pick<SpreadSettings, 'distribution' | 'seed'>): (into: Float64Array) => void {
  const generator = mersenne(seed);
  const uniform = (): number => uniformFloat64(generator);
  // Box and Muller, Annals of Mathematical Statistics 29, 1958; the second of each two numbers is kept for the next part.
  let kept: number | null = null;
  const normal = (): number => {
    if (kept !== null) {
      const value = kept;
      kept = null;
      return value;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
    const angle = 2 * Math.PI * uniform();
    kept = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
  return (into) => {
    for (let i = 0; i < parts.length; i++) into[i] = valueAt(parts[i], distribution === 'normal' ? normal() / sigmas : evenlyAt(parts[i], uniform()));
  };
}

/** A deviation for which the value, not the side, is uniform over the whole tolerance. */
export function evenlyAt({ tolerance: { up, down } }: Pick<ToleratedPart, 'tolerance'>, share: number): number {
  const shift = -down + share * (up + down);
  return shift >= 0 ? (up === 0 ? 0 : shift / up) : shift / down;
}
