import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Complex, Matrix } from 'mathjs';
import type { Element } from '../../src/network/element';
import { sampleImpedance } from '../../src/network/immittance';
import { ladderKernel } from '../../src/network/ladderKernel';
import { idealPart } from '../../src/network/part';
import { atLeast, atMost, type BenchRow } from './benchRow';
import { median, medianTimeNs } from './medianTime';

// A ladder of 8 lossy parts × 1,001 points, values changed at each call, |Γ| and transducer gain written at each point.

const POINTS = 1001;
const ROUNDS = 7;
const RUNS = 7;
const frequencyHz = Float64Array.from({ length: POINTS }, (_, k) => 700e6 + (500e6 * k) / (POINTS - 1));

interface Row {
  readonly orientation: 'series' | 'shunt';
  readonly kind: 'inductor' | 'capacitor';
  readonly value: number;
}

const rows: readonly Row[] = [
  { orientation: 'series', kind: 'inductor', value: 6.8e-9 },
  { orientation: 'shunt', kind: 'capacitor', value: 2.2e-12 },
  { orientation: 'series', kind: 'inductor', value: 4.7e-9 },
  { orientation: 'shunt', kind: 'capacitor', value: 3.3e-12 },
  { orientation: 'series', kind: 'capacitor', value: 22e-12 },
  { orientation: 'shunt', kind: 'inductor', value: 12e-9 },
  { orientation: 'series', kind: 'inductor', value: 3.9e-9 },
  { orientation: 'shunt', kind: 'capacitor', value: 1.5e-12 },
];

const Q_AT_HZ = 900e6;
const qOf = (kind: Row['kind']): number => (kind === 'inductor' ? 40 : 180);

interface Result {
  readonly timeNs: number;
  readonly magnitude: ArrayLike<number>;
  readonly gain: ArrayLike<number>;
}

export async function bench(): Promise<BenchRow[]> {
  const name = `cascade of ${rows.length} elements × ${POINTS} points`;
  const numpy = hasNumpy() ? turnAbout('numpy', withNumpy) : null;
  const compiled = hasCompiler() ? withProgram((program) => turnAbout('C++', program)) : null;
  // Last: a process that has loaded the matrix library does typed arrays a fifth slower.
  const ours = withKernel();
  const library = await withMatrixLibrary();
  check(ours, library, 'mathjs');
  const found = [atLeast(name, library.timeNs / ours.timeNs, '× faster than mathjs', 1000)];
  if (numpy !== null) found.push(atLeast(name, numpy, '× faster than numpy', 3));
  if (compiled !== null) found.push(atMost(name, 1 / compiled, '× the time of C++ -O3', 4));
  return found;
}

/** Their time over ours: the median of several rounds, one after the other in each, so that a busy machine slows both. */
function turnAbout(who: string, theirs: () => Result): number {
  return median(Array.from({ length: ROUNDS }, () => {
    const ours = withKernel();
    const other = theirs();
    check(ours, other, who);
    return other.timeNs / ours.timeNs;
  }));
}

function withKernel(): Result {
  const ladder = rows.map(({ orientation, kind, value }, i): Element => ({
    form: 'branch', name: `X${i}`, orientation, pair: false,
    branch: { form: 'part', part: { ...idealPart(kind, value), loss: { law: 'skin effect', q: qOf(kind), atHz: Q_AT_HZ } } },
  }));
  const source = sampleImpedance({ form: 'constant', impedanceOhm: { re: 50, im: 0 } }, frequencyHz);
  const capacitanceF = 1 / (2 * Math.PI * 868e6 * 37);
  const load = sampleImpedance({
    form: 'series',
    members: [{ form: 'constant', impedanceOhm: { re: 18, im: 0 } }, { form: 'part', part: idealPart('capacitor', capacitanceF) }],
  }, frequencyHz);
  const kernel = ladderKernel(ladder, frequencyHz, source, load);
  const timeNs = medianTimeNs((call) => {
    const change = 1 + 1e-6 * (call % 1000);
    rows.forEach(({ value }, i) => kernel.setValue(i, value * change));
    kernel.evaluate();
  }, { runs: RUNS, leastMs: 40 });
  rows.forEach(({ value }, i) => kernel.setValue(i, value));
  kernel.evaluate();
  return { timeNs, magnitude: kernel.reflectionMagnitude, gain: kernel.gain };
}

/** The textbook way: a 2×2 matrix for each element at each frequency, multiplied. */
async function withMatrixLibrary(): Promise<Result> {
  const { abs, add, complex, divide, matrix, multiply, subtract } = await import('mathjs');
  const magnitude = new Float64Array(POINTS);
  const gain = new Float64Array(POINTS);
  const timeNs = medianTimeNs(() => {
    for (let k = 0; k < POINTS; k++) {
      const omega = 2 * Math.PI * frequencyHz[k];
      let product: Matrix = matrix([[complex(1, 0), complex(0, 0)], [complex(0, 0), complex(1, 0)]] as never);
      for (const { orientation, kind, value } of rows) {
        const stated = 2 * Math.PI * Q_AT_HZ;
        const resistance = ((kind === 'inductor' ? stated * value : 1 / (stated * value)) / qOf(kind)) * Math.sqrt(frequencyHz[k] / Q_AT_HZ);
        const z = complex(resistance, kind === 'inductor' ? omega * value : -1 / (omega * value));
        const one = orientation === 'series' ? [[complex(1, 0), z], [complex(0, 0), complex(1, 0)]] : [[complex(1, 0), complex(0, 0)], [divide(1, z), complex(1, 0)]];
        product = multiply(matrix(one as never), product) as Matrix;
      }
      const load = complex(18, (-37 * 868e6) / frequencyHz[k]);
      const column = multiply(product, matrix([[load], [complex(1, 0)]] as never)) as Matrix;
      const v = column.get([0, 0]) as unknown as Complex;
      const i = column.get([1, 0]) as unknown as Complex;
      const bottom = add(v, multiply(50, i)) as Complex;
      magnitude[k] = Number(abs(divide(subtract(v, multiply(50, i)), bottom) as Complex));
      gain[k] = (4 * 50 * 18) / Number(abs(bottom)) ** 2;
    }
  }, { runs: 3, leastMs: 1 });
  return { timeNs, magnitude, gain };
}

const hasNumpy = (): boolean => succeeds('python3', ['-c', 'import numpy']);
const hasCompiler = (): boolean => succeeds('g++', ['--version']);

const withNumpy = (): Result => parse(execFileSync('python3', [besides('cascade.py'), String(RUNS), '400'], { encoding: 'utf8' }));

/** Compiles the program into a folder that is gone afterwards. */
function withProgram<T>(use: (program: () => Result) => T): T {
  const folder = mkdtempSync(join(tmpdir(), 'ohmward-bench-'));
  try {
    const program = join(folder, 'cascade');
    execFileSync('g++', ['-O3', '-o', program, besides('cascade.cpp')]);
    return use(() => parse(execFileSync(program, [String(RUNS), '1500'], { encoding: 'utf8' })));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const besides = (file: string): string => fileURLToPath(new URL(file, import.meta.url));

/** Whether a program is there and says yes; a bench whose program is not installed is left out. */
function succeeds(program: string, args: readonly string[]): boolean {
  try {
    execFileSync(program, args, { stdio: 'ignore' });
    return true;
  } catch {
    return false;
  }
}

function parse(output: string): Result {
  const [time, ...points] = output.trim().split('\n');
  const pairs = points.map((line) => line.split(' ').map(Number));
  return { timeNs: Number(time), magnitude: pairs.map(([m]) => m), gain: pairs.map(([, g]) => g) };
}

/** Times of different results would say nothing. */
function check(ours: Result, other: Result, who: string): void {
  for (let k = 0; k < POINTS; k++) {
    const difference = Math.max(Math.abs(ours.magnitude[k] - other.magnitude[k]), Math.abs(ours.gain[k] - other.gain[k]));
    if (!(difference < 1e-9)) throw new Error(`${who} gets another result at ${frequencyHz[k]} Hz: off by ${difference}`);
  }
}
