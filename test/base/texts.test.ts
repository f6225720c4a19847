import assert from 'node:assert/strict';
import fc from 'fast-check';
import { applyEdits } from '../../src/base/diagnostic';
import { lineMap } from '../../src/base/lineMap';
import { editDistance, nearestWord } from '../../src/base/nearestWord';
import { contains, overlaps, span } from '../../src/base/span';

const texts = fc.string({ unit: fc.constantFrom('a', 'Ω', '𝕏', '\n', '\r', '\r\n', ' '), maxLength: 40 });

describe('lines of a text', () => {
  it('end in LF, CR LF or a lone CR', () => {
    const map = lineMap('ab\ncd\r\ne\rf');
    assert.equal(map.lineCount, 4);
    assert.deepEqual([0, 1, 2, 3].map((line) => map.lineSpan(line)), [{ start: 0, end: 2 }, { start: 3, end: 5 }, { start: 7, end: 8 }, { start: 9, end: 10 }]);
    assert.deepEqual(map.positionAt(4), { line: 1, character: 1 });
    assert.deepEqual(map.positionAt(7), { line: 2, character: 0 });
    assert.equal(map.offsetAt({ line: 1, character: 2 }), 5);
  });

  it('are clamped where a place is outside', () => {
    const map = lineMap('ab\ncd');
    assert.deepEqual(map.positionAt(99), { line: 1, character: 2 });
    assert.deepEqual(map.positionAt(-3), { line: 0, character: 0 });
    assert.equal(map.offsetAt({ line: 9, character: 9 }), 5);
    assert.equal(map.offsetAt({ line: 0, character: 9 }), 2);
    assert.deepEqual(lineMap('').lineSpan(0), { start: 0, end: 0 });
  });

  it('lead from an offset to a position and back', () => {
    fc.assert(fc.property(texts, fc.nat(60), (text, at) => {
      const map = lineMap(text);
      assert.equal(map.lineCount, text.split(/\r\n|\r|\n/).length);
      const offset = Math.min(at, text.length);
      const position = map.positionAt(offset);
      // Between CR and LF there is no column of the line; the place is its end.
      const inLineEnd = text[offset - 1] === '\r' && text[offset] === '\n';
      assert.equal(map.offsetAt(position), inLineEnd ? offset - 1 : offset);
    }), { numRuns: 300 });
  });
});

describe('the nearest word', () => {
  for (const [word, expected] of [['titel', 'title'], ['Title', 'title'], ['goal', 'goals'], ['lader', 'ladder'], ['lod', 'load'], ['xyzzy', null], ['', null], ['zO', 'z0'], ['x'.repeat(100), null]] as const) {
    it(`to «${word.slice(0, 20)}» is ${expected}`, () => assert.equal(nearestWord(word, ['title', 'load', 'ladder', 'goals', 'z0']), expected));
  }

  it('counts a swap of neighbours as one slip', () => {
    assert.equal(editDistance('seires', 'series'), 1);
    assert.equal(editDistance('', 'abc'), 3);
    assert.equal(editDistance('kitten', 'sitting'), 3);
  });

  it('is a distance', () => {
    const word = fc.string({ unit: fc.constantFrom('a', 'b', 'c'), maxLength: 7 });
    fc.assert(fc.property(word, word, (a, b) => {
      const distance = editDistance(a, b);
      assert.equal(distance, editDistance(b, a));
      assert.equal(distance === 0, a === b);
      assert.ok(distance >= Math.abs(a.length - b.length) && distance <= Math.max(a.length, b.length));
    }), { numRuns: 300 });
  });

  it('is the first of equally near ones', () => assert.equal(nearestWord('cas', ['cat', 'car', 'cap']), 'cat'));
});

describe('edits of a text', () => {
  it('are applied together, in whatever order they come', () => {
    assert.equal(applyEdits('series L1: 5 nh', [{ span: span(13, 15), text: 'nH' }, { span: span(7, 9), text: 'L2' }, { span: span(15, 15), text: ' Q 40' }]), 'series L2: 5 nH Q 40');
  });
  it('may not overlap', () => {
    assert.throws(() => applyEdits('abcdef', [{ span: span(0, 3), text: '' }, { span: span(2, 4), text: '' }]), RangeError);
    assert.equal(applyEdits('abcdef', [{ span: span(0, 3), text: 'x' }, { span: span(3, 4), text: 'y' }]), 'xyef');
  });
  it('know whether places touch', () => {
    assert.ok(overlaps(span(0, 3), span(2, 5)) && !overlaps(span(0, 3), span(3, 5)));
    assert.ok(contains(span(2, 4), 2) && contains(span(2, 4), 4) && !contains(span(2, 4), 5));
  });
});
