import assert from 'node:assert/strict';
import fc from 'fast-check';
import { applyEdits } from '../../src/base/diagnostic';
import { sameMeaning, tidy } from '../../src/description/tidy';
import { yamlTree } from '../../src/description/tree/yamlTree';
import { seeds } from '../hostile/descriptionSeeds';
import { dice } from '../hostile/mutateText';

describe('laying a description out', () => {
  const cases: [string, string, string][] = [
    ['one space after colons and dashes', 'a:   1\nb :  2\nc:\n  -   d:  3\n', 'a: 1\nb: 2\nc:\n  - d: 3\n'],
    ['two columns for each level', 'a:\n     b:\n       c: 1\n     d: 2\n', 'a:\n  b:\n    c: 1\n  d: 2\n'],
    ['lists below their keys', 'a:\n- b\n-   - c\n    - d\n', 'a:\n  - b\n  - - c\n    - d\n'],
    ['entries with several keys', 'a:\n-    b: 1\n     c: 2\n', 'a:\n  - b: 1\n    c: 2\n'],
    ['no white space at line ends', 'a: 1  \nb:\t\n  - c \n', 'a: 1\nb:\n  - c\n'],
    ['one line end at the end', 'a: 1', 'a: 1\n'],
    ['no empty lines at either end, and one between', '\n\na: 1\n\n\n\nb: 2\n\n\n', 'a: 1\n\nb: 2\n'],
    ['comments with what they stand beside', 'a:\n    # first\n    b: 1\n    # last\n# about c\nc: 2\n', 'a:\n  # first\n  b: 1\n  # last\n# about c\nc: 2\n'],
    ['comments at their column where they fit', 'a:   1    # x\nb: 22    # y\n', 'a: 1      # x\nb: 22    # y\n'],
    ['phrases over several lines moved as a whole', 'a:\n    b: one\n      two\n    c: >\n      x\n        y\nd: 1\n', 'a:\n  b: one\n    two\n  c: >\n    x\n      y\nd: 1\n'],
    ['a value on the next line', 'a:\n      1\n', 'a:\n  1\n'],
    ['marks inside quotes left alone', 'a:  "x   # y"   # z\n', 'a: "x   # y"    # z\n'],
    ['braces left as they are', 'a:  {b:  1 ,c: 2}\n', 'a: {b:  1 ,c: 2}\n'],
    ['line ends of Windows', 'a:   1\r\nb:\r\n- c', 'a: 1\r\nb:\r\n  - c\r\n'],
    ['a byte order mark', '\ufeffa:   1\n', '\ufeffa: 1\n'],
  ];
  for (const [name, from, to] of cases) {
    it(`makes ${name}`, () => {
      const { text, edits } = tidy(from);
      assert.equal(text, to);
      assert.equal(applyEdits(from, edits), to);
      assert.deepEqual(tidy(to), { text: to, edits: [] }, 'and leaves it so');
    });
  }

  it('changes only white space', () => {
    for (const [, from] of cases) {
      for (const { span, text } of tidy(from).edits) assert.match(from.slice(span.start, span.end) + text, /^\s*$/);
    }
  });

  it('leaves alone what YAML cannot read, and what is no mapping', () => {
    for (const text of ['a:   1\n\tb: 2', 'a:   "x', 'a: &x   1', '-   a', '   ', '', 'a:   1\n---\nb:   2\n', '? a\n:   1\n']) assert.deepEqual(tidy(text), { text, edits: [] });
  });

  it('leaves well-laid descriptions alone', () => {
    for (const text of seeds) assert.deepEqual(tidy(text).edits, []);
  });
});

/** A description with its white space thrown about: levels indented by another step, gaps, empty lines, comments. */
function disorder(text: string, seed: number): string {
  const roll = dice(seed);
  const step = 1 + roll(5);
  const lines = text.split('\n').flatMap((line) => {
    const [, indent, dash, rest] = /^( *)(- )?(.*)$/.exec(line) ?? ['', '', '', line];
    const gap = dash ? 1 + roll(3) : 0;
    const moved = ' '.repeat((indent.length / 2) * step) + (dash ? `-${' '.repeat(gap)}` : '') + rest.replace(/^([\w ]+):(?= )/, (found) => found + ' '.repeat(roll(4)));
    return [...(roll(6) === 0 ? ['', ''] : []), ...(roll(6) === 0 ? ['# note'] : []), moved + ' '.repeat(roll(2))];
  });
  return lines.join('\n');
}

describe('laying out descriptions in disorder', () => {
  // Entries with lines of their own below a dash depend on its gap, so they stay as they are.
  const simple = seeds.filter((text) => !/^ *- .*\n +fixture:/m.test(text));

  it('keeps their meaning and comments, and is done after one time', () => {
    assert.ok(simple.length >= 2);
    fc.assert(fc.property(fc.nat(), fc.constantFrom(...simple), (seed, original) => {
      const from = disorder(original, seed);
      const before = yamlTree(from);
      const { text } = tidy(from);
      const comments = (all: string) => all.split('\n').filter((line) => line.includes('#')).map((line) => line.slice(line.indexOf('#')).trimEnd());
      assert.deepEqual(before.diagnostics, []);
      assert.ok(sameMeaning(before.root, yamlTree(text).root));
      assert.deepEqual(comments(text), comments(from));
      assert.equal(tidy(text).text, text);
      const laid = text.split('\n').filter((line) => line.trim() !== '' && !line.trimStart().startsWith('#'));
      const expected = original.split('\n').filter((line) => line.trim() !== '');
      assert.deepEqual(laid.map((line) => line.replace(/ +#.*/, '')), expected.map((line) => line.replace(/ +#.*/, '')), 'the layout of the original comes back');
    }), { numRuns: 200 });
  });
});
