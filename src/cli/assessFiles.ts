import { dirname, relative, sep } from 'node:path';
import type { Assessment } from '../assistance/assess';
import { assessFile } from './assessFile';
import { findDescriptions } from './findDescriptions';

export interface AssessedFile {
  readonly path: string;
  /** Relative to the working folder, with `/`. */
  readonly shown: string;
  readonly assessment: Assessment;
}

export const shownPath = (path: string): string => relative(process.cwd(), path).split(sep).join('/');

export function assessFiles(paths: readonly string[]): AssessedFile[] {
  return findDescriptions(paths).map((path) => ({ path, shown: shownPath(path), assessment: assessFile(path, [dirname(path)]) }));
}
