import type { FirmwareTable } from '../study/problem';
import type { ChannelCodes } from '../study/tuning/bestCodes';
import { firmwareHeader } from './firmwareHeader';
import { firmwareJson } from './firmwareJson';
import { firmwareRows } from './firmwareRows';

/** The files that a description's firmware asks for; paths as written there. */
export function firmwareTexts({ header, json, symbol }: FirmwareTable, channels: readonly ChannelCodes[]): { readonly path: string; readonly text: string }[] {
  const table = firmwareRows(symbol, channels);
  return [
    ...(header === null ? [] : [{ path: header, text: firmwareHeader(table) }]),
    ...(json === null ? [] : [{ path: json, text: firmwareJson(table) }]),
  ];
}
