import * as vscode from 'vscode';
import type { FileReference, LoadedFile } from '../description/files';
import { touchstoneReader } from '../network/touchstone/readTouchstone';
import { fitsPattern, isInside, pathSegments, resolveReference } from '../platform/pathRules';
import { MAX_FILE_BYTES, MAX_PATTERN_FILES, READ_CHUNK_BYTES } from './limits';

/** Where a description may look for its files. */
export interface FileScope {
  /** The folder that paths in it are relative to; null for a text that has none, such as one that was never saved. */
  readonly folder: vscode.Uri | null;
  /** What must not be left where the workspace is not trusted: the workspace folder, or a loose file's own. */
  readonly root: vscode.Uri | null;
  readonly trusted: boolean;
}

export function fileScope(document: vscode.TextDocument): FileScope {
  const trusted = vscode.workspace.isTrusted;
  if (document.isUntitled) {
    const root = vscode.workspace.workspaceFolders?.[0]?.uri ?? null;
    return { folder: root, root, trusted };
  }
  const folder = vscode.Uri.joinPath(document.uri, '..');
  return { folder, root: vscode.workspace.getWorkspaceFolder(document.uri)?.uri ?? folder, trusted };
}

const LINK_REFUSED = 'This workspace is not trusted, so links to other places are not followed.';

export type Resolved = { readonly uri: vscode.Uri } | { readonly refused: string };

/** The place that a path as written in a description means, or why it may not be looked at. */
export function resolveFile(scope: FileScope, path: string): Resolved {
  if (scope.folder === null || scope.root === null) return { refused: 'Save the description first: paths are relative to it.' };
  const segments = resolveReference(pathSegments(scope.folder.path), path);
  if (segments === null) return { refused: `«${path}» leads nowhere.` };
  if (!scope.trusted && !isInside(pathSegments(scope.root.path), segments)) {
    return { refused: 'This workspace is not trusted, so nothing outside its folder is read.' };
  }
  return { uri: scope.folder.with({ path: `/${segments.join('/')}` }) };
}

/** Where the workspace is not trusted, a link could lead out of the folder that its path stays in. */
async function passesLink(scope: FileScope, uri: vscode.Uri): Promise<boolean> {
  if (scope.trusted || scope.root === null) return false;
  const inside = pathSegments(uri.path).slice(pathSegments(scope.root.path).length);
  let at = scope.root;
  for (const segment of inside) {
    at = vscode.Uri.joinPath(at, segment);
    if ((await vscode.workspace.fs.stat(at)).type & vscode.FileType.SymbolicLink) return true;
  }
  return false;
}

const nextTurn = () => new Promise<void>((resolve) => setTimeout(resolve, 0));

async function parseTouchstone(name: string, bytes: Uint8Array): Promise<LoadedFile> {
  const reader = touchstoneReader(name);
  for (let at = 0; at < bytes.length; at += READ_CHUNK_BYTES) {
    if (at > 0) await nextTurn();
    reader.push(bytes.subarray(at, at + READ_CHUNK_BYTES));
  }
  const result = reader.finish();
  if (!result.ok) return { form: 'unreadable', message: result.problem.message, line: result.problem.line };
  return { form: 'touchstone', data: result.data, warnings: result.warnings.map((warning) => `line ${warning.line}: ${warning.message}`) };
}

async function listPattern(uri: vscode.Uri, path: string): Promise<LoadedFile> {
  const wanted = pathSegments(uri.path).at(-1) ?? '';
  const written = path.slice(0, Math.max(path.lastIndexOf('/'), path.lastIndexOf('\\')) + 1);
  const names = (await vscode.workspace.fs.readDirectory(vscode.Uri.joinPath(uri, '..')))
    .filter(([name, type]) => (type & vscode.FileType.File) !== 0 && fitsPattern(wanted, name))
    .map(([name]) => name);
  names.sort((a, b) => a.localeCompare(b, 'en', { numeric: true }));
  return { form: 'pattern', paths: names.slice(0, MAX_PATTERN_FILES).map((name) => written + name) };
}

const isNotFound = (error: unknown) => error instanceof vscode.FileSystemError && /FileNotFound|FileNotADirectory/.test(error.code);

/** Reads what a reference means, through the editor's own file system, so that remote and virtual ones work too. Never throws. */
export async function readReference(scope: FileScope, reference: FileReference, uri: vscode.Uri): Promise<LoadedFile> {
  try {
    if (reference.kind === 'pattern') {
      if (await passesLink(scope, vscode.Uri.joinPath(uri, '..'))) return { form: 'refused', reason: LINK_REFUSED };
      return await listPattern(uri, reference.path);
    }
    const { size, type } = await vscode.workspace.fs.stat(uri);
    if ((type & vscode.FileType.Directory) !== 0) return { form: 'unreadable', message: 'this is a folder, not a file', line: null };
    if (await passesLink(scope, uri)) return { form: 'refused', reason: LINK_REFUSED };
    if (size > MAX_FILE_BYTES) return { form: 'unreadable', message: `the file is larger than ${MAX_FILE_BYTES / 1024 / 1024} MB`, line: null };
    const bytes = await vscode.workspace.fs.readFile(uri);
    if (reference.kind === 'csv') return { form: 'csv', text: new TextDecoder('utf-8').decode(bytes) };
    return await parseTouchstone(pathSegments(uri.path).at(-1) ?? '', bytes);
  } catch (error) {
    if (isNotFound(error)) return { form: 'missing' };
    return { form: 'unreadable', message: `it could not be read: ${error instanceof Error ? error.message : String(error)}`, line: null };
  }
}
