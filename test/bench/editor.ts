import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { atMost, type BenchRow } from './benchRow';

// In a real editor: keystroke to picture, beside a panel that computes nothing, and activation beside the editor's own start.

const top = fileURLToPath(new URL('../../', import.meta.url));
const twoFramesMs = 1000 / 30;

interface Timings {
  readonly activationMs: number;
  readonly editorMs: number;
  readonly panelP95Ms: number;
  readonly emptyP95Ms: number;
}

export function bench(): BenchRow[] {
  const { stdout } = spawnSync('npx', ['tsx', 'test/host/run.ts', 'timing'], { cwd: top, encoding: 'utf8', timeout: 600_000 });
  const told = [...stdout.matchAll(/^TIMING (\{.*\})$/gm)].map(([, json]) => JSON.parse(json) as Partial<Timings>);
  const timings = Object.assign({}, ...told) as Timings;
  if (told.length < 2) throw new Error(`the editor told no times:\n${stdout}`);
  return [
    atMost('keystroke to picture, 6 elements, 401 points, 3 cases: 95th percentile above that of an empty panel', (timings.panelP95Ms - timings.emptyP95Ms) / twoFramesMs, 'of two frames', 1),
    atMost('activation', timings.activationMs / timings.editorMs, 'of the editor’s own start', 0.05),
  ];
}
