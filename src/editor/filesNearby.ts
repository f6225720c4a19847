import * as vscode from 'vscode';
import { fileScope } from './fileAccess';
import { MAX_FILES_NEARBY } from './limits';

const useful = /\.(?:s[1-4]p|ts|csv)$/i;

/** Touchstone files and drawers in the description's folder and one below it, as a description would name them. Empty where they cannot be listed. */
export async function filesNearby(document: vscode.TextDocument): Promise<readonly string[]> {
  const { folder } = fileScope(document);
  if (folder === null) return [];
  const list = async (uri: vscode.Uri): Promise<[string, vscode.FileType][]> => {
    try {
      return await vscode.workspace.fs.readDirectory(uri);
    } catch {
      return []; // not there, or not to be read: then there is nothing to offer
    }
  };
  const isFolder = ([name, type]: [string, vscode.FileType]) => type === vscode.FileType.Directory && !name.startsWith('.') && name !== 'node_modules';
  const isFile = ([name, type]: [string, vscode.FileType]) => (type & vscode.FileType.File) !== 0 && useful.test(name);
  const here = await list(folder);
  const below = await Promise.all(here.filter(isFolder).slice(0, MAX_FILES_NEARBY).map(async ([name]) =>
    (await list(vscode.Uri.joinPath(folder, name))).filter(isFile).map(([file]) => `${name}/${file}`)));
  return [...here.filter(isFile).map(([name]) => name), ...below.flat()].sort((a, b) => a.localeCompare(b, 'en', { numeric: true })).slice(0, MAX_FILES_NEARBY);
}
