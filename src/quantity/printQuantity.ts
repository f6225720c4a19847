const steps: readonly { readonly prefix: string; readonly exponent: number }[] = [
  { prefix: 'G', exponent: 9 }, { prefix: 'M', exponent: 6 }, { prefix: 'k', exponent: 3 }, { prefix: '', exponent: 0 },
  { prefix: 'm', exponent: -3 }, { prefix: 'µ', exponent: -6 }, { prefix: 'n', exponent: -9 }, { prefix: 'p', exponent: -12 },
];
const femto = { prefix: 'f', exponent: -15 };
const prefixed = new Set(['Ω', 'H', 'F', 'S', 'Hz', 'm', 's', 'W', 'V', 'A']);

/** A real minus sign, as in prose. */
export const withMinus = (text: string): string => text.replace(/-/g, '−');

/** At most `digits` significant ones, without zeros that say nothing and without an exponent. */
export function printNumber(value: number, digits: number): string {
  if (!Number.isFinite(value)) return Number.isNaN(value) ? 'not known' : value > 0 ? '∞' : '−∞';
  if (value === 0) return '0';
  const rounded = Number(value.toPrecision(digits));
  const magnitude = Math.abs(rounded);
  if (magnitude >= 1e15 || magnitude < 1e-9) return withMinus(rounded.toExponential());
  return withMinus(rounded.toFixed(Math.max(0, Math.min(20, digits - 1 - Math.floor(Math.log10(magnitude))))).replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, ''));
}

function stepFor(value: number, unit: string): { prefix: string; exponent: number } {
  if (!prefixed.has(unit) || value === 0 || !Number.isFinite(value)) return { prefix: '', exponent: 0 };
  const magnitude = Math.abs(value) * (1 + 1e-12);
  const found = steps.find(({ exponent }) => magnitude >= Number(`1e${exponent}`));
  // 0.82 pF: so small capacitors are written, and femtofarads only for what is no part any more.
  if (!found && unit === 'F' && magnitude >= 1e-14) return steps[steps.length - 1];
  return found ?? (unit === 'F' ? femto : steps[steps.length - 1]);
}

/** For people: `4.7 nH`, `866.5 MHz`, `−31.2 Ω`; with the prefix that leaves one to three digits before the point. */
export function printQuantity(value: number, unit: string, { digits }: { readonly digits: number }): string {
  const rounded = Number.isFinite(value) ? Number(value.toPrecision(digits)) : value;
  const { prefix, exponent } = stepFor(rounded, unit);
  const number = printNumber(Number(shifted(rounded, -exponent)), digits);
  return unit === '' ? number : `${number} ${prefix}${unit}`;
}

/** For descriptions: the shortest decimal that reads back to the same number, `3.3 pF`, with an ASCII minus. */
export function writeQuantity(value: number, unit: string): string {
  const { prefix, exponent } = stepFor(value, unit);
  const shortest = plainDecimal(shifted(value, -exponent));
  return unit === '' ? shortest : `${shortest} ${prefix}${unit}`;
}

/** value · 10^power in its shortest decimal digits, moved exactly. */
function shifted(value: number, power: number): string {
  if (!Number.isFinite(value)) return String(value);
  const [mantissa, exponent] = value.toExponential().split('e');
  return `${mantissa}e${Number(exponent) + power}`;
}

function plainDecimal(text: string): string {
  const [, sign, whole, fraction = '', exponent] = /^(-?)(\d+)(?:\.(\d+))?e([-+]?\d+)$/.exec(text) ?? [];
  if (whole === undefined) return text;
  const digits = whole + fraction;
  const point = whole.length + Number(exponent);
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${digits}`.replace(/\.?0+$/, '') || '0';
  if (point >= digits.length) return sign + digits + '0'.repeat(point - digits.length);
  return `${sign}${digits.slice(0, point)}.${digits.slice(point)}`.replace(/\.?0+$/, '');
}
