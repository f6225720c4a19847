import * as vscode from 'vscode';
import { hoverAt } from '../../assistance/hover';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf } from '../ranges';

export function registerHover(assistance: Assistance): vscode.Disposable {
  return vscode.languages.registerHoverProvider(DESCRIPTIONS, {
    provideHover: (document, position, token) =>
      guarded(assistance, 'hover', document, token, ({ assessment }) => {
        const found = hoverAt(assessment, document.offsetAt(position));
        // Neither trusted nor with HTML: names and paths of the description stand in it.
        return found && new vscode.Hover(new vscode.MarkdownString(found.markdown), rangeOf(document, found.span));
      }),
  });
}
