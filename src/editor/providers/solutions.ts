import * as vscode from 'vscode';
import { solutionFixes } from '../../assistance/solutionFixes';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, textEditsOf } from '../ranges';
import type { DocumentSolver } from '../solver';

/** The light bulb on a `solve`: what the solver found, if it has an answer to this version of the text. */
export function registerSolutions(assistance: Assistance, solver: DocumentSolver): vscode.Disposable {
  return vscode.languages.registerCodeActionsProvider(
    DESCRIPTIONS,
    {
      provideCodeActions: (document, range, _context, token) =>
        guarded(assistance, 'solved values', document, token, ({ assessment, version }) => {
          const solved = solver.latest(document);
          if (solved?.study.version !== version) return [];
          const span = { start: document.offsetAt(range.start), end: document.offsetAt(range.end) };
          return solutionFixes(assessment, solved.result, span).map((fix) => {
            const action = new vscode.CodeAction(fix.title, vscode.CodeActionKind.QuickFix);
            action.edit = new vscode.WorkspaceEdit();
            action.edit.set(document.uri, textEditsOf(document, fix.edits));
            action.isPreferred = fix.preferred === true;
            return action;
          });
        }),
    },
    { providedCodeActionKinds: [vscode.CodeActionKind.QuickFix] },
  );
}
