import * as vscode from 'vscode';
import { elementAt } from '../assistance/elementAt';
import { steppedValue } from '../assistance/steppedValue';
import { worstGoal } from '../assistance/worstGoal';
import type { DocumentStudies } from './documentStudies';
import type { Log } from './log';
import type { PanelHost } from './panel/panelHost';
import type { ValueEdits } from './panel/valueEdits';
import { insertSolved, solveAgain } from './insertSolved';
import type { FirmwareTables } from './firmwareTables';
import { isDescription } from './ranges';
import type { Reports } from './reports';
import type { DocumentSolver } from './solver';

interface Services {
  readonly extensionUri: vscode.Uri;
  readonly studies: DocumentStudies;
  readonly solver: DocumentSolver;
  readonly firmware: FirmwareTables;
  readonly reports: Reports;
  readonly panels: PanelHost;
  readonly edits: ValueEdits;
  readonly log: Log;
}

function activeDescription(): vscode.TextDocument | null {
  const document = vscode.window.activeTextEditor?.document;
  return isDescription(document) ? document : null;
}

async function describedBy(argument: unknown): Promise<vscode.TextDocument | null> {
  if (!(argument instanceof vscode.Uri)) return activeDescription();
  const document = await vscode.workspace.openTextDocument(argument);
  return isDescription(document) ? document : null;
}

async function revealWorstGoal(studies: DocumentStudies): Promise<void> {
  const editor = vscode.window.activeTextEditor;
  if (!editor || !isDescription(editor.document)) return;
  const study = await studies.current(editor.document);
  const worst = worstGoal(study?.assessment.evaluation?.goals ?? []);
  if (worst === null) {
    void vscode.window.setStatusBarMessage('This description has no goal that could be judged.', 4_000);
    return;
  }
  const line = Math.min(worst.goal.line - 1, editor.document.lineCount - 1);
  const at = new vscode.Position(line, editor.document.lineAt(line).firstNonWhitespaceCharacterIndex);
  editor.selection = new vscode.Selection(at, at);
  editor.revealRange(new vscode.Range(at, at), vscode.TextEditorRevealType.InCenterIfOutsideViewport);
}

async function step(edits: ValueEdits, direction: 'up' | 'down'): Promise<void> {
  const editor = vscode.window.activeTextEditor;
  if (!editor || !isDescription(editor.document)) return;
  const { document } = editor;
  await edits.apply(document, (assessment) => {
    const { elementId } = elementAt(assessment, document.offsetAt(editor.selection.active));
    if (elementId === null) return { refusal: 'Put the cursor on an element of the ladder to step its value.' };
    return steppedValue(assessment, elementId, direction);
  });
}

/** The commands of package.json; each failure is logged and told. */
export function registerCommands({ extensionUri, studies, solver, firmware, reports, panels, edits, log }: Services): vscode.Disposable {
  const command = (name: string, run: (argument: unknown, more: unknown) => unknown) =>
    vscode.commands.registerCommand(name, async (argument: unknown, more: unknown) => {
      try {
        await run(argument, more);
      } catch (error) {
        log.failure(name, error);
        void vscode.window.showErrorMessage(`Ohmward: ${error instanceof Error ? error.message : String(error)}`);
      }
    });
  return vscode.Disposable.from(
    command('ohmward.openPanel', async (argument) => panels.open(await describedBy(argument))),
    command('ohmward.pinPanel', () => panels.setPinned(true)),
    command('ohmward.unpinPanel', () => panels.setPinned(false)),
    command('ohmward.stepUp', () => step(edits, 'up')),
    command('ohmward.stepDown', () => step(edits, 'down')),
    command('ohmward.insertSolution', async (argument) => {
      const document = await describedBy(argument);
      if (document) await insertSolved(document, solver);
    }),
    command('ohmward.solveAgain', async (argument) => {
      const document = await describedBy(argument);
      if (document) await solveAgain(document, solver);
    }),
    command('ohmward.writeFirmware', async (argument) => {
      const document = await describedBy(argument);
      if (document) await firmware.write(document);
    }),
    command('ohmward.saveReport', async (argument, target) => {
      const document = await describedBy(argument);
      if (document) await reports.save(document, target instanceof vscode.Uri ? target : null);
    }),
    command('ohmward.revealWorstGoal', () => revealWorstGoal(studies)),
    command('ohmward.openReference', () => vscode.commands.executeCommand('markdown.showPreview', vscode.Uri.joinPath(extensionUri, 'media', 'language-reference.md'))),
    command('ohmward.showLog', () => log.show()),
  );
}
