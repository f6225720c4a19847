import assert from 'node:assert/strict';
import { channelProblems, nearestChannel } from '../../../src/study/tuning/channelProblems';
import { band, goalOf, points, problemOf } from '../problems';

// Invented: two bands with channels, one stop band without, one odd frequency between channels.
const channelsHz = points(100, 102, 104, 200);
const bands = [band('low', points(99, 101.5, 104)), band('high', points(195, 205)), band('stop', points(300, 310)), band('odd', points(103.4)), band('seen', points(100, 104), true)];
const problemWith = (...goals: ReturnType<typeof goalOf>[]) => problemOf({ bands, channelsHz, goals });

describe('what is asked at a channel', () => {
  it('bands with channels shrink to the channel in them; others keep the points that are nearest, or all outside the channels', () => {
    const seen = channelProblems(problemWith()).map(({ problem }) => problem.bands.map(({ name, frequencyHz }) => `${name} ${frequencyHz.join(' ')}`));
    assert.deepEqual(seen, [
      ['low 100', 'stop 300 310', 'seen 100'],
      ['low 102', 'stop 300 310', 'seen 102'],
      ['low 104', 'stop 300 310', 'odd 103.4', 'seen 104'],
      ['high 200', 'stop 300 310'],
    ]);
  });

  it('goals are judged where their place is', () => {
    const goals = [
      goalOf('return loss', '>=', 10),
      goalOf('return loss', '>=', 10, { place: { form: 'band', band: 'low' } }),
      goalOf('gain', '>=', -1, { place: { form: 'harmonic', order: 2, band: 'high' } }),
      goalOf('gain', '>=', -1, { place: { form: 'frequency', frequencyHz: 101.2 } }),
      goalOf('gain', '>=', -1, { place: { form: 'frequency', frequencyHz: 250 } }),
      goalOf('gain', '>=', -1, { place: { form: 'range', frequencyHz: points(101, 103, 105) } }),
      goalOf('gain', '>=', -1, { place: { form: 'range', frequencyHz: points(150, 160, 170) } }),
      goalOf('parts', '<=', 3), goalOf('dc path'), goalOf('yield', '>=', 90),
    ];
    const problems = channelProblems(problemWith(...goals));
    assert.deepEqual(problems.map(({ goalIndices }) => goalIndices), [[0, 1, 4], [0, 1, 3, 4, 5], [0, 1, 4, 5, 6], [0, 2, 4, 6]]);
    const range = problems[1].problem.goals[4].place;
    assert.deepEqual(range.form === 'range' && [...range.frequencyHz], [102]);
    const between = problems[2].problem.goals[4].place;
    assert.deepEqual(between.form === 'range' && [...between.frequencyHz], [150]);
  });

  it('a rejection is judged where its reference band is, also where that band is meant silently', () => {
    const stop = { form: 'band', band: 'stop' } as const;
    const problems = channelProblems(problemWith(goalOf('rejection', '>=', 20, { place: stop }), goalOf('rejection', '>=', 20, { place: stop, against: 'high' })));
    assert.deepEqual(problems.map(({ goalIndices }) => goalIndices), [[0], [0], [0], [1]]);
    assert.equal(problems[0].problem.goals[0].against, 'low');
  });

  it('a channel that rounding puts beyond the end of its band is in it', () => {
    const problem = problemOf({ bands: [band('main', points(863e6, 869.9e6))], channelsHz: points(863e6, 869.9e6 * (1 + 2 ** -52)), goals: [goalOf('gain', '>=', -1)] });
    assert.deepEqual(channelProblems(problem).map(({ goalIndices }) => goalIndices.length), [1, 1]);
  });

  it('the nearest of two equally near channels is the lower', () => {
    assert.deepEqual([0, 101, 101.1, 103, 152, 153, 1e9].map((each) => nearestChannel(each, channelsHz)), [0, 0, 1, 1, 2, 3, 3]);
    assert.equal(nearestChannel(5, points(7)), 0);
    assert.equal(nearestChannel(5, points()), -1);
  });
});
