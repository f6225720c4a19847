import * as vscode from 'vscode';
import { improves } from '../assistance/improves';
import { insertSolution } from '../assistance/insertSolution';
import { listedSolutions } from '../assistance/candidates';
import { printNumber } from '../quantity/printQuantity';
import { worstMarginDb } from '../assistance/worstMarginWith';
import { applyTextEdits } from './ranges';
import type { DocumentSolver, Solved } from './solver';

/** Puts one of the solver's solutions into the text, as one undoable step. `candidate`: its place in what the panel lists. */
export async function insertSolved(document: vscode.TextDocument, solver: DocumentSolver, candidate = 0): Promise<void> {
  const solved = await solver.current(document);
  const solution = solved && listedSolutions(solved.result)[candidate];
  if (!solved || !solution) {
    void vscode.window.showInformationMessage(solved?.result.reason ? `There is no solution: ${solved.result.reason}.` : 'Nothing is left to solve here.');
    return;
  }
  await apply(document, solved, candidate);
}

/** Reconsiders every value that says `from`, and puts the best in its place if it is better. */
export async function solveAgain(document: vscode.TextDocument, solver: DocumentSolver): Promise<void> {
  const solved = await solver.solveAgain(document);
  const [best] = solved?.result.solutions ?? [];
  if (!solved || !best) {
    void vscode.window.showInformationMessage(solved?.result.reason ? `There is no solution: ${solved.result.reason}.` : 'There is nothing to solve again: no value says «from» without being «fixed», or the text has errors.');
    return;
  }
  if (insertSolution(solved.study.assessment.description.syntax, best).length === 0 || !improves(solved.problem, best)) {
    void vscode.window.showInformationMessage(best.proved ? 'Nothing that exists is better: the values stay.' : 'Nothing better was found: the values stay.');
    return;
  }
  const before = worstMarginDb(solved.study.assessment.evaluation?.goals ?? []);
  await apply(document, solved, 0);
  const now = `${printNumber(best.marginDb, 3)} dB`;
  void vscode.window.setStatusBarMessage(before === null ? `Solved again: margin ${now}` : `Solved again: margin ${now}, was ${printNumber(before, 3)} dB`, 6_000);
}

async function apply(document: vscode.TextDocument, { study, result }: Solved, candidate: number): Promise<void> {
  const solution = listedSolutions(result)[candidate];
  const edits = insertSolution(study.assessment.description.syntax, solution);
  if (document.version !== study.version || !(await applyTextEdits(document, edits))) {
    void vscode.window.showWarningMessage('The text changed meanwhile, so the values were not inserted.');
  }
}
