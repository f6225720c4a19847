import * as vscode from 'vscode';
import type { FileReference, LoadedFile } from '../description/files';
import { readReference, resolveFile, type FileScope } from './fileAccess';
import { MAX_WATCHED_FOLDERS, SETTLING_LOOKS_MS } from './limits';
import type { Log } from './log';

/**
 * Files that descriptions name, as read, kept until they change. A change on disk is learnt from watchers of the folders
 * in use; where a file system tells nothing, `revalidate` compares times and sizes.
 */
export interface FileStore extends vscode.Disposable {
  /** What a reference means, if it is known already; undefined where it must be loaded. */
  peek(scope: FileScope, reference: FileReference): LoadedFile | undefined;
  load(scope: FileScope, reference: FileReference): Promise<LoadedFile>;
  /** Any file of text, as the `csv` form has it. */
  loadText(scope: FileScope, path: string): Promise<LoadedFile>;
  /** Looks whether anything changed unnoticed; tells so through `onDidChange`. */
  revalidate(): Promise<void>;
  /** Forgets everything, silently. */
  forget(): void;
  readonly onDidChange: vscode.Event<void>;
}

interface Entry {
  readonly uri: vscode.Uri;
  readonly isPattern: boolean;
  readonly stamp: string;
  readonly file: LoadedFile;
}

const keyOf = (scope: FileScope, uri: vscode.Uri, kind: FileReference['kind']) => `${scope.trusted ? 'trusted' : 'untrusted'} ${kind} ${uri.toString()}`;

/** Changes when the file does; empty where there is none. */
async function stampOf(uri: vscode.Uri): Promise<string> {
  try {
    const { mtime, size, type } = await vscode.workspace.fs.stat(uri);
    return `${mtime} ${size} ${type}`;
  } catch {
    return ''; // no such file, or none that can be looked at: reading it says which
  }
}

export function createFileStore(log: Log): FileStore {
  const entries = new Map<string, Entry>();
  const loading = new Map<string, Promise<LoadedFile>>();
  const watchers = new Map<string, vscode.Disposable>();
  const changed = new vscode.EventEmitter<void>();
  /** Counts what was invalidated, so that a reading that began before is neither kept nor waited for. */
  let generation = 0;
  const settling = new Set<NodeJS.Timeout>();

  /** Drops what a change at `uri` may concern: the file itself, and patterns of the folder that it is in. */
  const invalidate = (uri: vscode.Uri) => {
    const place = uri.toString();
    const folder = vscode.Uri.joinPath(uri, '..').toString();
    let dropped = loading.size > 0;
    generation++;
    for (const [key, entry] of entries) {
      const concerned = entry.uri.toString() === place || (entry.isPattern && vscode.Uri.joinPath(entry.uri, '..').toString() === folder);
      if (concerned) dropped = entries.delete(key) || dropped;
    }
    if (dropped) changed.fire();
  };

  const watch = (folder: vscode.Uri) => {
    const key = folder.toString();
    if (watchers.has(key)) return;
    const oldest = watchers.keys().next();
    if (watchers.size >= MAX_WATCHED_FOLDERS && !oldest.done) {
      watchers.get(oldest.value)?.dispose();
      watchers.delete(oldest.value);
    }
    const watcher = vscode.workspace.createFileSystemWatcher(new vscode.RelativePattern(folder, '*'));
    watchers.set(key, vscode.Disposable.from(watcher, watcher.onDidCreate(invalidate), watcher.onDidChange(invalidate), watcher.onDidDelete(invalidate)));
    // A watcher does not say when it has begun to watch, and a folder that was just made may be missed by the one above it.
    for (const delayMs of SETTLING_LOOKS_MS) {
      const timer = setTimeout(() => {
        settling.delete(timer);
        void revalidate();
      }, delayMs);
      settling.add(timer);
    }
  };

  const revalidate = async () => {
    try {
      const looked = await Promise.all(
        [...entries].map(async ([key, entry]) => ({ key, entry, stamp: await stampOf(entry.isPattern ? vscode.Uri.joinPath(entry.uri, '..') : entry.uri) })),
      );
      const outdated = looked.filter(({ key, entry, stamp }) => entries.get(key) === entry && stamp !== entry.stamp);
      for (const { key } of outdated) entries.delete(key);
      if (outdated.length > 0) changed.fire();
    } catch (error) {
      log.failure('looking for changed files', error);
    }
  };

  const read = async (scope: FileScope, reference: FileReference, uri: vscode.Uri, key: string): Promise<LoadedFile> => {
    const isPattern = reference.kind === 'pattern';
    const folder = vscode.Uri.joinPath(uri, '..');
    watch(folder);
    // The stamp is taken first: a file that changes while it is read is found to differ at the next look.
    const began = generation;
    const stamp = await stampOf(isPattern ? folder : uri);
    const file = await readReference(scope, reference, uri);
    if (began === generation) entries.set(key, { uri, isPattern, stamp, file });
    return file;
  };

  const load = (scope: FileScope, reference: FileReference): Promise<LoadedFile> => {
    const resolved = resolveFile(scope, reference.path);
    if ('refused' in resolved) return Promise.resolve({ form: 'refused', reason: resolved.refused });
    const key = keyOf(scope, resolved.uri, reference.kind);
    const known = entries.get(key);
    if (known) return Promise.resolve(known.file);
    const reading = `${generation} ${key}`;
    let promise = loading.get(reading);
    if (!promise) {
      promise = read(scope, reference, resolved.uri, key).finally(() => loading.delete(reading));
      loading.set(reading, promise);
    }
    return promise;
  };

  return {
    peek(scope, reference) {
      const resolved = resolveFile(scope, reference.path);
      if ('refused' in resolved) return { form: 'refused', reason: resolved.refused };
      return entries.get(keyOf(scope, resolved.uri, reference.kind))?.file;
    },
    load,
    loadText: (scope, path) => load(scope, { path, kind: 'csv', span: { start: 0, end: 0 }, within: null }),
    revalidate,
    forget() {
      generation++;
      entries.clear();
    },
    onDidChange: changed.event,
    dispose() {
      for (const timer of settling) clearTimeout(timer);
      settling.clear();
      for (const watcher of watchers.values()) watcher.dispose();
      watchers.clear();
      entries.clear();
      changed.dispose();
    },
  };
}
