import assert from 'node:assert/strict';
import { isDrawable, panelView } from '../../src/assistance/panelView';
import { sampleAssessment, sampleView } from '../page/sampleView';

const view = (change: (text: string) => string) => panelView(sampleAssessment(change), { fileName: 'frost.match.yaml', pinned: false, markerHz: null });

describe('the panel’s view', () => {
  it('is no picture to draw where mistakes leave no trace, though all that is known is in it', () => {
    for (const slip of [(text: string) => text.replace('\nload:', '\nlode:'), (text: string) => text.replace('10 nH', '10 nh')]) {
      assert.equal(isDrawable(sampleAssessment(slip)), false);
      assert.ok((view(slip)?.problems.length ?? 0) > 0);
    }
    assert.equal(isDrawable(sampleAssessment()), true);
  });

  it('shows what can still be computed beside a mistake', () => {
    const shown = view((text) => text.replace('parts <= 3', 'prts <= 3'));
    assert.equal(shown?.problems.length, 1);
    assert.ok(shown.traces.every(({ reflection }) => reflection.re.some((re) => re !== null)));
  });

  it('is there where values are still to be solved, which is no mistake', () => {
    const shown = view((text) => text.replace('4.3 pF from caps', 'solve from caps'));
    assert.ok(shown);
    assert.equal(shown.ladder.find(({ id }) => id === 'C1')?.value, 'to solve');
  });

  it('has a row for each element between the ends, and a goal view for each goal', () => {
    const shown = sampleView();
    assert.deepEqual(shown.ladder.map(({ id }) => id), ['load', 'L1', 'C1', 'C2', 'source']);
    assert.equal(shown.goals.length, 5);
  });
});
