import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import type { Assessment } from '../assistance/assess';
import type { AssessAnswer, AssessJob } from '../worker/assessJob';

/**
 * Assesses many descriptions on all cores, in the order of the jobs. `prepare` reads the files of one description just
 * before its turn, so that no more of them are held than there are workers. A worker that dies fails the call.
 */
export async function assessInWorkers(path: string, count: number, prepare: (index: number) => Omit<AssessJob, 'id'>): Promise<Assessment[]> {
  const assessments = new Array<Assessment>(count);
  let next = 0;
  const serve = (worker: Worker) => new Promise<void>((done, fail) => {
    const give = () => {
      if (next >= count) {
        done();
        return;
      }
      const id = next++;
      worker.postMessage({ id, ...prepare(id) } satisfies AssessJob);
    };
    worker.on('message', (answer: AssessAnswer) => {
      if ('failure' in answer) {
        fail(new Error(answer.failure));
        return;
      }
      assessments[answer.id] = answer.assessment;
      try {
        give();
      } catch (error) {
        fail(error as Error);
      }
    });
    worker.on('error', fail);
    worker.on('exit', (code) => fail(new Error(`a worker ended with ${code}`)));
    give();
  });
  const workers = Array.from({ length: Math.min(availableParallelism(), count) }, () => new Worker(path));
  try {
    await Promise.all(workers.map(serve));
  } finally {
    await Promise.all(workers.map((worker) => worker.terminate()));
  }
  return assessments;
}
