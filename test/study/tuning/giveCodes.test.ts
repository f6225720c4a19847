import assert from 'node:assert/strict';
import { evaluate } from '../../../src/study/evaluate';
import { bestCodes } from '../../../src/study/tuning/bestCodes';
import { giveCodes, tuneChannels, tuningPoints } from '../../../src/study/tuning/tuneChannels';
import { problemOf } from '../problems';
import { bankProblem } from './bank';

describe('codes that were found elsewhere', () => {
  it('give the evaluation that seeking them here gives', () => {
    const found = structuredClone(bestCodes(bankProblem()));
    const problem = bankProblem();
    giveCodes(problem, found);
    assert.deepEqual(evaluate(problem), evaluate(bankProblem()));
    assert.deepEqual(bestCodes(problem), found);
  });

  it('stand, also where they are not the best', () => {
    const problem = bankProblem();
    const worse = bestCodes(bankProblem()).map((channel) => ({ ...channel, codes: new Map([['across', 0], ['along', 0]]), proved: false }));
    giveCodes(problem, worse);
    for (const { codes, proved } of tuneChannels(problem)) assert.deepEqual([[...codes], proved], [[['across', 0], ['along', 0]], false]);
  });

  it('are refused where they belong to something else', () => {
    const found = bestCodes(bankProblem());
    assert.throws(() => giveCodes(bankProblem(), found.slice(1)), RangeError);
    assert.throws(() => giveCodes(bankProblem(), found.map((each) => ({ ...each, frequencyHz: each.frequencyHz + 1 }))), RangeError);
    assert.throws(() => giveCodes(bankProblem(), found.map((each) => ({ ...each, codes: new Map([['across', 99], ['along', 0]]) }))), RangeError);
  });

  it('cost at least combinations × channels × cases', () => {
    assert.equal(tuningPoints(bankProblem()), 12 * 5 * 8 * 2);
    assert.equal(tuningPoints(problemOf({})), 0);
  });
});
