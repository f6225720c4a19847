import assert from 'node:assert/strict';
import { evaluate } from '../../../src/study/evaluate';
import type { Goal } from '../../../src/study/goal';
import { isCondition, marginDb } from '../../../src/study/marginDb';
import type { Problem } from '../../../src/study/problem';
import { ladderAtCodes, type TunableCodes } from '../../../src/study/tunableCodes';
import { bestCodes, codesObstacle } from '../../../src/study/tuning/bestCodes';
import { capacitor, evenly, fileOf, goalOf, inductor, near, ohms, onePort, points, problemOf, shunt } from '../problems';
import { bankOf, bankProblem, frozen, inMain } from './bank';

/** Every combination, each by a whole evaluation of its own. */
function triedAll(problem: Problem, frequencyHz: number, previous: TunableCodes | null, goals: readonly Goal[] = problem.goals) {
  const all = problem.tunables.reduce<[string, number][][]>((found, { name, states }) => found.flatMap((before) => states.map(({ code }): [string, number][] => [...before, [name, code]])), [[]]);
  const scored = all.map((entries) => {
    const codes = new Map(entries);
    const results = evaluate(frozen(problem, frequencyHz, ladderAtCodes(problem, codes), goals)).goals;
    const margins = results.filter(({ goal }) => !isCondition(goal)).map((result) => marginDb(result) ?? -Infinity);
    return { codes, missed: results.filter(({ goal, ok }) => isCondition(goal) && !ok).length, margin: Math.min(...margins) };
  });
  const missed = Math.min(...scored.map((each) => each.missed));
  const margin = Math.max(...scored.filter((each) => each.missed === missed).map((each) => each.margin));
  const best = scored.filter((each) => each.missed === missed && each.margin >= margin - 1e-9);
  const distance = (codes: TunableCodes): number => (previous ? [...codes].reduce((sum, [name, code]) => sum + Math.abs(code - (previous.get(name) ?? 0)), 0) : 0);
  return best.sort((a, b) => distance(a.codes) - distance(b.codes))[0];
}

/** To 1e-9: the search goes through the fast kernel, which agrees with whole evaluations to rounding. */
function agrees(problem: Problem, goals?: readonly Goal[]): void {
  let previous: TunableCodes | null = null;
  for (const found of bestCodes(problem)) {
    const expected = triedAll(problem, found.frequencyHz, previous, goals);
    assert.deepEqual([...found.codes], [...expected.codes], `${found.frequencyHz}`);
    if (Number.isFinite(expected.margin)) near(found.marginDb, expected.margin, 1e-9);
    assert.equal(found.conditionsMissed, expected.missed);
    assert.equal(found.proved, true);
    previous = found.codes;
  }
}

describe('the best codes', () => {
  it('are those that trying all finds, over two cases and two goals', () => {
    const problem = bankProblem();
    agrees(problem);
    const codes = bestCodes(problem);
    assert.equal(codes.length, 8);
    assert.ok(new Set(codes.map(({ codes: each }) => [...each.values()].join())).size > 1, 'the channels differ');
  });

  it('also with harmonics, a rejection, one case alone, and goals that need a whole evaluation', () => {
    const twice = { form: 'harmonic', order: 2, band: 'main' } as const;
    const goals = [
      goalOf('return loss', '>=', 8, { place: inMain, caseName: 'dry', unit: 'dB' }),
      goalOf('rejection', '>=', 10, { place: twice, into: ohms(50), unit: 'dB' }),
      goalOf('insertion loss', '>=', 12, { place: twice, into: ohms(50), unit: 'dB' }),
      goalOf('efficiency', '>=', 70, { place: inMain, unit: '%' }),
      goalOf('voltage', '<=', 0.5, { place: inMain, elementName: 'C1', unit: 'V' }),
      goalOf('input resistance', '<=', 60, { place: inMain, unit: 'Ω' }),
      goalOf('parts', '<=', 2),
    ];
    agrees(bankProblem({ goals }), goals.slice(0, -1));
  });

  it('without goals have the largest worst gain', () => {
    const problem = bankProblem({ goals: [] });
    agrees(problem, [goalOf('gain', '>=', 0, { place: inMain, unit: 'dB' })]);
    for (const { marginDb: margin, worstGainDb } of bestCodes(problem)) near(margin, worstGainDb ?? NaN, 1e-12);
  });

  it('stay at the code of the channel before, then at the smallest, where it makes no difference', () => {
    // Codes 2, 3 and 5 are one and the same value, the best at every channel.
    const same = { name: 'bank', kind: 'capacitor' as const, elements: ['C1'], states: bankOf('bank', 'C1', [9, 1, 2.2, 2.2, 1, 2.2]).states };
    const twin = problemOf({
      load: { form: 'parallel', members: [ohms(50), inductor(11e-9)] }, ladder: [shunt('C1', capacitor(1e-12))], tunables: [same],
      channelsHz: points(0.9e9, 0.95e9, 1e9, 1.05e9), goals: [goalOf('return loss', '>=', 10, { place: { form: 'range', frequencyHz: points(0.9e9, 1.05e9) } })],
    });
    const found = bestCodes(twin).map(({ codes }) => codes.get('bank'));
    assert.deepEqual(found, [2, 2, 2, 2]);
    // From 9 pF (code 6) on, the nearest of 2, 3 and 5 is 5.
    const moved = { ...twin, channelsHz: points(0.505e9, 1e9), tunables: [{ ...same, states: [...same.states.slice(1), { code: 6, part: same.states[0].part }] }] };
    assert.deepEqual(bestCodes(moved).map(({ codes }) => codes.get('bank')), [6, 5]);
  });

  it('tell what one code up or down costs', () => {
    const problem = bankProblem();
    const [first] = bestCodes(problem);
    for (const { tunable, lowerDb, higherDb } of first.steps) {
      const code = first.codes.get(tunable) ?? NaN;
      for (const [step, said] of [[-1, lowerDb], [1, higherDb]] as const) {
        const there = problem.tunables.find(({ name }) => name === tunable)!.states.some((state) => state.code === code + step);
        if (!there) {
          assert.equal(said, null);
          continue;
        }
        const results = evaluate(frozen(problem, first.frequencyHz, ladderAtCodes(problem, new Map([...first.codes, [tunable, code + step]])))).goals;
        near(said, Math.min(...results.map((result) => marginDb(result) ?? NaN)), 1e-12);
        assert.ok((said ?? 0) <= (first.marginDb ?? 0));
      }
    }
  });

  it('take figures that differ from state to state', () => {
    const problem = bankProblem();
    const uneven = problem.tunables.map((tunable) => ({
      ...tunable, states: tunable.states.map((state, at) => ({ ...state, part: { ...state.part, eslH: 0.1e-9 * at, loss: { law: 'resistance' as const, resistanceOhm: 0.1 + 0.2 * (at % 3) } } })),
    }));
    agrees({ ...problem, tunables: uneven });
  });

  it('that are too many to try all are found one tunable at a time, and not called proved', () => {
    const wide = evenly(0.3, 9, 2100);
    const problem = bankProblem({ channelsHz: points(880e6, 910e6) });
    const [across, along] = problem.tunables;
    const many = { ...problem, tunables: [{ ...across, states: bankOf('across', 'C1', wide).states }, { ...along, states: bankOf('along', 'C2', wide).states }] };
    const coarse = { ...problem, tunables: [{ ...across, states: many.tunables[0].states.filter((_, at) => at % 32 === 0) }, { ...along, states: many.tunables[1].states.filter((_, at) => at % 32 === 0) }] };
    const found = bestCodes(many);
    bestCodes(coarse).forEach(({ marginDb: least }, channel) => {
      assert.equal(found[channel].proved, false);
      // Every thirty-second code is among those that the search may find.
      assert.ok((found[channel].marginDb ?? -Infinity) >= (least ?? Infinity), `${found[channel].marginDb} against ${least}`);
    });
  });

  it('say where a load is not known', () => {
    const load = fileOf(onePort(points(870e6, 890e6, 900e6), () => ({ re: 0.4, im: -0.5 })));
    const problem = bankProblem({ cases: [{ name: null, load, fixture: [] }] });
    const [first, second] = bestCodes(problem);
    assert.equal(first.marginDb, null);
    assert.match(first.reason ?? '', /860|870|file/);
    assert.equal(first.worstReflection, null);
    assert.deepEqual([...first.codes.values()], [0, 0]);
    assert.equal(typeof second.marginDb, 'number');
    assert.equal(second.reason, null);
  });

  it('are not there without tunables, or while the ladder is not known', () => {
    assert.match(codesObstacle(problemOf({})) ?? '', /nothing/);
    assert.match(codesObstacle(bankProblem({ ladder: [...bankProblem().ladder, { form: 'unsolved', name: 'L9', orientation: 'series', kind: null }] })) ?? '', /L9/);
    assert.equal(codesObstacle(bankProblem()), null);
  });
});
