import type { KeywordState } from './keywords';
import type { TouchstoneOptions } from './options';
import { growingArray, type GrowingArray } from './growingArray';
import { refuse } from './touchstoneResult';

/** Collects numbers line by line into frequency points, in real and imaginary parts and in the order of the file. */
export interface PointAssembly {
  /** The numbers of one line: `numbers[0 … count − 1]`. */
  takeLine(numbers: Float64Array, count: number, line: number): void;
  /** The last point must be whole. */
  close(): void;
  readonly frequencyHz: GrowingArray;
  /** Pairs re, im: as many a point as the file states. */
  readonly values: GrowingArray;
  readonly pairs: number;
  readonly noisePoints: number;
  /** Line (from 1) of the first reflection above 1, where the parameters are S; null where there is none. */
  readonly firstAboveOne: number | null;
}

const degrees = Math.PI / 180;
const noiseColumns = 5;
/** Rounding of a file's digits is no gain. */
const aboveOne = 1 + 1e-9;

export function pointAssembly(ports: number, options: TouchstoneOptions, state: KeywordState): PointAssembly {
  const versioned = state.version !== null;
  const pairs = state.matrix === 'full' ? ports * ports : (ports * (ports + 1)) / 2;
  const wanted = 2 * pairs;
  const frequencyHz = growingArray();
  const values = growingArray();
  let pending = 0;
  let held = 0;
  let inNoise = false;
  let noisePoints = 0;
  let lastNoise = 0;
  let firstAboveOne: number | null = null;

  const take = (first: number, second: number, line: number) => {
    let re = first;
    let im = second;
    if (options.format !== 'RI') {
      const size = options.format === 'DB' ? 10 ** (first / 20) : first;
      re = size * Math.cos(second * degrees);
      im = size * Math.sin(second * degrees);
    }
    if (!Number.isFinite(re) || !Number.isFinite(im)) refuse('a value is too large to compute with');
    if (firstAboveOne === null && options.parameter === 'S' && Math.hypot(re, im) > aboveOne && isDiagonal((values.length / 2) % pairs, ports, state)) firstAboveOne = line;
    values.push(re);
    values.push(im);
  };

  const takeNoise = (numbers: Float64Array, count: number) => {
    if (count !== noiseColumns) refuse(`a line of noise data has ${noiseColumns} numbers, not ${count}`);
    const hz = numbers[0] * options.unitHz;
    if (noisePoints > 0 && hz <= lastNoise) refuse('the frequencies of the noise data must increase');
    lastNoise = hz;
    noisePoints++;
  };

  const startPoint = (numbers: Float64Array, count: number) => {
    if (held > 0) refuse(incomplete(held, wanted, ports));
    const hz = numbers[0] * options.unitHz;
    if (hz < 0) refuse('a frequency is not negative');
    if (!Number.isFinite(hz)) refuse('a frequency is too large to compute with');
    if (frequencyHz.length > 0 && hz <= frequencyHz.at(frequencyHz.length - 1)) refuse('the frequencies must increase');
    if (count - 1 > wanted) refuse(tooMany(count, wanted, ports));
    frequencyHz.push(hz);
    held = 1;
    pending = wanted;
  };

  return {
    takeLine(numbers, count, line) {
      if (versioned ? state.section === 'noise' : inNoise) return takeNoise(numbers, count);
      const starts = count % 2 === 1;
      if (!starts && held === 0) {
        refuse(ports <= 2 ? `${count} numbers on the line, and a point has ${wanted + 1}` : 'a point begins with a line of an odd count of numbers: its frequency, then whole pairs');
      }
      if (!versioned && starts && held === 0 && ports === 2 && count === noiseColumns && frequencyHz.length > 0 && numbers[0] * options.unitHz <= frequencyHz.at(frequencyHz.length - 1)) {
        inNoise = true;
        return takeNoise(numbers, count);
      }
      if (starts) startPoint(numbers, count);
      const from = starts ? 1 : 0;
      if (count - from > pending) refuse(tooMany(count - from + wanted - pending + 1, wanted, ports));
      for (let i = from; i < count; i += 2) take(numbers[i], numbers[i + 1], line);
      pending -= count - from;
      if (pending === 0) held = 0;
      else if (!versioned && ports <= 2) refuse(incomplete(wanted - pending, wanted, ports));
    },
    close() {
      if (held > 0) refuse(incomplete(wanted - pending, wanted, ports));
    },
    frequencyHz, values, pairs,
    get noisePoints() {
      return noisePoints;
    },
    get firstAboveOne() {
      return firstAboveOne;
    },
  };
}

const incomplete = (found: number, wanted: number, ports: number): string =>
  `a point of ${portsText(ports)} has ${wanted + 1} numbers with its frequency, and here it has ${found + 1}`;

function tooMany(count: number, wanted: number, ports: number): string {
  const other = [1, 2, 3, 4].find((candidate) => candidate !== ports && 2 * candidate * candidate + 1 === count);
  return `${count} numbers, and a point of ${portsText(ports)} has ${wanted + 1}${other ? `: this looks like the data of ${portsText(other)} under the wrong name` : ''}`;
}

const portsText = (ports: number) => (ports === 1 ? 'one port' : `${ports} ports`);

/** Whether the pair of that index is a reflection. */
function isDiagonal(index: number, ports: number, { matrix }: KeywordState): boolean {
  if (matrix === 'full') return index % (ports + 1) === 0;
  for (let row = 0, at = 0; row < ports; row++) {
    const diagonal = matrix === 'lower' ? at + row : at;
    if (index === diagonal) return true;
    at += matrix === 'lower' ? row + 1 : ports - row;
  }
  return false;
}
