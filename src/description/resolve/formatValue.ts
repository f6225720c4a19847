import type { PartKind } from '../../network/part';
import { writeQuantity } from '../../quantity/printQuantity';

const units: Readonly<Record<PartKind, string>> = { resistor: 'Ω', inductor: 'H', capacitor: 'F' };

/** `4.7 nH`: as one writes it in a description. */
export const formatValue = (kind: PartKind, value: number): string => writeQuantity(value, units[kind]);
