import { isOk } from '../assistance/assess';
import { reportHtml } from '../report/reportHtml';
import { assessFiles } from './assessFiles';
import { CallError } from './callError';
import type { CallOptions, Surroundings } from './runCommandLine';
import { writeWhole } from './writeWhole';
import { writeDiagnostics } from './writeDiagnostics';

/** One self-contained HTML file with pictures and tables. */
export async function report(paths: readonly string[], options: CallOptions, around: Surroundings): Promise<number> {
  if (options.output === undefined) throw new CallError('report needs -o FILE');
  const files = await assessFiles(paths, around, { spread: true });
  for (const file of files) writeDiagnostics(file.shown, file.assessment, around);
  writeWhole(options.output, reportHtml(files.map(({ shown, assessment }) => ({ path: shown, assessment }))));
  around.out(`${options.output}\n`);
  return files.every(({ assessment }) => isOk(assessment)) ? 0 : 1;
}
