import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { solveProblem } from '../../src/solve/solveProblem';
import { answerSolveJob, type SolveAnswer } from '../../src/worker/solveJob';

const text = 'ohmward: 1\nload: 18 - j37 Ω at 868 MHz\nsource: {main: 40 Ω}\nbands:\n  main: 860 .. 876 MHz\nladder: solve up to 3 elements from coils, caps\nparts:\n  coils: inductor E12 1 nH .. 47 nH Q 40\n  caps: capacitor E12 0.47 pF .. 47 pF\n';

describe('solving away from the main thread', () => {
  it('answers with the same result, over what crosses a thread', () => {
    const { problem } = assess(text, new Map(), { expressions: true }).model;
    assert.ok(problem);
    const answers: SolveAnswer[] = [];
    answerSolveJob(structuredClone({ id: 7, problem, top: 4 }), (answer) => void answers.push(structuredClone(answer)));
    const last = answers[answers.length - 1];
    assert.ok(last.type === 'result');
    assert.deepEqual(last.result, solveProblem(problem, { top: 4 }));
    assert.ok(answers.every(({ id }) => id === 7));
  });

  it('answers also where the work throws', () => {
    const answers: SolveAnswer[] = [];
    answerSolveJob({ id: 8, problem: null as never, top: 1 }, (answer) => void answers.push(answer));
    assert.equal(answers.length, 1);
    assert.equal(answers[0].type, 'failure');
  });
});
