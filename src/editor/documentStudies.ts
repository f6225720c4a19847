import * as vscode from 'vscode';
import { assessModel, filesNeeded, type Assessment } from '../assistance/assess';
import { latestRunner, type LatestRunner } from '../base/latestRunner';
import { buildModel } from '../description/buildModel';
import type { LoadedFile } from '../description/files';
import { readDescription } from '../description/readDescription';
import { tuningInPlacePoints } from '../study/limits';
import { codesObstacle } from '../study/tuning/bestCodes';
import { giveCodes, tuningPoints } from '../study/tuning/tuneChannels';
import { fileScope } from './fileAccess';
import type { FileStore } from './fileStore';
import { MAX_FILES, MAX_LOADING_ROUNDS, MAX_STUDY_DELAY_MS, SMOOTH_STUDY_MS } from './limits';
import type { Log } from './log';
import { isDescription } from './ranges';
import type { Tuner } from './tuner';

/** One version of one document, evaluated. */
export interface Study {
  readonly document: vscode.TextDocument;
  readonly version: number;
  readonly text: string;
  readonly assessment: Assessment;
  readonly files: ReadonlyMap<string, LoadedFile>;
}

/**
 * Keeps an evaluation of every open description: after a change of its text, of a file that it names, or of the workspace's
 * trust. The latest version wins; versions in between may be passed over. Nothing has to be asked for.
 */
export interface DocumentStudies extends vscode.Disposable {
  /** The last one that was finished, perhaps of an older version. */
  latest(document: vscode.TextDocument): Study | null;
  /** That of the version that the document has now; null where there is none, e.g. since it changed meanwhile. */
  current(document: vscode.TextDocument): Promise<Study | null>;
  readonly onDidFinish: vscode.Event<Study>;
  /** The evaluation itself broke; the document's numbers stay as they were. */
  readonly onDidFail: vscode.Event<{ readonly document: vscode.TextDocument; readonly message: string }>;
  readonly onDidClose: vscode.Event<vscode.TextDocument>;
}

interface State {
  readonly runner: LatestRunner;
  study: Study | null;
  tookMs: number;
}

export function createDocumentStudies(store: FileStore, tuner: Tuner, log: Log): DocumentStudies {
  const states = new Map<vscode.TextDocument, State>();
  const finished = new vscode.EventEmitter<Study>();
  const failed = new vscode.EventEmitter<{ document: vscode.TextDocument; message: string }>();
  const closed = new vscode.EventEmitter<vscode.TextDocument>();

  /** Null where a newer version came meanwhile. */
  const study = async (document: vscode.TextDocument, state: State, superseded: () => boolean): Promise<Study | null> => {
    const { version } = document;
    const text = document.getText();
    const scope = fileScope(document);
    const start = performance.now();
    const description = readDescription(text, { expressions: scope.trusted });
    let tookMs = performance.now() - start;
    const files = new Map<string, LoadedFile>();
    for (let round = 0; round < MAX_LOADING_ROUNDS; round++) {
      const needed = filesNeeded(description, files).filter((reference) => !files.has(reference.path));
      if (needed.length === 0 || files.size >= MAX_FILES) break;
      const known = needed.map((reference) => store.peek(scope, reference));
      // Not even a microtask is lost where everything is known, as it is while one types.
      const loaded = known.every((file) => file !== undefined) ? known : await Promise.all(needed.map((reference) => store.load(scope, reference)));
      if (superseded()) return null;
      needed.forEach((reference, i) => files.set(reference.path, loaded[i] as LoadedFile));
    }
    let evaluating = performance.now();
    const model = buildModel(description, files);
    tookMs += performance.now() - evaluating;
    if (model.problem && tuningPoints(model.problem) > tuningInPlacePoints && codesObstacle(model.problem) === null) {
      const codes = await tuner.codes(document, model.problem);
      if (superseded()) return null;
      if (codes === null) throw new Error('the search for codes was stopped');
      giveCodes(model.problem, codes);
    }
    evaluating = performance.now();
    const assessment = assessModel(description, model);
    tookMs += performance.now() - evaluating;
    state.tookMs = tookMs;
    return { document, version, text, assessment, files };
  };

  const open = (document: vscode.TextDocument) => {
    if (!isDescription(document) || document.isClosed || states.has(document)) return;
    const later = (start: () => void) => {
      const wait = state.tookMs > SMOOTH_STUDY_MS ? Math.min(state.tookMs, MAX_STUDY_DELAY_MS) : 0;
      setTimeout(start, wait);
    };
    const run = async (superseded: () => boolean) => {
      const done = await study(document, state, superseded);
      if (done === null || superseded() || states.get(document) !== state || document.version !== done.version) return;
      state.study = done;
      finished.fire(done);
    };
    const onFailure = (error: unknown) => {
      log.failure(`evaluating ${document.uri.toString()}`, error);
      failed.fire({ document, message: 'The evaluation failed; the log says where. Please report it.' });
    };
    const state: State = { runner: latestRunner(run, onFailure, later), study: null, tookMs: 0 };
    states.set(document, state);
    state.runner.request();
  };
  const close = (document: vscode.TextDocument) => {
    const state = states.get(document);
    if (!state) return;
    state.runner.dispose();
    states.delete(document);
    tuner.supersede(document);
    if (states.size === 0) store.forget();
    closed.fire(document);
  };
  const requestAll = () => {
    for (const [document, state] of states) {
      tuner.supersede(document);
      state.runner.request();
    }
  };

  const subscriptions = vscode.Disposable.from(
    // A change of language arrives as a close and an open.
    vscode.workspace.onDidOpenTextDocument(open),
    vscode.workspace.onDidCloseTextDocument(close),
    vscode.workspace.onDidChangeTextDocument(({ document, contentChanges }) => {
      if (contentChanges.length === 0) return;
      tuner.supersede(document);
      states.get(document)?.runner.request();
    }),
    vscode.workspace.onDidSaveTextDocument(() => void store.revalidate()),
    vscode.window.onDidChangeWindowState(({ focused }) => {
      if (focused) void store.revalidate();
    }),
    vscode.workspace.onDidGrantWorkspaceTrust(requestAll),
    vscode.workspace.onDidChangeWorkspaceFolders(requestAll),
    store.onDidChange(requestAll),
    finished, failed, closed,
  );
  for (const document of vscode.workspace.textDocuments) open(document);

  return {
    latest: (document) => states.get(document)?.study ?? null,
    async current(document) {
      open(document);
      const state = states.get(document);
      if (!state) return null;
      if (state.study?.version !== document.version) await state.runner.whenIdle();
      return state.study?.version === document.version ? state.study : null;
    },
    onDidFinish: finished.event,
    onDidFail: failed.event,
    onDidClose: closed.event,
    dispose() {
      subscriptions.dispose();
      for (const state of states.values()) state.runner.dispose();
      states.clear();
    },
  };
}
