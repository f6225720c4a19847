import { assess, type Assessment } from '../assistance/assess';
import { assessWithSpread } from '../assistance/spreadAssessment';
import type { LoadedFiles } from '../description/files';

/** A description to assess away from the main thread, with all its files; both sides of it are plain data. */
export interface AssessJob {
  readonly id: number;
  readonly text: string;
  readonly files: LoadedFiles;
  readonly expressions: boolean;
  /** Whether builds with tolerances are studied too. */
  readonly spread: boolean;
}

export type AssessAnswer = { readonly id: number; readonly assessment: Assessment } | { readonly id: number; readonly failure: string };

/** A request is always answered, also when the work throws. */
export function answerJob({ id, text, files, expressions, spread }: AssessJob): AssessAnswer {
  try {
    const assessment = assess(text, files, { expressions });
    return { id, assessment: spread ? assessWithSpread(assessment) : assessment };
  } catch (error) {
    return { id, failure: error instanceof Error ? (error.stack ?? error.message) : String(error) };
  }
}
