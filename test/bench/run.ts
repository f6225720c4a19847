import { mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { Bench, BenchRow } from './benchRow';

// npm run bench [-- PART-OF-A-FILE-NAME]: runs every file of this folder that exports `bench`, prints the rows and writes
// out/bench.json. Ends with 1 where a bar is not held.

const folder = fileURLToPath(new URL('.', import.meta.url));
const wanted = process.argv[2] ?? '';

async function collect(): Promise<BenchRow[]> {
  const rows: BenchRow[] = [];
  const files = readdirSync(folder).filter((file) => file.endsWith('.ts') && file !== 'run.ts' && file.includes(wanted)).sort();
  for (const file of files) {
    const room = (await import(pathToFileURL(join(folder, file)).href)) as { bench?: Bench };
    if (typeof room.bench !== 'function') continue;
    process.stderr.write(`${file} …\n`);
    rows.push(...(await room.bench()));
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

const rows = await collect();
const out = fileURLToPath(new URL('../../out/', import.meta.url));
mkdirSync(out, { recursive: true });
writeFileSync(join(out, 'bench.json'), `${JSON.stringify({ node: process.version, rows }, null, 2)}\n`);
process.stdout.write(`${table(rows)}\n`);
process.exitCode = rows.every((row) => row.held) ? 0 : 1;
