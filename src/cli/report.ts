import { dirname, resolve } from 'node:path';
import { isOk, type Assessment } from '../assistance/assess';
import { defaultMarkerHz } from '../assistance/markerView';
import { panelView, type PanelContext } from '../assistance/panelView';
import type { FirmwareView } from '../messages/panel';
import { firmwareState } from '../report/firmwareState';
import { firmwareOf } from '../report/firmwareTexts';
import { reportHtml } from '../report/reportHtml';
import { defaultTop } from '../solve/solution';
import { solveProblem } from '../solve/solveProblem';
import { isSettled } from '../study/obstacles';
import type { Problem } from '../study/problem';
import { toleranceCloud } from '../study/spread/toleranceCloud';
import { codesObstacle } from '../study/tuning/bestCodes';
import { coverage } from '../study/tuning/coverage';
import { assessFiles } from './assessFiles';
import { CallError } from './callError';
import { presentText } from './presentText';
import { progressLine } from './progressLine';
import type { CallOptions, Surroundings } from './runCommandLine';
import { writeWhole } from './writeWhole';
import { writeDiagnostics } from './writeDiagnostics';

/** One self-contained HTML file with the pictures and tables of the panel. What is left to solve is shown with the best candidate, as the panel does. */
export async function report(paths: readonly string[], options: CallOptions, around: Surroundings): Promise<number> {
  if (options.output === undefined) throw new CallError('report needs -o FILE');
  const files = await assessFiles(paths, around, { spread: true });
  for (const file of files) writeDiagnostics(file.shown, file.assessment, around);
  const reported = files.map(({ path, shown, assessment }) => ({
    path: shown, view: panelView(assessment, contextOf(assessment, path, shown, around)), messages: assessment.diagnostics.map(({ message }) => message),
  }));
  around.progress?.('');
  writeWhole(options.output, reportHtml(reported));
  around.out(`${options.output}\n`);
  return files.every(({ assessment }) => isOk(assessment)) ? 0 : 1;
}

function contextOf({ description, model: { problem }, spread, diagnostics }: Assessment, path: string, shown: string, around: Surroundings): PanelContext {
  const bare = { fileName: shown, pinned: false, markerHz: null };
  if (!problem) return bare;
  const faulty = diagnostics.some(({ severity, code }) => severity === 'error' && code !== 'unsolved');
  if (!isSettled(problem)) return faulty ? bare : { ...bare, solved: { result: solveProblem(problem, { top: defaultTop, onProgress: progressLine(shown, around) }), stale: false } };
  const markerHz = defaultMarkerHz(problem);
  return {
    ...bare,
    spread: spread ? { spread, stale: false, cloud: toleranceCloud(problem) } : null,
    codes: { coverage: markerHz === null || codesObstacle(problem) !== null ? null : coverage(problem, { frequencyHz: markerHz }), firmware: firmwareViews(problem, description.syntax.text, dirname(path)) },
  };
}

const words = { missing: 'not written yet', foreign: 'not written by Ohmward', 'out of date': 'out of date', current: 'up to date' } as const;

function firmwareViews(problem: Problem, descriptionText: string, folder: string): FirmwareView[] {
  return firmwareOf(problem, descriptionText).map(({ path, text, reason }) => {
    const target = resolve(folder, path);
    const present = presentText(target);
    if (present === 'folder') return { path, text: 'a folder, no file', ok: false, writable: false };
    const state = firmwareState(text ?? '', present?.text ?? null);
    return { path, text: text === null ? reason : words[state], ok: text !== null && state === 'current', writable: false };
  });
}
