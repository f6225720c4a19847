import * as vscode from 'vscode';
import { panelView } from '../assistance/panelView';
import { defaultMarkerHz } from '../assistance/markerView';
import { shownProblem } from '../assistance/solvedAssessment';
import { reportHtml } from '../report/reportHtml';
import { codesObstacle } from '../study/tuning/bestCodes';
import { spreadObstacle } from '../study/spread/spreadOfBuilds';
import type { DocumentStudies, Study } from './documentStudies';
import type { FirmwareTables } from './firmwareTables';
import type { DocumentSolver } from './solver';
import type { DocumentSpreads, StudiedSpread } from './spreads';
import type { Tuner } from './tuner';
import { REPORT_WAITS_MS } from './limits';
import { writeWhole } from './writeWhole';

/** The report of a description: the same page as on the command line. */
export interface Reports {
  /** Asks where to, where no target is given. Everything that is still being worked out is waited for. */
  save(document: vscode.TextDocument, target: vscode.Uri | null): Promise<void>;
}

interface Sources {
  readonly solver: DocumentSolver;
  readonly spreads: DocumentSpreads;
  readonly tuner: Tuner;
  readonly firmware: FirmwareTables;
}

const fileNameOf = (document: vscode.TextDocument) => document.uri.path.split('/').at(-1) ?? '';

export function createReports(studies: DocumentStudies, { solver, spreads, tuner, firmware }: Sources): Reports {
  /** All builds of a version; null where there are none, or they take too long. */
  const builds = async ({ document, version, assessment: { model: { problem } } }: Study): Promise<StudiedSpread | null> => {
    if (!problem || spreadObstacle(problem) !== null) return null;
    const finished = () => {
      const found = spreads.latest(document);
      return found?.done && found.study.version === version ? found : null;
    };
    return finished() ?? new Promise((answer) => {
      const end = (found: StudiedSpread | null) => {
        clearTimeout(timer);
        listening.dispose();
        answer(found);
      };
      const timer = setTimeout(() => end(null), REPORT_WAITS_MS);
      const listening = spreads.onDidChange(() => {
        const found = finished();
        if (found) end(found);
      });
    });
  };

  const page = async (document: vscode.TextDocument): Promise<string> => {
    const study = await studies.current(document);
    if (study === null) throw new Error('the text changed meanwhile; ask again.');
    const solved = await solver.current(document);
    const found = solved && { result: solved.result, stale: false };
    const studied = found ? null : await builds(study);
    const problem = shownProblem(study.assessment.model.problem, found);
    const markerHz = problem && defaultMarkerHz(problem);
    const coverage = problem && markerHz !== null && codesObstacle(problem) === null ? await tuner.coverage(document, problem, markerHz) : null;
    const view = panelView(study.assessment, {
      fileName: fileNameOf(document), pinned: false, markerHz: null, solved: found,
      spread: studied && { spread: studied.spread, cloud: studied.cloud, stale: false }, codes: { coverage, firmware: firmware.view(document) },
    });
    return reportHtml([{ path: fileNameOf(document), view, messages: study.assessment.diagnostics.map(({ message }) => message) }]);
  };

  return {
    async save(document, target) {
      const folder = document.isUntitled ? vscode.workspace.workspaceFolders?.[0]?.uri : vscode.Uri.joinPath(document.uri, '..');
      const name = `${fileNameOf(document).replace(/\.match\.ya?ml$/, '')}.html`;
      const chosen = target ?? await vscode.window.showSaveDialog({ defaultUri: folder && vscode.Uri.joinPath(folder, name), filters: { 'HTML page': ['html'] }, title: 'Save the report' });
      if (!chosen) return;
      await vscode.window.withProgress({ location: vscode.ProgressLocation.Window, title: 'Making the report' }, async () => writeWhole(chosen, await page(document)));
      void vscode.window.setStatusBarMessage('The report is saved.', 4_000);
    },
  };
}
