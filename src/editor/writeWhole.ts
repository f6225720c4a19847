import * as vscode from 'vscode';

const freshSuffix = () => [...crypto.getRandomValues(new Uint8Array(6))].map((byte) => byte.toString(16).padStart(2, '0')).join('');

/** Beside it first, then renamed over it: a reader sees the old file or the new one, never half of one. Folders on the way are made. */
export async function writeWhole(uri: vscode.Uri, text: string): Promise<void> {
  const folder = vscode.Uri.joinPath(uri, '..');
  await vscode.workspace.fs.createDirectory(folder);
  if (await isLink(uri)) {
    // What it leads to is written: the link stays.
    await vscode.workspace.fs.writeFile(uri, new TextEncoder().encode(text));
    return;
  }
  const beside = vscode.Uri.joinPath(folder, `.${uri.path.split('/').at(-1) ?? ''}.${freshSuffix()}.tmp`);
  try {
    await vscode.workspace.fs.writeFile(beside, new TextEncoder().encode(text));
    await vscode.workspace.fs.rename(beside, uri, { overwrite: true });
  } catch (error) {
    await vscode.workspace.fs.delete(beside).then(undefined, () => undefined); // the first failure is the one to tell
    throw error;
  }
}

async function isLink(uri: vscode.Uri): Promise<boolean> {
  try {
    return ((await vscode.workspace.fs.stat(uri)).type & vscode.FileType.SymbolicLink) !== 0;
  } catch {
    return false; // nothing is there yet
  }
}
