import assert from 'node:assert/strict';
import path from 'node:path';
import * as vscode from 'vscode';

/** The copy of the sample workspaces that this run may change. */
const workspace = process.env.OHMWARD_WORKSPACE ?? '';

/** `orchard/frost.match.yaml` */
export const sampleUri = (name: string) => vscode.Uri.file(path.join(workspace, ...name.split('/')));

/** A description in an editor of its own, with the cursor at the start. */
export async function openSample(name: string): Promise<vscode.TextEditor> {
  const document = await vscode.workspace.openTextDocument(sampleUri(name));
  assert.equal(document.languageId, 'ohmward');
  const editor = await vscode.window.showTextDocument(document, vscode.ViewColumn.One);
  editor.selection = new vscode.Selection(0, 0, 0, 0);
  return editor;
}

/** Writes a file into the workspace's copy and opens it. `$0` in the text is where the cursor goes. */
export async function openText(name: string, text: string): Promise<vscode.TextEditor> {
  const cursor = text.indexOf('$0');
  await vscode.workspace.fs.writeFile(sampleUri(name), new TextEncoder().encode(text.replace('$0', '')));
  const editor = await openSample(name);
  if (cursor >= 0) {
    const at = editor.document.positionAt(cursor);
    editor.selection = new vscode.Selection(at, at);
  }
  return editor;
}

/** Where a piece of the text stands, the first time. */
export function placeOf(document: vscode.TextDocument, piece: string): vscode.Range {
  const start = document.getText().indexOf(piece);
  assert.ok(start >= 0, `«${piece}» is not in the text`);
  return new vscode.Range(document.positionAt(start), document.positionAt(start + piece.length));
}

/** Replaces the first occurrence, as one edit of the person. */
export async function replace(editor: vscode.TextEditor, piece: string, by: string): Promise<void> {
  const range = placeOf(editor.document, piece);
  assert.ok(await editor.edit((edit) => edit.replace(range, by)), 'the editor took the edit');
}

export const undo = () => vscode.commands.executeCommand('undo');
