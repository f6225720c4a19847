import type { SpreadView } from '../messages/panel';
import type { Problem } from '../study/problem';
import { cornerText, goalYieldsText, remedyText, yieldText } from './spreadText';
import type { Spread } from './spreadAssessment';

/** Bars of the histogram at most. */
const barsAtMost = 24;

/** The spread as the panel shows it. */
export function spreadView({ builds, corner, remedy }: Spread, { goals, spread: { builds: wanted } }: Problem, options: { readonly stale: boolean; readonly cloud: SpreadView['cloud'] }): SpreadView {
  const { marginsDb } = builds;
  return {
    stale: options.stale,
    share: wanted === 0 ? 1 : builds.builds / wanted,
    yieldText: yieldText(builds),
    goalsText: goalYieldsText(builds, goals),
    cornerText: cornerText(corner),
    remedyText: remedy ? remedyText(remedy) : '',
    cornerDb: Number.isFinite(corner.marginDb) ? corner.marginDb : null,
    bars: histogram(marginsDb),
    cloud: options.cloud,
  };
}

/** Equal steps of a width that is easy to read, so that the limit at 0 lies between two of them. Builds without a finite margin are left out. */
export function histogram(marginsDb: Float64Array): SpreadView['bars'] {
  const finite = marginsDb.filter(Number.isFinite);
  if (finite.length === 0) return [];
  const low = finite.reduce((least, value) => Math.min(least, value), Infinity);
  const high = finite.reduce((most, value) => Math.max(most, value), -Infinity);
  const width = stepFor((high - low) / barsAtMost);
  const first = Math.floor(low / width);
  const counts = new Array<number>(Math.floor(high / width) - first + 1).fill(0);
  for (const value of finite) counts[Math.floor(value / width) - first]++;
  return counts.map((count, i) => ({ fromDb: (first + i) * width, toDb: (first + i + 1) * width, count }));
}

/** 1, 2 or 5 times a power of ten, not below `least`. */
function stepFor(least: number): number {
  const size = Math.max(least, 1e-3);
  const decade = 10 ** Math.floor(Math.log10(size));
  return [1, 2, 5, 10].map((factor) => factor * decade).find((step) => step >= size * (1 - 1e-9)) ?? 10 * decade;
}
