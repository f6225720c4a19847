import { remedyFor, type Spread } from '../assistance/spreadAssessment';
import type { Problem } from '../study/problem';
import { spreadOfBuilds } from '../study/spread/spreadOfBuilds';
import { toleranceCloud, type CloudTrace } from '../study/spread/toleranceCloud';
import { worstCorner } from '../study/spread/worstCorner';

/** A spread to work out away from the main thread. A newer job takes the place of an older one. */
export interface SpreadJob {
  readonly type: 'spread';
  readonly id: number;
  readonly problem: Problem;
}

export type SpreadAnswer =
  /** The first few builds at once, then more and more of them; `done` with all. */
  | { readonly type: 'spread'; readonly id: number; readonly done: boolean; readonly spread: Spread; readonly cloud: readonly CloudTrace[] }
  | { readonly type: 'failure'; readonly id: number; readonly message: string };

const firstBuilds = 200;
const chunkMs = 20;
const betweenAnswersMs = 250;

/** Works piece by piece, so that `isLatest` can change between them. `later` puts the next piece behind what has arrived meanwhile. */
export function answerSpreadJob({ id, problem }: SpreadJob, send: (answer: SpreadAnswer) => void, isLatest: () => boolean, later: (next: () => void) => void): void {
  const attempt = (work: () => void): void => {
    try {
      work();
    } catch (error) {
      send({ type: 'failure', id, message: error instanceof Error ? (error.stack ?? error.message) : String(error) });
    }
  };
  attempt(() => {
    const run = spreadOfBuilds(problem);
    let more = run.more(firstBuilds);
    const corner = worstCorner(problem);
    const cloud = toleranceCloud(problem);
    const tell = (done: boolean) => {
      const builds = run.result();
      send({ type: 'spread', id, done, spread: { builds, corner, remedy: done ? remedyFor(problem, builds) : null }, cloud });
    };
    let told = performance.now();
    const step = (): void => attempt(() => {
      if (!isLatest()) return;
      for (const end = performance.now() + chunkMs; more && performance.now() < end;) more = run.more(50);
      if (!more || performance.now() - told > betweenAnswersMs) {
        tell(!more);
        told = performance.now();
      }
      if (more) later(step);
    });
    tell(!more);
    if (more) later(step);
  });
}
