import type { ChannelFigures } from '../study/tuning/bestCodes';

/** What firmware is told. All but `description` decides a written table. */
export interface FirmwareRows {
  /** The table's name in C. */
  readonly symbol: string;
  readonly tunables: readonly string[];
  /** Content of the description (`contentOfText`) that the table was made from, for whoever looks for it in a history; null where not known. */
  readonly description: string | null;
  readonly rows: readonly { readonly frequencyHz: number; readonly codes: readonly number[] }[];
}

/** Frequencies in whole hertz: a step like 200 kHz in binary is off by less than that. */
export function firmwareRows(symbol: string, channels: readonly Pick<ChannelFigures, 'frequencyHz' | 'codes'>[], descriptionText: string | null = null): FirmwareRows {
  const tunables = [...(channels[0]?.codes.keys() ?? [])];
  return { symbol, tunables, description: descriptionText === null ? null : contentOfText(descriptionText), rows: channels.map(({ frequencyHz, codes }) => ({ frequencyHz: Math.round(frequencyHz), codes: tunables.map((name) => codes.get(name) ?? 0) })) };
}

/**
 * Sixteen digits that change with any frequency, code or name in the table: FNV-1a of 64 bits (Fowler, Noll, Vo; constants from
 * memory, checked against two published values in the test) over its JSON text. It tells tables apart, not forgeries.
 */
export const contentOf = ({ symbol, tunables, rows }: FirmwareRows): string =>
  fnv1a(JSON.stringify([symbol, tunables, rows.map(({ frequencyHz, codes }) => [frequencyHz, ...codes])]));

/** The same of a description's text, whatever its line ends. */
export const contentOfText = (text: string): string => fnv1a(text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n'));

export function fnv1a(text: string): string {
  let hash = 0xcbf29ce484222325n;
  for (const byte of new TextEncoder().encode(text)) hash = ((hash ^ BigInt(byte)) * 0x100000001b3n) & 0xffffffffffffffffn;
  return hash.toString(16).padStart(16, '0');
}
