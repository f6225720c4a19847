import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { wholeSpread } from '../../src/assistance/spreadAssessment';
import { answerSpreadJob, type SpreadAnswer } from '../../src/worker/spreadJob';

// Invented.
const { problem } = assess('ohmward: 1\nload: 12 Ω + 3.3 pF\nbuilds: 3000\nbands:\n  main: 862 .. 871 MHz\nladder:\n  - series L1: 12 nH ±5 %\n  - shunt C1: 4.3 pF ±2 %\ngoals:\n  - return loss >= 6 dB\n', new Map(), { expressions: true }).model;

describe('a spread away from the main thread', () => {
  it('tells a first estimate at once, and ends with what working it out in one go gives', () => {
    assert.ok(problem);
    const answers: SpreadAnswer[] = [];
    const later: (() => void)[] = [];
    answerSpreadJob(structuredClone({ type: 'spread' as const, id: 4, problem }), (answer) => void answers.push(structuredClone(answer)), () => true, (next) => void later.push(next));
    assert.equal(answers.length, 1);
    assert.ok(answers[0].type === 'spread' && !answers[0].done && answers[0].spread.builds.builds === 200);
    for (let next = later.shift(); next; next = later.shift()) next();
    const last = answers[answers.length - 1];
    assert.ok(last.type === 'spread' && last.done);
    assert.deepEqual(last.spread, wholeSpread(problem));
    assert.equal(last.cloud.length, 24);
  });

  it('stops between two pieces where a newer one is asked for', () => {
    assert.ok(problem);
    const answers: SpreadAnswer[] = [];
    const later: (() => void)[] = [];
    let latest = true;
    answerSpreadJob({ type: 'spread', id: 5, problem }, (answer) => void answers.push(answer), () => latest, (next) => void later.push(next));
    latest = false;
    later.shift()?.();
    assert.equal(later.length, 0);
    assert.equal(answers.length, 1);
  });

  it('answers also where the work throws', () => {
    const answers: SpreadAnswer[] = [];
    answerSpreadJob({ type: 'spread', id: 6, problem: null as never }, (answer) => void answers.push(answer), () => true, () => undefined);
    assert.equal(answers[0].type, 'failure');
  });
});
