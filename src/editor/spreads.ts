import * as vscode from 'vscode';
import { withSpread, type Spread } from '../assistance/spreadAssessment';
import { startWorker, type WorkerHandle } from '../platform/startWorker';
import { spreadObstacle } from '../study/spread/spreadOfBuilds';
import type { CloudTrace } from '../study/spread/toleranceCloud';
import type { SpreadAnswer, SpreadJob } from '../worker/spreadJob';
import type { DocumentStudies, Study } from './documentStudies';
import { HANGING_AFTER_MS, SPREAD_DELAY_MS } from './limits';
import type { Log } from './log';

/** What builds with tolerances do, as far as that is known for one version of a document. */
export interface StudiedSpread {
  readonly study: Study;
  readonly spread: Spread;
  readonly cloud: readonly CloudTrace[];
  /** False while more builds are being made. */
  readonly done: boolean;
}

/** Studies the builds of each open description off the extension host's thread: a first estimate soon, then refined; typing ends it. */
export interface DocumentSpreads extends vscode.Disposable {
  latest(document: vscode.TextDocument): StudiedSpread | null;
  /** The study with its goals on yield judged, where all builds of that version have been made; else as it is. */
  complete(study: Study): Study;
  readonly onDidChange: vscode.Event<vscode.TextDocument>;
}

export function createDocumentSpreads(extensionUri: vscode.Uri, studies: DocumentStudies, log: Log): DocumentSpreads {
  const found = new Map<vscode.TextDocument, StudiedSpread>();
  const changed = new vscode.EventEmitter<vscode.TextDocument>();
  const waiting = new Map<vscode.TextDocument, ReturnType<typeof setTimeout>>();
  const queue: Study[] = [];
  let script: Promise<string> | null = null;
  let worker: WorkerHandle | null = null;
  let running: { readonly id: number; readonly study: Study } | null = null;
  let nextId = 1;
  let hangTimer: ReturnType<typeof setTimeout> | undefined;
  let disposed = false;

  const readScript = () => (script ??= Promise.resolve(vscode.workspace.fs.readFile(vscode.Uri.joinPath(extensionUri, 'dist', 'solver.js'))).then((bytes) => new TextDecoder().decode(bytes)));
  const fail = (reason: string) => {
    log.failure('the spread of builds', new Error(reason));
    worker?.end();
    worker = null;
    running = null;
    void next();
  };
  const watch = () => {
    clearTimeout(hangTimer);
    if (running) hangTimer = setTimeout(() => fail('it gave no sign for a long time'), HANGING_AFTER_MS);
  };
  const hear = (raw: unknown) => {
    const answer = raw as SpreadAnswer;
    if (running === null || answer.id !== running.id) return;
    if (answer.type === 'failure') {
      fail(answer.message);
      return;
    }
    const { study } = running;
    found.set(study.document, { study, spread: answer.spread, cloud: answer.cloud, done: answer.done });
    if (answer.done) running = null;
    watch();
    changed.fire(study.document);
    if (answer.done) void next();
  };
  const next = async (): Promise<void> => {
    if (running !== null || disposed) return;
    const study = queue.shift();
    const problem = study?.assessment.model.problem;
    if (!study || !problem) return;
    const job = { id: nextId++, study };
    running = job;
    try {
      const text = await readScript();
      if (running !== job || disposed) return;
      worker ??= startWorker(text, { message: hear, died: fail });
      watch();
      worker.post({ type: 'spread', id: job.id, problem } satisfies SpreadJob);
    } catch (error) {
      fail(error instanceof Error ? error.message : String(error));
    }
  };
  /** What is asked for a document is out of date: nothing of it is heard any more. */
  const drop = (document: vscode.TextDocument) => {
    clearTimeout(waiting.get(document));
    waiting.delete(document);
    const at = queue.findIndex((study) => study.document === document);
    if (at >= 0) queue.splice(at, 1);
    if (running?.study.document === document) running = null;
  };
  const follow = (study: Study) => {
    const { document, assessment } = study;
    drop(document);
    const { problem } = assessment.model;
    if (!problem || spreadObstacle(problem) !== null || assessment.diagnostics.some(({ severity }) => severity === 'error')) {
      if (found.delete(document)) changed.fire(document);
      return;
    }
    waiting.set(document, setTimeout(() => {
      waiting.delete(document);
      queue.push(study);
      void next();
    }, SPREAD_DELAY_MS));
  };

  const subscriptions = vscode.Disposable.from(
    changed,
    studies.onDidFinish(follow),
    studies.onDidClose((document) => {
      drop(document);
      found.delete(document);
    }),
  );
  return {
    latest: (document) => found.get(document) ?? null,
    complete(study) {
      const studied = found.get(study.document);
      return studied?.done && studied.study.version === study.version ? { ...study, assessment: withSpread(study.assessment, studied.spread) } : study;
    },
    onDidChange: changed.event,
    dispose() {
      disposed = true;
      subscriptions.dispose();
      for (const timer of waiting.values()) clearTimeout(timer);
      clearTimeout(hangTimer);
      worker?.end();
    },
  };
}
