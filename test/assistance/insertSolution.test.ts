import assert from 'node:assert/strict';
import { insertSolution, solvedValue } from '../../src/assistance/insertSolution';
import { applyEdits } from '../../src/base/diagnostic';
import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import { idealPart } from '../../src/network/part';
import type { SolvedElement } from '../../src/solve/solution';
import { solveProblem } from '../../src/solve/solveProblem';
import type { Problem } from '../../src/study/problem';

// Invented: a gate reader's loop with a drawer of two families.
const head = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 860 .. 876 MHz
parts:
  coils: inductor E12 1 nH .. 47 nH Q 40 @ 900 MHz
  caps: capacitor E12 0.47 pF .. 47 pF Q 200   # the blue drawer
goals:
  - return loss >= 15 dB
  - gain >= -1 dB
`;

const read = (text: string) => readDescription(text, { expressions: true });

function problemOf(text: string, reopen = false): Problem {
  const { problem, diagnostics } = buildModel(read(text), new Map(), { reopen });
  assert.deepEqual(diagnostics.filter(({ severity }) => severity === 'error'), []);
  assert.ok(problem);
  return problem;
}

/** The text with its best solution in it, and what must hold of any insertion. */
function inserted(text: string, reopen = false): string {
  const problem = problemOf(text, reopen);
  const { solutions: [best] } = solveProblem(problem, { top: 1 });
  const after = applyEdits(text, insertSolution(read(text).syntax, best));
  const again = problemOf(after);
  assert.deepEqual(again.unknowns, []);
  assert.deepEqual(again.ladder.map((element) => element.name), best.ladder.map((element) => element.name));
  const values = (ladder: Problem['ladder']) => ladder.map((element) => (element.form === 'branch' && element.branch.form === 'part' ? element.branch.part : element.form));
  if (!text.includes('solve 1 mm')) assert.deepEqual(values(again.ladder), values(best.ladder));
  return after;
}

const lines = (text: string) => text.split('\n').slice(head.split('\n').length - 1);

describe('inserting solved values', () => {
  it('writes them as a person would, and leaves the rest of each line alone', () => {
    const after = inserted(`${head}ladder:   # load first
  - series L1: solve from coils   # may be any of them
  - shunt C1: "solve from caps"
  - {series X1: solve from coils, caps or none}
`.replace('{series X1: solve from coils, caps or none}', 'series X1: solve from coils, caps or none'));
    assert.match(after, /^ {2}- series L1: [\d.]+ nH from coils {3}# may be any of them$/m);
    assert.match(after, /^ {2}- shunt C1: "[\d.]+ pF from caps"$/m);
    assert.match(after, /^ {2}- series X1: 0 Ω$/m);
    assert.equal(after.split('\n').slice(0, 11).join('\n'), head.split('\n').slice(0, 10).join('\n') + '\nladder:   # load first');
  });

  it('keeps figures that stand beside a solve', () => {
    const after = inserted(`${head}ladder:
  - series L1: solve from E24 Q 30 ±2 %
  - shunt C1: solve 1 .. 10 pF from caps ±5 %
`);
    assert.match(after, /series L1: [\d.]+ nH Q 30 ±2 %/);
    assert.match(after, /shunt C1: [\d.]+ pF from caps ±5 %/);
  });

  it('writes a whole ladder with names counted from the load', () => {
    const after = inserted(`${head}ladder: solve up to 3 elements from coils, caps   # whatever it takes\n`);
    assert.match(lines(after).join('\n'), /^ladder: {2,}# whatever it takes\n( {2}- (series|shunt) [LC]\d: [\d.]+ [np][HF] from (coils|caps)\n){1,3}$/);
    const names = [...after.matchAll(/(?:series|shunt) ([LC]\d):/g)].map(([, name]) => name);
    for (const letter of ['L', 'C']) {
      const own = names.filter((name) => name.startsWith(letter));
      assert.deepEqual(own, own.map((_, i) => `${letter}${i + 1}`));
    }
  });

  it('writes the length of a line', () => {
    const after = inserted(`${head}ladder:\n  - line T1: 50 Ω, solve 1 mm .. 60 mm, vf 0.55\n  - shunt C1: solve from caps\n`);
    assert.match(after, /line T1: 50 Ω, [\d.]+ mm, vf 0\.55/);
  });

  it('solves again what says from, leaves what is fixed, and does not rewrite a value that stays', () => {
    const before = `${head}ladder:\n  - series L1: 1.0e0 nH from coils\n  - shunt C1: 4.70 pF from caps fixed\n`.replace('1.0e0', '1.0');
    const after = inserted(before, true);
    assert.match(after, /shunt C1: 4\.70 pF from caps fixed/);
    assert.doesNotMatch(after, /series L1: 1\.0 nH/);
    assert.equal(inserted(after, true), after);
  });

  it('names the part of a drawer where its value means another one', () => {
    const solved: SolvedElement = {
      name: 'C1', orientation: 'shunt', part: idealPart('capacitor', 3.3e-12), family: 'drawer', label: 'TP-33',
      element: { form: 'branch', name: 'C1', orientation: 'shunt', branch: { form: 'part', part: idealPart('capacitor', 3.3e-12) }, pair: false },
    };
    assert.equal(solvedValue(solved), '3.3 pF from drawer part TP-33');
    assert.equal(solvedValue({ ...solved, family: null, label: null, part: idealPart('capacitor', 3.31459e-12) }), '3.315 pF');
  });
});
