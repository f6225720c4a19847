import type { FirmwareTable, Problem } from '../study/problem';
import { channelObstacle, codesObstacle, type ChannelFigures } from '../study/tuning/bestCodes';
import { tuneChannels } from '../study/tuning/tuneChannels';
import { firmwareHeader } from './firmwareHeader';
import { firmwareJson } from './firmwareJson';
import { firmwareRows } from './firmwareRows';

/** The files that a description's firmware asks for; paths as written there. */
export function firmwareTexts({ header, json, symbol }: FirmwareTable, channels: readonly Pick<ChannelFigures, 'frequencyHz' | 'codes'>[]): { readonly path: string; readonly text: string }[] {
  const table = firmwareRows(symbol, channels);
  return [
    ...(header === null ? [] : [{ path: header, text: firmwareHeader(table) }]),
    ...(json === null ? [] : [{ path: json, text: firmwareJson(table) }]),
  ];
}

/** The same for a whole problem: no text, with a reason, where not all is known that decides the codes. Empty without tunables or `firmware`. */
export function firmwareOf(problem: Problem): { readonly path: string; readonly text: string | null; readonly reason: string }[] {
  if (!problem.firmware || codesObstacle(problem) !== null) return [];
  const tuned = tuneChannels(problem);
  const reason = tuned.map(channelObstacle).find((each) => each !== null) ?? null;
  return firmwareTexts(problem.firmware, tuned.map(({ channel: { frequencyHz }, codes }) => ({ frequencyHz, codes })))
    .map(({ path, text }) => (reason === null ? { path, text, reason: '' } : { path, text: null, reason }));
}
