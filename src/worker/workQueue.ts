import type { WorkerHandle, WorkerListeners } from '../platform/startWorker';
/** What a worker says of a job: it ends with a result or a failure. */
export type WorkAnswer<Result> =
  | { readonly id: number; readonly type: 'progress'; readonly share: number; readonly bestMarginDb: number | null }
  | { readonly id: number; readonly type: 'result'; readonly result: Result }
  | { readonly id: number; readonly type: 'failure'; readonly message: string };

/** What is asked of a worker. Either `done` is called once, or `dropped`. */
export interface WorkRequest<Job, Result> {
  /** Posted to the worker with an `id` in it. */
  readonly job: Job;
  /** Its turn has come. */
  readonly started: () => void;
  /** `share`: 0 … 1. `bestMarginDb`: null where nothing has been found yet. */
  readonly progress: (share: number, bestMarginDb: number | null) => void;
  /** Null where it was cut short: superseded, or the worker died or hung. */
  readonly done: (result: Result | null) => void;
  /** A newer one took its place before its turn came. */
  readonly dropped: () => void;
}

/** One worker that does one job after another. `Key`: whose job it is; a newer one of the same owner supersedes the older. */
export interface WorkQueue<Key, Job, Result> {
  ask(key: Key, request: WorkRequest<Job, Result>): void;
  /** Drops what waits for an owner, and gives what runs for it a moment to finish. True where something waiting was dropped. */
  supersede(key: Key): boolean;
  /** True where something of this owner waits or runs. */
  isBusy(key: Key): boolean;
  dispose(): void;
}

export interface WorkQueueOptions {
  readonly start: (listeners: WorkerListeners) => Promise<WorkerHandle>;
  /** The worker died, hung or could not start; the next request gets a new one. */
  readonly failed: (reason: string) => void;
  /** What runs for an older text gets so long to finish, however often it is superseded. */
  readonly graceMs: number;
  /** A worker that gives no sign for so long is taken for dead. */
  readonly hangingMs: number;
}

interface Waiting<Key, Job, Result> {
  readonly id: number;
  readonly key: Key;
  readonly request: WorkRequest<Job, Result>;
}

export function createWorkQueue<Key, Job extends object, Result>({ start, failed, graceMs, hangingMs }: WorkQueueOptions): WorkQueue<Key, Job, Result> {
  let waiting: Waiting<Key, Job, Result>[] = [];
  let running: Waiting<Key, Job, Result> | null = null;
  let worker: WorkerHandle | null = null;
  let nextId = 1;
  let disposed = false;
  let graceTimer: ReturnType<typeof setTimeout> | undefined;
  let hangTimer: ReturnType<typeof setTimeout> | undefined;

  const endWorker = () => {
    worker?.end();
    worker = null;
  };
  const settle = (result: Result | null) => {
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
    const answer = raw as WorkAnswer<Result>;
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
      worker.post({ ...job.request.job, id: job.id });
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
