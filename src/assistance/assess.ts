import type { Diagnostic } from '../base/diagnostic';
import { buildModel } from '../description/buildModel';
import type { Description, Model, ReadOptions } from '../description/description';
import type { FileReference, LoadedFiles } from '../description/files';
import { readDescription } from '../description/readDescription';
import { evaluate } from '../study/evaluate';
import type { Evaluation } from '../study/evaluation';
import { goalDiagnostics } from './goalDiagnostics';
import { ratingWarnings } from './ratingWarnings';
import type { Spread } from './spreadAssessment';

/** A text, its files and what they amount to: the one thing that editor, panel and command line all start from. */
export interface Assessment {
  readonly description: Description;
  readonly model: Model;
  /** Null where there is nothing to study. */
  readonly evaluation: Evaluation | null;
  /** Of the reading, of the model, and of the goals that are missed; in the order of the text. */
  readonly diagnostics: readonly Diagnostic[];
  /** What builds with tolerances do; absent while it is not worked out, null where there is none. */
  readonly spread?: Spread | null;
}

/** Never throws; a file that is not in the map counts as not read yet. */
export function assess(text: string, files: LoadedFiles, options: ReadOptions): Assessment {
  return assessDescription(readDescription(text, options), files);
}

export const assessDescription = (description: Description, files: LoadedFiles): Assessment => assessModel(description, buildModel(description, files));

export function assessModel(description: Description, model: Model): Assessment {
  const evaluation = model.problem && evaluate(model.problem);
  const diagnostics = [...model.diagnostics, ...ratingWarnings(description, model, evaluation), ...goalDiagnostics(description, model, evaluation)];
  diagnostics.sort((a, b) => a.span.start - b.span.start);
  return { description, model, evaluation, diagnostics };
}

/** References that are not in the map yet. Call again after loading them: a drawer may name more. */
export function filesNeeded(description: Description, files: LoadedFiles): readonly FileReference[] {
  const missing = description.files.filter((file) => !files.has(file.path));
  return missing.length > 0 ? missing : buildModel(description, files).missingFiles;
}

/** True where the file as a whole is in order: no error in it, every goal holds, nothing is left to solve. */
export function isOk(assessment: Assessment): boolean {
  return assessment.evaluation !== null && assessment.evaluation.ok && !assessment.diagnostics.some((d) => d.severity === 'error');
}
