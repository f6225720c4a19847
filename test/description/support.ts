import assert from 'node:assert/strict';
import type { Diagnostic } from '../../src/base/diagnostic';
import { buildModel, type BuildOptions } from '../../src/description/buildModel';
import type { Description, Model } from '../../src/description/description';
import type { LoadedFile, LoadedFiles } from '../../src/description/files';
import { readDescription } from '../../src/description/readDescription';
import type { Complex } from '../../src/network/complex';
import type { NetworkData } from '../../src/network/networkData';
import type { Problem } from '../../src/study/problem';

export const read = (text: string): Description => readDescription(text, { expressions: true });

export const model = (text: string, files: LoadedFiles = new Map(), options: BuildOptions = {}): Model => buildModel(read(text), files, options);

/** The problem of a text that must be free of mistakes. */
export function soundProblem(text: string, files: LoadedFiles = new Map(), options: BuildOptions = {}): Problem {
  const { problem, diagnostics } = model(text, files, options);
  assert.deepEqual(diagnostics.map(({ code, message }) => `${code}: ${message}`), []);
  assert.ok(problem);
  return problem;
}

/** `code: text under the mark`, in the order of the text. */
export const marks = (text: string, diagnostics: readonly Diagnostic[]): string[] => diagnostics.map(({ code, span }) => `${code}: ${text.slice(span.start, span.end)}`);

/**
 * Compares diagnostics with a text in which lines of carets, each with a code after it, stand under what they mean:
 *
 *     titel: x
 *     ^^^^^ unknown-key
 */
export function checkMarked(marked: string, diagnose: (text: string) => readonly Diagnostic[]): void {
  const lines: string[] = [];
  const expected: string[] = [];
  let offset = 0;
  let lineStart = 0;
  for (const line of marked.split('\n')) {
    const caret = /^( *)(\^+) ([a-z-]+)$/.exec(line);
    if (caret) {
      expected.push(`${lineStart + caret[1].length}-${lineStart + caret[1].length + caret[2].length} ${caret[3]}`);
      continue;
    }
    lineStart = offset;
    lines.push(line);
    offset += line.length + 1;
  }
  const text = lines.join('\n');
  assert.deepEqual(diagnose(text).map(({ code, span }) => `${span.start}-${span.end} ${code}`), expected, marks(text, diagnose(text)).join('\n'));
}

/** An invented one-port: its impedance at each frequency, in a 50 Ω file. */
export function onePort(frequenciesHz: readonly number[], impedanceAt: (frequencyHz: number) => Complex): NetworkData {
  const reflections = frequenciesHz.map((frequencyHz) => {
    const { re, im } = impedanceAt(frequencyHz);
    const size = (re + 50) ** 2 + im ** 2;
    return { re: ((re - 50) * (re + 50) + im * im) / size, im: (100 * im) / size };
  });
  return {
    ports: 1, frequencyHz: Float64Array.from(frequenciesHz), referenceOhm: Float64Array.of(50),
    sRe: Float64Array.from(reflections, ({ re }) => re), sIm: Float64Array.from(reflections, ({ im }) => im),
  };
}

/** An invented two-port: an impedance in series between two 50 Ω ports. */
export function seriesTwoPort(frequenciesHz: readonly number[], impedanceAt: (frequencyHz: number) => Complex): NetworkData {
  // S11 = Z/(Z + 100), S21 = 100/(Z + 100): a textbook identity.
  const s = frequenciesHz.flatMap((frequencyHz) => {
    const { re, im } = impedanceAt(frequencyHz);
    const size = (re + 100) ** 2 + im ** 2;
    const through = { re: (100 * (re + 100)) / size, im: (-100 * im) / size };
    const back = { re: 1 - through.re, im: -through.im };
    return [back, through, through, back];
  });
  return {
    ports: 2, frequencyHz: Float64Array.from(frequenciesHz), referenceOhm: Float64Array.of(50, 50),
    sRe: Float64Array.from(s, ({ re }) => re), sIm: Float64Array.from(s, ({ im }) => im),
  };
}

export const evenly = (from: number, to: number, points: number): number[] => Array.from({ length: points }, (_, i) => from + ((to - from) * i) / (points - 1));

export const touchstone = (data: NetworkData): LoadedFile => ({ form: 'touchstone', data, warnings: [] });
export const csv = (text: string): LoadedFile => ({ form: 'csv', text });
export const files = (entries: Readonly<Record<string, LoadedFile>>): LoadedFiles => new Map(Object.entries(entries));
