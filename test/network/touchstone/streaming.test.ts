import assert from 'node:assert/strict';
import { readTouchstone, touchstoneReader } from '../../../src/network/touchstone/readTouchstone';
import { dice } from '../../hostile/mutateText';

const encoded = (text: string) => new TextEncoder().encode(text);

function inPieces(name: string, bytes: Uint8Array, cut: () => number) {
  const reader = touchstoneReader(name);
  for (let at = 0; at < bytes.length; ) {
    const end = Math.min(bytes.length, at + cut());
    reader.push(bytes.slice(at, end));
    at = end;
  }
  return reader.finish();
}

const manyPoints = (ports: number, lineEnd: string) =>
  [`# MHz S RI R 50`, '! an invented network', ...Array.from({ length: 60 }, (_, k) => [`${400 + k}.25`, ...Array.from({ length: 2 * ports * ports }, (_unused, i) => ((k * 7 + i * 3) % 19) / 20 - 0.45)].join(' ')), ''].join(lineEnd);

const files: readonly (readonly [what: string, name: string, text: string])[] = [
  ['LF', 'a.s1p', manyPoints(1, '\n')],
  ['CR LF', 'a.s2p', manyPoints(2, '\r\n')],
  ['CR', 'a.s2p', manyPoints(2, '\r')],
  ['CR LF with empty lines', 'a.s1p', manyPoints(1, '\r\n\r\n')],
  ['a mistake in line 41', 'a.s1p', manyPoints(1, '\n').replace('438.25', '438,25')],
  ['a mistake behind CR LF', 'a.s1p', manyPoints(1, '\r\n').replace('438.25', '438.2.5')],
  ['letters of two bytes', 'a.s1p', `\ufeff! Ω µ °\r\n${manyPoints(1, '\r\n')}`],
  ['version 2', 'a.ts', '[Version] 2.0\r\n# MHz S RI R 50\r\n[Number of Ports] 1\r\n[Number of Frequencies] 2\r\n[Reference]\r\n75\r\n[Network Data]\r\n1 0.1 0.2\r\n2 0.3 0.4\r\n[End]'],
];

describe('reading a Touchstone file in pieces', () => {
  for (const [what, name, text] of files) {
    it(`gives what the whole gives: ${what}`, () => {
      const bytes = encoded(text);
      const whole = readTouchstone(name, bytes);
      assert.deepEqual(readTouchstone(name, text), whole);
      assert.deepEqual(inPieces(name, bytes, () => 1), whole);
      for (let seed = 1; seed <= 25; seed++) {
        const roll = dice(seed);
        const longest = [2, 5, 40, 700][roll(4)];
        assert.deepEqual(inPieces(name, bytes, () => 1 + roll(longest)), whole, `seed ${seed}`);
      }
    });
  }

  it('keeps the place of a mistake', () => {
    const result = inPieces('a.s1p', encoded(files[4][2]), () => 3);
    assert.equal(result.ok ? 0 : result.problem.line, 41);
  });

  it('takes empty pieces and pieces whose memory is used again', () => {
    const reader = touchstoneReader('a.s1p');
    const buffer = new Uint8Array(7);
    const bytes = encoded(files[0][2]);
    reader.push(new Uint8Array(0));
    for (let at = 0; at < bytes.length; at += 7) {
      const count = Math.min(7, bytes.length - at);
      buffer.set(bytes.subarray(at, at + count));
      reader.push(buffer.subarray(0, count));
    }
    buffer.fill(0);
    assert.deepEqual(reader.finish(), readTouchstone('a.s1p', bytes));
  });

  it('gives up on a line without end rather than hold it', () => {
    const reader = touchstoneReader('a.s1p');
    for (let i = 0; i < 40; i++) reader.push(new Uint8Array(10_000).fill(48));
    const result = reader.finish();
    assert.ok(!result.ok && /longer than \d+ characters/.test(result.problem.message) && result.problem.line === 1);
  });

  it('reads a large file point by point', () => {
    const points = 40_000;
    const reader = touchstoneReader('a.s1p');
    reader.push(encoded('# Hz S RI R 50\n'));
    for (let k = 1; k <= points; k++) reader.push(encoded(`${k} ${k / points} 0\n`));
    const result = reader.finish();
    assert.ok(result.ok);
    assert.equal(result.data.frequencyHz.length, points);
    assert.ok(result.data.sRe.every((value, i) => value === (i + 1) / points));
  });
});
