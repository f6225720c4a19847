import * as vscode from 'vscode';
import { ladderLenses, type Lens } from '../../assistance/ladderLenses';
import { guarded, type Assistance } from '../guarded';
import { DESCRIPTIONS, rangeOf } from '../ranges';
import type { DocumentSolver } from '../solver';

const commandOf: Readonly<Record<NonNullable<Lens['action']>, string>> = {
  'worst goal': 'ohmward.revealWorstGoal', insert: 'ohmward.insertSolution', 'solve again': 'ohmward.solveAgain',
};

/** Above `ladder:`: the verdict, «Insert solved values» where something is to be solved, «Solve again» where something could be. */
export function registerLenses(assistance: Assistance, solver: DocumentSolver): vscode.Disposable {
  const changed = new vscode.EventEmitter<void>();
  return vscode.Disposable.from(
    changed,
    assistance.studies.onDidFinish(() => changed.fire()),
    solver.onDidSolve(() => changed.fire()),
    assistance.spreads.onDidChange((document) => {
      if (assistance.spreads.latest(document)?.done) changed.fire();
    }),
    vscode.languages.registerCodeLensProvider(DESCRIPTIONS, {
      onDidChangeCodeLenses: changed.event,
      provideCodeLenses: (document, token) =>
        guarded(assistance, 'code lenses', document, token, ({ assessment, version }) => {
          const solved = solver.latest(document);
          const found = ladderLenses(assessment, solved?.study.version === version ? solved.result : null, solver.isSolving(document));
          if (!found) return [];
          const range = rangeOf(document, found.span);
          return found.lenses.map(({ title, tooltip, action }) =>
            new vscode.CodeLens(range, { title, tooltip, command: action === null ? '' : commandOf[action], arguments: action === null ? [] : [document.uri] }));
        }),
    }),
  );
}
