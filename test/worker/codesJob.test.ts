import assert from 'node:assert/strict';
import { bestCodes } from '../../src/study/tuning/bestCodes';
import { coverage } from '../../src/study/tuning/coverage';
import { answerCodesJob, type CodesJob, type CodesResult } from '../../src/worker/codesJob';
import type { WorkAnswer } from '../../src/worker/workQueue';
import { bankProblem } from '../study/tuning/bank';

const problem = bankProblem();

/** What comes back over the border of a thread. */
function answered(job: CodesJob): WorkAnswer<CodesResult> {
  const answers: WorkAnswer<CodesResult>[] = [];
  answerCodesJob(structuredClone(job), (answer) => void answers.push(structuredClone(answer)));
  return answers[answers.length - 1];
}

describe('codes away from the main thread', () => {
  it('are those that one finds in place', () => {
    const answer = answered({ type: 'codes', id: 3, problem });
    assert.ok(answer.type === 'result' && answer.id === 3 && answer.result.type === 'codes');
    assert.deepEqual(answer.result.channels, bestCodes(problem));
  });

  it('have the same coverage', () => {
    const answer = answered({ type: 'coverage', id: 4, problem, frequencyHz: 889e6 });
    assert.ok(answer.type === 'result' && answer.result.type === 'coverage');
    assert.deepEqual(answer.result.coverage, coverage(problem, { frequencyHz: 889e6 }));
  });

  it('are answered also where the work throws', () => {
    assert.equal(answered({ type: 'codes', id: 5, problem: null as never }).type, 'failure');
  });
});
