import { dirname } from 'node:path';
import type { Assessment } from '../assistance/assess';
import { isOk } from '../assistance/assess';
import { checkJson, type CheckedFile } from '../report/checkJson';
import { checkJunit } from '../report/checkJunit';
import { checkSarif } from '../report/checkSarif';
import { checkText } from '../report/checkText';
import { assessFile } from './assessFile';
import { formatOf } from './formatOf';
import { assessFiles } from './assessFiles';
import type { CallOptions, Surroundings } from './runCommandLine';
import { toolVersion } from './toolVersion';
import { writeDiagnostics } from './writeDiagnostics';

/** Reads and evaluates; says for each goal whether it holds and by how much. Never solves. */
export async function check(paths: readonly string[], options: CallOptions, around: Surroundings): Promise<number> {
  const format = formatOf(options.format, ['text', 'json', 'sarif', 'junit']);
  const assessed = await assessFiles(paths, around, { spread: true });
  const earlier = (path: string): Assessment | undefined =>
    options.since === undefined ? undefined : assessFile(options.since, [dirname(options.since), dirname(path)]);
  const files: CheckedFile[] = assessed.map(({ shown, path, assessment }) => ({ path: shown, assessment, earlier: earlier(path) }));
  for (const file of files) writeDiagnostics(file.path, file.assessment, around, { goals: true });
  if (format === 'json') {
    around.out(`${JSON.stringify(checkJson(files), null, 2)}\n`);
  } else if (format === 'sarif') {
    around.out(`${JSON.stringify(checkSarif(files, toolVersion()), null, 2)}\n`);
  } else if (format === 'junit') {
    around.out(checkJunit(files));
  } else {
    for (const file of files) around.out(checkText(file, around.colour));
    if (files.length > 1) around.out(`${files.filter((file) => isOk(file.assessment)).length} of ${files.length} descriptions are in order\n`);
  }
  return files.every((file) => isOk(file.assessment)) ? 0 : 1;
}
