import * as vscode from 'vscode';
import type { DocumentStudies, Study } from './documentStudies';
import type { Log } from './log';
import type { DocumentSpreads } from './spreads';

/** What every provider needs. */
export interface Assistance {
  readonly studies: DocumentStudies;
  readonly spreads: DocumentSpreads;
  readonly log: Log;
}

/**
 * The study of the document as it is now, with what is known of its builds, handed to `answer`; null where the request was cancelled before or after, where
 * the text has moved on, and where `answer` fails (which is logged once, with `where`).
 */
export async function guarded<T>(
  { studies, spreads, log }: Assistance,
  where: string,
  document: vscode.TextDocument,
  token: vscode.CancellationToken,
  answer: (study: Study) => T | null,
): Promise<T | null> {
  try {
    if (token.isCancellationRequested) return null;
    const study = await studies.current(document);
    if (study === null || token.isCancellationRequested || document.version !== study.version) return null;
    return answer(spreads.complete(study));
  } catch (error) {
    log.failure(where, error);
    return null;
  }
}
