type WorkerThreads = typeof import('node:worker_threads');

/** The module where there is Node; null elsewhere. No static import, so that one bundle serves hosts with and without Node. */
export function workerThreads(): WorkerThreads | null {
  if (typeof process === 'undefined' || typeof process.getBuiltinModule !== 'function') return null;
  return process.getBuiltinModule('node:worker_threads') ?? null;
}
