import { refuse } from './touchstoneResult';

export interface TouchstoneOptions {
  readonly unitHz: number;
  readonly parameter: 'S' | 'Y' | 'Z' | 'G' | 'H';
  readonly format: 'DB' | 'MA' | 'RI';
  /** One for all ports, or one a port. */
  readonly referenceOhm: readonly number[];
}

const units: Readonly<Record<string, number>> = { HZ: 1, KHZ: 1e3, MHZ: 1e6, GHZ: 1e9 };

/** The option line after its `#`: any order, but the numbers follow R; defaults GHz S MA R 50. */
export function readOptions(words: readonly string[]): TouchstoneOptions {
  const found = new Map<'unit' | 'parameter' | 'format' | 'reference', string>();
  let referenceOhm: number[] = [50];
  const state = (what: 'unit' | 'parameter' | 'format' | 'reference', value: string) => {
    const before = found.get(what);
    if (before !== undefined && before !== value) refuse(`the option line states the ${what} twice: ${before} and ${value}`);
    found.set(what, value);
  };
  for (let i = 0; i < words.length; i++) {
    const word = words[i].toUpperCase();
    if (Object.hasOwn(units, word)) state('unit', word);
    else if (/^[SYZGH]$/.test(word)) state('parameter', word);
    else if (/^(DB|MA|RI)$/.test(word)) state('format', word);
    else if (word === 'R') {
      const numbers: number[] = [];
      while (i + 1 < words.length && !/^[A-Za-z]+$/.test(words[i + 1])) numbers.push(readReference(words[++i]));
      if (numbers.length === 0) refuse('after R on the option line comes a resistance in ohms');
      state('reference', numbers.join(' '));
      referenceOhm = numbers;
    } else refuse(unknownWord(words[i]));
  }
  return {
    unitHz: units[found.get('unit') ?? 'GHZ'],
    parameter: (found.get('parameter') ?? 'S') as TouchstoneOptions['parameter'],
    format: (found.get('format') ?? 'MA') as TouchstoneOptions['format'],
    referenceOhm,
  };
}

function unknownWord(word: string): string {
  if (/hz$/i.test(word)) return `«${word}» is no unit of a Touchstone file; there are Hz, kHz, MHz and GHz`;
  if (/^[A-Za-z]$/.test(word)) return `«${word}» is no parameter of a Touchstone file; there are S, Y, Z, G and H`;
  return `«${word}» on the option line is not understood`;
}

/** A reference resistance: a positive real number. */
export function readReference(word: string): number {
  if (/[ij]/i.test(word)) refuse(`the reference «${word}» is not real; complex references are not part of the format`);
  const value = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(word) ? Number(word) : NaN;
  if (word.includes(',') && Number.isNaN(value)) refuse(`«${word}» has a decimal comma; numbers have a point`);
  if (!(value > 0) || !Number.isFinite(value)) refuse(`the reference «${word}» is not a resistance greater than zero`);
  return value;
}
