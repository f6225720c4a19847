import assert from 'node:assert/strict';
import type { Impedance } from '../../../src/network/impedance';
import { evaluate } from '../../../src/study/evaluate';
import { marginDb } from '../../../src/study/marginDb';
import { ladderAtCodes } from '../../../src/study/tunableCodes';
import { coverage, type Coverage } from '../../../src/study/tuning/coverage';
import { cases, goalOf, near, points, problemOf, shunt, capacitor, inductor, series } from '../problems';
import { bankOf, bankProblem, frozen, inMain } from './bank';

const problem = bankProblem();
const found = (across: number): Coverage => {
  const answer = coverage(problem, { frequencyHz: 889e6, across });
  assert.ok(typeof answer !== 'string', String(answer));
  return answer;
};

/** The best margin with some codes, each by a whole evaluation of that load at the channel. */
function bestFor(load: Impedance, frequencyHz: number): number {
  const [across, along] = problem.tunables;
  const margins = across.states.flatMap((first) => along.states.map((second) => {
    const ladder = ladderAtCodes(problem, new Map([[across.name, first.code], [along.name, second.code]]));
    return Math.min(...evaluate({ ...frozen(problem, frequencyHz, ladder), cases: cases(load) }).goals.map((result) => marginDb(result) ?? NaN));
  }));
  return Math.max(...margins);
}

describe('coverage of the chart', () => {
  it('is what whole evaluations of each grid point give', () => {
    const { frequencyHz, marginDb: margins, share } = found(11);
    assert.equal(frequencyHz, 890e6);
    let inside = 0;
    let covered = 0;
    margins.forEach((margin, at) => {
      const reflection = { re: -1 + (at % 11) / 5, im: -1 + Math.floor(at / 11) / 5 };
      if (Math.hypot(reflection.re, reflection.im) > 1 + 1e-9) {
        assert.ok(Number.isNaN(margin));
        return;
      }
      const expected = bestFor({ form: 'reflection', reflection, referenceOhm: 50 }, frequencyHz);
      // On the rim nothing reaches the load but a rounding.
      if (Math.hypot(reflection.re, reflection.im) > 1 - 1e-9) assert.ok(margin < -100 && expected < -100, `${at}: ${margin}, ${expected}`);
      else near(margin, expected, 1e-8, `${at}`);
      inside++;
      if (expected >= 0) covered++;
    });
    near(share, covered / inside, 1e-12);
    assert.ok(covered > 0 && covered < inside, `${covered} of ${inside}`);
  });

  it('has the load cases where they lie, each with its own best codes', () => {
    const { cases: lying, frequencyHz } = found(3);
    assert.deepEqual(lying.map(({ caseName }) => caseName), ['dry', 'wet']);
    lying.forEach(({ reflection, marginDb: margin }, at) => {
      near(margin, bestFor(problem.cases[at].load, frequencyHz), 1e-9);
      near(margin, bestFor({ form: 'reflection', reflection: reflection!, referenceOhm: 50 }, frequencyHz), 1e-6);
    });
  });

  it('of a lossless ell of two free parts covers, by the closed form, loads whose resistance lies below the source', () => {
    // A shunt part at the source brings any R < 50 Ω to 50 Ω where the series part makes up for its reactance: here with so
    // many values that some comes near enough for 10 dB.
    const many = Array.from({ length: 60 }, (_, at) => 0.3 * 1.08 ** at);
    const ell = problemOf({
      ladder: [series('L1', inductor(40e-9)), series('C1', capacitor(1e-12)), shunt('C2', capacitor(1e-12))], channelsHz: points(1e9),
      tunables: [bankOf('along', 'C1', many), bankOf('across', 'C2', many)], goals: [goalOf('return loss', '>=', 10, { place: inMain, unit: 'dB' })],
    });
    const answer = coverage(ell, { frequencyHz: 1e9, across: 41 });
    assert.ok(typeof answer !== 'string');
    const marginAt = (re: number, im: number): number => answer.marginDb[Math.round((im + 1) * 20) * 41 + Math.round((re + 1) * 20)];
    for (const [re, im] of [[-0.5, 0], [-0.3, 0.4], [-0.6, -0.3], [0, 0]]) assert.ok(marginAt(re, im) >= 0, `${re} ${im}`);
    // 450 Ω lies far above: what stands across can only lower it by taking current, which the part in series cannot mend.
    assert.ok(marginAt(0.8, 0) < 0);
  });

  it('says why there is none', () => {
    assert.match(String(coverage(problemOf({}), { frequencyHz: 1e9 })), /nothing/);
    assert.match(String(coverage({ ...problem, goals: [] }, { frequencyHz: 890e6 })), /no goal/);
    const wet = goalOf('return loss', '>=', 10, { place: inMain, caseName: 'wet', unit: 'dB' });
    assert.match(String(coverage({ ...problem, goals: [wet] }, { frequencyHz: 890e6 })), /no goal/);
    assert.equal(typeof coverage({ ...problem, goals: [wet] }, { frequencyHz: 890e6, across: 3, caseName: 'wet' }), 'object');
  });
});
