import { reflectionOf } from '../network/immittance';
import { fixtureOvershootSlack } from './limits';
import type { LoadCase, Problem } from './problem';
import { sampleLoad } from './sampleCase';

/** A load that reflects more than it receives once its fixture is removed: the fixture's stated loss or length is wrong. */
export interface FixtureOvershoot {
  readonly caseName: string | null;
  /** Where |Γ| is largest. */
  readonly frequencyHz: number;
  readonly reflection: number;
  /** Largest |Γ| of the file itself, with the fixture still in it. */
  readonly reflectionBefore: number;
}

/** Cases whose |Γ| is above 1 somewhere after the fixture is removed, at the points of their own files. */
export function fixtureOvershoots(problem: Pick<Problem, 'cases' | 'z0Ohm'>): readonly FixtureOvershoot[] {
  return problem.cases.flatMap((loadCase) => {
    if (loadCase.load.form !== 'file' || loadCase.fixture.length === 0) return [];
    const { frequencyHz } = loadCase.load.data;
    const after = largestReflection(loadCase, frequencyHz, problem.z0Ohm);
    if (!(after.reflection > 1 + fixtureOvershootSlack)) return [];
    const before = largestReflection({ ...loadCase, fixture: [] }, frequencyHz, problem.z0Ohm);
    return [{ caseName: loadCase.name, ...after, reflectionBefore: before.reflection }];
  });
}

function largestReflection(loadCase: LoadCase, frequencyHz: Float64Array, z0Ohm: number): { frequencyHz: number; reflection: number } {
  const load = sampleLoad(loadCase, frequencyHz);
  const { re, im } = reflectionOf(load, z0Ohm);
  let reflection = -1;
  let at = 0;
  for (let k = 0; k < frequencyHz.length; k++) {
    const size = Math.hypot(re[k], im[k]);
    if (load.known[k] && size > reflection) {
      reflection = size;
      at = k;
    }
  }
  return { frequencyHz: frequencyHz[at], reflection };
}
