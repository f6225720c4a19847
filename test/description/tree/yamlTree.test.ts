import assert from 'node:assert/strict';
import fc from 'fast-check';
import { applyEdits } from '../../../src/base/diagnostic';
import type { TreeNode } from '../../../src/description/tree/treeNode';
import { yamlTree } from '../../../src/description/tree/yamlTree';

type Plain = string | null | Plain[] | { [key: string]: Plain };

function plain(node: TreeNode | null): Plain {
  if (!node) return null;
  if (node.form === 'scalar') return node.phrase.text;
  if (node.form === 'list') return node.items.map(plain);
  return Object.fromEntries(node.entries.map(({ key, value }) => [key.phrase.text, plain(value)]));
}

function scalars(node: TreeNode | null): Extract<TreeNode, { form: 'scalar' }>[] {
  if (!node) return [];
  if (node.form === 'scalar') return [node];
  return node.form === 'list' ? node.items.flatMap(scalars) : node.entries.flatMap(({ key, value }) => [...scalars(key), ...scalars(value)]);
}

/** Codes with the text that each one points at. */
const told = (text: string) => yamlTree(text).diagnostics.map(({ code, span }) => `${code}: ${text.slice(span.start, span.end)}`);

describe('the tree of a text', () => {
  const readings: [string, string, Plain][] = [
    ['words that YAML takes for numbers or null', 'null: ~\n00: 1e3\nyes: 0x1F\non: 1_000', { null: '~', '00': '1e3', yes: '0x1F', on: '1_000' }],
    ['an empty text', '', null],
    ['comments only', '# nothing yet\n', null],
    ['a byte order mark', '\ufeffa: 1', { a: '1' }],
    ['a marked start', '---\na: 1\n', { a: '1' }],
    ['CR LF', 'a: 1\r\nb:\r\n  - c\r\n', { a: '1', b: ['c'] }],
    ['nothing after a colon', 'a:\nb: ""\n', { a: null, b: '' }],
    ['a phrase over several lines', 'a: one\n  two\n\n  three # end\n', { a: 'one two three' }],
    ['double quotes with escapes', 'a: "x\\u00b5 \\"y\\" \\\n   z"', { a: 'xµ "y" z' }],
    ['single quotes', "a: 'it''s: # so'", { a: "it's: # so" }],
    ['a folded block', 'a: >\n  one\n  two\nb: 1', { a: 'one two', b: '1' }],
    ['a literal block', 'a: |-\n  one\n    two\n', { a: 'one   two' }],
    ['flow style', 'bank: {0b00: 1.1 pF, 0b01: 2.3 pF}\nlist: [a b, "c, d"]', { bank: { '0b00': '1.1 pF', '0b01': '2.3 pF' }, list: ['a b', 'c, d'] }],
    ['brackets inside a phrase', 'caps: capacitor [1 pF, 2.2 pF] Q 30', { caps: 'capacitor [1 pF, 2.2 pF] Q 30' }],
  ];
  for (const [name, text, expected] of readings) {
    it(`reads ${name}`, () => {
      assert.deepEqual(plain(yamlTree(text).root), expected);
      assert.deepEqual(yamlTree(text).diagnostics, []);
    });
  }

  it('leads from each character of a phrase back to the text', () => {
    const text = 'a: one\n   two\nb: "q\\u00b5 \\n z"\nc: >\n   fo\n   ld\nd: \'it\'\'s\'\n';
    const characters = scalars(yamlTree(text).root).flatMap(({ phrase }) => [...phrase.text].map((char, i) => [char, text[phrase.at(i)]]));
    for (const [char, there] of characters) {
      if (/[a-pr-z']/.test(char)) assert.equal(there, char);
    }
    const quoted = scalars(yamlTree(text).root)[3];
    assert.equal(text.slice(quoted.phrase.at(1), quoted.phrase.at(2)), '\\u00b5', 'an escape is one character of the phrase');
    assert.equal(text[quoted.phrase.at(quoted.phrase.text.length)], '"', 'the end is before the closing mark');
  });

  it('keeps places inside the text and in order, whatever the scalar', () => {
    fc.assert(fc.property(fc.string({ unit: fc.constantFrom('a', ' ', '\n', '"', "'", '\\', 'n', 'é', '𝕏', ':', '#') }), fc.constantFrom('"', "'", ''), (inside, quote) => {
      const text = `k: ${quote}${inside}${quote}\n`;
      for (const { phrase } of scalars(yamlTree(text).root)) {
        let before = 0;
        for (let i = 0; i <= phrase.text.length; i++) {
          const at = phrase.at(i);
          assert.ok(at >= before && at <= text.length);
          before = at;
        }
      }
    }), { numRuns: 300 });
  });
});

describe('what YAML has and a description has not', () => {
  const refused: [string, string[]][] = [
    ['a: &x 3', ['yaml-anchor: &x']],
    ['a: 3\nb: *x', ['yaml-alias: *x']],
    ['a: !!str 3', ['yaml-tag: !!str']],
    ['a: !local 3', ['yaml-tag: !local']],
    ['<<: 3\na: 1', ['yaml-merge: <<']],
    ['a: 1\n---\nb: 2\n', ['yaml-documents: ---']],
    ['? [a, b]\n: 3\nc: 1', ['complex-key: [a, b]']],
    ['a: 1\nb: 2\na: 3', ['duplicate-key: a']],
    ['a: \u0002b', ['control-character: \u0002']],
  ];
  for (const [text, expected] of refused) it(`refuses ${JSON.stringify(text)}`, () => assert.deepEqual(told(text), expected));

  it('keeps the first of two keys', () => assert.deepEqual(plain(yamlTree('a: 1\nb: 2\na: 3').root), { a: '1', b: '2' }));
  it('names a second document and reads the first', () => assert.deepEqual(plain(yamlTree('a: 1\n---\nb: 2\n').root), { a: '1' }));
});

describe('traps of YAML', () => {
  // Text, what is told where, and how the text is read all the same.
  const traps: [string, string, string[], Plain][] = [
    ['a second colon', 'title: Orchard: frost\nz0: 50 Ω', ['second-colon: :'], { title: 'Orchard: frost', z0: '50 Ω' }],
    ['a missing space', 'z0:50 Ω\ntitle: x', ['missing-space: :'], { z0: '50 Ω', title: 'x' }],
    ['a missing space on the last line', 'title: x\nz0:50 Ω\n', ['missing-space: :'], { title: 'x', z0: '50 Ω' }],
    ['missing spaces everywhere', 'a:1\nb:2', ['missing-space: :', 'missing-space: :'], { a: '1', b: '2' }],
    ['a missing space in braces', 'a: {file:wet.s1p, fixture: [b]}', ['missing-space: :'], { a: { file: 'wet.s1p', fixture: ['b'] } }],
    ['a phrase that starts with a dash', 'load: - j37 Ω\nz0: 1', ['phrase-start: - j37 Ω'], { load: '- j37 Ω', z0: '1' }],
    ['a phrase that starts with a bar', 'load: || 2 pF\nz0: 1', ['phrase-start: || 2 pF'], { load: '|| 2 pF', z0: '1' }],
    ['a phrase that starts with >', 'goal: >= 3 dB\nz0: 1', ['phrase-start: >= 3 dB'], { goal: '>= 3 dB', z0: '1' }],
    ['a phrase that starts with @', 'a: @home', ['phrase-start: @home'], { a: '@home' }],
    ['a tab', 'ladder:\n\t- series L1: 3 nH\n', ['tab: \t'], { ladder: [{ 'series L1': '3 nH' }] }],
    ['a list on the line of its key', 'ladder: - series L1: 3 nH\nz0: 1', ['list-on-key-line: - series L1: 3 nH'], { ladder: [{ 'series L1': '3 nH' }], z0: '1' }],
    ['text after brackets', 'a: [1 pF, 2 pF] Q 30', ['text-after-bracket: [1 pF, 2 pF] Q 30'], { a: '[1 pF, 2 pF] Q 30' }],
    ['commas in braces', 'a: {b: 50 Ω, 11 mm, vf 0.66}', ['flow-comma: 50 Ω, 11 mm, vf 0.66'], { a: { b: '50 Ω, 11 mm, vf 0.66' } }],
    ['commas in brackets', 'fixture: [line F1: 50 Ω, 11 mm, line F2: 1]', ['flow-comma: 50 Ω, 11 mm'], { fixture: [{ 'line F1': '50 Ω, 11 mm' }, { 'line F2': '1' }] }],
    ['a comment that cuts a phrase', 'title: Board #4\nz0: 1', ['silent-comment: #4'], { title: 'Board', z0: '1' }],
  ];
  for (const [name, text, expected, reading] of traps) {
    it(`explains ${name}`, () => {
      assert.deepEqual(told(text), expected);
      assert.deepEqual(plain(yamlTree(text).root), reading);
    });
  }
  for (const [name, text, , reading] of traps.filter(([, , [first]]) => !first.startsWith('silent'))) {
    it(`mends ${name}`, () => {
      const edits = yamlTree(text).diagnostics.flatMap(({ fixes }) => fixes?.[0].edits ?? []);
      const mended = applyEdits(text, edits);
      assert.deepEqual(plain(yamlTree(mended).root), reading);
      assert.deepEqual(told(mended), []);
    });
  }

  it('leaves comments alone that are meant as such', () => {
    for (const text of ['a: 1 # c', 'a: 1  #c', '#c\na: 1', 'a:\n  #c\n  - b', 'a: 1 ## c']) assert.deepEqual(told(text), []);
  });

  it('tells marks that are never closed at their beginning', () => {
    assert.deepEqual(told('a: "unclosed\nb: 2\n'), ['unclosed-quote: "']);
    assert.deepEqual(told('a: [1, 2\nb: 3'), ['unclosed-bracket: [']);
    assert.deepEqual(told('a: {b: c'), ['unclosed-bracket: {']);
  });

  it('tells a dash at a wrong column without an echo', () => {
    assert.deepEqual(yamlTree('ladder:\n    - a\n   - b\n').diagnostics.map((each) => each.code), ['bad-indentation']);
  });
});

describe('a text with a line that YAML cannot read', () => {
  const broken: [string, string, string[], Plain][] = [
    ['an unclosed quotation mark', 'title: "Orch\nz0: 50 Ω\nload:\n  - b\n', ['unclosed-quote: "'], { z0: '50 Ω', load: ['b'] }],
    ['an unclosed bracket', 'a: [1, 2\nz0: 50 Ω\n', ['unclosed-bracket: ['], { z0: '50 Ω' }],
    ['a stray bracket', 'z0: 50 Ω\nsource:]\ntitle: x\nload: y\n', ['missing-space: :'], { z0: '50 Ω', title: 'x', load: 'y' }],
    ['words at the wrong column', 'ladder:\n    - a\n   - b\nz0: 1\n', ['bad-indentation:    '], { ladder: ['a'], z0: '1' }],
    ['text after a quotation mark', 'title: "a" b\nz0: 1\n', ['text-after-end: b'], { z0: '1' }],
    ['nothing but words', 'z0: 1\nwords\nload: x\n', ['missing-colon: words'], { z0: '1', load: 'x' }],
    ['words, and an anchor before them', 'z0: &a 1\nwords\nload: x\n', ['yaml-anchor: &a', 'missing-colon: words'], { z0: '1', load: 'x' }],
    ['lines below a phrase', 'a: 1\n  b: 2\nc: 3\n', ['bad-indentation: 1'], { a: '1', c: '3' }],
  ];
  for (const [name, text, expected, reading] of broken) {
    it(`reads the others beside ${name}`, () => {
      assert.deepEqual(told(text), expected);
      assert.deepEqual(plain(yamlTree(text).root), reading);
    });
  }
});

describe('texts against the reader', () => {
  const hostile: [string, string][] = [
    ['brackets', '['.repeat(20_000)],
    ['braces', '{a: '.repeat(5_000)],
    ['dashes', '- '.repeat(5_000)],
    ['keys on a line', 'a: '.repeat(5_000)],
    ['deep indentation', Array.from({ length: 2_000 }, (_, i) => `${' '.repeat(i)}a:`).join('\n')],
    ['question marks', '? '.repeat(5_000)],
    ['a long text', 'a: 1\n'.repeat(100_000)],
  ];
  for (const [name, text] of hostile) {
    it(`refuses ${name}`, () => {
      const { root, diagnostics } = yamlTree(text);
      assert.equal(root, null);
      assert.match(diagnostics[0].code, /^(nested-too-deeply|text-too-long)$/);
    });
  }

  it('caps the errors of YAML', () => {
    const { diagnostics } = yamlTree(Array.from({ length: 2_000 }, (_, i) => `a${i}: "b" c`).join('\n'));
    assert.ok(diagnostics.length > 0 && diagnostics.length <= 100, String(diagnostics.length));
  });

  it('reads any text, with places inside it', () => {
    const unit = fc.oneof(fc.constantFrom('a', ':', ' ', '\n', '-', '#', '"', "'", '[', ']', '{', '}', ',', '&', '*', '!', '|', '>', '%', '@', '\t', '\r', '?', '\\', '---\n', ': ', '- ', '\u0000', '\ufeff', '\u2028'), fc.string());
    fc.assert(fc.property(fc.array(unit, { maxLength: 60 }), (pieces) => {
      const text = pieces.join('');
      const { root, diagnostics } = yamlTree(text);
      for (const { span } of [...diagnostics, ...scalars(root)]) assert.ok(span.start >= 0 && span.start <= span.end && span.end <= text.length);
    }), { numRuns: 1_000 });
  });
});
