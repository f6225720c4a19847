import { workerThreads } from './nodeModules';

/** A worker, whatever it runs on. */
export interface WorkerHandle {
  post(message: unknown): void;
  /** For good; nothing arrives any more. */
  end(): void;
}

export interface WorkerListeners {
  readonly message: (message: unknown) => void;
  /** It ended by itself or could not start. */
  readonly died: (reason: string) => void;
}

/** Names of browsers' workers, which the types of the extension host do not have. */
interface BrowserWorker {
  postMessage(message: unknown): void;
  terminate(): void;
  onmessage: ((event: { readonly data: unknown }) => void) | null;
  onerror: ((event: { readonly message?: string }) => void) | null;
}
interface BrowserHost {
  readonly Worker?: new (url: string) => BrowserWorker;
  readonly Blob: new (parts: string[], options: { type: string }) => unknown;
  readonly URL: { createObjectURL(blob: unknown): string; revokeObjectURL(url: string): void };
}

/**
 * Starts a script as a worker: as a thread where there is Node, else as a worker of the browser, which gets the script's text
 * by an address of its own, since it may not read it from where the extension lies. Throws where neither is there.
 */
export function startWorker(script: string, { message, died }: WorkerListeners): WorkerHandle {
  const threads = workerThreads();
  if (threads) {
    const worker = new threads.Worker(script, { eval: true });
    let ended = false;
    const once = (reason: string) => {
      if (!ended) died(reason);
      ended = true;
    };
    worker.on('message', message);
    worker.on('error', (error: Error) => once(error.message));
    worker.on('exit', (code) => once(`it ended with ${code}`));
    worker.unref();
    return {
      post: (each) => worker.postMessage(each),
      end() {
        ended = true;
        worker.removeAllListeners('message');
        void worker.terminate();
      },
    };
  }
  const host = globalThis as unknown as BrowserHost;
  if (!host.Worker) throw new Error('this host has no workers');
  const url = host.URL.createObjectURL(new host.Blob([script], { type: 'text/javascript' }));
  const worker = new host.Worker(url);
  worker.onmessage = ({ data }) => message(data);
  worker.onerror = (event) => died(event.message ?? 'it could not be started');
  return {
    post: (each) => worker.postMessage(each),
    end() {
      worker.onmessage = null;
      worker.onerror = null;
      worker.terminate();
      host.URL.revokeObjectURL(url);
    },
  };
}
