import type * as vscode from 'vscode';
import { start } from './start';

/** The entry where the extension host has no Node. */
export function activate(context: vscode.ExtensionContext): void {
  start(context);
}
