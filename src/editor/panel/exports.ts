import * as vscode from 'vscode';
import type { ToHost } from '../../messages/panel';

type SaveMessage = Extract<ToHost, { type: 'save' }>;

const FORMATS: Readonly<Record<SaveMessage['what'], { readonly extension: string; readonly filter: string }>> = {
  'chart svg': { extension: 'svg', filter: 'SVG picture' },
  'chart png': { extension: 'png', filter: 'PNG picture' },
};

function bytesOf(base64: string): Uint8Array {
  const binary = atob(base64);
  return Uint8Array.from(binary, (character) => character.charCodeAt(0));
}

/** Asks where to, then writes what the page has drawn. */
export async function savePicture(document: vscode.TextDocument, message: SaveMessage): Promise<void> {
  const { extension, filter } = FORMATS[message.what];
  const folder = document.isUntitled ? vscode.workspace.workspaceFolders?.[0]?.uri : vscode.Uri.joinPath(document.uri, '..');
  const name = `${(document.uri.path.split('/').at(-1) ?? 'chart').replace(/\.match\.ya?ml$/, '')}.${extension}`;
  const target = await vscode.window.showSaveDialog({
    defaultUri: folder && vscode.Uri.joinPath(folder, name),
    filters: { [filter]: [extension] },
    title: 'Save the chart',
  });
  if (target) await vscode.workspace.fs.writeFile(target, bytesOf(message.base64));
}

export async function copyText(text: string): Promise<void> {
  await vscode.env.clipboard.writeText(text);
  vscode.window.setStatusBarMessage('$(clippy) Copied', 2_000);
}
