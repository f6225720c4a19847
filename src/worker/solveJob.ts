import type { SolveResult } from '../solve/solution';
import { solveProblem } from '../solve/solveProblem';
import type { Problem } from '../study/problem';

/** A problem to solve away from the main thread; both sides of it are plain data. */
export interface SolveJob {
  readonly id: number;
  readonly problem: Problem;
  readonly top: number;
}

export type SolveAnswer =
  | { readonly id: number; readonly type: 'progress'; readonly share: number; readonly bestMarginDb: number | null }
  | { readonly id: number; readonly type: 'result'; readonly result: SolveResult }
  | { readonly id: number; readonly type: 'failure'; readonly message: string };

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
