import { contentOf, type FirmwareRows } from './firmwareRows';

/** The table as JSON, a channel a line; names and units as in the JSON of `codes`. */
export function firmwareJson(table: FirmwareRows): string {
  const { symbol, tunables, rows } = table;
  const lines = rows.map(({ frequencyHz, codes }) =>
    `    ${JSON.stringify({ frequency: frequencyHz, codes: Object.fromEntries(tunables.map((name, t) => [name, codes[t]])) })}`);
  return [
    '{',
    `  "ohmward-table": "1 ${contentOf(table)}",`,
    ...(table.description === null ? [] : [`  "ohmward-description": "${table.description}",`]),
    '  "comment": "Codes of the tunable parts by channel; frequencies in Hz. What is changed by hand here is lost.",',
    `  "symbol": ${JSON.stringify(symbol)},`,
    '  "channels": [',
    lines.join(',\n'),
    '  ]',
    '}',
    '',
  ].join('\n');
}
