import * as vscode from 'vscode';
import { page } from './page';

/** Long enough for a loaded machine; a wait ends as soon as the thing is there. */
const WAIT_MS = 20_000;

/** Asks again and again until `look` gives something, and gives that. */
export async function eventually<T>(what: string | (() => string), look: () => T | Promise<T>, limitMs = WAIT_MS): Promise<NonNullable<Awaited<T>>> {
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
    if (Date.now() > end) await page.picture('waited-in-vain').catch(() => undefined); // where there is a window to take one of
    if (Date.now() > end) throw new Error(`waited in vain for ${typeof what === 'string' ? what : what()}${last instanceof Error ? `: ${last.message}` : ''}`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

export const marks = (document: vscode.TextDocument) => vscode.languages.getDiagnostics(document.uri);

export const errors = (document: vscode.TextDocument) => marks(document).filter(({ severity }) => severity === vscode.DiagnosticSeverity.Error);

/** Waits until the marks of a document are such; gives them. */
export const marksThat = (document: vscode.TextDocument, what: string, fit: (found: vscode.Diagnostic[]) => boolean) =>
  eventually(() => `marks: ${what}; there are: ${marks(document).map(({ message }) => message).join(' | ')}`, () => {
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
