import { remedyFor, type Spread } from '../assistance/spreadAssessment';
import type { Problem } from '../study/problem';
import { spreadOfBuilds } from '../study/spread/spreadOfBuilds';
import { toleranceCloud, type CloudTrace } from '../study/spread/toleranceCloud';
import { cornerRun } from '../study/spread/worstCorner';

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
/** All corners of a dozen parts are tried before the first answer. */
const firstCorners = 1 << 12;
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
    const corners = cornerRun(problem);
    let moreCorners = corners.more(firstCorners);
    const cloud = toleranceCloud(problem);
    const tell = (done: boolean) => {
      const builds = run.result();
      send({ type: 'spread', id, done, spread: { builds, corner: corners.result(), remedy: done ? remedyFor(problem, builds) : null }, cloud });
    };
    let told = performance.now();
    const step = (): void => attempt(() => {
      if (!isLatest()) return;
      for (const end = performance.now() + chunkMs; (more || moreCorners) && performance.now() < end;) {
        if (more) more = run.more(50);
        else moreCorners = corners.more(250);
      }
      const done = !more && !moreCorners;
      if (done || performance.now() - told > betweenAnswersMs) {
        tell(done);
        told = performance.now();
      }
      if (!done) later(step);
    });
    tell(!more && !moreCorners);
    if (more || moreCorners) later(step);
  });
}
