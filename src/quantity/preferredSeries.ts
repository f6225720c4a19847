/** Preferred numbers of IEC 60063. */
export type SeriesName = 'E3' | 'E6' | 'E12' | 'E24' | 'E48' | 'E96' | 'E192';

const e24 = [1.0, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2, 9.1];

const everyOf = (values: readonly number[], step: number) => values.filter((_, i) => i % step === 0);

/** The finer series are 10^(i/n) to three digits, but for 9.20 of E192, which the standard prints against 9.19. */
const rounded = (count: number) => Array.from({ length: count }, (_, i) => (count === 192 && i === 185 ? 9.2 : Math.round(100 * 10 ** (i / count)) / 100));

const e192 = rounded(192);

/** Mantissas from 1 up to (not including) 10. */
export const preferredSeries: Readonly<Record<SeriesName, readonly number[]>> = {
  E3: everyOf(e24, 8), E6: everyOf(e24, 4), E12: everyOf(e24, 2), E24: e24, E48: everyOf(e192, 4), E96: everyOf(e192, 2), E192: e192,
};

export const seriesNames = Object.keys(preferredSeries) as SeriesName[];

export const isSeriesName = (name: string): name is SeriesName => Object.hasOwn(preferredSeries, name);

/** Mantissa times 10^decade as the nearest double. */
const member = (mantissa: number, decade: number) => Number(`${mantissa}e${decade}`);

/** Values within a part in a thousand million of each other count as the same. */
const same = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.abs(b);

/** Every value of the series from `min` to `max` (positive), both included, increasing. */
export function seriesBetween(series: SeriesName, min: number, max: number): number[] {
  if (!(min > 0) || !(max >= min) || !Number.isFinite(max)) return [];
  const values: number[] = [];
  for (let decade = Math.floor(Math.log10(min)) - 1; decade <= Math.ceil(Math.log10(max)) + 1; decade++) {
    for (const mantissa of preferredSeries[series]) {
      const value = member(mantissa, decade);
      if ((value >= min || same(value, min)) && (value <= max || same(value, max))) values.push(value);
    }
  }
  return values;
}

const around = (value: number, series: SeriesName) => seriesBetween(series, value / 20, value * 20);

/** The next value of the series above or below, never the value itself. Null for what is not positive. */
export function nextInSeries(value: number, series: SeriesName, direction: 'up' | 'down'): number | null {
  if (!(value > 0) || !Number.isFinite(value)) return null;
  const others = around(value, series).filter((candidate) => !same(candidate, value));
  return (direction === 'up' ? others.find((candidate) => candidate > value) : others.findLast((candidate) => candidate < value)) ?? null;
}

/** The value nearest by ratio, the next decade included; of two equally near the smaller. Null for what is not positive. */
export function nearestInSeries(value: number, series: SeriesName): number | null {
  if (!(value > 0) || !Number.isFinite(value)) return null;
  const distance = (candidate: number) => Math.abs(Math.log(candidate / value));
  return around(value, series).reduce((best, candidate) => (distance(candidate) < distance(best) - 1e-12 ? candidate : best));
}
