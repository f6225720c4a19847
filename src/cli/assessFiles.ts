import { dirname } from 'node:path';
import { assessDescription, type Assessment } from '../assistance/assess';
import { assessWithSpread } from '../assistance/spreadAssessment';
import { readDescription } from '../description/readDescription';
import { readText } from './assessFile';
import { assessInWorkers } from './assessInWorkers';
import { findDescriptions, shownPath } from './findDescriptions';
import { loadFiles } from './loadFiles';
import { progressLine } from './progressLine';
import type { Surroundings } from './runCommandLine';

export interface AssessedFile {
  readonly path: string;
  /** Relative to the working folder, with `/`. */
  readonly shown: string;
  readonly assessment: Assessment;
}

/** Fewer descriptions than this are done before the workers have started. */
const worthWorkers = 24;

/** `spread`: builds with tolerances are studied too, and goals on yield judged. */
export async function assessFiles(paths: readonly string[], around: Surroundings, { spread }: { readonly spread: boolean } = { spread: false }): Promise<AssessedFile[]> {
  const found = findDescriptions(paths, around.error);
  const prepared = (path: string) => {
    const description = readDescription(readText(path), { expressions: true });
    return { description, files: loadFiles(description, [dirname(path)]) };
  };
  // The bundle is its own worker; the source, as tests run it, is not.
  const worker = found.length >= worthWorkers && __filename.endsWith('.cjs') ? __filename : null;
  const report = progressLine(`${found.length} descriptions`, around);
  const assessments = worker === null
    ? found.map((path) => {
        const { description, files } = prepared(path);
        const assessment = assessDescription(description, files);
        const report = progressLine(shownPath(path), around);
        return spread ? assessWithSpread(assessment, (share) => report(share, null)) : assessment;
      })
    : await assessInWorkers(worker, found.length, (index) => {
        const { description, files } = prepared(found[index]);
        report(index / found.length, null);
        return { text: description.syntax.text, files, expressions: true, spread };
      });
  around.progress?.('');
  return found.map((path, index) => ({ path, shown: shownPath(path), assessment: assessments[index] }));
}
