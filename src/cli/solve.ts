import { dirname } from 'node:path';
import { improves } from '../assistance/improves';
import { insertSolution } from '../assistance/insertSolution';
import { applyEdits } from '../base/diagnostic';
import { buildModel } from '../description/buildModel';
import { readDescription } from '../description/readDescription';
import { solveJson, type SolvedFile } from '../report/solveJson';
import { solveText } from '../report/solveText';
import { defaultTop, type SolveResult } from '../solve/solution';
import { solveProblem } from '../solve/solveProblem';
import { isSettled } from '../study/obstacles';
import { assessDescription } from '../assistance/assess';
import { readTextFile } from './assessFile';
import { CallError } from './callError';
import { findDescriptions, shownPath } from './findDescriptions';
import { formatOf } from './formatOf';
import { loadFiles } from './loadFiles';
import { progressLine } from './progressLine';
import type { CallOptions, Surroundings } from './runCommandLine';
import { writeDiagnostics } from './writeDiagnostics';
import { writeWhole } from './writeWhole';

const topAtMost = 1000;

/** Solves what is unknown; with `--write` the best goes into the file. */
export function solve(paths: readonly string[], options: CallOptions, around: Surroundings): number {
  const format = formatOf(options.format, ['text', 'json']);
  const top = topOf(options.top);
  const files: (SolvedFile & { readonly good: boolean })[] = [];
  for (const path of findDescriptions(paths, around.error)) {
    const shown = shownPath(path);
    const { text, isUtf8 } = readTextFile(path);
    const description = readDescription(text, { expressions: true });
    const loaded = loadFiles(description, [dirname(path)]);
    const assessment = assessDescription(description, loaded);
    // That values are missing is why one solves.
    writeDiagnostics(shown, { ...assessment, diagnostics: assessment.diagnostics.filter(({ code }) => code !== 'unsolved') }, around);
    const { problem, diagnostics } = buildModel(description, loaded, { reopen: options.again === true });
    const faulty = problem === null || diagnostics.some(({ severity }) => severity === 'error');
    const result = faulty ? none('the description has errors') : isSettled(problem) ? none('nothing is left to solve') : solveProblem(problem, { top, onProgress: progressLine(shown, around) });
    around.progress?.('');
    const [best] = result.solutions;
    files.push({ path: shown, result, good: faulty ? false : isSettled(problem) ? assessment.evaluation?.ok === true : best?.holds === true });
    // Values that are all there stay where nothing better was found.
    const stays = best !== undefined && assessment.model.problem !== null && isSettled(assessment.model.problem) && problem !== null && !improves(problem, best);
    if (options.write === true && stays) around.error(`${shown}: nothing better was found; the values stay\n`);
    if (options.write === true && best && !stays) {
      if (!isUtf8) throw new CallError(`${shown}: is not UTF-8; save it as UTF-8 first, so that nothing is lost`);
      const written = applyEdits(text, insertSolution(description.syntax, best));
      if (written !== text) {
        writeWhole(path, written);
        around.error(`${shown}: written\n`);
      }
    }
  }
  if (format === 'json') around.out(`${JSON.stringify(solveJson(files), null, 2)}\n`);
  else for (const file of files) around.out(solveText(file));
  return files.every(({ good }) => good) ? 0 : 1;
}

const none = (reason: string): SolveResult => ({ solutions: [], byParts: [], reason, hints: [], outOfReach: [] });

function topOf(asked: string | undefined): number {
  if (asked === undefined) return defaultTop;
  const top = Number(asked);
  if (!Number.isInteger(top) || top < 1 || top > topAtMost) throw new CallError(`--top takes a whole number from 1 to ${topAtMost}, not «${asked}»`);
  return top;
}
