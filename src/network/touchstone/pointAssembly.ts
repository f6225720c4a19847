import type { NetworkData } from '../networkData';
import { portsText, type DataLayout } from './dataLayout';
import { numberStore } from './numberStore';
import { toScattering } from './toScattering';
import { refuse } from './touchstoneResult';

/** Collects numbers line by line into frequency points, and each whole point into a row of S. */
export interface PointAssembly {
  /** The numbers `numbers[0 … count − 1]` of line `line`; `firstHz` is the first of them taken as a frequency. */
  takeLine(numbers: Float64Array, count: number, firstHz: number, line: number): void;
  /** A line of noise data under its own keyword. */
  takeNoise(count: number, firstHz: number): void;
  /** The last point must be whole. */
  close(): void;
  /** Empties the assembly. */
  data(): NetworkData;
  readonly points: number;
  readonly noisePoints: number;
  /** Line of the first reflection above 1; null where there is none. */
  readonly firstAboveOne: number | null;
}

const degrees = Math.PI / 180;
const noiseColumns = 5;
/** Rounding of a file's digits is no gain. */
const aboveOne = 1 + 1e-9;

/**
 * A line with an odd count of numbers starts a point, one with an even count continues it: a pair never falls on two
 * lines. In version 1 the points of one and two ports have one line each, and noise data begin where the frequency of a
 * two-port stops increasing and five numbers stand on the line.
 */
export function pointAssembly(layout: DataLayout): PointAssembly {
  const { ports, options, versioned, places, pairs, referenceOhm } = layout;
  const { format, parameter } = options;
  const wanted = 2 * pairs;
  const oneLine = !versioned && ports <= 2;
  const frequencyHz = numberStore();
  const sRe = numberStore();
  const sIm = numberStore();
  const pairRe = new Float64Array(pairs);
  const pairIm = new Float64Array(pairs);
  let lastHz = -1;
  let held = wanted;
  let inNoise = false;
  let noisePoints = 0;
  let lastNoiseHz = -1;
  let firstAboveOne: number | null = null;

  const takePair = (first: number, second: number) => {
    const index = held / 2;
    if (format === 'RI') {
      pairRe[index] = first;
      pairIm[index] = second;
    } else {
      if (format === 'MA' && first < 0) refuse('a magnitude is negative');
      const size = format === 'DB' ? 10 ** (first / 20) : first;
      pairRe[index] = size * Math.cos(second * degrees);
      pairIm[index] = size * Math.sin(second * degrees);
    }
    if (!Number.isFinite(pairRe[index]) || !Number.isFinite(pairIm[index])) refuse(`the value ${first} ${format === 'DB' ? 'dB ' : ''}is too large to compute with`);
    held += 2;
  };

  const finishPoint = (line: number) => {
    if (parameter === 'S') {
      for (const place of places) {
        sRe.push(pairRe[place]);
        sIm.push(pairIm[place]);
      }
      for (let port = 0; port < ports && firstAboveOne === null; port++) {
        const place = places[port * ports + port];
        if (pairRe[place] ** 2 + pairIm[place] ** 2 > aboveOne) firstAboveOne = line;
      }
      return;
    }
    const matrix = Array.from({ length: ports }, (_, row) => Array.from({ length: ports }, (__, column) => {
      const place = places[row * ports + column];
      return { re: pairRe[place], im: pairIm[place] };
    }));
    const scattering = toScattering(parameter, matrix, referenceOhm, !versioned);
    if (scattering === null) return refuse(`this point of ${parameter} parameters has no finite scattering parameters`);
    scattering.forEach((row, port) => row.forEach((value, column) => {
      sRe.push(value.re);
      sIm.push(value.im);
      if (port === column && firstAboveOne === null && value.re ** 2 + value.im ** 2 > aboveOne) firstAboveOne = line;
    }));
  };

  const takeNoise = (count: number, firstHz: number) => {
    if (count !== noiseColumns) refuse(`a line of noise data has ${noiseColumns} numbers, not ${count}`);
    if (firstHz < 0) refuse('a frequency is negative');
    if (firstHz <= lastNoiseHz) refuse('the frequencies of the noise data must increase');
    lastNoiseHz = firstHz;
    noisePoints++;
  };

  const startPoint = (count: number, firstHz: number) => {
    if (held < wanted) refuse(incomplete(held, wanted, ports));
    if (count - 1 > wanted || (oneLine && count - 1 < wanted)) refuse(wrongCount(count, wanted, ports));
    if (firstHz < 0) refuse('a frequency is negative');
    if (!Number.isFinite(firstHz)) refuse('a frequency is too large to compute with');
    if (firstHz <= lastHz) refuse('the frequencies must increase');
    frequencyHz.push(firstHz);
    lastHz = firstHz;
    held = 0;
  };

  return {
    takeLine(numbers, count, firstHz, line) {
      const starts = count % 2 === 1;
      const whole = held === wanted;
      if (inNoise || (!versioned && ports === 2 && whole && count === noiseColumns && frequencyHz.length > 0 && firstHz <= lastHz)) {
        inNoise = true;
        return takeNoise(count, firstHz);
      }
      if (starts) startPoint(count, firstHz);
      else if (whole) refuse(oneLine ? wrongCount(count, wanted, ports) : tornOrExtra(count));
      if (count > wanted - held + (starts ? 1 : 0)) refuse(wrongCount(1 + held + count, wanted, ports));
      for (let i = starts ? 1 : 0; i < count; i += 2) takePair(numbers[i], numbers[i + 1]);
      if (held === wanted) finishPoint(line);
    },
    takeNoise,
    close() {
      if (held < wanted) refuse(incomplete(held, wanted, ports));
    },
    data: () => ({ ports, frequencyHz: frequencyHz.drain(), referenceOhm: Float64Array.from(referenceOhm), sRe: sRe.drain(), sIm: sIm.drain() }),
    get points() {
      return frequencyHz.length;
    },
    get noisePoints() {
      return noisePoints;
    },
    get firstAboveOne() {
      return firstAboveOne;
    },
  };
}

const incomplete = (held: number, wanted: number, ports: number): string =>
  `the point before is not complete: ${portsText(ports)} make ${wanted + 1} numbers with the frequency, and it has ${held + 1}`;

const tornOrExtra = (count: number): string =>
  `${count} numbers where a point begins: its line has an odd count, the frequency and whole pairs, so a pair is torn by the line's end or a number is missing or too many`;

function wrongCount(count: number, wanted: number, ports: number): string {
  const other = [1, 2, 3, 4].find((candidate) => candidate !== ports && 2 * candidate * candidate + 1 === count);
  const hint = other === undefined ? '' : `: these look like the data of ${portsText(other)} under the name of another count`;
  return `${count === 1 ? 'one number' : `${count} numbers`} for a point, and ${portsText(ports)} make ${wanted + 1} with the frequency${hint}`;
}
