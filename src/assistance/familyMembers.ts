import type { PartKind } from '../network/part';
import { writeQuantity } from '../quantity/printQuantity';
import type { Family, FamilyMember } from '../study/problem';

export const unitOfKind = { resistor: 'Ω', inductor: 'H', capacitor: 'F' } as const satisfies Record<PartKind, string>;

/** As it is written in a description: `13 nH`. */
export const writeValue = (kind: PartKind, value: number): string => writeQuantity(value, unitOfKind[kind]);

/** Values within a part in a thousand million of each other are one value. */
export const isSameValue = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.abs(b);

/** Members of one kind by increasing value; of several with one value the first, as a description means it. */
export function membersOf(family: Family, kind: PartKind): FamilyMember[] {
  const found: FamilyMember[] = [];
  for (const member of family.members) {
    if (member.part.kind === kind && !found.some((other) => isSameValue(other.part.value, member.part.value))) found.push(member);
  }
  return found.sort((a, b) => a.part.value - b.part.value);
}

/** The next member above or below a value, never one of that value; null beyond the last. */
export function nextMember(family: Family, kind: PartKind, value: number, direction: 'up' | 'down'): FamilyMember | null {
  const others = membersOf(family, kind).filter(({ part }) => !isSameValue(part.value, value));
  return (direction === 'up' ? others.find(({ part }) => part.value > value) : others.findLast(({ part }) => part.value < value)) ?? null;
}
