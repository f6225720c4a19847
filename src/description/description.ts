import type { Diagnostic } from '../base/diagnostic';
import type { Problem } from '../study/problem';
import type { FileReference } from './files';
import type { DescriptionSyntax } from './syntax';

/** How a description may be read. */
export interface ReadOptions {
  /** False in an untrusted workspace: expressions are refused with an error that says so. */
  readonly expressions: boolean;
}

/** A text as read: never fails. */
export interface Description {
  readonly syntax: DescriptionSyntax;
  readonly diagnostics: readonly Diagnostic[];
  /** Files to load before the model can be built; CSV rows may add more (see `model.ts`). */
  readonly files: readonly FileReference[];
}

/** A description with its files: what can be studied, and everything that is wrong. */
export interface Model {
  /** Null only where there is nothing to study: no readable load or no bands can be had. */
  readonly problem: Problem | null;
  /** Those of the reading and those of names, files, families and physical sense; in the order of the text, at most 100. */
  readonly diagnostics: readonly Diagnostic[];
  /** Further files that CSV drawers name and that are not in the map yet. */
  readonly missingFiles: readonly FileReference[];
}
