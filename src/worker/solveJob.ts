import type { SolveResult } from '../solve/solution';
import { solveProblem } from '../solve/solveProblem';
import type { Problem } from '../study/problem';
import type { WorkAnswer } from './workQueue';

/** A problem to solve away from the main thread; both sides of it are plain data. */
export interface SolveJob {
  readonly id: number;
  readonly problem: Problem;
  readonly top: number;
}

export type SolveAnswer = WorkAnswer<SolveResult>;

/** Between two signs of life. */
const betweenMs = 50;

/** A job is always answered, also when the work throws; while it runs it says how far it is. */
export function answerSolveJob({ id, problem, top }: SolveJob, send: (answer: SolveAnswer) => void): void {
  let last = -Infinity;
  try {
    const result = solveProblem(problem, {
      top,
      onProgress(share, bestMarginDb) {
        const now = performance.now();
        if (now - last < betweenMs) return;
        last = now;
        send({ id, type: 'progress', share, bestMarginDb });
      },
    });
    send({ id, type: 'result', result });
  } catch (error) {
    send({ id, type: 'failure', message: error instanceof Error ? (error.stack ?? error.message) : String(error) });
  }
}
