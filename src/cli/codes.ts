import { dirname, isAbsolute, resolve } from 'node:path';
import { codesJson, type CodedFile } from '../report/codesJson';
import { codesText } from '../report/codesText';
import { firmwareState } from '../report/firmwareState';
import { firmwareObstacle, firmwareTexts } from '../report/firmwareTexts';
import type { Problem } from '../study/problem';
import { bestCodes, codesObstacle } from '../study/tuning/bestCodes';
import { readDescription } from '../description/readDescription';
import { buildModel } from '../description/buildModel';
import type { Diagnostic } from '../base/diagnostic';
import { readText } from './assessFile';
import { CallError } from './callError';
import { findDescriptions, shownPath } from './findDescriptions';
import { formatOf } from './formatOf';
import { loadFiles } from './loadFiles';
import { presentText } from './presentText';
import { progressLine } from './progressLine';
import type { CallOptions, Surroundings } from './runCommandLine';
import { writeDiagnostics } from './writeDiagnostics';
import { writeWhole } from './writeWhole';

interface Coded extends CodedFile {
  readonly folder: string;
  readonly descriptionText: string;
  readonly problem: Problem | null;
  readonly faulty: boolean;
}

/**
 * The best codes of each channel. With `--write` they go into the firmware's tables, never over a file that this tool did not
 * write; with `--verify` nothing is written, and the call fails where a table is missing or not what would be written. What lies
 * in a folder and has no tunable part is passed over.
 */
export function codes(paths: readonly string[], options: CallOptions, around: Surroundings): number {
  const format = formatOf(options.format, ['text', 'json']);
  if (options.write && options.verify) throw new CallError('--write and --verify exclude each other');
  const files = findDescriptions(paths, around.error).map((path) => codeFile(path, around));
  const asked = files.filter(({ channels, faulty }) => channels.length > 0 || faulty);
  if (files.length > 0 && asked.length === 0) around.error('ohmward: nothing is set by a code here\n');
  let good = asked.length > 0 && asked.every(({ faulty }) => !faulty);
  if (options.write || options.verify) good = firmwareFiles(asked, options.write === true, around) && good;
  if (!options.verify) {
    // Tables can be up to date although a goal is missed: that is what `check` and a plain call are for.
    good &&= asked.every(({ channels }) => channels.every(({ holds }) => holds));
    if (format === 'json') around.out(`${JSON.stringify(codesJson(files), null, 2)}\n`);
    else for (const file of files) around.out(codesText(file));
  }
  return good ? 0 : 1;
}

function codeFile(path: string, around: Surroundings): Coded {
  const shown = shownPath(path);
  const description = readDescription(readText(path), { expressions: true });
  const { problem, diagnostics } = buildModel(description, loadFiles(description, [dirname(path)]));
  writeDiagnostics(shown, { description, diagnostics }, around);
  const isError = ({ severity }: Diagnostic): boolean => severity === 'error';
  const reason = problem === null || diagnostics.some(isError) ? 'the description has errors' : codesObstacle(problem);
  const report = progressLine(shown, around);
  const channels = problem !== null && reason === null ? bestCodes(problem, (share) => report(share, null)) : [];
  around.progress?.('');
  // With values left to solve, tunables in the ladder are waited for in vain; without tunables there is nothing to ask.
  const faulty = problem === null || diagnostics.some(isError) || (reason !== null && problem.tunables.some(({ elements }) => elements.length > 0));
  return { path: shown, channels, reason, folder: dirname(path), descriptionText: description.syntax.text, problem, faulty };
}

/** True where every table is as it should be in the end. */
function firmwareFiles(files: readonly Coded[], write: boolean, around: Surroundings): boolean {
  let asked = false;
  let good = true;
  const fail = (message: string): void => {
    around.error(message);
    good = false;
  };
  /** By place on the disk: who writes there, and what. */
  const claimed = new Map<string, { readonly path: string; readonly text: string }>();
  for (const { path, folder, problem, channels, reason, descriptionText } of files) {
    if (!problem?.firmware) continue;
    asked = true;
    const unknown = channels.find(({ marginDb }) => marginDb === null)?.reason;
    const obstacle = unknown ? `not all is known: ${unknown}` : channels.length === 0 ? reason : firmwareObstacle(channels);
    if (obstacle !== null) {
      fail(`${path}: there is no table: ${obstacle}\n`);
      continue;
    }
    for (const table of firmwareTexts(problem.firmware, channels, descriptionText)) {
      const target = isAbsolute(table.path) ? table.path : resolve(folder, table.path);
      const other = claimed.get(target);
      claimed.set(target, other ?? { path, text: table.text });
      if (other && firmwareState(other.text, table.text) !== 'current') fail(`${path}: writes another table to ${shownPath(target)} than ${other.path} does; give each its own file\n`);
      else good = oneTable(target, table.text, write, around) && good;
    }
  }
  if (!asked) fail('ohmward: no description here says where a firmware table goes\n');
  else if (good && !write) around.error(`ohmward: ${claimed.size === 1 ? 'the table agrees with its description' : `${claimed.size} tables agree with their descriptions`}\n`);
  return good;
}

function oneTable(target: string, text: string, write: boolean, around: Surroundings): boolean {
  const shown = shownPath(target);
  const present = presentText(target);
  if (present === 'folder') {
    around.error(`${shown}: is a folder, so no table can be written there\n`);
    return false;
  }
  const state = firmwareState(text, present?.text ?? null);
  if (state === 'current') return true;
  if (state === 'foreign') {
    around.error(`${shown}: was not written by ohmward, so it is left as it is\n`);
    return false;
  }
  if (write) {
    writeWhole(target, text);
    around.error(`${shown}: written\n`);
    return true;
  }
  around.error(`${shown}: ${state === 'missing' ? 'the table is missing' : 'the table is out of date'}; «ohmward codes --write» writes it\n`);
  return false;
}
