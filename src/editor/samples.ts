import * as vscode from 'vscode';
import type { Log } from './log';
import { FIRST_SAMPLE, SAMPLE_FILES } from './sampleList';

/** Made in the folder that the person picks. */
const FOLDER_NAME = 'ohmward-samples';

async function pickFolder(): Promise<vscode.Uri | undefined> {
  const picked = await vscode.window.showOpenDialog({
    canSelectFiles: false, canSelectFolders: true, canSelectMany: false,
    title: `Where to put the folder «${FOLDER_NAME}»`, openLabel: 'Put the samples here',
    defaultUri: vscode.workspace.workspaceFolders?.[0]?.uri,
  });
  return picked?.[0];
}

async function isThere(uri: vscode.Uri): Promise<boolean> {
  try {
    await vscode.workspace.fs.stat(uri);
    return true;
  } catch (error) {
    if (error instanceof vscode.FileSystemError && error.code === 'FileNotFound') return false;
    throw error;
  }
}

/** Copies what is not there yet; what is there stays, as it may have been worked on. */
async function copySamples(extensionUri: vscode.Uri, target: vscode.Uri): Promise<void> {
  for (const name of SAMPLE_FILES) {
    const copy = vscode.Uri.joinPath(target, name);
    if (await isThere(copy)) continue;
    // Folders on the way are made by the editor.
    await vscode.workspace.fs.writeFile(copy, await vscode.workspace.fs.readFile(vscode.Uri.joinPath(extensionUri, 'media', 'samples', name)));
  }
}

async function openSamples(extensionUri: vscode.Uri, folder: vscode.Uri | undefined): Promise<void> {
  const chosen = folder ?? (await pickFolder());
  if (chosen === undefined) return;
  const target = vscode.Uri.joinPath(chosen, FOLDER_NAME);
  await copySamples(extensionUri, target);
  const document = await vscode.workspace.openTextDocument(vscode.Uri.joinPath(target, FIRST_SAMPLE));
  await vscode.window.showTextDocument(document, { preview: false });
}

/** The command that copies the samples into a folder of the person's, who is asked for it unless it is handed in, and opens one. */
export function registerSamples(extensionUri: vscode.Uri, log: Log): vscode.Disposable {
  const name = 'ohmward.openSamples';
  return vscode.commands.registerCommand(name, async (argument: unknown) => {
    try {
      await openSamples(extensionUri, argument instanceof vscode.Uri ? argument : undefined);
    } catch (error) {
      log.failure(name, error);
      void vscode.window.showErrorMessage(`Ohmward: the samples could not be copied. ${error instanceof Error ? error.message : String(error)}`);
    }
  });
}
