import assert from 'node:assert/strict';
import { evaluate } from '../../../src/study/evaluate';
import type { Goal } from '../../../src/study/goal';
import type { Problem } from '../../../src/study/problem';
import { ladderAtCodes } from '../../../src/study/tunableCodes';
import { bestCodes } from '../../../src/study/tuning/bestCodes';
import { codesAt, showChannelAt } from '../../../src/study/tuning/evaluateTuned';
import { band, evenly, goalOf, near, ohms, points } from '../problems';
import { bankProblem, frozen, inMain } from './bank';

const shown = bankProblem();

/** Each goal at each channel, by an evaluation of that channel alone with its codes. */
function byChannel(problem: Problem, goals: readonly Goal[] = problem.goals) {
  return bestCodes(problem).map(({ frequencyHz, codes }) => evaluate(frozen(problem, frequencyHz, ladderAtCodes(problem, codes), goals)));
}

describe('evaluation with tunables', () => {
  it('judges each goal at each channel with its own codes, and gives the worst', () => {
    const goals = [
      goalOf('return loss', '>=', 10, { place: inMain, unit: 'dB' }), goalOf('VSWR', '<=', 2), goalOf('gain', '>=', -1.5, { unit: 'dB' }),
      goalOf('rejection', '>=', 10, { place: { form: 'harmonic', order: 2, band: 'main' }, into: ohms(50), unit: 'dB' }),
      goalOf('dissipation', '<=', 1e-4, { elementName: 'C2', unit: 'W' }), goalOf('bandwidth', '>=', 5e6, { unit: 'Hz' }),
    ];
    const problem = bankProblem({ goals });
    const each = byChannel(problem);
    evaluate(problem).goals.forEach((result, g) => {
      const margins = each.map(({ goals: results }) => results[g].margin ?? NaN);
      near(result.margin, Math.min(...margins), 1e-12, result.goal.text);
      assert.equal(result.goal, goals[g]);
      const there = each[margins.indexOf(Math.min(...margins))].goals[g];
      assert.deepEqual([result.frequencyHz, result.caseName, result.ok], [there.frequencyHz, there.caseName, there.ok]);
    });
  });

  it('is better than any one combination of codes over the whole band', () => {
    const margin = (codes?: ReadonlyMap<string, number>) => evaluate(shown, codes ? { codes } : {}).goals[0].margin ?? NaN;
    for (const { codes } of bestCodes(shown)) assert.ok(margin() >= margin(codes));
  });

  it('takes the worst of a band, and of what its parts bear, over its channels', () => {
    const { bands: [main], elements } = evaluate(shown);
    const each = byChannel(shown);
    assert.deepEqual([main.startHz, main.stopHz], [860e6, 930e6]);
    main.cases.forEach((result, at) => {
      const there = each.map(({ bands: [only] }) => only.cases[at]);
      assert.equal(result.worstReflection, Math.max(...there.map(({ worstReflection }) => worstReflection ?? NaN)));
      assert.equal(result.worstGainDb, Math.min(...there.map(({ worstGainDb }) => worstGainDb ?? NaN)));
      assert.equal(result.atHz, there.find(({ worstReflection }) => worstReflection === result.worstReflection)?.atHz);
    });
    elements.forEach(({ peakVoltageV, dissipationW }, at) => {
      assert.equal(peakVoltageV, Math.max(...each.map((one) => one.elements[at].peakVoltageV ?? NaN)));
      assert.equal(dissipationW, Math.max(...each.map((one) => one.elements[at].dissipationW ?? NaN)));
    });
  });

  it('plots with the codes of the middle channel, or of the one nearest to the marker', () => {
    const { tuning, traces } = evaluate(shown);
    assert.equal(tuning?.shown, 3);
    const codes = bestCodes(shown);
    assert.deepEqual(traces[1].gainDb, evaluate(shown, { codes: codes[3].codes }).traces[1].gainDb);
    const marked = evaluate(shown, { markerHz: 928e6 });
    assert.equal(marked.tuning?.shown, 7);
    assert.deepEqual(marked.traces[0].gainDb, evaluate(shown, { codes: codes[7].codes }).traces[0].gainDb);
    assert.deepEqual(codesAt(shown, 861e6), codes[0].codes);
    assert.equal(codesAt({ ...shown, tunables: [] }, 861e6), undefined);
  });

  it('looks the same from another channel as evaluated with the marker there', () => {
    const before = evaluate(shown);
    assert.deepEqual(showChannelAt(shown, before, 928e6), evaluate(shown, { markerHz: 928e6 }));
    assert.equal(showChannelAt(shown, before, 890e6), before);
  });

  it('judges goals that say nothing of frequency once, and one without a channel not at all', () => {
    const bands = [band('main', points(860e6, 930e6)), band('other', points(1.5e9, 1.6e9))];
    const goals = [goalOf('parts', '<=', 2), goalOf('dc block'), goalOf('rejection', '>=', 3, { place: inMain, against: 'later' }), goalOf('gain', '<=', -3, { place: { form: 'band', band: 'other' } })];
    const { goals: [parts, block, rejection, gain] } = evaluate(bankProblem({ bands, goals, channelsHz: evenly(860e6, 930e6, 3) }));
    assert.deepEqual([parts.value, parts.ok, block.ok], [3, false, true]);
    assert.equal(rejection.ok, false);
    assert.match(rejection.reason ?? '', /no channel/);
    assert.ok(gain.frequencyHz === 1.5e9 || gain.frequencyHz === 1.6e9);
  });

  it('of one single code is that of the plain ladder at the channels', () => {
    const only = shown.tunables.map((tunable) => ({ ...tunable, states: tunable.states.slice(2, 3) }));
    const channelsHz = shown.bands[0].frequencyHz;
    const tuned = evaluate({ ...shown, tunables: only, channelsHz });
    const { tuning, ...plain } = evaluate({ ...shown, tunables: [], ladder: ladderAtCodes({ ...shown, tunables: only }) });
    assert.equal(tuning, null);
    assert.deepEqual({ ...tuned, tuning: null }, { ...plain, tuning: null });
  });
});
