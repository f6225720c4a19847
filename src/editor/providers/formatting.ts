import * as vscode from 'vscode';
import { tidy } from '../../description/tidy';
import type { Assistance } from '../guarded';
import { DESCRIPTIONS, textEditsOf } from '../ranges';

/** Tidies the layout of the whole document. Needs no study: only the text counts. */
export function registerFormatting({ log }: Assistance): vscode.Disposable {
  const edits = (document: vscode.TextDocument, token: vscode.CancellationToken): vscode.TextEdit[] => {
    if (token.isCancellationRequested) return [];
    try {
      return textEditsOf(document, tidy(document.getText()).edits);
    } catch (error) {
      log.failure('formatting', error);
      return [];
    }
  };
  return vscode.languages.registerDocumentFormattingEditProvider(DESCRIPTIONS, {
    provideDocumentFormattingEdits: (document, _options, token) => edits(document, token),
  });
}
