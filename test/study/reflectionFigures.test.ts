import assert from 'node:assert/strict';
import { mismatchLossOf, reflectionOfMismatchLoss, reflectionOfReturnLoss, reflectionOfVswr, vswrOf } from '../../src/study/reflectionFigures';
import { near } from './problems';

describe('figures of a reflection near and above 1', () => {
  for (const figure of [vswrOf, mismatchLossOf]) {
    it(figure.name, () => {
      assert.equal(figure(1), Infinity);
      // What rounding makes of a lossless load.
      assert.equal(figure(1 - 1e-15), Infinity);
      assert.equal(figure(1 + 1e-15), Infinity);
      assert.ok(Number.isFinite(figure(1 - 1e-9)));
      assert.ok(Number.isNaN(figure(1 + 1e-9)));
    });
  }
  it('and back', () => {
    for (const reflection of [0, 1e-6, 0.1, 0.5, 0.999]) {
      near(reflectionOfVswr(vswrOf(reflection)) + 1, reflection + 1, 1e-12);
      // A loss of |Γ|² below the rounding of 1 is lost in it: |Γ| comes back to the root of that.
      near(reflectionOfMismatchLoss(mismatchLossOf(reflection)) + 1, reflection + 1, 2e-8);
    }
    assert.deepEqual([reflectionOfVswr(Infinity), reflectionOfMismatchLoss(Infinity), reflectionOfReturnLoss(0), reflectionOfReturnLoss(Infinity)], [1, 1, 1, 0]);
  });
});
