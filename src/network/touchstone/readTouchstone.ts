import { dataLayout } from './dataLayout';
import { keywordState, takeKeyword, takeReferences } from './keywords';
import { numbersPerLine, warningsAtMost } from './limits';
import { lineSplitter } from './lineSplitter';
import { asciiText, contentEnd, skipText } from './lineText';
import { readOptions, type TouchstoneOptions } from './options';
import { pointAssembly, type PointAssembly } from './pointAssembly';
import { scanNumber } from './scanNumber';
import { quoted, refuse, TouchstoneRefusal, type TouchstoneProblem, type TouchstoneResult } from './touchstoneResult';

export type { TouchstoneProblem, TouchstoneResult } from './touchstoneResult';

/** Takes a file in pieces, so that a large one is never held whole beside its numbers. */
export interface TouchstoneReader {
  push(chunk: Uint8Array): void;
  finish(): TouchstoneResult;
}

/**
 * A Touchstone file of version 1.1, 2.0 or 2.1 with one to four ports; S, Y, Z, G or H; RI, MA or DB; any real references.
 * The number of ports is the name's (`.s1p` … `.s4p`) or that of [Number of Ports]. Data of other parameters are converted
 * to S; noise data are counted and skipped. Never throws: what is wrong is named with its line, and then nothing of the
 * file counts. All values of the result are finite. After «Touchstone File Format Specification» 1.1, 2.0 and 2.1; the
 * published snippets are in `test/network/touchstone/legalSnippets.test.ts`.
 */
export function readTouchstone(fileName: string, content: string | Uint8Array): TouchstoneResult {
  const reader = touchstoneReader(fileName);
  reader.push(typeof content === 'string' ? new TextEncoder().encode(content) : content);
  return reader.finish();
}

const openingBracket = 91;
const numberSign = 35;

/** The same in pieces of any size. Memory: the numbers of the file and, at the end, a third of them once more. */
export function touchstoneReader(fileName: string): TouchstoneReader {
  const state = keywordState();
  const warnings: TouchstoneProblem[] = [];
  const numbers = new Float64Array(numbersPerLine);
  const scanned = { value: 0, shifted: 0, end: 0 };
  let options: TouchstoneOptions | null = null;
  let points: PointAssembly | null = null;
  let problem: TouchstoneProblem | null = null;

  const warn = (message: string) => {
    const said = warnings.some((warning) => warning.message === message);
    if (!said && warnings.length < warningsAtMost) warnings.push({ message, line: lines.line });
  };

  const takeLine = (bytes: Uint8Array, from: number, to: number) => {
    let start = from;
    if (lines.line === 1 && bytes[start] === 0xef && bytes[start + 1] === 0xbb && bytes[start + 2] === 0xbf && to - start >= 3) start += 3;
    while (start < to && (bytes[start] === 32 || bytes[start] === 9)) start++;
    if (state.section === 'end') return takeAfterEnd(bytes, start, to);
    if (state.section === 'information' && bytes[start] !== openingBracket) return skipText(bytes, start, to, 'the information block', warn);
    if (start === to) return;
    const first = bytes[start];
    if (points !== null && first !== openingBracket && first !== numberSign) return takeNumbers(points, bytes, start, to);
    const end = contentEnd(bytes, start, to, warn);
    if (start === end) return;
    if (first === openingBracket) return takeKeyword(state, asciiText(bytes, start, end).trim(), lines.line, options !== null);
    if (first === numberSign) return takeOptions(asciiText(bytes, start + 1, end));
    if (state.section === 'references') return takeReferences(state, asciiText(bytes, start, end));
    points = pointAssembly(dataLayout(fileName, options, state, lines.line));
    takeNumbers(points, bytes, start, to);
  };

  const takeAfterEnd = (bytes: Uint8Array, start: number, to: number) => {
    skipText(bytes, start, to, 'what follows [End]', warn);
    if (start < to && bytes[start] !== 33) warn('what follows [End] is not read');
  };

  const takeOptions = (text: string) => {
    if (options === null) options = readOptions(text.split(/\s+/).filter((word) => word !== ''), lines.line);
    else warn('a second option line is not read; the first one holds');
  };

  /** What is no number may be the comment, or a character that has no business there: looked at only then, for speed. */
  const takeNumbers = (assembly: PointAssembly, bytes: Uint8Array, start: number, to: number) => {
    const shift = options!.unitExponent;
    let end = to;
    let looked = false;
    let count = 0;
    let firstHz = 0;
    for (let at = start; at < end; ) {
      if (bytes[at] === 32 || bytes[at] === 9) {
        at++;
        continue;
      }
      scanNumber(bytes, at, end, count === 0 ? shift : 0, scanned);
      if (!Number.isFinite(scanned.value)) {
        if (looked) refuse(notNumber(asciiText(bytes, at, scanned.end), scanned.value));
        end = contentEnd(bytes, start, to, warn);
        looked = true;
        continue;
      }
      if (count === numbersPerLine) refuse(`more than ${numbersPerLine} numbers stand on the line`);
      if (count === 0) firstHz = scanned.shifted;
      numbers[count++] = scanned.value;
      at = scanned.end;
    }
    if (count === 0) return;
    if (state.section === 'noise') assembly.takeNoise(count, firstHz);
    else assembly.takeLine(numbers, count, firstHz, lines.line);
  };

  const conclude = (): TouchstoneResult => {
    if (state.section === 'information') refuse('[End Information] is missing', state.lines.get('begin information'));
    if (points === null) return refuse(options === null ? 'the option line (# …) is missing, and there are no data' : 'the file has no data');
    points.close();
    if (state.version !== null) checkCounts(points);
    if (points.firstAboveOne !== null) warnings.push({ message: 'a reflection is above 1, as noise or gain makes it', line: points.firstAboveOne });
    return { ok: true, data: points.data(), warnings, noisePoints: points.noisePoints };
  };

  const checkCounts = ({ points: found, noisePoints }: PointAssembly) => {
    if (state.section !== 'end') refuse('[End] is missing: the file may have been cut off');
    if (found !== state.frequencies) refuse(`[Number of Frequencies] says ${state.frequencies}, and ${found} were found`, state.lines.get('number of frequencies'));
    if (state.noiseFrequencies === null) {
      if (noisePoints > 0) warn('[Number of Noise Frequencies] is missing');
    } else if (noisePoints !== state.noiseFrequencies) {
      refuse(`[Number of Noise Frequencies] says ${state.noiseFrequencies}, and ${noisePoints} were found`, state.lines.get('number of noise frequencies'));
    }
  };

  /** Refusals are the one kind of exception that is expected; the first ends the reading. */
  const guarded = (work: () => void) => {
    if (problem !== null) return;
    try {
      work();
    } catch (error) {
      if (!(error instanceof TouchstoneRefusal)) throw error;
      problem = { message: error.message, line: error.line ?? Math.max(lines.line, 1) };
    }
  };

  const lines = lineSplitter(takeLine);
  return {
    push: (chunk) => guarded(() => lines.push(chunk)),
    finish() {
      let result: TouchstoneResult | null = null;
      guarded(() => {
        lines.finish();
        result = conclude();
      });
      return result ?? { ok: false, problem: problem! };
    },
  };
}

function notNumber(word: string, value: number): string {
  if (!Number.isNaN(value)) return `${quoted(word)} is too large for a number`;
  if (/^[+-]?\d*,\d+(?:[eE][+-]?\d+)?$/.test(word)) return `${quoted(word)} has a decimal comma; numbers have a point`;
  if (/^[^,]+,/.test(word)) return `${quoted(word)} has commas; numbers are set apart by blanks`;
  return `${quoted(word)} is not a number`;
}
