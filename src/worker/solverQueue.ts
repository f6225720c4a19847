import type { WorkerHandle, WorkerListeners } from '../platform/startWorker';
import type { SolveResult } from '../solve/solution';
import type { Problem } from '../study/problem';
import type { SolveAnswer, SolveJob } from './solveJob';

/** What is asked of the solver. Either `done` is called once, or `dropped`. */
export interface SolverRequest {
  readonly problem: Problem;
  /** Solutions that are wanted. */
  readonly top: number;
  /** Its turn has come. */
  readonly started: () => void;
  /** `share`: 0 … 1. `bestMarginDb`: null where nothing has been found yet. */
  readonly progress: (share: number, bestMarginDb: number | null) => void;
  /** Null where it was cut short: superseded, or the worker died or hung. */
  readonly done: (result: SolveResult | null) => void;
  /** A newer one took its place before its turn came. */
  readonly dropped: () => void;
}

/** One worker that solves one problem after another. `Key`: whose problem it is; a newer one of the same owner supersedes the older. */
export interface SolverQueue<Key> {
  ask(key: Key, request: SolverRequest): void;
  /** Drops what waits for an owner, and gives what runs for it a moment to finish. True where something waiting was dropped. */
  supersede(key: Key): boolean;
  /** True where something of this owner waits or runs. */
  isBusy(key: Key): boolean;
  dispose(): void;
}

export interface SolverQueueOptions {
  readonly start: (listeners: WorkerListeners) => Promise<WorkerHandle>;
  /** The worker died, hung or could not start; the next request gets a new one. */
  readonly failed: (reason: string) => void;
  /** What runs for an older text gets so long to finish, however often it is superseded. */
  readonly graceMs: number;
  /** A worker that gives no sign for so long is taken for dead. */
  readonly hangingMs: number;
}

interface Job<Key> {
  readonly id: number;
  readonly key: Key;
  readonly request: SolverRequest;
}

export function createSolverQueue<Key>({ start, failed, graceMs, hangingMs }: SolverQueueOptions): SolverQueue<Key> {
  let waiting: Job<Key>[] = [];
  let running: Job<Key> | null = null;
  let worker: WorkerHandle | null = null;
  let nextId = 1;
  let disposed = false;
  let graceTimer: ReturnType<typeof setTimeout> | undefined;
  let hangTimer: ReturnType<typeof setTimeout> | undefined;

  const endWorker = () => {
    worker?.end();
    worker = null;
  };
  const settle = (result: SolveResult | null) => {
    clearTimeout(graceTimer);
    clearTimeout(hangTimer);
    graceTimer = undefined;
    const job = running;
    running = null;
    job?.request.done(result);
    void next();
  };
  const fail = (reason: string) => {
    endWorker();
    failed(reason);
    settle(null);
  };
  const watch = () => {
    clearTimeout(hangTimer);
    hangTimer = setTimeout(() => fail('it gave no sign for a long time'), hangingMs);
  };
  const hear = (raw: unknown) => {
    const answer = raw as SolveAnswer;
    if (running === null || answer.id !== running.id) return;
    watch();
    switch (answer.type) {
      case 'progress': running.request.progress(answer.share, answer.bestMarginDb); break;
      case 'failure': fail(answer.message); break;
      case 'result': settle(answer.result); break;
    }
  };
  const next = async (): Promise<void> => {
    if (running !== null || disposed) return;
    const job = waiting.shift();
    if (!job) return;
    running = job;
    try {
      const ready = worker ?? await start({ message: hear, died: fail });
      // While it started, the job may have run out of its time, and another have started a worker.
      if (running !== job || disposed) {
        if (ready !== worker) ready.end();
        return;
      }
      worker = ready;
      watch();
      job.request.started();
      worker.post({ id: job.id, problem: job.request.problem, top: job.request.top } satisfies SolveJob);
    } catch (error) {
      const reason = error instanceof Error ? error.message : String(error);
      if (running === job) fail(reason);
      else if (!disposed) failed(reason);
    }
  };

  return {
    ask(key, request) {
      waiting.push({ id: nextId++, key, request });
      void next();
    },
    supersede(key) {
      const dropped = waiting.filter((job) => job.key === key);
      waiting = waiting.filter((job) => job.key !== key);
      for (const { request } of dropped) request.dropped();
      if (running?.key === key && graceTimer === undefined) {
        graceTimer = setTimeout(() => {
          endWorker();
          settle(null);
        }, graceMs);
      }
      return dropped.length > 0;
    },
    isBusy: (key) => running?.key === key || waiting.some((job) => job.key === key),
    dispose() {
      disposed = true;
      endWorker();
      settle(null);
      for (const { request } of waiting.splice(0)) request.dropped();
    },
  };
}
