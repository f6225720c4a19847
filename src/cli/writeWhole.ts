import { randomBytes } from 'node:crypto';
import { renameSync, rmSync, statSync, writeFileSync } from 'node:fs';

/** Beside it first, then renamed over it: a reader sees the old file or the new one, never half of one. */
export function writeWhole(path: string, text: string): void {
  const beside = `${path}.${randomBytes(6).toString('hex')}.tmp`;
  try {
    let mode = 0o644;
    try {
      mode = statSync(path).mode;
    } catch {
      // A new file: the usual mode stands.
    }
    writeFileSync(beside, text, { flag: 'wx', mode });
    renameSync(beside, path);
  } catch (error) {
    rmSync(beside, { force: true });
    throw error;
  }
}
