import * as vscode from 'vscode';
import { progressText } from '../assistance/candidates';
import { buildModel } from '../description/buildModel';
import { startWorker } from '../platform/startWorker';
import type { SolveResult } from '../solve/solution';
import { isSettled } from '../study/obstacles';
import type { Problem } from '../study/problem';
import type { SolveJob } from '../worker/solveJob';
import { createWorkQueue } from '../worker/workQueue';
import type { DocumentStudies, Study } from './documentStudies';
import { CANDIDATES, HANGING_AFTER_MS, PROGRESS_AFTER_MS, SUPERSEDED_GRACE_MS } from './limits';
import type { Log } from './log';

/** What the unknowns of one version of a document came out as. */
export interface Solved {
  readonly study: Study;
  /** The problem that was solved: with `reopen` other values than those left to solve were unknown too. */
  readonly problem: Problem;
  readonly result: SolveResult;
}

/** Solves every open description that leaves something unknown, off the extension host's thread; the latest version wins. */
export interface DocumentSolver extends vscode.Disposable {
  /** The last answer, perhaps to an older version; null where the document has nothing to solve. */
  latest(document: vscode.TextDocument): Solved | null;
  /** That of the version which the document has now; null where there is none. */
  current(document: vscode.TextDocument): Promise<Solved | null>;
  /** Reconsiders every value that says `from` and is not `fixed`. Null where the text changed meanwhile or nothing can be solved. */
  solveAgain(document: vscode.TextDocument): Promise<Solved | null>;
  isSolving(document: vscode.TextDocument): boolean;
  /** Nothing is being solved for the document any more, with an answer or without. */
  readonly onDidSolve: vscode.Event<vscode.TextDocument>;
  /** Only of what the text asks for, and only where it takes long. */
  readonly onDidProgress: vscode.Event<SolvingProgress>;
}

export interface SolvingProgress {
  readonly document: vscode.TextDocument;
  readonly version: number;
  /** 0 … 1. */
  readonly share: number;
  /** The best margin so far in dB; null where nothing has been found yet. */
  readonly bestMarginDb: number | null;
}

interface Listeners {
  readonly progress: (share: number, bestMarginDb: number | null) => void;
  readonly done: (result: SolveResult | null) => void;
  readonly dropped: () => void;
}

export function createDocumentSolver(extensionUri: vscode.Uri, studies: DocumentStudies, log: Log): DocumentSolver {
  const answers = new Map<vscode.TextDocument, Solved>();
  /** Documents whose text leaves something to solve; an answer for another comes too late. */
  const followed = new Set<vscode.TextDocument>();
  const solvedEvent = new vscode.EventEmitter<vscode.TextDocument>();
  const progressEvent = new vscode.EventEmitter<SolvingProgress>();
  let script: Promise<string> | null = null;
  let told = false;

  const readScript = () => (script ??= Promise.resolve(vscode.workspace.fs.readFile(vscode.Uri.joinPath(extensionUri, 'dist', 'solver.js'))).then((bytes) => new TextDecoder().decode(bytes)));
  const queue = createWorkQueue<vscode.TextDocument, Omit<SolveJob, 'id'>, SolveResult>({
    start: async (listeners) => startWorker(await readScript(), listeners),
    failed(reason) {
      log.failure('the solver', new Error(reason));
      if (!told) void vscode.window.showWarningMessage('The solver stopped and was started anew; the log says why.');
      told = true;
    },
    graceMs: SUPERSEDED_GRACE_MS,
    hangingMs: HANGING_AFTER_MS,
  });

  /** Asks the queue, and shows in the window that it goes on where that takes long. */
  const ask = (document: vscode.TextDocument, problem: Problem, { progress, done, dropped }: Listeners) => {
    let report: Listeners['progress'] | null = null;
    let endProgress: (() => void) | null = null;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const showProgress = () => {
      const ended = new Promise<void>((end) => { endProgress = end; });
      void vscode.window.withProgress({ location: vscode.ProgressLocation.Window, title: 'Solving' }, (shown) => {
        report = (share, bestMarginDb) => {
          shown.report({ message: progressText({ share, bestMarginDb }) });
          progress(share, bestMarginDb);
        };
        return ended;
      });
    };
    queue.ask(document, {
      job: { problem, top: CANDIDATES },
      started: () => { timer = setTimeout(showProgress, PROGRESS_AFTER_MS); },
      progress: (share, bestMarginDb) => report?.(share, bestMarginDb),
      done(result) {
        clearTimeout(timer);
        endProgress?.();
        done(result);
        // Also for what was asked for by hand: until now the document counted as being solved.
        solvedEvent.fire(document);
      },
      dropped,
    });
  };

  const solvable = ({ assessment }: Study, problem: Problem | null): problem is Problem =>
    problem !== null && !isSettled(problem) && !assessment.diagnostics.some(({ severity }) => severity === 'error');
  /** `dropped`: somebody may wait for an answer that will not come. */
  const forget = (document: vscode.TextDocument, dropped: boolean) => {
    followed.delete(document);
    if (answers.delete(document) || dropped) solvedEvent.fire(document);
  };
  const follow = (study: Study) => {
    const { document, version } = study;
    const dropped = queue.supersede(document);
    const { problem } = study.assessment.model;
    if (!solvable(study, problem)) {
      forget(document, dropped);
      return;
    }
    followed.add(document);
    ask(document, problem, {
      progress: (share, bestMarginDb) => progressEvent.fire({ document, version, share, bestMarginDb }),
      done(result) {
        if (result && followed.has(document)) answers.set(document, { study, problem, result });
      },
      dropped: () => undefined, // what took its place speaks for it
    });
  };

  const subscriptions = vscode.Disposable.from(
    solvedEvent,
    progressEvent,
    studies.onDidFinish(follow),
    studies.onDidClose((document) => forget(document, queue.supersede(document))),
  );
  return {
    latest: (document) => answers.get(document) ?? null,
    isSolving: (document) => queue.isBusy(document),
    async current(document) {
      for (;;) {
        const study = await studies.current(document);
        if (study === null) return null;
        const known = answers.get(document);
        if (known?.study.version === study.version) return known;
        if (!queue.isBusy(document)) return null;
        await new Promise<void>((resolve) => {
          const listening = solvedEvent.event((solved) => {
            if (solved !== document) return;
            listening.dispose();
            resolve();
          });
        });
      }
    },
    async solveAgain(document) {
      const study = await studies.current(document);
      if (study === null) return null;
      const { problem } = buildModel(study.assessment.description, study.files, { reopen: true });
      if (!solvable(study, problem)) return null;
      return new Promise((answer) => ask(document, problem, {
        progress: () => undefined, // no text asks for it
        done: (result) => answer(result && { study, problem, result }),
        dropped: () => answer(null),
      }));
    },
    onDidSolve: solvedEvent.event,
    onDidProgress: progressEvent.event,
    dispose() {
      queue.dispose();
      subscriptions.dispose();
    },
  };
}
