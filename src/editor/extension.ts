import type * as vscode from 'vscode';
import { start } from './start';

/** Called by the editor when a description is opened, a command is run or a panel comes back; not before. The same in both extension hosts, with Node and without. */
export function activate(context: vscode.ExtensionContext): void {
  start(context);
}
