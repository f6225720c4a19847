import { polyline, tag, textTag } from './svg';

/** Radius of the chart in its own units. */
export const chartRadius = 200;

export const chartX = (re: number): number => re * chartRadius;
/** Up is inductive, as charts are printed. */
export const chartY = (im: number): number => -im * chartRadius;

const resistances = [0.2, 0.5, 1, 2, 5];
const reactances = [0.2, 0.5, 1, 2, 5];

/** Reflection of the normalised impedance r + jx. */
export function reflectionOfNormalised(r: number, x: number): { re: number; im: number } {
  const below = (r + 1) ** 2 + x * x;
  return { re: (r * r - 1 + x * x) / below, im: (2 * x) / below };
}

/** Circles of constant resistance and arcs of constant reactance, with the resistances written on the axis. */
export function chartGrid(): string {
  const rim = tag('circle', { class: 'rim', cx: 0, cy: 0, r: chartRadius });
  const axis = tag('line', { class: 'grid', x1: -chartRadius, y1: 0, x2: chartRadius, y2: 0 });
  const circles = resistances.map((r) => tag('circle', { class: 'grid', cx: chartX(r / (1 + r)), cy: 0, r: chartRadius / (1 + r) }));
  const arcs = reactances.flatMap((x) => [x, -x]).map((x) => tag('path', { class: 'grid', d: reactanceArc(x) }));
  const labels = resistances.map((r) => textTag({ class: 'scale', x: chartX((r - 1) / (r + 1)) + 4, y: -4 }, String(r)));
  return tag('g', { class: 'chart-grid', 'aria-hidden': 'true' }, axis + circles.join('') + arcs.join('') + rim + labels.join(''));
}

/** From the rim to the chart's right end, for resistances from 0 to far beyond what one can see. */
function reactanceArc(x: number): string {
  const points = Array.from({ length: 41 }, (_, i) => reflectionOfNormalised(Math.tan((Math.PI / 2) * (i / 41)) * (1 + Math.abs(x)), x));
  return polyline([...points.map(({ re }) => chartX(re)), chartX(1)], [...points.map(({ im }) => chartY(im)), 0]);
}

/** The circle along which a lossless element in series moves the point: constant resistance. */
export function resistanceCircle(reflection: { re: number; im: number }): { cx: number; cy: number; r: number } | null {
  const r = normalised(reflection, 1);
  return r === null ? null : { cx: chartX(r / (1 + r)), cy: 0, r: chartRadius / (1 + r) };
}

/** The same for one across: constant conductance. */
export function conductanceCircle(reflection: { re: number; im: number }): { cx: number; cy: number; r: number } | null {
  const g = normalised(reflection, -1);
  return g === null ? null : { cx: chartX(-g / (1 + g)), cy: 0, r: chartRadius / (1 + g) };
}

/** Real part of (1 ± Γ)/(1 ∓ Γ); null on and outside the rim. */
function normalised({ re, im }: { re: number; im: number }, sign: 1 | -1): number | null {
  const inside = 1 - re * re - im * im;
  const below = (1 - sign * re) ** 2 + im * im;
  return inside > 1e-9 && below > 1e-12 ? inside / below : null;
}
