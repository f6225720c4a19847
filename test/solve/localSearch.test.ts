import assert from 'node:assert/strict';
import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import { omissions } from '../../src/solve/forms';
import { solveProblem } from '../../src/solve/solveProblem';

const head = 'ohmward: 1\nload: 18 - j37 Ω at 868 MHz\nbands:\n  main: 860 .. 876 MHz, 5 points\n';

function solve(text: string) {
  const { problem, diagnostics } = buildModel(readDescription(head + text, { expressions: true }), new Map());
  assert.deepEqual(diagnostics.filter(({ severity }) => severity === 'error'), []);
  assert.ok(problem);
  return solveProblem(problem, { top: 3 });
}

const row = (count: number, phrase: string): string => Array.from({ length: count }, (_, i) => `  - ${i % 2 ? 'shunt C' : 'series L'}${i + 1}: ${phrase}`).join('\n');

describe('problems that are too large to be searched exactly', () => {
  it('get the best found, the same every time, and no proof', () => {
    const text = `ladder:\n${row(8, 'solve from E24')}\ngoals:\n  - return loss >= 20 dB\n`;
    const { solutions: [best] } = solve(text);
    assert.equal(best.proved, false);
    assert.equal(best.boundDb, null);
    assert.ok(best.holds, `${best.marginDb} dB`);
    assert.deepEqual(solve(text).solutions[0], best);
  });

  it('are told of where goals give nothing to prune by', () => {
    const { solutions: [best] } = solve(`ladder:\n${row(4, 'solve from E24')}\ngoals:\n  - rejection >= 20 dB at 2 x main\n`);
    assert.equal(best.proved, false);
    assert.ok(best.marginDb > 0);
  });

  it('leave out few or fit few of many places that may stay empty, and say so', () => {
    const places = Array.from({ length: 12 }, (_, i) => i);
    const all = omissions(places);
    assert.equal(new Set(all.map(String)).size, all.length);
    assert.ok(all.every((omitted) => omitted.length <= 2 || omitted.length >= 10));
    assert.equal(omissions(places.slice(0, 5)).length, 32);
    const { solutions, hints } = solve(`ladder:\n${row(10, 'solve from few or none').replaceAll('L', 'X').replaceAll('C', 'X')}\nparts:\n  few: capacitor [1 pF, 4.7 pF]\ngoals:\n  - return loss >= 1 dB\n`);
    assert.ok(solutions.length > 0);
    assert.match(hints.join(), /So many places may stay empty/);
  });
});
