import assert from 'node:assert/strict';
import type { Element } from '../../../src/network/element';
import type { Part } from '../../../src/network/part';
import { evaluate } from '../../../src/study/evaluate';
import { isCondition, marginDb } from '../../../src/study/marginDb';
import type { Problem } from '../../../src/study/problem';
import { ladderAtCodes } from '../../../src/study/tunableCodes';
import { studiedLadder } from '../../../src/study/studiedLadder';
import { randomBuilds } from '../../../src/study/spread/randomBuilds';
import { sensitivities } from '../../../src/study/spread/sensitivities';
import { spreadOfBuilds } from '../../../src/study/spread/spreadOfBuilds';
import { toleratedParts } from '../../../src/study/spread/toleratedParts';
import { worstCorner } from '../../../src/study/spread/worstCorner';
import { bestCodes } from '../../../src/study/tuning/bestCodes';
import { capacitor, goalOf, inductor, near, series, shunt } from '../problems';
import { bankProblem, frozen, inMain } from '../tuning/bank';

const fivePercent: Part['tolerance'] = { form: 'relative', up: 0.05, down: 0.05 };

/** Coil and bank may both differ from what is printed on them. */
function buildsProblem(more: Partial<Problem> = {}): Problem {
  const problem = bankProblem(more);
  const [across, along] = problem.tunables;
  return {
    ...problem, spread: { distribution: 'uniform', builds: 40, seed: 5 },
    ladder: [series('L1', inductor(8.2e-9, { tolerance: fivePercent })), shunt('C1', capacitor(1e-12)), series('C2', capacitor(1e-12))],
    tunables: [{ ...across, states: across.states.map(({ code, part }) => ({ code, part: { ...part, tolerance: fivePercent } })) }, along],
  };
}

/** A build's worst margin by a whole evaluation at each channel, and whether it holds. */
function judged(problem: Problem, shares: readonly number[]): { readonly margin: number; readonly holds: boolean } {
  const results = bestCodes(problem).flatMap(({ frequencyHz, codes }) => {
    const built = ladderAtCodes(problem, codes).map((element): Element => {
      const at = ['L1', 'C1'].indexOf(element.name);
      if (at < 0 || element.form !== 'branch' || element.branch.form !== 'part') return element;
      return { ...element, branch: { form: 'part', part: { ...element.branch.part, value: element.branch.part.value * shares[at] } } };
    });
    return evaluate(frozen(problem, frequencyHz, built)).goals;
  });
  return { margin: Math.min(...results.filter(({ goal }) => !isCondition(goal)).map((result) => marginDb(result) ?? NaN)), holds: results.every(({ ok }) => ok) };
}

describe('builds of a tuned ladder', () => {
  it('are judged at each channel with the codes of a board without deviations, and tuned parts deviate at every code', () => {
    const problem = buildsProblem({ goals: [goalOf('return loss', '>=', 4, { place: inMain, unit: 'dB' }), goalOf('input resistance', '<=', 160, { place: inMain, unit: 'Ω' })] });
    const parts = toleratedParts(studiedLadder(problem));
    assert.deepEqual(parts.map(({ name }) => name), ['L1', 'C1']);
    const run = spreadOfBuilds(problem);
    while (run.more(7));
    const { marginsDb, yield: share } = run.result();
    const draw = randomBuilds(parts, problem.spread);
    const values = new Float64Array(2);
    let held = 0;
    for (const margin of marginsDb) {
      draw(values);
      const expected = judged(problem, [values[0] / parts[0].part.value, values[1] / parts[1].part.value]);
      near(margin, expected.margin, 1e-9);
      held += expected.holds ? 1 : 0;
    }
    near(share, held / marginsDb.length, 1e-12);
    assert.ok(held > 0 && held < marginsDb.length, `${held}`);
  });

  it('have the worst corner of all four', () => {
    const problem = buildsProblem();
    const margins = [[0.95, 0.95], [0.95, 1.05], [1.05, 0.95], [1.05, 1.05]].map((shares) => judged(problem, shares).margin);
    near(worstCorner(problem).marginDb, Math.min(...margins), 1e-9);
  });

  it('without goals have the least gain, and a missed count of parts fails them all', () => {
    const problem = buildsProblem({ goals: [goalOf('parts', '<=', 2)] });
    const run = spreadOfBuilds(problem);
    run.more(3);
    assert.equal(run.result().yield, 0);
    const nominal = Math.min(...bestCodes(problem).map(({ worstGainDb }) => worstGainDb ?? NaN));
    assert.ok(Math.abs(run.result().marginsDb[0] - nominal) < 3);
  });

  it('lose by 1 % what a whole evaluation of the change tells, to first order', () => {
    const problem = buildsProblem();
    const [coil, across] = sensitivities(problem);
    const now = judged(problem, [1, 1]).margin;
    const loss = (change: number, at: number): number => now - judged(problem, at === 0 ? [1 + change, 1] : [1, 1 + change]).margin;
    // A hundredth of the change, a hundred times: the slope, to the three tenths that curvature takes over a whole per cent.
    [coil, across].forEach((said, at) => near(said, Math.max(0, 100 * loss(1e-4, at), 100 * loss(-1e-4, at)), 0.3));
  });
});
