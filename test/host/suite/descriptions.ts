import assert from 'node:assert/strict';
import path from 'node:path';
import * as vscode from 'vscode';

/** The copy of the sample workspaces that this run may change. */
const workspace = process.env.OHMWARD_WORKSPACE ?? '';

/** `orchard/frost.match.yaml` */
export const sampleUri = (name: string) => vscode.Uri.file(path.join(workspace, ...name.split('/')));

/** Long enough for a loaded machine; a wait ends as soon as the thing is there. */
const WAIT_MS = 20_000;

/** Asks again and again until `look` gives something, and gives that. */
export async function eventually<T>(what: string, look: () => T | Promise<T>, limitMs = WAIT_MS): Promise<NonNullable<Awaited<T>>> {
  const end = Date.now() + limitMs;
  let last: unknown;
  for (;;) {
    try {
      const found = await look();
      if (found !== null && found !== undefined && found !== false) return found as NonNullable<Awaited<T>>;
      last = found;
    } catch (error) {
      last = error;
    }
    if (Date.now() > end) throw new Error(`waited in vain for ${what}${last instanceof Error ? `: ${last.message}` : ''}`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

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

export const marks = (document: vscode.TextDocument) => vscode.languages.getDiagnostics(document.uri);

export const errors = (document: vscode.TextDocument) => marks(document).filter(({ severity }) => severity === vscode.DiagnosticSeverity.Error);

/** Waits until the marks of a document are such; gives them. */
export const marksThat = (document: vscode.TextDocument, what: string, fit: (found: vscode.Diagnostic[]) => boolean) =>
  eventually(`marks: ${what}; there are: ${marks(document).map(({ message }) => message).join(' | ')}`, () => {
    const found = marks(document);
    return fit(found) ? found : null;
  });

/** Throws unsaved changes away and closes everything. */
export async function closeAll(): Promise<void> {
  for (const document of vscode.workspace.textDocuments) {
    if (!document.isDirty) continue;
    await vscode.window.showTextDocument(document);
    await vscode.commands.executeCommand('workbench.action.files.revert');
  }
  await vscode.commands.executeCommand('workbench.action.closeAllEditors');
}
