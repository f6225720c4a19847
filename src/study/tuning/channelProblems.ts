import type { Goal } from '../goal';
import type { Band, Problem } from '../problem';

/** What is asked of the ladder while the radio works on one channel. */
export interface ChannelProblem {
  readonly frequencyHz: number;
  /** Bands cut to what counts at this channel, and only the goals that are judged there. */
  readonly problem: Problem;
  /** By goal of `problem`: its index in the whole problem. */
  readonly goalIndices: readonly number[];
}

/** Goals that do not depend on where the radio works: they are judged once, or (yield) elsewhere. */
export const isJudgedOnce = ({ quantity }: Pick<Goal, 'quantity'>): boolean => once.has(quantity);

const once: ReadonlySet<Goal['quantity']> = new Set(['parts', 'yield', 'dc path', 'dc block', 'dc short at load']);

/** A channel made by steps may lie a rounding beyond the end of its band. */
const slack = 1e-9;

/**
 * The problem once for each channel. A goal on a band is judged at the channels in it, one on `N x BAND` at N times each; a
 * bandwidth is that around the channel. A range is like a band. A band or range that holds no channel, and a single frequency,
 * keeps its own points: one between the first and the last channel belongs to the channel nearest to it (the lower of two),
 * one outside of them to every channel, since it must hold whatever the radio is tuned to. A rejection is judged at the
 * channels at which its reference band is. Goals that say nothing of frequency (`isJudgedOnce`) are in none of them.
 */
export function channelProblems(problem: Problem): readonly ChannelProblem[] {
  const channelsHz = problem.channelsHz ?? new Float64Array(0);
  // Which band's source a frequency outside of all bands has does not depend on the channel.
  const source = { ...problem.source, nearestAmong: problem.source.nearestAmong ?? problem.bands };
  const bandsAt = problem.bands.map((band) => pointsByChannel(band.frequencyHz, channelsHz));
  const goalsAt = problem.goals.map(({ place }) =>
    place.form === 'range' ? pointsByChannel(place.frequencyHz, channelsHz)
      : place.form === 'frequency' ? ownPoints(Float64Array.of(place.frequencyHz), channelsHz)
        : null);
  return Array.from(channelsHz, (frequencyHz, channel) => {
    const bands = problem.bands.flatMap((band, b): Band[] => {
      const own = bandsAt[b](channel);
      return own.length > 0 ? [{ ...band, frequencyHz: own }] : [];
    });
    const goalIndices: number[] = [];
    const goals = problem.goals.flatMap((goal, g): Goal[] => {
      const own = isJudgedOnce(goal) ? null : goalAt(goal, bands, problem.bands, goalsAt[g]?.(channel) ?? null);
      if (own) goalIndices.push(g);
      return own ? [own] : [];
    });
    return { frequencyHz, goalIndices, problem: { ...problem, source, bands, goals, channelsHz: Float64Array.of(frequencyHz) } };
  });
}

/** The goal with what is left of its place; null where that is nothing. */
function goalAt(goal: Goal, bands: readonly Band[], allBands: readonly Band[], own: Float64Array | null): Goal | null {
  const has = (name: string): boolean => bands.some((band) => band.name === name);
  const { place } = goal;
  if ((place.form === 'band' || place.form === 'harmonic') && !has(place.band)) return null;
  if (place.form === 'bands' && bands.every((band) => band.watch)) return null;
  if (own?.length === 0) return null;
  const here: Goal = place.form === 'range' && own ? { ...goal, place: { form: 'range', frequencyHz: own } } : goal;
  if (goal.quantity !== 'rejection' || place.form === 'harmonic') return here;
  const against = goal.against ?? allBands[0]?.name;
  return against !== undefined && has(against) ? { ...here, against } : null;
}

type ByChannel = (channel: number) => Float64Array;

function pointsByChannel(frequencyHz: Float64Array, channelsHz: Float64Array): ByChannel {
  const startHz = frequencyHz[0] * (1 - slack);
  const stopHz = frequencyHz[frequencyHz.length - 1] * (1 + slack);
  const isIn = (channel: number): boolean => channelsHz[channel] >= startHz && channelsHz[channel] <= stopHz;
  if (!channelsHz.some((_, channel) => isIn(channel))) return ownPoints(frequencyHz, channelsHz);
  return (channel) => (isIn(channel) ? Float64Array.of(channelsHz[channel]) : new Float64Array(0));
}

function ownPoints(frequencyHz: Float64Array, channelsHz: Float64Array): ByChannel {
  const owners = Array.from(frequencyHz, (each) =>
    each < channelsHz[0] || each > channelsHz[channelsHz.length - 1] ? null : nearestChannel(each, channelsHz));
  return (channel) => frequencyHz.filter((_, k) => owners[k] === null || owners[k] === channel);
}

/** Index of the channel nearest to a frequency, the lower of two; −1 without channels. */
export function nearestChannel(frequencyHz: number, channelsHz: Float64Array): number {
  let low = 0;
  let high = channelsHz.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (channelsHz[middle] <= frequencyHz) low = middle;
    else high = middle;
  }
  return high < 0 || Math.abs(channelsHz[high] - frequencyHz) >= Math.abs(channelsHz[low] - frequencyHz) ? Math.min(low, high) : high;
}
