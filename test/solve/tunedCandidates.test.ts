import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { solveProblem } from '../../src/solve/solveProblem';
import type { Solution } from '../../src/solve/solution';
import { isCondition, marginDb } from '../../src/study/marginDb';
import { bestCodes } from '../../src/study/tuning/bestCodes';
import type { Problem } from '../../src/study/problem';

// Invented: a hatch's radio with a bank, in two situations.
const text = ({ coil = 'solve from coils', cap = 'solve from caps or none', goals = '  - return loss >= 4 dB in main\n  - gain >= -3 dB in main\n', parts = '' } = {}) => `ohmward: 1
load:
  shut: 14 Ω + 3.1 pF
  open: 19 Ω + 2.7 pF
bands:
  main: 863 .. 928 MHz
tunables:
  bank: {0: 2 pF, 1: 3.3 pF, 2: 4.7 pF, 5: 6.8 pF}
  fine: {0: 0.5 pF, 3: 1.2 pF}
channels: [864 MHz, 880 MHz, 901 MHz, 927 MHz]
ladder:
  - series L1: ${coil}
  - shunt C1: tunable bank
  - series L2: ${coil.replace('6.8', '3.3')}
  - shunt C2: tunable fine
  - series C3: ${cap}
parts:
  coils: inductor [2.2 nH, 3.3 nH, 4.7 nH, 6.8 nH, 10 nH] Q 40 @ 900 MHz
  caps: capacitor [4.7 pF, 10 pF, 22 pF] Q 150
${parts}goals:
${goals}`;

const problemOf = (description: string): Problem => {
  const { problem } = assess(description, new Map(), { expressions: true }).model;
  assert.ok(problem);
  return problem;
};

/** The same by writing each value into the text. */
function judged(goals?: string): { readonly values: string; readonly margin: number; readonly missed: number; readonly parts: number }[] {
  const all = [];
  for (const l1 of [2.2, 3.3, 4.7, 6.8, 10]) for (const l2 of [2.2, 3.3, 4.7, 6.8, 10]) for (const c3 of [null, 4.7, 10, 22]) {
    const written = text({ goals }).replace('L1: solve from coils', `L1: ${l1} nH from coils`).replace('L2: solve from coils', `L2: ${l2} nH from coils`).replace('C3: solve from caps or none', c3 === null ? 'C3: 0 Ω' : `C3: ${c3} pF from caps`);
    const results = assess(written, new Map(), { expressions: true }).evaluation!.goals;
    const margins = results.filter(({ goal }) => !isCondition(goal)).map((result) => marginDb(result) ?? -Infinity);
    all.push({ values: [l1, l2, c3 ?? 'none'].join(), margin: Math.min(...margins), missed: results.filter(({ goal, ok }) => isCondition(goal) && !ok).length, parts: c3 === null ? 4 : 5 });
  }
  return all;
}

const valuesOf = ({ solved }: Solution): string => solved.map(({ part }) => (part ? Number((part.value * (part.kind === 'capacitor' ? 1e12 : 1e9)).toPrecision(6)) : 'none')).join();

describe('solving beside parts that are set by codes', () => {
  it('finds for each number of parts what writing every value into the text finds, proved', () => {
    const all = judged();
    const { byParts, solutions } = solveProblem(problemOf(text()), { top: 6 });
    for (const parts of [4, 5]) {
      const best = all.filter((each) => each.parts === parts).sort((a, b) => b.margin - a.margin);
      const found = byParts.find((each) => each.parts === parts)!;
      assert.equal(valuesOf(found), best[0].values);
      assert.ok(Math.abs(found.marginDb - best[0].margin) < 1e-9);
      assert.ok(found.proved && Math.abs((found.boundDb ?? NaN) - best[0].margin) < 1e-9);
    }
    const holding = all.filter(({ margin }) => margin >= 0).sort((a, b) => a.parts - b.parts || b.margin - a.margin);
    assert.ok(holding.length >= 2);
    assert.deepEqual(solutions.slice(0, 2).map(valuesOf), holding.slice(0, 2).map(({ values }) => values));
  });

  it('goes by goals that need a whole evaluation too, without calling it proved', () => {
    const goals = '  - return loss >= 10 dB in main\n  - voltage C1 <= 0.19 V\n';
    const all = judged(goals);
    assert.ok(all.some(({ missed }) => missed === 0) && all.some(({ missed }) => missed === 1));
    const { byParts } = solveProblem(problemOf(text({ goals })), { top: 40 });
    for (const found of byParts) {
      const [best] = all.filter(({ parts }) => parts === found.parts).sort((a, b) => a.missed - b.missed || b.margin - a.margin);
      assert.deepEqual([valuesOf(found), found.conditionsMissed], [best.values, best.missed]);
      assert.equal(found.proved, false);
    }
  });

  it('has the margin that the codes of the filled-in text have', () => {
    const { solutions: [best] } = solveProblem(problemOf(text()), { top: 1 });
    const [l1, l2, c3] = valuesOf(best).split(',');
    const filled = text().replace('L1: solve from coils', `L1: ${l1} nH from coils`).replace('L2: solve from coils', `L2: ${l2} nH from coils`).replace('C3: solve from caps or none', c3 === 'none' ? 'C3: 0 Ω' : `C3: ${c3} pF from caps`);
    assert.ok(Math.abs(Math.min(...bestCodes(problemOf(filled)).map(({ marginDb: margin }) => margin ?? NaN)) - best.marginDb) < 1e-9);
  });

  it('takes no part twice of which there is one', () => {
    const { problem } = { problem: problemOf(text({ cap: '0 Ω' })) };
    const limited: Problem = { ...problem, unknowns: problem.unknowns.map((unknown) => ({ ...unknown, choices: unknown.choices.map((choice) => (choice.form === 'catalogue' ? { ...choice, counts: choice.parts.map(() => 1) } : choice)) })) };
    const found = solveProblem(limited, { top: 25 }).solutions.map(valuesOf);
    assert.equal(found.length, 20);
    assert.ok(found.every((values) => new Set(values.split(',')).size === 2));
  });

  it('refines values that may be anything beyond what the families hold', () => {
    const free = solveProblem(problemOf(text({ coil: 'solve 1 .. 15 nH', cap: '0 Ω' })), { top: 3 }).solutions[0];
    const listed = solveProblem(problemOf(text({ coil: 'solve from coils', cap: '0 Ω' }).replace(' Q 40 @ 900 MHz', '')), { top: 1 }).solutions[0];
    assert.ok(free.marginDb >= listed.marginDb, `${free.marginDb}, ${listed.marginDb}`);
    assert.equal(free.proved, false);
    // No neighbour is better: a few per cent up or down of either value.
    const values = free.solved.map(({ part }) => part!.value);
    for (const [a, b] of [[1.02, 1], [0.98, 1], [1, 1.02], [1, 0.98], [1.02, 0.98], [0.98, 1.02]]) {
      const written = text({ coil: '6.8 nH', cap: '0 Ω' }).replace('6.8 nH', `${values[0] * a * 1e9} nH`).replace('3.3 nH\n', `${values[1] * b * 1e9} nH\n`);
      const margin = Math.min(...bestCodes(problemOf(written)).map(({ marginDb: each }) => each ?? NaN));
      assert.ok(margin <= free.marginDb + 0.02, `${a} ${b}: ${margin}, ${free.marginDb}`);
    }
  });
});
