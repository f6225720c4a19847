import type { FirmwareTable, Problem } from '../study/problem';
import { channelObstacle, codesObstacle, type ChannelFigures } from '../study/tuning/bestCodes';
import { tuneChannels } from '../study/tuning/tuneChannels';
import { firmwareHeader } from './firmwareHeader';
import { firmwareJson } from './firmwareJson';
import { firmwareRows } from './firmwareRows';

/** The files that a description's firmware asks for; paths as written there. `descriptionText`: what they are made from. */
export function firmwareTexts({ header, json, symbol }: FirmwareTable, channels: readonly Pick<ChannelFigures, 'frequencyHz' | 'codes'>[], descriptionText: string): { readonly path: string; readonly text: string }[] {
  const table = firmwareRows(symbol, channels, descriptionText);
  return [
    ...(header === null ? [] : [{ path: header, text: firmwareHeader(table) }]),
    ...(json === null ? [] : [{ path: json, text: firmwareJson(table) }]),
  ];
}

/** Why channels make no table; null where they do. */
export function firmwareObstacle(channels: readonly Pick<ChannelFigures, 'frequencyHz'>[]): string | null {
  const hertz = new Set(channels.map(({ frequencyHz }) => Math.round(frequencyHz)));
  return hertz.size < channels.length ? 'two channels are less than 1 Hz apart, and the table counts in whole hertz' : null;
}

/** The same for a whole problem: no text, with a reason, where not all is known that decides the codes. Empty without tunables or `firmware`. */
export function firmwareOf(problem: Problem, descriptionText: string): { readonly path: string; readonly text: string | null; readonly reason: string }[] {
  if (!problem.firmware || codesObstacle(problem) !== null) return [];
  const tuned = tuneChannels(problem);
  const channels = tuned.map(({ channel: { frequencyHz }, codes }) => ({ frequencyHz, codes }));
  const unknown = tuned.map(channelObstacle).find((each) => each !== null) ?? null;
  const reason = unknown === null ? firmwareObstacle(channels) : `not all is known: ${unknown}`;
  return firmwareTexts(problem.firmware, channels, descriptionText)
    .map(({ path, text }) => (reason === null ? { path, text, reason: '' } : { path, text: null, reason }));
}
