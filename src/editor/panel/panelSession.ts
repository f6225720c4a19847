import * as vscode from 'vscode';
import { listedSolutions, progressText } from '../../assistance/candidates';
import { elementAt } from '../../assistance/elementAt';
import { defaultMarkerHz, markerView } from '../../assistance/markerView';
import { isDrawable, panelView, problemViews } from '../../assistance/panelView';
import { readMarkerText } from '../../assistance/readMarkerText';
import { isQuick, shownProblem, solvedAssessment, type SolvedUnknowns } from '../../assistance/solvedAssessment';
import { setValue, steppedValue } from '../../assistance/steppedValue';
import { traceView } from '../../assistance/traceViews';
import { decodeToHost } from '../../messages/decodePanel';
import { pageHtml } from '../../messages/pageHtml';
import type { ToHost, ToPage } from '../../messages/panel';
import { nearestChannel } from '../../study/tuning/channelProblems';
import type { DocumentCoverages } from '../coverages';
import type { DocumentStudies, Study } from '../documentStudies';
import type { FirmwareTables } from '../firmwareTables';
import { insertSolved } from '../insertSolved';
import type { Log } from '../log';
import type { Reports } from '../reports';
import type { DocumentSpreads } from '../spreads';
import type { DocumentSolver } from '../solver';
import { PROGRESS_AFTER_MS } from '../limits';
import { copyText, savePicture } from './exports';
import type { ElementHighlight } from './elementHighlight';
import type { ValueEdits } from './valueEdits';

export interface PanelServices {
  readonly extensionUri: vscode.Uri;
  readonly studies: DocumentStudies;
  readonly solver: DocumentSolver;
  readonly spreads: DocumentSpreads;
  readonly coverages: DocumentCoverages;
  readonly firmware: FirmwareTables;
  readonly reports: Reports;
  readonly edits: ValueEdits;
  readonly highlight: ElementHighlight;
  readonly log: Log;
}

/** What is kept of a panel over a reload of the window. */
export interface PanelState {
  /** The description's address; null where none was shown yet. */
  document: string | null;
  pinned: boolean;
  markerHz: number | null;
}

/** One panel: what it shows, and what its page asks for. */
export interface PanelSession {
  readonly panel: vscode.WebviewPanel;
  readonly state: Readonly<PanelState>;
  show(document: vscode.TextDocument | null): void;
  setPinned(pinned: boolean): void;
  /** The cursor in the description's editor. */
  cursorAt(document: vscode.TextDocument, offset: number): void;
  readonly onDidChangeState: vscode.Event<void>;
}

/** An evaluation that takes longer than this marks the picture as old. */
const STALE_AFTER_MS = 150;

const NOTHING = 'Open a match description (a file that ends in .match.yaml), and its picture appears here.';

function freshNonce(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(18));
  return btoa(String.fromCharCode(...bytes)).replace(/\+/g, '-').replace(/\//g, '_');
}

const fileNameOf = (document: vscode.TextDocument) => document.uri.path.split('/').at(-1) ?? '';

async function revealLine(document: vscode.TextDocument, line: number): Promise<void> {
  if (line >= document.lineCount) return;
  const at = document.lineAt(line).range;
  const start = new vscode.Position(line, document.lineAt(line).firstNonWhitespaceCharacterIndex);
  const column = vscode.window.visibleTextEditors.find((editor) => editor.document === document)?.viewColumn ?? vscode.ViewColumn.One;
  const editor = await vscode.window.showTextDocument(document, { viewColumn: column, selection: new vscode.Range(start, start) });
  editor.revealRange(at, vscode.TextEditorRevealType.InCenterIfOutsideViewport);
}

export function createPanelSession(panel: vscode.WebviewPanel, services: PanelServices, initial: PanelState): PanelSession {
  const { studies, solver, spreads, coverages, firmware, reports, edits, highlight, log } = services;
  const state: PanelState = { ...initial };
  const changed = new vscode.EventEmitter<void>();
  let shown: vscode.TextDocument | null = null;
  let staleTimer: ReturnType<typeof setTimeout> | undefined;
  let solvingTimer: ReturnType<typeof setTimeout> | undefined;
  // A document that is closed and opened again counts its versions from 1, and the page drops what looks older.
  let versionsBefore = 0;
  /** The description whose good picture the page holds. */
  let pictured: string | null = null;
  let lastVersion = 0;
  const versionOf = (documentVersion: number) => (lastVersion = Math.max(lastVersion, versionsBefore + documentVersion));

  const send = (message: ToPage) => void panel.webview.postMessage(message).then(undefined, (error: unknown) => log.failure('telling the panel', error));
  const idOf = (document: vscode.TextDocument) => document.uri.toString();

  const solvedFor = ({ document, version }: Study): SolvedUnknowns | null => {
    const found = solver.latest(document);
    return found && { result: found.result, stale: found.study.version !== version };
  };
  const spreadFor = ({ document, version }: Study) => {
    const studied = spreads.latest(document);
    return studied && { spread: studied.spread, cloud: studied.cloud, stale: studied.study.version !== version };
  };
  const codesFor = ({ document, assessment }: Study) => {
    const problem = shownProblem(assessment.model.problem, null);
    const markerHz = problem && (state.markerHz ?? defaultMarkerHz(problem));
    const tuned = problem && markerHz !== null && assessment.evaluation?.tuning;
    return { coverage: tuned ? coverages.at(document, problem, markerHz) : 'values are left to solve', firmware: firmware.view(document) };
  };
  const sendStudy = (study: Study) => {
    clearTimeout(staleTimer);
    const { document, version, assessment } = study;
    const view = panelView(assessment, {
      fileName: fileNameOf(document), pinned: state.pinned, markerHz: state.markerHz, solved: solvedFor(study), solving: solver.isSolving(document),
      spread: spreadFor(study), codes: codesFor(study),
    });
    // What can still be computed is shown, unless a better picture of the same description stands there.
    if (view !== null && (pictured !== idOf(document) || isDrawable(assessment))) {
      if (isDrawable(assessment)) pictured = idOf(document);
      send({ type: 'view', document: idOf(document), version: versionOf(version), view });
    } else {
      send({ type: 'stale', document: idOf(document), version: versionOf(version), reason: 'The text cannot be evaluated as it is.', problems: problemViews(assessment) });
    }
  };
  /** While the values are worked out the last picture stays, marked as old. */
  const sendSolving = ({ document, version, assessment }: Study) => {
    const problems = problemViews(assessment).filter(({ code }) => code !== 'unsolved');
    send({ type: 'stale', document: idOf(document), version: versionOf(version), reason: 'The values are being worked out.', problems });
  };
  const sendAll = () => {
    if (shown === null) {
      send({ type: 'nothing', document: '', version: 0, message: NOTHING });
      return;
    }
    const study = studies.latest(shown);
    if (study) sendStudy(study);
    else void studies.current(shown); // it comes by itself when it is finished
  };
  const show = (document: vscode.TextDocument | null) => {
    if (document === shown) return;
    shown = document;
    pictured = null;
    versionsBefore = lastVersion;
    highlight.clear();
    panel.title = document === null ? 'Ohmward' : `Ohmward: ${fileNameOf(document)}`;
    if (document !== null && state.document !== idOf(document)) {
      state.document = idOf(document);
      state.markerHz = null;
      changed.fire();
    }
    sendAll();
  };
  const setPinned = (pinned: boolean) => {
    if (state.pinned === pinned) return;
    state.pinned = pinned;
    changed.fire();
    sendAll();
  };

  const moveMarker = (document: vscode.TextDocument, request: number, frequencyHz: number | { refusal: string }) => {
    const study = studies.latest(document);
    const answer = (marker: ReturnType<typeof markerView>, refusal: string | null) =>
      send({ type: 'marker', document: idOf(document), version: versionOf(study?.version ?? document.version), request, marker, refusal });
    if (typeof frequencyHz !== 'number') {
      answer(null, frequencyHz.refusal);
    } else {
      const problem = study && shownProblem(study.assessment.model.problem, solvedFor(study));
      const marker = problem && markerView(problem, frequencyHz);
      const before = state.markerHz ?? (problem && defaultMarkerHz(problem));
      if (marker) {
        state.markerHz = frequencyHz;
        changed.fire();
      }
      answer(marker, marker ? null : 'Nothing is known at this frequency.');
      // Another channel has other codes: everything that is drawn follows.
      const channelsHz = marker && problem?.channelsHz;
      if (study && channelsHz && (before === null || nearestChannel(before, channelsHz) !== nearestChannel(frequencyHz, channelsHz))) sendStudy(study);
    }
  };

  const handle = async (message: ToHost): Promise<void> => {
    if (message.type === 'ready') {
      pictured = null;
      sendAll();
      return;
    }
    if (message.type === 'failure') {
      log.failure('the panel’s page', new Error(message.message));
      return;
    }
    const document = shown;
    if (document === null || message.document !== idOf(document) || document.isClosed) return;
    switch (message.type) {
      case 'move marker':
        moveMarker(document, message.request, message.frequencyHz);
        break;
      case 'type marker':
        moveMarker(document, message.request, readMarkerText(message.text));
        break;
      case 'reveal line':
        await revealLine(document, message.line);
        break;
      case 'point at element': {
        const study = studies.latest(document);
        if (study) highlight.show(study, message.elementId);
        break;
      }
      case 'step value':
        await edits.apply(document, (assessment) => steppedValue(assessment, message.elementId, message.direction));
        break;
      case 'set value':
        await edits.apply(document, (assessment) => setValue(assessment, message.elementId, message.text));
        break;
      case 'preview candidate': {
        const solved = solver.latest(document);
        const study = studies.latest(document);
        const solution = solved && study && solved.study.version === study.version ? listedSolutions(solved.result)[message.candidate] : undefined;
        const traces = solution && study?.assessment.model.problem && isQuick(study.assessment.model.problem) ? (solvedAssessment(study.assessment, solution).evaluation?.traces ?? []).map(traceView) : null;
        send({ type: 'preview', document: idOf(document), version: versionOf(study?.version ?? document.version), request: message.request, traces });
        break;
      }
      case 'insert candidate':
        // What the person saw must be what is meant.
        if (message.version !== versionOf(document.version)) break;
        await insertSolved(document, solver, message.candidate);
        break;
      case 'write firmware':
        if (message.version === versionOf(document.version)) await vscode.commands.executeCommand('ohmward.writeFirmware', document.uri);
        break;
      case 'save report':
        await reports.save(document, null);
        break;
      case 'copy':
        await copyText(message.text);
        break;
      case 'save':
        await savePicture(document, message);
        break;
      case 'pin':
        setPinned(message.pinned);
        break;
    }
  };

  const dist = vscode.Uri.joinPath(services.extensionUri, 'dist');
  panel.webview.options = { enableScripts: true, localResourceRoots: [dist] };
  const icon = (theme: string) => vscode.Uri.joinPath(services.extensionUri, 'media', 'icons', `panel-${theme}.svg`);
  panel.iconPath = { light: icon('light'), dark: icon('dark') };
  const subscriptions = vscode.Disposable.from(
    changed,
    panel.webview.onDidReceiveMessage((raw: unknown) => {
      const message = decodeToHost(raw);
      if (message === null) {
        log.failure('the panel’s page', new Error('a message that is none was dropped'));
        return;
      }
      handle(message).catch((error: unknown) => log.failure(`the panel: ${message.type}`, error));
    }),
    studies.onDidFinish((study) => {
      if (study.document !== shown) return;
      clearTimeout(solvingTimer);
      // Mostly the answer is there before one could read that it is being worked out.
      if (solver.isSolving(study.document) && pictured === idOf(study.document)) solvingTimer = setTimeout(() => sendSolving(study), PROGRESS_AFTER_MS);
      else sendStudy(study);
    }),
    solver.onDidSolve((document) => {
      const study = document === shown ? studies.latest(document) : null;
      if (!study || solver.isSolving(document)) return;
      clearTimeout(solvingTimer);
      sendStudy(study);
    }),
    solver.onDidProgress(({ document, version, share, bestMarginDb }) => {
      if (document !== shown || studies.latest(document)?.version !== version) return;
      send({ type: 'solving', document: idOf(document), version: versionOf(version), share, text: progressText({ share, bestMarginDb }) });
    }),
    ...[spreads.onDidChange, coverages.onDidChange, firmware.onDidChange].map((more) => more((document) => {
      const study = document === shown ? studies.latest(document) : null;
      if (study && study.version === document.version) sendStudy(study);
    })),
    studies.onDidFail(({ document, message }) => {
      if (document === shown) send({ type: 'stale', document: idOf(document), version: versionOf(document.version), reason: message, problems: [] });
    }),
    vscode.workspace.onDidChangeTextDocument(({ document, contentChanges }) => {
      if (document !== shown || contentChanges.length === 0) return;
      clearTimeout(staleTimer);
      staleTimer = setTimeout(() => send({ type: 'stale', document: idOf(document), version: versionOf(document.version), reason: null, problems: [] }), STALE_AFTER_MS);
    }),
  );
  panel.onDidDispose(() => {
    clearTimeout(staleTimer);
    clearTimeout(solvingTimer);
    highlight.clear();
    subscriptions.dispose();
  });
  panel.webview.html = pageHtml({
    cspSource: panel.webview.cspSource,
    nonce: freshNonce(),
    scriptUri: panel.webview.asWebviewUri(vscode.Uri.joinPath(dist, 'webview.js')).toString(),
    styleUri: panel.webview.asWebviewUri(vscode.Uri.joinPath(dist, 'webview.css')).toString(),
  });

  return {
    panel, state, show, setPinned,
    cursorAt(document, offset) {
      const study = studies.latest(document);
      if (document !== shown || study?.version !== document.version) return;
      const { elementId, goalId } = elementAt(study.assessment, offset);
      send({ type: 'cursor', document: idOf(document), version: versionOf(study.version), elementId, goalId });
    },
    onDidChangeState: changed.event,
  };
}
