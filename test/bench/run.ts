import { fork } from 'node:child_process';
import { mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { Bench, BenchRow } from './benchRow';

// npm run bench [-- PART-OF-A-FILE-NAME]: runs every file of this folder that exports `bench`, prints the rows and writes
// out/bench.json. Ends with 1 where a bar is not held.

const folder = fileURLToPath(new URL('.', import.meta.url));
const wanted = process.argv[2] ?? '';

const mark = '--file=';
const own = process.argv.find((argument) => argument.startsWith(mark));

/** Each file in a process of its own: what one loads does not slow another. */
function runApart(file: string): Promise<BenchRow[]> {
  return new Promise((resolve, reject) => {
    let rows: BenchRow[] = [];
    const child = fork(fileURLToPath(import.meta.url), [mark + file]);
    child.on('message', (message) => {
      rows = message as BenchRow[];
    });
    child.on('error', reject);
    child.on('exit', (code) => (code === 0 ? resolve(rows) : reject(new Error(`${file} ended with ${code}`))));
  });
}

async function runHere(file: string): Promise<void> {
  const room = (await import(pathToFileURL(join(folder, file)).href)) as { bench?: Bench };
  const rows = typeof room.bench === 'function' ? await room.bench() : [];
  await new Promise((resolve) => process.send?.(rows, resolve));
  process.exit(0);
}

async function collect(): Promise<BenchRow[]> {
  const rows: BenchRow[] = [];
  for (const file of readdirSync(folder).filter((name) => name.endsWith('.ts') && name !== 'run.ts' && name.includes(wanted)).sort()) {
    process.stderr.write(`${file}\n`);
    rows.push(...(await runApart(file)));
  }
  return rows;
}

/** Three digits, never an exponent. */
const formatRatio = (ratio: number): string => (ratio >= 100 ? ratio.toFixed(0) : String(Number(ratio.toPrecision(3))));

function table(rows: readonly BenchRow[]): string {
  const cells = rows.map((row) => [row.name, formatRatio(row.ratio), row.unit, String(row.bar), row.held ? 'held' : 'MISSED']);
  const head = ['what', 'ratio', 'unit', 'bar', ''];
  const widths = head.map((title, i) => Math.max(title.length, ...cells.map((cell) => cell[i].length)));
  return [head, ...cells].map((cell) => cell.map((text, i) => text.padEnd(widths[i])).join('  ').trimEnd()).join('\n');
}

async function runAll(): Promise<void> {
  const rows = await collect();
  const out = fileURLToPath(new URL('../../out/', import.meta.url));
  mkdirSync(out, { recursive: true });
  writeFileSync(join(out, 'bench.json'), `${JSON.stringify({ node: process.version, rows }, null, 2)}\n`);
  process.stdout.write(`${table(rows)}\n`);
  process.exitCode = rows.every((row) => row.held) ? 0 : 1;
}

if (own === undefined) await runAll();
else await runHere(own.slice(mark.length));
