import * as vscode from 'vscode';

/** What went wrong inside the tool itself, for whoever looks at the output channel. */
export interface Log extends vscode.Disposable {
  /** Each `where` with each message is written once: a failure on every keystroke is one entry. */
  failure(where: string, error: unknown): void;
  show(): void;
}

const MAX_REMEMBERED = 500;

export function createLog(): Log {
  const channel = vscode.window.createOutputChannel('Ohmward', { log: true });
  const told = new Set<string>();
  return {
    failure(where, error) {
      const message = error instanceof Error ? error.message : String(error);
      const key = `${where}: ${message}`;
      if (told.has(key) || told.size >= MAX_REMEMBERED) return;
      told.add(key);
      channel.error(key, error instanceof Error ? error.stack : undefined);
    },
    show: () => channel.show(),
    dispose: () => channel.dispose(),
  };
}
