import assert from 'node:assert/strict';
import { histogram } from '../../src/assistance/spreadView';
import { histogramPicture } from '../../src/picture/histogram';

describe('histogram of builds', () => {
  it('counts every finite margin once, in steps of 1, 2 or 5, with the limit between two of them', () => {
    const margins = Float64Array.from({ length: 500 }, (_, i) => -1.3 + (i * 3.7) / 499);
    const bars = histogram(Float64Array.of(...margins, -Infinity, NaN));
    assert.equal(bars.reduce((sum, { count }) => sum + count, 0), 500);
    assert.ok(bars.length <= 26);
    assert.ok(bars.some(({ fromDb }) => Math.abs(fromDb) < 1e-12));
    bars.forEach(({ fromDb, toDb, count }) => assert.equal(margins.filter((value) => value >= fromDb && value < toDb).length, count));
    assert.deepEqual(histogram(Float64Array.of(-Infinity)), []);
    assert.equal(histogram(Float64Array.of(1, 1, 1)).reduce((sum, { count }) => sum + count, 0), 3);
  });

  it('draws a bar for each step that has builds, the limit, and the corner', () => {
    const drawn = histogramPicture({ bars: [{ fromDb: -1, toDb: 0, count: 2 }, { fromDb: 0, toDb: 1, count: 0 }, { fromDb: 1, toDb: 2, count: 5 }], cornerDb: -2.5 });
    assert.equal(drawn.match(/bar-held/g)?.length, 1);
    assert.equal(drawn.match(/bar-missed/g)?.length, 1);
    assert.equal(drawn.match(/corner-mark/g)?.length, 1);
    assert.doesNotMatch(drawn, /NaN|Infinity|undefined/);
    assert.equal(histogramPicture({ bars: [], cornerDb: null }), ' ');
  });
});
