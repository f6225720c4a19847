import type { NetworkData } from '../networkData';

export interface WriteOptions {
  readonly comments: readonly string[];
  readonly unit?: 'Hz' | 'kHz' | 'MHz' | 'GHz';
  readonly format?: 'RI' | 'MA' | 'DB';
}

const unitExponents = { Hz: 0, kHz: 3, MHz: 6, GHz: 9 } as const;

/** Twelve digits: read back, the values agree to 1e-9 and better. */
const number = (value: number): string => String(Number(value.toPrecision(12)));

/**
 * A Touchstone 1.1 file; `unit` Hz and `format` RI where they are left out. References that differ stand behind R one a
 * port, as files may since the revision of 2023. Zero in DB is written as −400 dB. Comments are cut to ASCII and one line
 * each. Frequencies are written in full, so that no two become one. Points with a value that is not finite have no place in a
 * file and are left out.
 */
export function writeTouchstone(data: NetworkData, { comments, unit = 'Hz', format = 'RI' }: WriteOptions): string {
  const { ports, referenceOhm } = data;
  const references = referenceOhm.every((value) => value === referenceOhm[0]) ? number(referenceOhm[0]) : Array.from(referenceOhm, number).join(' ');
  const lines = comments.map((comment) => `! ${comment.replace(/[^\x20-\x7e]+/g, '?')}`);
  lines.push(`# ${unit} S ${format} R ${references}`);
  for (let k = 0; k < data.frequencyHz.length; k++) {
    // Two ports stand column by column in version 1, larger ones row by row.
    const places = Array.from({ length: ports * ports }, (_, i) => k * ports * ports + (ports === 2 ? [0, 2, 1, 3][i] : i));
    if (!places.every((at) => Number.isFinite(Math.hypot(data.sRe[at], data.sIm[at])))) continue;
    const pairs = places.map((at) => pairText(data.sRe[at], data.sIm[at], format));
    const perLine = ports <= 2 ? pairs.length : ports;
    for (let first = 0; first < pairs.length; first += perLine) {
      const row = pairs.slice(first, first + perLine).join(' ');
      lines.push(first === 0 ? `${frequencyText(data.frequencyHz[k], unit)} ${row}` : row);
    }
  }
  return `${lines.join('\n')}\n`;
}

/** The shortest digits that are read back as the same frequency, the point moved by the unit. */
function frequencyText(hz: number, unit: NonNullable<WriteOptions['unit']>): string {
  const [mantissa, power = '0'] = String(hz).split('e');
  const exact = `${mantissa}e${Number(power) - unitExponents[unit]}`;
  const short = String(Number(exact));
  return Number(`${short}e${unitExponents[unit]}`) === hz ? short : exact;
}

function pairText(re: number, im: number, format: 'RI' | 'MA' | 'DB'): string {
  if (format === 'RI') return `${number(re)} ${number(im)}`;
  const size = Math.hypot(re, im);
  const angle = number((Math.atan2(im, re) * 180) / Math.PI);
  return `${format === 'MA' ? number(size) : number(size > 1e-20 ? 20 * Math.log10(size) : -400)} ${angle}`;
}
