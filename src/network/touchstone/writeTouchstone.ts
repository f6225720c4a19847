import type { NetworkData } from '../networkData';

export interface WriteOptions {
  readonly comments: readonly string[];
  readonly unit?: 'Hz' | 'kHz' | 'MHz' | 'GHz';
  readonly format?: 'RI' | 'MA' | 'DB';
}

const unitHz = { Hz: 1, kHz: 1e3, MHz: 1e6, GHz: 1e9 } as const;

/** Twelve digits: read back, the values agree to 1e-9 and better. */
const number = (value: number) => Number(value.toPrecision(12)).toString();

/**
 * A Touchstone 1.1 file. References that differ stand behind R one a port, as files may since the revision of 2023. Points
 * of zero in DB are written as −400 dB. Comments are cut to ASCII and one line each.
 */
export function writeTouchstone(data: NetworkData, { comments, unit = 'Hz', format = 'RI' }: WriteOptions): string {
  const { ports, referenceOhm } = data;
  const references = referenceOhm.every((value) => value === referenceOhm[0]) ? number(referenceOhm[0]) : Array.from(referenceOhm, number).join(' ');
  const lines = comments.map((comment) => `! ${comment.replace(/[^\x20-\x7e]+/g, '?')}`);
  lines.push(`# ${unit} S ${format} R ${references}`);
  for (let k = 0; k < data.frequencyHz.length; k++) {
    const pairs = Array.from({ length: ports * ports }, (_, i) => {
      // Two ports stand column by column in version 1, larger ones row by row.
      const entry = ports === 2 ? [0, 2, 1, 3][i] : i;
      const at = k * ports * ports + entry;
      return pairText(data.sRe[at], data.sIm[at], format);
    });
    const perLine = ports <= 2 ? pairs.length : ports;
    for (let first = 0; first < pairs.length; first += perLine) {
      const row = pairs.slice(first, first + perLine).join(' ');
      lines.push(first === 0 ? `${number(data.frequencyHz[k] / unitHz[unit])} ${row}` : row);
    }
  }
  return `${lines.join('\n')}\n`;
}

function pairText(re: number, im: number, format: 'RI' | 'MA' | 'DB'): string {
  if (format === 'RI') return `${number(re)} ${number(im)}`;
  const size = Math.hypot(re, im);
  const angle = number((Math.atan2(im, re) * 180) / Math.PI);
  return `${format === 'MA' ? number(size) : number(size > 1e-20 ? 20 * Math.log10(size) : -400)} ${angle}`;
}
