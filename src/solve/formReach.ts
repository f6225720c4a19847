import type { Complex } from '../network/complex';
import type { Region } from '../study/discs';
import { inverse, type ReactiveKind, type TwoElementForm } from './closedForms';

/** A region of the chart: a union of pieces, each of them where all of its discs and half-planes overlap. */
export type Reach = readonly (readonly Region[])[];

/**
 * The loads that a two-element form can match to a source (Ω, positive real part), on the chart against `z0Ohm`.
 *
 * With the series part at the load, what the part across the source makes of Zs is an arc of the circle of its conductance,
 * and the series part moves every point of that arc up or down; the other order is the same with admittances, the chart
 * turned by 180°. After Pozar, Microwave Engineering, §5.1; for a source of z0 the mixed forms cover half of the chart by
 * area, those of two equal kinds a quarter (`closedForms.test.ts`).
 */
export function formReach({ first, kinds }: TwoElementForm, source: Complex, z0Ohm: number): Reach {
  const normalised: Complex = { re: source.re / z0Ohm, im: source.im / z0Ohm };
  if (first === 'series') return seriesFirst(inverse(normalised), kinds[0], kinds[1]);
  return mapReach(seriesFirst(normalised, dual(kinds[0]), dual(kinds[1])), ({ re, im }) => ({ re: -re, im: -im }));
}

/** True for points of the chart (|w| ≤ 1) inside. */
export const inReach = (reach: Reach, point: Complex): boolean => depthIn(reach, point) >= 0;

/** How deep a point lies inside, 0 on the border and below it outside; near the border the distance from it. */
export const depthIn = (reach: Reach, point: Complex): number =>
  reach.reduce((most, piece) => Math.max(most, piece.reduce((least, region) => Math.min(least, depthInRegion(region, point)), Infinity)), -Infinity);

function depthInRegion(region: Region, { re, im }: Complex): number {
  if (region.form === 'half-plane') return region.offset - re * region.normal.re - im * region.normal.im;
  const distance = Math.hypot(re - region.centre.re, im - region.centre.im);
  return region.form === 'inside' ? region.radius - distance : distance - region.radius;
}

/** `y` is the source's admittance times z0. */
function seriesFirst(y: Complex, near: ReactiveKind, far: ReactiveKind): Reach {
  if (far === 'inductor') {
    const mirrored = seriesFirst({ re: y.re, im: -y.im }, dual(near), 'capacitor');
    return mapReach(mirrored, ({ re, im }) => ({ re, im: -im }));
  }
  const largest = 1 / y.re;
  const ownResistance = inverse(y).re;
  const inCircle = conductanceAbove(y.re);
  const below: Region = { form: 'half-plane', normal: { re: 0, im: 1 }, offset: 0 };
  const above: Region = { form: 'half-plane', normal: { re: 0, im: -1 }, offset: 0 };
  const outOfCircle: Region = { ...inCircle, form: 'outside' };
  if (near === 'inductor') {
    const limit = resistanceBelow(y.im >= 0 ? ownResistance : largest);
    return [[limit, below], [limit, inCircle]];
  }
  const upper: Region[] = [resistanceBelow(ownResistance), above, outOfCircle];
  if (y.im >= 0) return [upper];
  const between: Region[] = [resistanceBelow(largest), { ...resistanceBelow(ownResistance), form: 'inside' }];
  return [upper, [...between, above], [...between, inCircle]];
}

type Disc = Extract<Region, { centre: Complex }>;

/** R below a normalised limit: outside of the circle of that resistance. */
const resistanceBelow = (r: number): Disc => ({ form: 'outside', centre: { re: r / (1 + r), im: 0 }, radius: 1 / (1 + r) });

const conductanceAbove = (g: number): Disc => ({ form: 'inside', centre: { re: -g / (1 + g), im: 0 }, radius: 1 / (1 + g) });

const dual = (kind: ReactiveKind): ReactiveKind => (kind === 'inductor' ? 'capacitor' : 'inductor');

/** `map` is a mirror or a half turn. */
function mapReach(reach: Reach, map: (point: Complex) => Complex): Reach {
  return reach.map((piece) => piece.map((region): Region =>
    region.form === 'half-plane' ? { ...region, normal: map(region.normal) } : { ...region, centre: map(region.centre) }));
}
