import { randomBytes } from 'node:crypto';
import { renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tidy } from '../description/tidy';
import { readDescription } from '../description/readDescription';
import { readText } from './assessFile';
import { shownPath } from './assessFiles';
import { findDescriptions } from './findDescriptions';
import type { CallOptions, Surroundings } from './runCommandLine';
import { lineMap } from '../base/lineMap';

/** Lays descriptions out in place, or with `--verify` only says which ones would change. */
export function tidyFiles(paths: readonly string[], options: CallOptions, around: Surroundings): number {
  let failed = false;
  for (const path of findDescriptions(paths)) {
    const before = readText(path);
    const faulty = readDescription(before, { expressions: true }).diagnostics.find((diagnostic) => diagnostic.severity === 'error');
    const after = tidy(before).text;
    if (after === before) {
      if (faulty) {
        const { line, character } = lineMap(before).positionAt(faulty.span.start);
        around.error(`${shownPath(path)}:${line + 1}:${character + 1}: error: ${faulty.message} (${faulty.code})\n`);
        failed = true;
      }
      continue;
    }
    if (options.verify) {
      around.error(`${shownPath(path)}: would be laid out differently\n`);
      failed = true;
    } else {
      writeWhole(path, after);
      around.out(`${shownPath(path)}: laid out\n`);
    }
  }
  return failed ? 1 : 0;
}

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
