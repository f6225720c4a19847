import { isNameInC } from '../base/cWords';
import { contentOf, type FirmwareRows } from './firmwareRows';

/**
 * The table as a C99 header that C++ takes too: a structure, its count, a constant array in increasing frequency. Comments
 * give the units. Nothing in it depends on anything but the rows, so that it changes when a code does, and only then.
 */
export function firmwareHeader(table: FirmwareRows): string {
  const { symbol, tunables, rows } = table;
  const upper = symbol.toUpperCase();
  const frequencies = rows.map(({ frequencyHz }) => frequencyHz);
  const fields = fieldNames(tunables);
  const types = tunables.map((_, t) => typeFor(Math.max(0, ...rows.map(({ codes }) => codes[t]))));
  const frequencyType = typeFor(Math.max(1 << 16, ...frequencies));
  return [
    '/*',
    ' * Codes of the tunable parts by channel. Written by Ohmward from a match description:',
    ' * what is changed by hand here is lost.',
    ' *',
    ` * ohmward-table 1 ${contentOf(table)}`,
    ...(table.description === null ? [] : [` * ohmward-description ${table.description}`]),
    ' */',
    `#ifndef ${upper}_H`,
    `#define ${upper}_H`,
    '',
    '#include <stdint.h>',
    '',
    `struct ${symbol}_row {`,
    `    ${frequencyType} frequency_hz; /* the channel, Hz; increasing */`,
    ...fields.map((field, t) => `    ${types[t]} ${field}; /* code of "${tunables[t]}" */`),
    '};',
    '',
    `#define ${upper}_COUNT ${rows.length}`,
    '',
    `static const struct ${symbol}_row ${symbol}[${upper}_COUNT] = {`,
    ...rows.map(({ frequencyHz, codes }) => `    { ${literal(frequencyHz, frequencyType)}, ${codes.map((code, t) => literal(code, types[t])).join(', ')} },`),
    '};',
    '',
    '#endif',
    '',
  ].join('\n');
}

type CType = 'uint8_t' | 'uint16_t' | 'uint32_t' | 'uint64_t';

const typeFor = (largest: number): CType =>
  largest < 2 ** 8 ? 'uint8_t' : largest < 2 ** 16 ? 'uint16_t' : largest < 2 ** 32 ? 'uint32_t' : 'uint64_t';

const literal = (value: number, type: CType): string => `${value}${type === 'uint64_t' ? 'ull' : type === 'uint32_t' ? 'ul' : 'u'}`;

/** Names of tunables as names in C, in lower case so that no macro of the header meets them, each its own. */
function fieldNames(tunables: readonly string[]): string[] {
  const taken = new Set(['frequency_hz']);
  return tunables.map((name) => {
    const plain = name.toLowerCase().replace(/[^a-z0-9_]/g, '_').replace(/^(?=[\d_])/, 't').slice(0, 56);
    const stem = isNameInC(plain) ? plain : `${plain}_`;
    let field = stem;
    for (let n = 2; taken.has(field); n++) field = `${stem}_${n}`;
    taken.add(field);
    return field;
  });
}
