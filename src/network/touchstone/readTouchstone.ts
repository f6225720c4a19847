import { keywordState, takeKeyword, takeReferences } from './keywords';
import { networkFromPoints } from './networkFromPoints';
import { readOptions, type TouchstoneOptions } from './options';
import { pointAssembly, type PointAssembly } from './pointAssembly';
import { scanNumber } from './scanNumber';
import { refuse, TouchstoneRefusal, type TouchstoneProblem, type TouchstoneResult } from './touchstoneResult';

export type { TouchstoneProblem, TouchstoneResult } from './touchstoneResult';

/** Takes a file in pieces, so that a large one is never held whole beside its numbers. */
export interface TouchstoneReader {
  push(chunk: Uint8Array): void;
  finish(): TouchstoneResult;
}

const portsAtMost = 4;
const numbersPerLine = 2 * portsAtMost * portsAtMost + 1;
/** A line beyond this is no text. */
const longestLine = 1 << 16;

/**
 * A Touchstone file of version 1.1, 2.0 or 2.1 with one to four ports; S, Y, Z, G or H; RI, MA or DB; any real references.
 * The number of ports is the name's (`.s1p` … `.s4p`) or that of [Number of Ports]. Noise data are counted and skipped. Never
 * throws: what is wrong is named with its line, and then nothing of the file counts.
 */
export function readTouchstone(fileName: string, content: string | Uint8Array): TouchstoneResult {
  const reader = touchstoneReader(fileName);
  reader.push(typeof content === 'string' ? new TextEncoder().encode(content) : content);
  return reader.finish();
}

export function touchstoneReader(fileName: string): TouchstoneReader {
  const named = /\.s(\d+)p$/i.exec(fileName);
  const state = keywordState();
  const warnings: TouchstoneProblem[] = [];
  const numbers = new Float64Array(numbersPerLine + 1);
  const scanned = { value: 0, end: 0 };
  let options: TouchstoneOptions | null = null;
  let points: PointAssembly | null = null;
  let ports = 0;
  let line = 0;
  let carry = new Uint8Array(0);
  let problem: TouchstoneProblem | null = null;
  let afterReturn = false;
  let foreignSeen = false;

  const portsOf = (): number => {
    const stated = named ? Number(named[1]) : null;
    if (state.version === null && stated === null) return refuse('without [Version] the number of ports comes from the name: .s1p to .s4p');
    if (state.version !== null && state.ports === null) return refuse('[Number of Ports] is missing');
    if (stated !== null && state.ports !== null && stated !== state.ports) refuse(`the name says ${stated} ports, [Number of Ports] says ${state.ports}`);
    const count = state.ports ?? stated!;
    if (count < 1 || count > portsAtMost) refuse(`files of 1 to ${portsAtMost} ports are read, and this has ${count}`);
    return count;
  };

  const begin = (): PointAssembly => {
    if (!options) return refuse('the option line (# …) is missing before the data');
    ports = portsOf();
    if (state.version !== null) {
      if (state.section !== 'network') refuse('the data must come after [Network Data]');
      if (ports === 2 && state.twoPortOrder === null) refuse('[Two-Port Data Order] is missing, and the order of S12 and S21 is not to be guessed');
      if (state.frequencies === null) refuse('[Number of Frequencies] is missing');
    }
    if (ports !== 2 && (options.parameter === 'H' || options.parameter === 'G')) refuse(`${options.parameter} parameters are those of two-ports`);
    const referenceCount = (state.references ?? options.referenceOhm).length;
    if (referenceCount !== ports && !(referenceCount === 1 && state.references === null)) refuse(`${referenceCount} references are stated for ${ports === 1 ? 'one port' : `${ports} ports`}`);
    return pointAssembly(ports, options, state);
  };

  const textOf = (bytes: Uint8Array, start: number, end: number) => new TextDecoder('latin1').decode(bytes.subarray(start, end));

  const takeLine = (bytes: Uint8Array, from: number, to: number) => {
    let start = from;
    if (line === 1 && bytes[start] === 0xef && bytes[start + 1] === 0xbb && bytes[start + 2] === 0xbf) start += 3;
    if (to - start > longestLine) refuse('the line is too long for a text file');
    let end = to;
    for (let i = start; i < to; i++) {
      const byte = bytes[i];
      if (byte === 33) {
        end = i;
        checkComment(bytes, i, to);
        break;
      }
      if (byte > 126 || (byte < 32 && byte !== 9)) refuse(strangeByte(bytes, i));
    }
    while (start < end && bytes[start] <= 32) start++;
    if (start === end || state.section === 'end') return;
    const first = bytes[start];
    if (first === 91) return takeKeyword(state, textOf(bytes, start, end).trim(), options !== null);
    if (state.section === 'information') return;
    if (first === 35) {
      const words = textOf(bytes, start + 1, end).split(/\s+/).filter((word) => word !== '');
      options ??= readOptions(words);
      return;
    }
    if (state.section === 'references') return takeReferences(state, textOf(bytes, start, end));
    points ??= begin();
    takeNumbers(bytes, start, end);
  };

  const takeNumbers = (bytes: Uint8Array, start: number, end: number) => {
    let count = 0;
    for (let at = start; at < end; ) {
      if (bytes[at] <= 32) {
        at++;
        continue;
      }
      scanNumber(bytes, at, end, scanned);
      if (!Number.isFinite(scanned.value)) refuse(notNumber(textOf(bytes, at, scanned.end)));
      if (count === numbersPerLine) refuse(`more than ${numbersPerLine} numbers stand on the line`);
      numbers[count++] = scanned.value;
      at = scanned.end;
    }
    points!.takeLine(numbers, count, line);
  };

  const checkComment = (bytes: Uint8Array, start: number, end: number) => {
    if (foreignSeen) return;
    for (let i = start; i < end; i++) {
      if (bytes[i] <= 126) continue;
      foreignSeen = true;
      warnings.push({ message: 'a comment has characters outside ASCII', line });
      return;
    }
  };

  const guarded = (work: () => void) => {
    if (problem) return;
    try {
      work();
    } catch (error) {
      if (!(error instanceof TouchstoneRefusal)) throw error;
      problem = { message: error.message, line: Math.max(line, 1) };
    }
  };

  return {
    push(chunk) {
      guarded(() => {
        let bytes = chunk;
        if (carry.length > 0) {
          bytes = new Uint8Array(carry.length + chunk.length);
          bytes.set(carry);
          bytes.set(chunk, carry.length);
        }
        let start = 0;
        for (let i = carry.length; i < bytes.length; i++) {
          const byte = bytes[i];
          if (byte !== 10 && byte !== 13) {
            if (i - start > 2 * longestLine) refuse('the line is too long for a text file');
            afterReturn = false;
            continue;
          }
          // CR LF is one end; the LF may even come with the next piece.
          if (byte === 10 && afterReturn && i === start) {
            afterReturn = false;
            start = i + 1;
            continue;
          }
          line++;
          takeLine(bytes, start, i);
          afterReturn = byte === 13;
          start = i + 1;
        }
        carry = bytes.slice(start);
      });
    },
    finish() {
      guarded(() => {
        if (carry.length > 0) {
          line++;
          takeLine(carry, 0, carry.length);
        }
      });
      let result: TouchstoneResult | null = null;
      guarded(() => {
        if (state.section === 'information') refuse('[End Information] is missing');
        if (!points) return refuse(!options ? 'the option line (# …) is missing' : 'the file has no data');
        points.close();
        if (state.version !== null) checkCounts(points);
        if (points.firstAboveOne !== null) warnings.push({ message: 'a reflection is above 1, as noise can make it', line: points.firstAboveOne });
        result = { ok: true, data: networkFromPoints(points, ports, options!, state), warnings, noisePoints: points.noisePoints };
      });
      return result ?? { ok: false, problem: problem! };
    },
  };

  function checkCounts({ frequencyHz, noisePoints }: PointAssembly): void {
    if (state.section !== 'end') refuse('[End] is missing: the file may have been cut off');
    if (frequencyHz.length !== state.frequencies) refuse(`[Number of Frequencies] says ${state.frequencies}, and ${frequencyHz.length} were found`);
    if (state.noiseFrequencies !== null && noisePoints !== state.noiseFrequencies) refuse(`[Number of Noise Frequencies] says ${state.noiseFrequencies}, and ${noisePoints} were found`);
  }
}

const notNumber = (word: string): string =>
  /^[+-]?\d*,\d/.test(word) ? `«${word.slice(0, 40)}» has a decimal comma; numbers have a point` : `«${word.slice(0, 40)}» is not a number`;

function strangeByte(bytes: Uint8Array, at: number): string {
  if (bytes[at] === 0) return 'the file is not plain text (a zero byte)';
  if (bytes[at] === 0xc2 && bytes[at + 1] === 0xa0) return 'a no-break space stands among the data';
  return bytes[at] > 126 ? 'a character outside ASCII stands among the data' : 'a control character stands among the data';
}
