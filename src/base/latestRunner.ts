/** One thing to keep up to date, however often it is asked for. */
export interface LatestRunner {
  /** Asks for a run that starts after this call. Asking again before it starts changes nothing. */
  request(): void;
  /** Resolves when nothing runs and nothing is asked for. */
  whenIdle(): Promise<void>;
  /** No run starts any more; one that runs sees itself superseded. */
  dispose(): void;
}

/**
 * Runs `task` one at a time. Requests that come while it waits to start are one; requests that come while it runs make it
 * superseded and lead to exactly one more run. `task` gets a test for that and should stop early. Its failure goes to
 * `onFailure` and does not keep later runs from happening. `later` puts the start off, to let a burst of requests gather.
 */
export function latestRunner(
  task: (superseded: () => boolean) => void | Promise<void>,
  onFailure: (error: unknown) => void,
  later: (start: () => void) => void,
): LatestRunner {
  let scheduled = false;
  let running = false;
  let disposed = false;
  let asked = 0;
  let waiting: (() => void)[] = [];

  const settle = () => {
    if (scheduled || running) return;
    const resolved = waiting;
    waiting = [];
    for (const resolve of resolved) resolve();
  };
  const start = async () => {
    scheduled = false;
    if (disposed) {
      settle();
      return;
    }
    running = true;
    const mine = asked;
    try {
      await task(() => disposed || asked !== mine);
    } catch (error) {
      onFailure(error);
    }
    running = false;
    if (asked !== mine && !disposed) schedule();
    settle();
  };
  const schedule = () => {
    scheduled = true;
    later(() => void start());
  };

  return {
    request() {
      if (disposed) return;
      asked++;
      if (!scheduled && !running) schedule();
    },
    whenIdle: () => new Promise((resolve) => (scheduled || running ? waiting.push(resolve) : resolve())),
    dispose() {
      disposed = true;
      if (!running) {
        scheduled = false;
        settle();
      }
    },
  };
}
