import * as vscode from 'vscode';
import { progressText } from '../assistance/candidates';
import { buildModel } from '../description/buildModel';
import { startWorker, type WorkerHandle } from '../platform/startWorker';
import type { SolveResult } from '../solve/solution';
import { isSettled } from '../study/obstacles';
import type { Problem } from '../study/problem';
import type { SolveAnswer, SolveJob } from '../worker/solveJob';
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

interface Job {
  readonly id: number;
  readonly study: Study;
  readonly problem: Problem;
  /** False for one that was asked for by hand: its answer is not what the text says. */
  readonly follows: boolean;
  readonly done: (solved: Solved | null) => void;
}

export function createDocumentSolver(extensionUri: vscode.Uri, studies: DocumentStudies, log: Log): DocumentSolver {
  const answers = new Map<vscode.TextDocument, Solved>();
  const waiting = new Map<vscode.TextDocument, Job[]>();
  const solvedEvent = new vscode.EventEmitter<vscode.TextDocument>();
  const progressEvent = new vscode.EventEmitter<SolvingProgress>();
  let script: Promise<string> | null = null;
  let worker: WorkerHandle | null = null;
  let running: Job | null = null;
  let nextId = 1;
  let told = false;
  let graceTimer: ReturnType<typeof setTimeout> | undefined;
  let hangTimer: ReturnType<typeof setTimeout> | undefined;
  let progressTimer: ReturnType<typeof setTimeout> | undefined;
  let report: ((share: number, bestMarginDb: number | null) => void) | null = null;
  let endProgress: (() => void) | null = null;
  let disposed = false;

  const readScript = () => (script ??= Promise.resolve(vscode.workspace.fs.readFile(vscode.Uri.joinPath(extensionUri, 'dist', 'solver.js'))).then((bytes) => new TextDecoder().decode(bytes)));

  const settle = (solved: Solved | null) => {
    clearTimeout(graceTimer);
    clearTimeout(hangTimer);
    clearTimeout(progressTimer);
    endProgress?.();
    endProgress = report = null;
    const job = running;
    running = null;
    if (job) {
      if (job.follows && solved) answers.set(job.study.document, solved);
      job.done(solved);
      if (job.follows) solvedEvent.fire(job.study.document);
    }
    void next();
  };
  const endWorker = () => {
    worker?.end();
    worker = null;
  };
  /** A worker that dies or hangs is ended, the person told once, and the next job gets a new one. */
  const fail = (reason: string) => {
    log.failure('the solver', new Error(reason));
    endWorker();
    if (!told) void vscode.window.showWarningMessage('The solver stopped and was started anew; the log says why.');
    told = true;
    settle(null);
  };
  const watch = () => {
    clearTimeout(hangTimer);
    hangTimer = setTimeout(() => fail('it gave no sign for a long time'), HANGING_AFTER_MS);
  };
  const hear = (raw: unknown) => {
    const answer = raw as SolveAnswer;
    if (running === null || answer.id !== running.id) return;
    watch();
    switch (answer.type) {
      case 'progress': report?.(answer.share, answer.bestMarginDb); break;
      case 'failure': fail(answer.message); break;
      case 'result': settle({ study: running.study, problem: running.problem, result: answer.result }); break;
    }
  };
  const showProgress = () => {
    const ended = new Promise<void>((end) => { endProgress = end; });
    void vscode.window.withProgress({ location: vscode.ProgressLocation.Window, title: 'Solving' }, (progress) => {
      report = (share, bestMarginDb) => {
        progress.report({ message: progressText({ share, bestMarginDb }) });
        if (running?.follows) progressEvent.fire({ document: running.study.document, version: running.study.version, share, bestMarginDb });
      };
      return ended;
    });
  };

  const next = async (): Promise<void> => {
    if (running !== null || disposed) return;
    const [document, jobs] = waiting.entries().next().value ?? [];
    if (!document || !jobs) return;
    const job = jobs.shift()!;
    if (jobs.length === 0) waiting.delete(document);
    running = job;
    try {
      const text = await readScript();
      if (running !== job || disposed) return;
      worker ??= startWorker(text, { message: hear, died: fail });
      watch();
      progressTimer = setTimeout(showProgress, PROGRESS_AFTER_MS);
      worker.post({ id: job.id, problem: job.problem, top: CANDIDATES } satisfies SolveJob);
    } catch (error) {
      fail(error instanceof Error ? error.message : String(error));
    }
  };

  /** A newer version of a document takes the place of what waits for it; what runs for it gets a moment to finish. */
  const supersede = (document: vscode.TextDocument) => {
    for (const job of waiting.get(document) ?? []) job.done(null);
    waiting.delete(document);
    if (running?.study.document !== document) return;
    clearTimeout(graceTimer);
    const stale = running;
    graceTimer = setTimeout(() => {
      if (running !== stale) return;
      endWorker();
      settle(null);
    }, SUPERSEDED_GRACE_MS);
  };
  const ask = (study: Study, problem: Problem, follows: boolean): Promise<Solved | null> => new Promise((done) => {
    const jobs = waiting.get(study.document) ?? [];
    jobs.push({ id: nextId++, study, problem, follows, done });
    waiting.set(study.document, jobs);
    void next();
  });

  const solvable = ({ assessment }: Study, problem: Problem | null): problem is Problem =>
    problem !== null && !isSettled(problem) && !assessment.diagnostics.some(({ severity }) => severity === 'error');
  const follow = (study: Study) => {
    supersede(study.document);
    const { problem } = study.assessment.model;
    if (solvable(study, problem)) {
      void ask(study, problem, true);
    } else if (answers.delete(study.document)) {
      solvedEvent.fire(study.document);
    }
  };

  const subscriptions = vscode.Disposable.from(
    solvedEvent,
    progressEvent,
    studies.onDidFinish(follow),
    studies.onDidClose((document) => {
      supersede(document);
      answers.delete(document);
    }),
  );
  return {
    latest: (document) => answers.get(document) ?? null,
    isSolving: (document) => running?.study.document === document || waiting.has(document),
    async current(document) {
      for (;;) {
        const study = await studies.current(document);
        if (study === null) return null;
        const known = answers.get(document);
        if (known?.study.version === study.version) return known;
        if (running?.study.document !== document && !waiting.has(document)) return null;
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
      return solvable(study, problem) ? ask(study, problem, false) : null;
    },
    onDidSolve: solvedEvent.event,
    onDidProgress: progressEvent.event,
    dispose() {
      disposed = true;
      subscriptions.dispose();
      for (const timer of [graceTimer, hangTimer, progressTimer]) clearTimeout(timer);
      endProgress?.();
      endWorker();
    },
  };
}
