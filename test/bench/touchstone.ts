import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { touchstoneReader } from '../../src/network/touchstone/readTouchstone';
import { atLeast, atMost, type BenchRow } from './benchRow';

// An invented two-port of about 20 MB, read as a stream: against numpy's text reader (or, without it, against split and
// Number), and in memory against its own size. Once with digits as an analyser writes them, once with all that a double has.

const fileBytes = 20e6;
const chunkBytes = 1 << 20;
const runs = 5;
const beside = (name: string) => fileURLToPath(new URL(name, import.meta.url));

/** A turning phase, so that signs, sizes and digits vary. */
function inventedFile(print: (value: number) => string): string {
  const parts = ['! an invented two-port\n# Hz S RI R 50\n'];
  let length = parts[0].length;
  for (let k = 0; length < fileBytes; k++) {
    const turn = k / 700;
    const values = [0.3 * Math.cos(turn), 0.3 * Math.sin(turn), 0.9 * Math.cos(1.7 * turn), -0.9 * Math.sin(1.7 * turn), 1e-3 * Math.cos(turn), 1e-3 * Math.sin(2 * turn), 0.2 * Math.cos(3 * turn), 0.2 * Math.sin(3 * turn)];
    const line = `${1_000_000 + 1250 * k} ${values.map(print).join(' ')}\n`;
    parts.push(line);
    length += line.length;
  }
  return parts.join('');
}

function ours(bytes: Uint8Array): { milliseconds: number; sum: number } {
  const start = performance.now();
  const reader = touchstoneReader('invented.s2p');
  for (let at = 0; at < bytes.length; at += chunkBytes) reader.push(bytes.subarray(at, at + chunkBytes));
  const result = reader.finish();
  const milliseconds = performance.now() - start;
  if (!result.ok) throw new Error(`line ${result.problem.line}: ${result.problem.message}`);
  let sum = 0;
  for (const values of [result.data.frequencyHz, result.data.sRe, result.data.sIm]) for (const value of values) sum += value;
  return { milliseconds, sum };
}

function plain(bytes: Uint8Array): { milliseconds: number; sum: number } {
  const start = performance.now();
  const rows = new TextDecoder().decode(bytes).split('\n').filter((line) => line !== '' && !/^[#!]/.test(line)).map((line) => Float64Array.from(line.split(' '), Number));
  const milliseconds = performance.now() - start;
  return { milliseconds, sum: rows.reduce((sum, row) => row.reduce((all, value) => all + value, sum), 0) };
}

function numpy(path: string): { milliseconds: number; sum: number } {
  const [milliseconds, sum] = execFileSync('python3', [beside('touchstoneNumpy.py'), path], { encoding: 'utf8' }).trim().split(' ').map(Number);
  return { milliseconds, sum };
}

function hasNumpy(): boolean {
  try {
    execFileSync('python3', ['-c', 'import numpy'], { stdio: 'ignore' });
    return true;
  } catch {
    return false; // Not installed: the plain reader is compared instead, under its own name.
  }
}

function least(work: () => { milliseconds: number; sum: number }): { milliseconds: number; sum: number } {
  const all = Array.from({ length: runs }, work);
  return { milliseconds: Math.min(...all.map(({ milliseconds }) => milliseconds)), sum: all[0].sum };
}

function benchFile(name: string, path: string, other: 'numpy' | 'plain'): BenchRow[] {
  const bytes = readFileSync(path);
  const rival = other === 'numpy' ? numpy(path) : least(() => plain(bytes));
  const own = least(() => ours(bytes));
  if (Math.abs(own.sum - rival.sum) > 1e-9 * Math.abs(rival.sum)) throw new Error(`the readers differ: ${own.sum} and ${rival.sum}`);
  const rows = [atLeast(`Touchstone file of 20 MB, ${name}`, rival.milliseconds / own.milliseconds, other === 'numpy' ? '× faster than numpy.loadtxt' : '× faster than split and Number', 1)];
  if (process.platform === 'linux') {
    const script = `import(process.argv[1]).then((room) => console.log(room.readingPeakBytes(process.argv[2])))`;
    const peak = Number(execFileSync(process.execPath, ['--import', 'tsx', '--eval', script, beside('touchstonePeak.ts'), path], { encoding: 'utf8' }));
    rows.push(atMost(`Touchstone file of 20 MB, ${name}, memory`, peak / bytes.length, '× the size of the file', 3));
  }
  return rows;
}

export function benchTouchstone(): BenchRow[] {
  const folder = mkdtempSync(join(tmpdir(), 'ohmward-bench-'));
  const other = hasNumpy() ? 'numpy' : 'plain';
  try {
    const files: [string, (value: number) => string][] = [['9 digits', (value) => value.toExponential(8)], ['17 digits', (value) => value.toExponential(16)]];
    return files.flatMap(([name, print], i) => {
      const path = join(folder, `${i}.s2p`);
      writeFileSync(path, inventedFile(print));
      return benchFile(name, path, other);
    });
  } finally {
    rmSync(folder, { recursive: true });
  }
}

export const bench = benchTouchstone;
