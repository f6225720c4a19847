import assert from 'node:assert/strict';
import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import type { Element } from '../../src/network/element';
import { compareRounded } from '../../src/solve/topList';
import { withLadder } from '../../src/solve/solutionOf';
import { solveProblem } from '../../src/solve/solveProblem';
import { countParts } from '../../src/study/countParts';
import { evaluate } from '../../src/study/evaluate';
import { isCondition, marginDb } from '../../src/study/marginDb';
import type { Problem } from '../../src/study/problem';

function problemOf(text: string): Problem {
  const { problem, diagnostics } = buildModel(readDescription(text, { expressions: true }), new Map());
  assert.deepEqual(diagnostics.filter(({ severity }) => severity === 'error'), []);
  assert.ok(problem);
  return problem;
}

interface Tried {
  readonly ladder: readonly Element[];
  readonly missed: number;
  readonly marginDb: number;
  readonly gainDb: number;
  readonly parts: number;
}

/** Every ladder that the unknowns allow, each through a whole evaluation: nothing of the solver is used. */
function everyLadder(problem: Problem): Tried[] {
  let ladders: Element[][] = [[]];
  problem.ladder.forEach((element, index) => {
    const unknown = problem.unknowns.find(({ elementIndex }) => elementIndex === index);
    const orientation = 'orientation' in element && element.orientation !== 'through' ? element.orientation : 'series';
    const options: Element[] = !unknown ? [element] : unknown.choices.flatMap((choice) => (choice.form === 'catalogue'
      ? choice.parts.map((part): Element => ({ form: 'branch', name: unknown.name, orientation, branch: { form: 'part', part }, pair: false }))
      : []));
    if (unknown?.mayOmit) options.push(orientation === 'series' ? { form: 'bridge', name: unknown.name, orientation } : { form: 'not fitted', name: unknown.name, orientation, kind: null });
    ladders = ladders.flatMap((before) => options.map((option) => [...before, option]));
  });
  return ladders.map((ladder) => {
    const { goals, bands } = evaluate({ ...withLadder(problem, ladder), sweepHz: problem.sweepHz.slice(0, 1) });
    const gains = bands.flatMap(({ cases }) => cases.map(({ worstGainDb }) => worstGainDb ?? -Infinity));
    const margins = goals.filter(({ goal }) => !isCondition(goal)).map((result) => marginDb(result) ?? -Infinity);
    return {
      ladder, parts: countParts(ladder), gainDb: Math.min(...gains), missed: goals.filter(({ goal, ok }) => isCondition(goal) && !ok).length,
      marginDb: margins.length > 0 ? Math.min(...margins) : Math.min(...gains),
    };
  });
}

/** As the solver is meant to rank them, worked out on decibels. */
function byRank(a: Tried, b: Tried, byDefault: boolean): number {
  const holds = (each: Tried): boolean => !byDefault && each.missed === 0 && each.marginDb >= 0;
  return a.missed - b.missed || Number(holds(b)) - Number(holds(a)) || (holds(a) ? a.parts - b.parts : 0) || compareRounded(b.marginDb, a.marginDb);
}

const bands = 'bands:\n  low: 433 .. 435 MHz, 3 points\n  high: 862 .. 871 MHz, 5 points\n';
const families = `parts:
  coils: inductor E6 2.2 nH .. 47 nH Q 35 @ 900 MHz SRF 5 GHz
  caps: capacitor E6 1 pF .. 22 pF Q 150 ESL 0.4 nH
  few: capacitor [1 pF, 3.3 pF, 10 pF]
`;

// Invented loads and ladders.
const problems: readonly (readonly [string, string])[] = [
  ['two cases, two goals', `load:\n  near: 12 Ω + 3.3 pF\n  far: 25 Ω + 2.7 pF\nladder:\n  - series L1: solve from coils\n  - shunt C1: solve from caps\n  - series X1: solve from coils, caps or none\ngoals:\n  - return loss >= 9 dB in high\n  - gain >= -1.2 dB in high\n`],
  ['a complex source and VSWR', `load: 30 - j80 Ω at 868 MHz\nsource: wants 18 - j22 Ω\nladder:\n  - shunt X1: solve from coils, caps or none\n  - series X2: solve from coils, caps or none\n  - shunt X3: solve from few or none\ngoals:\n  - VSWR <= 2 in high\n  - mismatch loss <= 0.6 dB in high\n`],
  ['conditions of the structure', `load: 20 Ω + 4 pF\nladder:\n  - series X1: solve from coils, caps or none\n  - shunt X2: solve from coils, caps or none\n  - series X3: solve from coils, few or none\ngoals:\n  - return loss >= 10 dB in high\n  - dc block\n  - parts <= 2\n  - dc short at load\n`],
  ['conditions of the values', `load: 20 Ω + 4 pF\npower: 20 dBm\nladder:\n  - series X1: solve from coils, few\n  - shunt X2: solve from coils, caps\n  - line T1: 50 Ω, 12 mm, vf 0.6\ngoals:\n  - return loss >= 6 dB in high\n  - voltage X1 <= 4 V\n  - input resistance >= 30 Ω in high\n`],
  ['rejection and efficiency', `load: 20 Ω + 4 pF\nladder:\n  - series L1: solve from coils\n  - shunt C1: solve from caps\n  - series X1: solve from coils, few\ngoals:\n  - rejection >= 9 dB at 2 x high into 50 Ω\n  - efficiency >= 80 % in high\n  - insertion loss <= 2 dB in high\n`],
  ['no goal at all', `load: 20 Ω + 4 pF\nladder:\n  - series X1: solve from coils, caps\n  - shunt X2: solve from coils, caps or none\n`],
  ['both bands, goals that cannot be met', `load: 9 Ω + 2 pF\nladder:\n  - series X1: solve from coils, caps or none\n  - shunt X2: solve from coils, caps or none\n  - series X3: solve from coils, few or none\ngoals:\n  - return loss >= 20 dB\n  - reflection <= 0.2 in high\n`],
];

describe('solving a problem', () => {
  for (const [name, text] of problems) {
    it(`finds what trying every ladder by a whole evaluation finds: ${name}`, () => {
      const problem = problemOf(`ohmward: 1\n${bands}${families}${text}`);
      const byDefault = problem.goals.every(isCondition);
      const tried = everyLadder(problem).sort((a, b) => byRank(a, b, byDefault));
      const { solutions, byParts } = solveProblem(problem, { top: 5 });
      assert.equal(solutions.length, 5);
      solutions.forEach((solution, i) => {
        assert.equal(solution.proved, true);
        assert.equal(solution.conditionsMissed, tried[i].missed);
        // Both are the same margin by two ways; 1e-8 dB is far above their rounding and below what tells ladders apart.
        assert.ok(Math.abs(solution.marginDb - tried[i].marginDb) <= 1e-8 || byDefault && Math.abs(solution.marginDb - tried[i].gainDb) < 1e-8, `${i}: ${solution.marginDb} dB, and there is ${tried[i].marginDb} dB`);
        if (solution.holds) assert.equal(solution.parts, tried[i].parts);
      });
      for (const best of byParts) {
        const own = tried.find(({ parts }) => parts === best.parts);
        assert.ok(own && Math.abs(best.marginDb - own.marginDb) <= 1e-8, `${best.parts} parts: ${best.marginDb} dB, and there is ${own?.marginDb} dB`);
        assert.equal(best.boundDb, best.marginDb);
      }
      assert.deepEqual(byParts.map(({ parts }) => parts), [...new Set(tried.map(({ parts }) => parts))].sort((a, b) => a - b));
    });
  }

  it('answers the same every time', () => {
    const problem = problemOf(`ohmward: 1\n${bands}${families}${problems[0][1]}`);
    assert.deepEqual(solveProblem(problem), solveProblem(problem));
  });

  it('takes no part more often than there are pieces', () => {
    const text = `ohmward: 1\nload: 18 - j37 Ω at 868 MHz\nbands:\n  main: 868 MHz\nladder:\n  - shunt C1: solve from few\n  - series L1: 3.3 nH\n  - shunt C2: solve from few\nparts:\n  few: capacitor [1 pF, 2.2 pF, 4.7 pF]\n`;
    const problem = problemOf(text);
    const limited: Problem = {
      ...problem,
      unknowns: problem.unknowns.map((unknown) => ({ ...unknown, choices: unknown.choices.map((choice) => (choice.form === 'catalogue' ? { ...choice, counts: [1, 2, 1] } : choice)) })),
    };
    const values = solveProblem(limited, { top: 9 }).solutions.map(({ solved }) => solved.map(({ part }) => part?.value));
    assert.equal(values.length, 7);
    assert.ok(values.every(([one, other]) => one !== other || one === 2.2e-12));
    assert.equal(solveProblem(problem, { top: 9 }).solutions.length, 9);
  });

  it('says what stands in the way', () => {
    const bare = (ladder: string, more = '') => `ohmward: 1\nload: 18 - j37 Ω\nbands:\n  main: 868 MHz\n${ladder}${more}`;
    assert.equal(solveProblem(problemOf(bare('ladder:\n  - series L1: 3.3 nH\n'))).reason, 'nothing is left to solve');
    const outOfReach = solveProblem(problemOf(bare('ladder: solve pi Q 0.5\n')));
    assert.equal(outOfReach.solutions.length, 0);
    assert.match(outOfReach.outOfReach[0].reason, /at least/);
  });

  it('asks for a goal on gain where losses could pass for a match', () => {
    const text = (goals: string) => `ohmward: 1\nload: 20 Ω + 4 pF\n${bands}${families}ladder:\n  - series L1: solve from coils\n  - shunt C1: solve from caps\ngoals:\n${goals}`;
    assert.match(solveProblem(problemOf(text('  - return loss >= 10 dB in high\n'))).hints.join(), /goal on gain/);
    assert.deepEqual(solveProblem(problemOf(text('  - return loss >= 10 dB in high\n  - gain >= -2 dB in high\n'))).hints, []);
  });

  it('tells how far it is, never backwards, and stops where the listener throws', () => {
    const problem = problemOf(`ohmward: 1\n${bands}${families.replaceAll('E6', 'E24')}load: 18 - j37 Ω\nladder: solve up to 4 elements from coils, caps\ngoals:\n  - return loss >= 30 dB in high\n  - gain >= -1 dB in high\n`);
    const shares: number[] = [];
    solveProblem(problem, { onProgress: (share) => void shares.push(share) });
    assert.ok(shares.length > 3);
    assert.deepEqual(shares, [...shares].sort((a, b) => a - b));
    assert.throws(() => solveProblem(problem, { onProgress: () => { throw new Error('enough'); } }), /enough/);
  });
});
