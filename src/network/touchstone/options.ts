import { quoted, refuse } from './touchstoneResult';

export type Parameter = 'S' | 'Y' | 'Z' | 'G' | 'H';

export interface TouchstoneOptions {
  /** Frequencies of the file count in 10^n Hz. */
  readonly unitExponent: number;
  readonly parameter: Parameter;
  readonly format: 'DB' | 'MA' | 'RI';
  /** Ω: one for all ports, or one a port. */
  readonly referenceOhm: readonly number[];
  /** Where the option line stands, from 1. */
  readonly line: number;
}

type Option = 'frequency unit' | 'parameter' | 'format' | 'reference';

const unitExponents: Readonly<Record<string, number>> = { HZ: 0, KHZ: 3, MHZ: 6, GHZ: 9 };

/** The option line after its `#`: any order and case, but the numbers follow R; defaults GHz S MA R 50. */
export function readOptions(words: readonly string[], line: number): TouchstoneOptions {
  const found = new Map<Option, string>();
  let referenceOhm: number[] = [50];
  const state = (what: Option, value: string) => {
    const before = found.get(what);
    if (before !== undefined && before !== value) refuse(`the option line states the ${what} twice: ${before} and ${value}`);
    found.set(what, value);
  };
  for (let i = 0; i < words.length; i++) {
    const word = words[i].toUpperCase();
    if (Object.hasOwn(unitExponents, word)) state('frequency unit', word);
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
    unitExponent: unitExponents[found.get('frequency unit') ?? 'GHZ'],
    parameter: (found.get('parameter') ?? 'S') as Parameter,
    format: (found.get('format') ?? 'MA') as TouchstoneOptions['format'],
    referenceOhm,
    line,
  };
}

function unknownWord(word: string): string {
  if (/hz$/i.test(word)) return `${quoted(word)} is not a frequency unit of a Touchstone file; there are Hz, kHz, MHz and GHz`;
  if (/^[A-Za-z]$/.test(word)) return `${quoted(word)} is not a parameter of a Touchstone file; there are S, Y, Z, G and H`;
  if (/^[+-]?[\d.]/.test(word)) return `${quoted(word)} on the option line does not belong to anything; a reference resistance follows R`;
  if (/^[A-Za-z]{2}$/.test(word)) return `${quoted(word)} is not a number format of a Touchstone file; there are DB, MA and RI`;
  return `${quoted(word)} on the option line is not understood`;
}

/** A reference resistance: a positive real number of ohms. */
export function readReference(word: string): number {
  if (/^[+-]?\d+,\d/.test(word)) refuse(`${quoted(word)} has a decimal comma; numbers have a point`);
  if (/\d.*[ij]|[ij].*\d/i.test(word)) refuse(`the reference ${quoted(word)} is not real; references are real numbers of ohms`);
  const value = word.length <= 40 && /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(word) ? Number(word) : NaN;
  if (Number.isNaN(value)) refuse(`the reference ${quoted(word)} is not a number of ohms`);
  if (!(value >= referenceAtLeastOhm && value <= referenceAtMostOhm)) refuse(`the reference ${quoted(word)} is not a resistance greater than zero that a line can have`);
  return value;
}

/** Beyond these a reference is a slip, and its square leaves the numbers. */
const referenceAtLeastOhm = 1e-12;
const referenceAtMostOhm = 1e12;
