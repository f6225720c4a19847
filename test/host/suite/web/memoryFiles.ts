import * as vscode from 'vscode';

/** A virtual file system that holds the given files, as a web editor's repository view does. */
export function memoryFiles(files: ReadonlyMap<string, string>): vscode.FileSystemProvider & { write(path: string, text: string): void } {
  const content = new Map<string, Uint8Array>([...files].map(([path, text]) => [path, new TextEncoder().encode(text)]));
  const times = new Map<string, number>();
  const changed = new vscode.EventEmitter<vscode.FileChangeEvent[]>();
  const isFolder = (path: string) => [...content.keys()].some((file) => file.startsWith(path === '/' ? '/' : `${path}/`));
  const refuse = (uri: vscode.Uri): never => {
    throw vscode.FileSystemError.NoPermissions(uri);
  };
  const put = (path: string, bytes: Uint8Array) => {
    const type = content.has(path) ? vscode.FileChangeType.Changed : vscode.FileChangeType.Created;
    content.set(path, bytes);
    times.set(path, (times.get(path) ?? 1) + 1);
    changed.fire([{ type, uri: vscode.Uri.from({ scheme: 'memory', path }) }]);
  };
  return {
    onDidChangeFile: changed.event,
    watch: () => new vscode.Disposable(() => undefined),
    stat(uri) {
      const bytes = content.get(uri.path);
      if (bytes) return { type: vscode.FileType.File, ctime: 0, mtime: times.get(uri.path) ?? 1, size: bytes.length };
      if (isFolder(uri.path)) return { type: vscode.FileType.Directory, ctime: 0, mtime: 0, size: 0 };
      throw vscode.FileSystemError.FileNotFound(uri);
    },
    readFile(uri) {
      const bytes = content.get(uri.path);
      if (!bytes) throw vscode.FileSystemError.FileNotFound(uri);
      return bytes;
    },
    readDirectory: (uri) =>
      [...content.keys()]
        .filter((path) => path.slice(0, path.lastIndexOf('/')) === uri.path.replace(/\/$/, ''))
        .map((path): [string, vscode.FileType] => [path.slice(path.lastIndexOf('/') + 1), vscode.FileType.File]),
    writeFile: (uri, bytes) => put(uri.path, bytes),
    createDirectory: refuse,
    delete: refuse,
    rename: refuse,
    write: (path, text) => put(path, new TextEncoder().encode(text)),
  };
}
