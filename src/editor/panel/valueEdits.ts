import * as vscode from 'vscode';
import type { Assessment } from '../../assistance/assess';
import type { TextEdit } from '../../base/diagnostic';
import type { DocumentStudies } from '../documentStudies';
import type { Log } from '../log';
import { applyTextEdits } from '../ranges';

type Made = readonly TextEdit[] | { readonly refusal: string };

/** Edits that are worked out from the numbers, one after another, so that two quick steps are two steps. */
export interface ValueEdits {
  /** `make` gets the assessment of the text as it is when its turn comes. */
  apply(document: vscode.TextDocument, make: (assessment: Assessment) => Made): Promise<void>;
}

const isRefusal = (made: Made): made is { readonly refusal: string } => !Array.isArray(made);

export function createValueEdits(studies: DocumentStudies, log: Log): ValueEdits {
  let queue: Promise<void> = Promise.resolve();
  const run = async (document: vscode.TextDocument, make: (assessment: Assessment) => Made) => {
    const study = await studies.current(document);
    if (study === null) return; // the text changes at this moment: what was asked for is out of date
    const made = make(study.assessment);
    if (isRefusal(made)) {
      void vscode.window.showInformationMessage(made.refusal);
    } else if (document.version !== study.version || !(await applyTextEdits(document, made))) {
      void vscode.window.showWarningMessage('The value could not be changed in the editor.');
    }
  };
  return {
    apply(document, make) {
      queue = queue.then(() => run(document, make)).catch((error: unknown) => log.failure('changing a value', error));
      return queue;
    },
  };
}
