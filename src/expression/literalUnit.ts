import { metresOf, unitOf } from '../quantity/unit';
import { dimensionVectors, plain, type DimensionVector } from './dimensionVector';

/** A unit of the language as an expression uses it. Levels (dB, dBm) and shares have no place in arithmetic. */
export function literalUnit(name: string): { readonly dimension: DimensionVector; readonly of: (digits: string) => number } | null {
  if (Object.hasOwn(metresOf, name)) return { dimension: dimensionVectors.length, of: (digits) => metresOf[name](Number(digits)) };
  const unit = unitOf(name);
  if (!unit) return null;
  if (unit.dimension === 'angle') return { dimension: plain, of: (digits) => (Number(digits) * Math.PI) / 180 };
  if (!Object.hasOwn(dimensionVectors, unit.dimension)) return null;
  const scaled = (digits: string) => {
    const [mantissa, exponent = '0'] = digits.toLowerCase().split('e');
    return Number(`${mantissa}e${Number(exponent) + unit.exponent}`);
  };
  return { dimension: dimensionVectors[unit.dimension as keyof typeof dimensionVectors], of: scaled };
}
