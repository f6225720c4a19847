import * as vscode from 'vscode';
import { startWorker } from '../platform/startWorker';
import type { Problem } from '../study/problem';
import type { ChannelCodes } from '../study/tuning/bestCodes';
import type { Coverage } from '../study/tuning/coverage';
import type { CodesJob, CodesResult } from '../worker/codesJob';
import { createWorkQueue } from '../worker/workQueue';
import { HANGING_AFTER_MS, SUPERSEDED_GRACE_MS } from './limits';
import type { Log } from './log';

type Asked = Omit<Extract<CodesJob, { type: 'codes' }>, 'id'> | Omit<Extract<CodesJob, { type: 'coverage' }>, 'id'>;

/** Seeks codes and coverage off the extension host's thread. Answers are null where they were superseded, or the worker died or hung. */
export interface Tuner extends vscode.Disposable {
  codes(document: vscode.TextDocument, problem: Problem): Promise<readonly ChannelCodes[] | null>;
  /** A text where there is none: why. */
  coverage(document: vscode.TextDocument, problem: Problem, frequencyHz: number): Promise<Coverage | string | null>;
  /** What is sought for the document is out of date. */
  supersede(document: vscode.TextDocument): void;
}

export function createTuner(extensionUri: vscode.Uri, log: Log): Tuner {
  let script: Promise<string> | null = null;
  const readScript = () => (script ??= Promise.resolve(vscode.workspace.fs.readFile(vscode.Uri.joinPath(extensionUri, 'dist', 'solver.js'))).then((bytes) => new TextDecoder().decode(bytes)));
  const queue = createWorkQueue<vscode.TextDocument, Asked, CodesResult>({
    start: async (listeners) => startWorker(await readScript(), listeners),
    failed: (reason) => log.failure('the search for codes', new Error(reason)),
    graceMs: SUPERSEDED_GRACE_MS,
    hangingMs: HANGING_AFTER_MS,
  });
  const ask = (document: vscode.TextDocument, job: Asked) => new Promise<CodesResult | null>((answer) =>
    queue.ask(document, { job, started: () => undefined, progress: () => undefined, done: answer, dropped: () => answer(null) }));
  return {
    async codes(document, problem) {
      const result = await ask(document, { type: 'codes', problem });
      return result?.type === 'codes' ? result.channels : null;
    },
    async coverage(document, problem, frequencyHz) {
      const result = await ask(document, { type: 'coverage', problem, frequencyHz });
      return result?.type === 'coverage' ? result.coverage : null;
    },
    supersede: (document) => void queue.supersede(document),
    dispose: () => queue.dispose(),
  };
}
