import type { Problem } from '../problem';
import { studiedLadder } from '../studiedLadder';
import { ladderObstacle } from '../obstacles';
import { meterOf } from './meterOf';
import { randomBuilds } from './randomBuilds';
import { partsOfBuilds } from './tunedParts';
import { wilsonInterval } from './wilson';

/** What random builds of one ladder do, as far as they have been made. */
export interface SpreadOfBuilds {
  readonly builds: number;
  readonly seed: number;
  /** Share of builds that meet every goal but yield in every case. */
  readonly yield: number;
  /** Its 95 % Wilson interval. */
  readonly low: number;
  readonly high: number;
  /** By goal: the share of builds that meet it; null for yield goals. */
  readonly goalYields: readonly (number | null)[];
  /** The worst margin of each build in dB, in the order of the builds. */
  readonly marginsDb: Float64Array;
}

export interface SpreadRun {
  /** Makes up to so many more builds; false where all have been made. */
  more(builds: number): boolean;
  result(): SpreadOfBuilds;
}

/** Why there is no spread: something is unsolved or unreadable, or no part has a tolerance. */
export function spreadObstacle(problem: Problem): string | null {
  const ladder = studiedLadder(problem);
  return ladderObstacle(ladder) ?? (partsOfBuilds(problem, ladder).length === 0 ? 'no part has a tolerance' : null);
}

/** Random builds of the problem's ladder, as many and with the seed that the problem says. Only where there is no `spreadObstacle`. */
export function spreadOfBuilds(problem: Problem, ladder = studiedLadder(problem)): SpreadRun {
  const parts = partsOfBuilds(problem, ladder);
  const { builds: wanted, seed } = problem.spread;
  const draw = randomBuilds(parts, problem.spread);
  const meter = meterOf(problem, ladder, parts);
  const values = new Float64Array(parts.length);
  const marginsDb = new Float64Array(wanted);
  const held = new Float64Array(problem.goals.length);
  let made = 0;
  let passed = 0;
  return {
    more(builds) {
      for (const end = Math.min(wanted, made + builds); made < end; made++) {
        draw(values);
        meter.measure(values);
        marginsDb[made] = meter.worstDb;
        let all = true;
        for (let g = 0; g < held.length; g++) {
          if (meter.holds[g] === 1) held[g]++;
          else all = false;
        }
        if (all) passed++;
      }
      return made < wanted;
    },
    result: () => ({
      builds: made, seed, yield: made === 0 ? 0 : passed / made, ...wilsonInterval(passed, made),
      goalYields: problem.goals.map(({ quantity }, g) => (quantity === 'yield' || made === 0 ? null : held[g] / made)),
      marginsDb: marginsDb.slice(0, made),
    }),
  };
}
