import * as vscode from 'vscode';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf, textEditsOf } from '../ranges';

/** Quick fixes: those that a diagnostic brings along, found again by its code and place. */
export function registerFixes(assistance: Assistance): vscode.Disposable {
  return vscode.languages.registerCodeActionsProvider(
    DESCRIPTIONS,
    {
      provideCodeActions: (document, range, context, token) =>
        guarded(assistance, 'quick fixes', document, token, ({ assessment }) => {
          const actions: vscode.CodeAction[] = [];
          for (const diagnostic of assessment.diagnostics) {
            const place = rangeOf(document, diagnostic.span);
            if (!diagnostic.fixes || !place.intersection(range)) continue;
            const marked = context.diagnostics.filter((shown) => shown.code === diagnostic.code && shown.range.isEqual(place));
            for (const fix of diagnostic.fixes) {
              const action = new vscode.CodeAction(fix.title, vscode.CodeActionKind.QuickFix);
              action.edit = new vscode.WorkspaceEdit();
              action.edit.set(document.uri, textEditsOf(document, fix.edits));
              action.diagnostics = marked;
              action.isPreferred = fix.preferred === true;
              actions.push(action);
            }
          }
          return actions;
        }),
    },
    { providedCodeActionKinds: [vscode.CodeActionKind.QuickFix] },
  );
}
