import { servePort } from '../platform/workerPort';
import { answerCodesJob, type CodesJob } from './codesJob';
import { answerSolveJob, type SolveJob } from './solveJob';
import { answerSpreadJob, type SpreadJob } from './spreadJob';

// Entry of the workers' own bundle: the same for a thread of Node and for a worker of a browser. Solving goes on to its end, a
// spread of builds in pieces, between which a newer one is heard of.
let latest = -1;

servePort<SolveJob | SpreadJob | CodesJob>((job, send) => {
  if (!('type' in job)) {
    answerSolveJob(job, send);
    return;
  }
  if (job.type !== 'spread') {
    answerCodesJob(job, send);
    return;
  }
  latest = job.id;
  answerSpreadJob(job, send, () => latest === job.id, (next) => setTimeout(next, 0));
});
