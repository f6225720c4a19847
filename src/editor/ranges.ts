import * as vscode from 'vscode';
import type { TextEdit } from '../base/diagnostic';
import type { Span } from '../base/span';

export const LANGUAGE_ID = 'ohmward';

/** Every scheme: files on disk, unsaved ones, remote and virtual ones. */
export const DESCRIPTIONS: vscode.DocumentSelector = { language: LANGUAGE_ID };

export const isDescription = (document: vscode.TextDocument | undefined): document is vscode.TextDocument => document?.languageId === LANGUAGE_ID;

export const rangeOf = (document: vscode.TextDocument, { start, end }: Span): vscode.Range =>
  new vscode.Range(document.positionAt(start), document.positionAt(end));

export const textEditsOf = (document: vscode.TextDocument, edits: readonly TextEdit[]): vscode.TextEdit[] =>
  edits.map((edit) => vscode.TextEdit.replace(rangeOf(document, edit.span), edit.text));

/** All edits as one undoable step of the document; false where the editor would not have them. */
export async function applyTextEdits(document: vscode.TextDocument, edits: readonly TextEdit[]): Promise<boolean> {
  if (edits.length === 0) return true;
  const change = new vscode.WorkspaceEdit();
  change.set(document.uri, textEditsOf(document, edits));
  return vscode.workspace.applyEdit(change);
}
