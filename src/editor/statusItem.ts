import * as vscode from 'vscode';
import { verdictText } from '../assistance/goalText';
import { worstGoal, worstGoalDetail, worstGoalText } from '../assistance/worstGoal';
import { unsolvedElements } from '../study/obstacles';
import type { DocumentStudies, Study } from './documentStudies';
import { isDescription } from './ranges';
import type { DocumentSpreads } from './spreads';

/** The worst margin of the active description, in the status bar; a click goes to that goal. */
export function createStatusItem(studies: DocumentStudies, spreads: DocumentSpreads): vscode.Disposable {
  const item = vscode.window.createStatusBarItem('ohmward.margin', vscode.StatusBarAlignment.Left, 50);
  item.name = 'Ohmward: worst margin';
  item.command = 'ohmward.revealWorstGoal';

  const paint = (bare: Study | null) => {
    const study = bare && spreads.complete(bare);
    const errors = study?.assessment.diagnostics.filter(({ severity }) => severity === 'error').length ?? 0;
    const goals = study?.assessment.evaluation?.goals ?? [];
    const worst = worstGoal(goals);
    const problem = study?.assessment.model.problem;
    const toSolve = problem ? unsolvedElements(problem) : [];
    item.backgroundColor = undefined;
    if (study === null) {
      item.text = '$(loading~spin) Ohmward';
      item.tooltip = 'The description is being evaluated.';
    } else if (errors === 0 && toSolve.length > 0) {
      item.text = '$(wand) to solve';
      item.tooltip = `Still to be solved: ${toSolve.join(', ')}.`;
    } else if (worst === null) {
      item.text = errors > 0 ? `$(error) ${errors === 1 ? '1 error' : `${errors} errors`}` : '$(graph-scatter) no goals';
      item.tooltip = errors > 0 ? 'The description has errors.' : 'The description has no goals.';
    } else {
      item.text = `${worst.ok ? '$(pass)' : '$(warning)'} ${worstGoalText(worst)}`;
      item.tooltip = `${verdictText(goals)}\n${worstGoalDetail(worst)}`;
      if (!worst.ok) item.backgroundColor = new vscode.ThemeColor('statusBarItem.warningBackground');
    }
    item.accessibilityInformation = { label: `Ohmward: ${item.text.replace(/\$\([^)]*\)\s*/, '')}` };
    item.show();
  };
  const follow = () => {
    const document = vscode.window.activeTextEditor?.document;
    if (isDescription(document)) paint(studies.latest(document));
    // An active panel or terminal leaves no active editor: what was shown stays.
    else if (document) item.hide();
  };

  follow();
  return vscode.Disposable.from(
    item,
    vscode.window.onDidChangeActiveTextEditor(follow),
    studies.onDidFinish((study) => {
      if (vscode.window.activeTextEditor?.document === study.document) paint(study);
    }),
    spreads.onDidChange(follow),
    studies.onDidClose(follow),
  );
}
