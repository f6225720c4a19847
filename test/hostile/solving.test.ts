import assert from 'node:assert/strict';
import { insertSolution } from '../../src/assistance/insertSolution';
import { applyEdits } from '../../src/base/diagnostic';
import { buildModel } from '../../src/description/buildModel';
import { readDescription } from '../../src/description/readDescription';
import { solveProblem } from '../../src/solve/solveProblem';
import { evaluate } from '../../src/study/evaluate';
import { spreadObstacle, spreadOfBuilds } from '../../src/study/spread/spreadOfBuilds';
import { worstCorner } from '../../src/study/spread/worstCorner';
import { seedFiles, seeds } from './descriptionSeeds';
import { dice, mutateText } from './mutateText';

const long = process.env.OHMWARD_LONG === '1';
const runs = long ? 5_000 : 150;

// Invented: small catalogues, so that many can be solved.
const unsolved: readonly string[] = [
  'ohmward: 1\nload:\n  a: 18 - j37 Ω at 868 MHz\n  b: 12 Ω + 3 pF\nbands:\n  main: 860 .. 876 MHz, 3 points\n  side: 433 MHz, watch\npower: 20 dBm\nladder:\n  - series L1: solve from coils\n  - shunt X1: solve from coils, caps or none\n  - line T1: 50 Ω, 4 mm, vf 0.6\n  - series C1: 10 pF ±5 % from caps\nparts:\n  coils: inductor E6 2 nH .. 22 nH ±5 % Q 40 @ 900 MHz SRF 6 GHz\n  caps: capacitor [1 pF, 2.2 pF, 4.7 pF, 10 pF] ±2 % ESL 0.4 nH\ngoals:\n  - return loss >= 8 dB in main\n  - gain >= -2 dB in main\n  - voltage X1 <= 9 V\n  - rejection >= 3 dB at 2 x main into 50 Ω\n  - yield >= 60 %\n  - dc block\nbuilds: 60\n',
  'ohmward: 1\nload: 18 - j37 Ω\nsource: wants 30 - j10 Ω\nbands:\n  one: 868 MHz\nladder: solve up to 2 elements\ngoals:\n  - VSWR <= 2\n  - efficiency >= 50 %\n',
  'ohmward: 1\nload: 50 Ω\nsource: 200 Ω\nbands:\n  one: 100 MHz\nladder: solve pi Q 10\n',
  'ohmward: 1\nload: 60 - j80 Ω\nbands:\n  one: 2 GHz\nladder:\n  - line T1: 50 Ω, solve 1 mm .. 70 mm\n  - stub short S1: 50 Ω, solve 1 mm .. 70 mm\ngoals:\n  - return loss >= 20 dB\n  - bandwidth >= 10 MHz in one\n',
];

describe('solving and spread of descriptions with random changes', function () {
  this.timeout(long ? 3_600_000 : 240_000);

  it(`ends with an answer or a reason, ${runs} of them`, () => {
    let answers = 0;
    for (let seed = 1; seed <= runs; seed++) {
      const roll = dice(seed);
      const all = [...unsolved, ...unsolved, ...seeds];
      const text = mutateText(all[roll(all.length)], roll);
      try {
        const description = readDescription(text, { expressions: true });
        const { problem, diagnostics } = buildModel(description, seedFiles, { reopen: roll(3) === 0 });
        if (!problem) continue;
        const small = { ...problem, spread: { ...problem.spread, builds: 40 } };
        const { solutions, reason } = solveProblem(small, { top: 2 });
        assert.equal(solutions.length === 0, reason !== null);
        if (solutions.length > 0) {
          answers++;
          assert.ok(!Number.isNaN(solutions[0].marginDb));
          evaluate({ ...small, ladder: solutions[0].ladder, unknowns: [], ladderTask: null });
          // Nobody inserts into a text with mistakes: a name may stand there twice.
          if (!diagnostics.some(({ severity }) => severity === 'error')) readDescription(applyEdits(text, insertSolution(description.syntax, solutions[0])), { expressions: true });
        }
        if (spreadObstacle(small) !== null) continue;
        const run = spreadOfBuilds(small);
        run.more(40);
        const { yield: share, low, high } = run.result();
        assert.ok(share >= 0 && share <= 1 && low <= share && share <= high);
        assert.ok(!Number.isNaN(worstCorner(small).marginDb));
      } catch (error) {
        assert.fail(`seed ${seed}: ${error instanceof Error ? error.stack : String(error)}\n${text}`);
      }
    }
    assert.ok(answers > runs / 10, `only ${answers} answers`);
  });
});
