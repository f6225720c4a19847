import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { availableParallelism, tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { atLeast, atMost, type BenchRow } from './benchRow';
import { median } from './medianTime';

// `check` of many descriptions: what one more costs, and whether all cores work. Then the size of the packaged extension.

const top = fileURLToPath(new URL('../../', import.meta.url));
const sample = join(top, 'media', 'samples', 'orchard');

interface Run {
  readonly seconds: number;
  /** Of all threads together. */
  readonly cpuSeconds: number;
}

function check(count: number): Run {
  const folder = mkdtempSync(join(tmpdir(), 'ohmward-bench-'));
  try {
    const text = readFileSync(join(sample, 'frost.match.yaml'), 'utf8');
    for (const name of ['frost-free-air.s1p', 'frost-wet-bark.s1p']) writeFileSync(join(folder, name), readFileSync(join(sample, name)));
    mkdirSync(join(folder, 'boards'));
    for (let i = 0; i < count; i++) writeFileSync(join(folder, 'boards', `b${i}.match.yaml`), text.replace(/: frost-/g, ': ../frost-'));
    const start = performance.now();
    const program = `const { execFileSync } = require('node:child_process'); execFileSync(process.execPath, [${JSON.stringify(join(top, 'dist', 'ohmward.cjs'))}, 'check', '--format', 'json', 'boards'], { stdio: ['ignore', 'pipe', 'pipe'], maxBuffer: 1 << 30 });`;
    const { status, stderr } = spawnSync('bash', ['-c', `TIMEFORMAT='%R %U %S'; time ${JSON.stringify(process.execPath)} -e ${JSON.stringify(program)}`], { cwd: folder, encoding: 'utf8', maxBuffer: 1 << 30 });
    if (status !== 0) throw new Error(stderr);
    const [, user, system] = (stderr.trim().split('\n').at(-1) ?? '').split(' ').map(Number);
    return { seconds: (performance.now() - start) / 1000, cpuSeconds: user + system };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const timesOf = (count: number): Run => {
  const runs = [check(count), check(count), check(count)];
  return { seconds: median(runs.map(({ seconds }) => seconds)), cpuSeconds: median(runs.map(({ cpuSeconds }) => cpuSeconds)) };
};

export function bench(): BenchRow[] {
  const [few, some, many] = [timesOf(100), timesOf(300), timesOf(1000)];
  const perFile = (many.seconds - some.seconds) / 700 / ((some.seconds - few.seconds) / 200);
  const cores = Math.min(2, availableParallelism());
  const rows = [
    atMost('1,000 descriptions in check: cost of one more, beside that among 300', perFile, '×', 1.25),
    atLeast('1,000 descriptions in check: cores at work', many.cpuSeconds / many.seconds, `of ${cores}`, 0.75 * cores),
  ];
  const packaged = join(top, 'ohmward.vsix');
  if (spawnSync('npm', ['run', '-s', 'package'], { cwd: top, encoding: 'utf8' }).status !== 0 || !existsSync(packaged)) throw new Error('the extension could not be packaged');
  return [...rows, atMost('the packaged extension', statSync(packaged).size / 1e6, 'MB', 1)];
}
