import type { Band } from '../../study/problem';
import { channelsAtMost } from '../limits';
import type { DescriptionSyntax } from '../syntax';
import { findName } from './findName';
import { rangePoints } from './rangePoints';
import { doubtAt, problemAt, type Resolution } from './resolution';

/** Increasing frequencies, each once; by default the points of all bands. Null without tunables. */
export function resolveChannels(syntax: DescriptionSyntax, bands: readonly Band[], tunables: number, { report }: Resolution): Float64Array | null {
  const { channels } = syntax;
  if (tunables === 0) {
    if (channels && syntax.tunables.length === 0) report(doubtAt('channels-without-tunables', 'Channels matter only where the ladder has tunable parts.', channels.span));
    return null;
  }
  const all = bands.flatMap((band) => [...band.frequencyHz]);
  if (!channels) return increasing(all);
  if (channels.band) {
    const { value } = channels.band;
    const named = findName(channels.band, [...bands.map((band) => band.name), ...syntax.bands.map((band) => band.name.value)], 'band', report);
    if (!named || !bands.some((band) => band.name === value)) return increasing(all);
    return increasing(bands.filter((band) => band.name === value).flatMap((band) => [...band.frequencyHz]));
  }
  const below = [...channels.frequenciesHz, ...channels.ranges.map(({ min }) => min)].filter(({ value }) => !(value > 0));
  for (const { span } of below) report(problemAt('not-physical', 'A channel lies above 0 Hz.', span));
  if (channels.isEmpty) report(problemAt('no-channels', 'A list without a channel in it. Name channels, or leave the key out: then the points of all bands are channels.', channels.span));
  const stated = [...channels.frequenciesHz.map((frequency) => frequency.value), ...channels.ranges.flatMap((range) => [...rangePoints(range, 21)])];
  const good = increasing(stated.filter((frequency) => frequency > 0));
  if (good.length > channelsAtMost) {
    report(problemAt('too-many', `More than ${channelsAtMost} channels; those above are left out.`, channels.span));
    return good.slice(0, channelsAtMost);
  }
  return good.length > 0 ? good : increasing(all);
}

const increasing = (frequencies: readonly number[]) => Float64Array.from([...new Set(frequencies)].sort((a, b) => a - b));
