import { tidy } from '../description/tidy';
import { readDescription } from '../description/readDescription';
import { readTextFile } from './assessFile';
import { findDescriptions, shownPath } from './findDescriptions';
import type { CallOptions, Surroundings } from './runCommandLine';
import { lineMap } from '../base/lineMap';
import { writeWhole } from './writeWhole';

/** Lays descriptions out in place, or with `--verify` only says which ones would change. */
export function tidyFiles(paths: readonly string[], options: CallOptions, around: Surroundings): number {
  let failed = false;
  for (const path of findDescriptions(paths, around.error)) {
    const { text: before, isUtf8 } = readTextFile(path);
    if (!isUtf8) {
      around.error(`${shownPath(path)}: is not UTF-8; save it as UTF-8 first, so that nothing is lost\n`);
      failed = true;
      continue;
    }
    const faulty = readDescription(before, { expressions: true }).diagnostics.find((diagnostic) => diagnostic.severity === 'error');
    const after = tidy(before).text;
    if (faulty) {
      const { line, character } = lineMap(before).positionAt(faulty.span.start);
      around.error(`${shownPath(path)}:${line + 1}:${character + 1}: error: ${faulty.message} (${faulty.code})\n`);
      failed = true;
    }
    if (after === before) continue;
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
