import { elementAbcd } from '../network/cascade';
import type { Element } from '../network/element';
import { elementObstacle, named } from './obstacles';

/** Why a ladder is not known at a frequency: the first element from the load that is not, by name; null where all are. */
export function uncoveredElement(ladder: readonly Element[], frequencyHz: number): string | null {
  const point = Float64Array.of(frequencyHz);
  for (const element of ladder) {
    const obstacle = elementObstacle(element);
    if (obstacle) return obstacle;
    const abcd = elementAbcd(element, point);
    if (!abcd.known[0]) return named(element.name, abcd.reason ?? 'not known there');
  }
  return null;
}
