import { workerThreads } from './nodeModules';

/** What a worker of a browser has for a global; the names that are needed here. */
interface WorkerScope {
  postMessage(message: unknown): void;
  onmessage: ((event: { readonly data: unknown }) => void) | null;
}

/** Inside a worker: hands every message to `answer`, which sends what it likes. */
export function servePort<Job>(answer: (job: Job, send: (message: unknown) => void) => void): void {
  const port = workerThreads()?.parentPort;
  if (port) {
    port.on('message', (job: Job) => answer(job, (message) => port.postMessage(message)));
    return;
  }
  const scope = globalThis as unknown as WorkerScope;
  scope.onmessage = ({ data }) => answer(data as Job, (message) => scope.postMessage(message));
}
