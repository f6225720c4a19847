/** Exponents of metre, kilogram, second and ampere. */
export type DimensionVector = readonly [metre: number, kilogram: number, second: number, ampere: number];

export const plain: DimensionVector = [0, 0, 0, 0];

/** What the language has names for. */
export const dimensionVectors = {
  resistance: [2, 1, -3, -2], inductance: [2, 1, -2, -2], capacitance: [-2, -1, 4, 2], conductance: [-2, -1, 3, 2], frequency: [0, 0, -1, 0],
  time: [0, 0, 1, 0], length: [1, 0, 0, 0], power: [2, 1, -3, 0], voltage: [2, 1, -3, -1], current: [0, 0, 0, 1],
} as const satisfies Readonly<Record<string, DimensionVector>>;

const names: readonly (readonly [keyof typeof dimensionVectors, string])[] = [
  ['resistance', 'Ω'], ['inductance', 'H'], ['capacitance', 'F'], ['conductance', 'S'], ['frequency', 'Hz'], ['time', 's'], ['length', 'm'],
  ['power', 'W'], ['voltage', 'V'], ['current', 'A'],
];

export const sameDimension = (a: DimensionVector, b: DimensionVector): boolean => a.every((exponent, i) => Math.abs(exponent - b[i]) < 1e-9);

export const combine = (a: DimensionVector, b: DimensionVector, sign: 1 | -1): DimensionVector =>
  [a[0] + sign * b[0], a[1] + sign * b[1], a[2] + sign * b[2], a[3] + sign * b[3]];

export const raise = (a: DimensionVector, power: number): DimensionVector => [a[0] * power, a[1] * power, a[2] * power, a[3] * power];

/** `Ω`, `a plain number`, or base units such as `m·kg·s^-2`. */
export function dimensionText(dimension: DimensionVector): string {
  if (sameDimension(dimension, plain)) return 'a plain number';
  const known = names.find(([name]) => sameDimension(dimension, dimensionVectors[name]));
  if (known) return known[1];
  return ['m', 'kg', 's', 'A'].flatMap((unit, i) => (dimension[i] === 0 ? [] : [dimension[i] === 1 ? unit : `${unit}^${Number(dimension[i].toFixed(3))}`])).join('·');
}
