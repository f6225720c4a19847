import { randomBytes } from 'node:crypto';
import { lstatSync, mkdirSync, readlinkSync, realpathSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import { CallError } from './callError';

/**
 * Beside it first, then renamed over it: a reader sees the old file or the new one, never half of one. A link stays, and
 * what it leads to is written. Where that is not possible the call is wrong.
 */
export function writeWhole(path: string, text: string): void {
  try {
    mkdirSync(dirname(path), { recursive: true });
    writeAt(placeOf(path), text);
  } catch (error) {
    throw new CallError(`${path}: cannot be written (${(error as NodeJS.ErrnoException).code ?? String(error)})`);
  }
}

/** Where a link leads, also one to a file that is not there yet; else the path itself. */
function placeOf(path: string): string {
  if (statSync(path, { throwIfNoEntry: false })) return realpathSync(path);
  return lstatSync(path, { throwIfNoEntry: false })?.isSymbolicLink() === true ? resolve(dirname(path), readlinkSync(path)) : path;
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
