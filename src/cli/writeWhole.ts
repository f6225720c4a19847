import { randomBytes } from 'node:crypto';
import { mkdirSync, realpathSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { CallError } from './callError';

/**
 * Beside it first, then renamed over it: a reader sees the old file or the new one, never half of one. A link stays, and
 * what it leads to is written. Where that is not possible the call is wrong.
 */
export function writeWhole(path: string, text: string): void {
  try {
    mkdirSync(dirname(path), { recursive: true });
    writeAt(statSync(path, { throwIfNoEntry: false }) ? realpathSync(path) : path, text);
  } catch (error) {
    throw new CallError(`${path}: cannot be written (${(error as NodeJS.ErrnoException).code ?? String(error)})`);
  }
}

function writeAt(path: string, text: string): void {
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
