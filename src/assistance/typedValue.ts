import type { Diagnostic } from '../base/diagnostic';
import { plainPhrase } from '../description/phrase/phrase';
import { quantityAt, type QuantityKind } from '../description/phrase/readQuantity';
import { atEnd, expectEnd, scanner } from '../description/phrase/scanner';
import { writeQuantity } from '../quantity/printQuantity';

export interface TypedValue {
  /** In the SI unit of `kind`. */
  readonly value: number;
  readonly kind: QuantityKind;
  /** As it may stand in a description, where nothing but the unit tells the kind. */
  readonly text: string;
}

const units: Partial<Record<QuantityKind, string>> = { resistance: 'Ω', inductance: 'H', capacitance: 'F', length: 'm' };

/** A value that a person typed into a field, `3.3 pF` or `3p3`; else one sentence that says what is wrong with it. */
export function readTypedValue(typed: string, kinds: readonly QuantityKind[]): TypedValue | { refusal: string } {
  const text = typed.trim();
  if (text.startsWith('=')) return { refusal: 'An expression is written in the description; here a value with its unit is expected.' };
  const found: Diagnostic[] = [];
  const s = scanner(plainPhrase(text), { report: (diagnostic) => found.push(diagnostic), lets: new Map(), expressions: false });
  const quantity = quantityAt(s, kinds);
  if (quantity && !atEnd(s)) expectEnd(s);
  if (!quantity || found.length > 0) return { refusal: found[0]?.message ?? 'This is not a value with a unit.' };
  if (quantity.value < 0) return { refusal: `A ${quantity.kind} is not negative.` };
  const unit = units[quantity.kind];
  const keepsWords = quantity.literal?.form === 'unit' || unit === undefined;
  return { value: quantity.value, kind: quantity.kind, text: keepsWords ? text : writeQuantity(quantity.value, unit) };
}
