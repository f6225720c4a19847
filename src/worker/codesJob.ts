import type { Problem } from '../study/problem';
import { bestCodes, type ChannelCodes } from '../study/tuning/bestCodes';
import { coverage, type Coverage } from '../study/tuning/coverage';
import type { WorkAnswer } from './workQueue';

/** The codes of every channel, or the loads that the channel nearest to a frequency can bring to the goals. */
export type CodesJob =
  | { readonly type: 'codes'; readonly id: number; readonly problem: Problem }
  | { readonly type: 'coverage'; readonly id: number; readonly problem: Problem; readonly frequencyHz: number };

export type CodesResult =
  | { readonly type: 'codes'; readonly channels: readonly ChannelCodes[] }
  /** A text where there is none: why. */
  | { readonly type: 'coverage'; readonly coverage: Coverage | string };

/** Between two signs of life. */
const betweenMs = 50;

/** A job is always answered, also when the work throws. Only for problems without a `codesObstacle`. */
export function answerCodesJob(job: CodesJob, send: (answer: WorkAnswer<CodesResult>) => void): void {
  const { id, problem } = job;
  let last = -Infinity;
  try {
    if (job.type === 'coverage') {
      send({ id, type: 'result', result: { type: 'coverage', coverage: coverage(problem, { frequencyHz: job.frequencyHz }) } });
      return;
    }
    const channels = bestCodes(problem, (share) => {
      const now = performance.now();
      if (now - last < betweenMs) return;
      last = now;
      send({ id, type: 'progress', share, bestMarginDb: null });
    });
    send({ id, type: 'result', result: { type: 'codes', channels } });
  } catch (error) {
    send({ id, type: 'failure', message: error instanceof Error ? (error.stack ?? error.message) : String(error) });
  }
}
