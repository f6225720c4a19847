import assert from 'node:assert/strict';
import { buildModel } from '../../src/description/buildModel';
import { textAtMost } from '../../src/description/limits';
import { readDescription } from '../../src/description/readDescription';
import { tidy } from '../../src/description/tidy';

/** So much of a piece as a description may be long. */
const fill = (piece: string, frame = 100) => piece.repeat(Math.floor((textAtMost - frame) / piece.length));
const numbered = (count: number, line: (i: number) => string) => Array.from({ length: count }, (_, i) => line(i)).join('');
const head = 'ohmward: 1\nload: 5 Ω\n';

/** Each of these took minutes, or the whole stack, in some way of reading them. */
const texts: readonly [string, string][] = [
  ['anchors on one line', `a: [${fill('&a b, ')}]`],
  ['anchors on many lines', fill('&a b: c\n')],
  ['comments that cut phrases', fill('a: b #c\n')],
  ['keys that are not known', head + numbered(14_000, (i) => `k${i}: 1\n`)],
  ['keys in one entry', `${head}ladder:\n  - a: 1\n${numbered(12_000, (i) => `    k${i}: 1\n`)}`],
  ['commas in braces', `a: {b: ${fill('c, ')}}`],
  ['second colons', fill('a: b: c\n')],
  ['empty entries', `a:\n${fill('- \n')}`],
  ['empty lines', `a: b${fill('\n')}`],
  ['comments', `${fill('# x\n')}a: 1`],
  ['complex keys', fill('? [a]\n: b\n')],
  ['documents', fill('---\na: 1\n')],
  ['an open quotation mark', `a: "${fill('x\n')}`],
  ['one long phrase', `title: ${fill('abc def ')}`],
  ['a table', `ohmward: 1\nladder: []\nbands: {a: 1 GHz}\nload:\n${numbered(10_000, (i) => `  ${i + 1} MHz: 5 Ω\n`)}`],
];

describe('large descriptions', function () {
  this.timeout(120_000);

  for (const [name, text] of texts) {
    it(`are read in bounded time: ${name}`, () => {
      assert.ok(text.length <= textAtMost);
      const start = performance.now();
      const description = readDescription(text, { expressions: true });
      buildModel(description, new Map());
      tidy(text);
      assert.ok(description.diagnostics.length <= 100);
      // They take one to three seconds here; a way of reading that grows with the square took over a minute.
      assert.ok(performance.now() - start < 30_000);
    });
  }
});
