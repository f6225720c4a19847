import assert from 'node:assert/strict';
import fc from 'fast-check';
import { applyEdits, type TextEdit } from '../../src/base/diagnostic';
import { insertElements, replaceInScalar, replaceScalar, setElementPhrase, setElementValue } from '../../src/description/edits';
import type { ElementSyntax } from '../../src/description/syntax';
import { isPlainSafe, writeScalar } from '../../src/description/writeScalar';
import { yamlTree } from '../../src/description/tree/yamlTree';
import { writeQuantity } from '../../src/quantity/printQuantity';
import { marks, read } from './support';

const text = `ohmward: 1
load: 18 - j37 Ω      # invented
ladder:               # from the load
  - series L1: 13 nH ±5 % from coils   # keep me
  - shunt C1: solve from caps or none Q 30   # and me
  - series L2: "solve 1 .. 33 nH"
  - {shunt C2: 3 pF}
  - series L3: pair 5.6 nH
  - line T1: 50 Ω, solve 2 mm .. 40 mm, vf 0.55
  - line T2: 50 Ω, 6 mm
  - shunt C3: not fitted
  - series L4: >
      4.7 nH
      from coils
  - series R1:
parts:
  coils: inductor E24 1 nH .. 47 nH
  caps: capacitor E24 1 pF .. 47 pF
`;

const after = (edits: readonly TextEdit[], from = text) => applyEdits(from, edits);
const element = (from: string, name: string): ElementSyntax => {
  const found = read(from).syntax.ladder?.elements.find((each) => each.name.value === name);
  assert.ok(found, name);
  return found;
};
const partIn = (from: string, name: string) => {
  const { body } = element(from, name);
  return body.form === 'branch' && body.branch.form === 'part' ? body.branch : null;
};
/** The lines that differ, as they are afterwards. */
const changed = (result: string, from = text) => result.split('\n').filter((line, i) => line !== from.split('\n')[i]);

describe('edits of a description', () => {
  const cases: [string, string, string, string][] = [
    ['a value, with its figures and family kept', 'L1', '12 nH', '  - series L1: 12 nH ±5 % from coils   # keep me'],
    ['a value with the same family', 'L1', '12 nH from coils', '  - series L1: 12 nH ±5 % from coils   # keep me'],
    ['a value with another family', 'L1', '12 nH from caps', '  - series L1: 12 nH ±5 % from caps   # keep me'],
    ['a solve, with the figures after it kept', 'C1', '2.2 pF from caps', '  - shunt C1: 2.2 pF from caps Q 30   # and me'],
    ['a place that stays empty', 'C1', 'not fitted', '  - shunt C1: not fitted   # and me'],
    ['a solve in quotes', 'L2', '6.8 nH', '  - series L2: "6.8 nH"'],
    ['a bridge', 'L2', '0 Ω', '  - series L2: 0 Ω'],
    ['a value in braces', 'C2', '4.7 pF', '  - {shunt C2: 4.7 pF}'],
    ['a pair', 'L3', '6.8 nH', '  - series L3: pair 6.8 nH'],
    ['the length of a line', 'T1', '12.4 mm', '  - line T1: 50 Ω, 12.4 mm, vf 0.55'],
    ['a known length', 'T2', '7 mm', '  - line T2: 50 Ω, 7 mm'],
    ['an empty place', 'C3', '1 pF', '  - shunt C3: 1 pF'],
    ['a value in a block of text', 'L4', '5.6 nH', '      5.6 nH'],
    ['a missing value', 'R1', '5 Ω', '  - series R1: 5 Ω'],
  ];
  for (const [name, of, value, line] of cases) {
    it(`put in ${name}, and touch one line`, () => {
      const result = after(setElementValue(read(text).syntax, of, value));
      assert.deepEqual(changed(result), [line]);
    });
  }

  it('do nothing where there is no such element', () => {
    assert.deepEqual(setElementValue(read(text).syntax, 'L9', '1 nH'), []);
    assert.deepEqual(insertElements(read(text).syntax, [{ key: 'series L1', phrase: '1 nH' }]), [], 'the ladder is not to be solved');
  });

  it('re-read to the value that was put in, whatever it was', () => {
    const known = ['L1', 'C1', 'L2', 'C2', 'L3', 'L4'];
    fc.assert(fc.property(fc.constantFrom(...known), fc.double({ min: 1e-3, max: 999, noNaN: true }), fc.boolean(), (name, number, family) => {
      const unit = name.startsWith('C') ? 'F' : 'H';
      const value = number * (unit === 'F' ? 1e-12 : 1e-9);
      const result = after(setElementValue(read(text).syntax, name, `${writeQuantity(value, unit)}${family ? ` from ${unit === 'F' ? 'caps' : 'coils'}` : ''}`));
      const part = partIn(result, name);
      assert.ok(part?.value.form === 'known');
      assert.ok(Math.abs(part.value.value - value) <= 4e-16 * value, `${part.value.value} is not ${value}`);
      assert.equal(result.replace(/.*(L1|C1|L2|C2|L3):.*\n/g, '').split('#').length, text.replace(/.*(L1|C1|L2|C2|L3):.*\n/g, '').split('#').length);
      assert.deepEqual(marks(result, read(result).diagnostics), marks(text, read(text).diagnostics));
    }), { numRuns: 200 });
  });

  it('put phrases into quotes where they need it, and only there', () => {
    const phrases: [string, string][] = [
      ['coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm', '  - series L1: coil 6 turns, diameter 5 mm, length 7 mm, wire 0.8 mm   # keep me'],
      ['3 nH #2', '  - series L1: "3 nH #2"   # keep me'],
      ['- 3 nH', '  - series L1: "- 3 nH"   # keep me'],
      ['a: "b"', "  - series L1: 'a: \"b\"'   # keep me"],
    ];
    for (const [phrase, line] of phrases) assert.deepEqual(changed(after(setElementPhrase(read(text).syntax, 'L1', phrase))), [line]);
    assert.deepEqual(changed(after(setElementPhrase(read(text).syntax, 'C2', 'coil 6 turns, wire 1 mm'))), ['  - {shunt C2: "coil 6 turns, wire 1 mm"}']);
  });

  it('replace inside scalars by the rules of their style', () => {
    const inside = (from: string, word: string, replacement: string) => after(replaceInScalar(from, { start: from.indexOf(word), end: from.indexOf(word) + word.length }, replacement), from);
    assert.equal(inside('a: one two', 'two', 'it"s'), 'a: one it"s');
    assert.equal(inside('a: "one two"', 'two', 'it"s'), 'a: "one it\\"s"');
    assert.equal(inside("a: 'one two'", 'two', "it's"), "a: 'one it''s'");
    assert.equal(inside('a: one two # c', 'two', 'x: y'), 'a: "one x: y" # c');
    assert.equal(inside('a: {b: one two}', 'two', 'x, y'), 'a: {b: "one x, y"}');
    assert.equal(after(replaceScalar('a: "one" # c', { start: 4, end: 7 }, 'two'), 'a: "one" # c'), 'a: two # c');
  });
});

describe('inserting a whole ladder', () => {
  const entries = [{ key: 'shunt C1', phrase: '2.2 pF from caps' }, { key: 'series L1', phrase: '6.8 nH from coils' }];
  const insert = (from: string) => after(insertElements(read(from).syntax, entries), from);
  const lines = '  - shunt C1: 2.2 pF from caps\n  - series L1: 6.8 nH from coils';

  it('takes the place of the phrase', () => {
    assert.equal(insert('ohmward: 1\nladder: solve up to 2 elements\nload: 5 Ω\n'), `ohmward: 1\nladder:\n${lines}\nload: 5 Ω\n`);
    assert.equal(insert('ohmward: 1\nladder: solve up to 2 elements'), `ohmward: 1\nladder:\n${lines}`);
  });

  it('keeps a comment on its line', () => {
    assert.equal(insert('ladder: solve up to 2 elements   # why\nload: 5 Ω\n'), `ladder:   # why\n${lines}\nload: 5 Ω\n`);
  });

  it('keeps line ends and the column of the other lists', () => {
    assert.equal(insert('ladder: solve pi Q 5\r\ngoals:\r\n- dc path\r\n'), 'ladder:\r\n- shunt C1: 2.2 pF from caps\r\n- series L1: 6.8 nH from coils\r\ngoals:\r\n- dc path\r\n');
  });

  it('works in braces', () => {
    const result = insert('{ohmward: 1, load: 5 Ω, ladder: solve pi Q 5}');
    assert.equal(result, '{ohmward: 1, load: 5 Ω, ladder: [{shunt C1: 2.2 pF from caps}, {series L1: 6.8 nH from coils}]}');
    assert.deepEqual(read(result).syntax.ladder?.elements.map(({ name }) => name.value), ['C1', 'L1']);
  });

  it('re-reads as the elements that were put in', () => {
    for (const from of ['ladder: solve up to 2 elements', 'ladder: "solve pi Q 5"  # c\nload: 5 Ω', 'goals:\n    - dc path\nladder: >\n  solve up to\n  2 elements\nload: 5 Ω\n']) {
      const { syntax } = read(insert(from));
      assert.deepEqual(syntax.ladder?.elements.map(({ name, body }) => [name.value, body.form]), [['C1', 'branch'], ['L1', 'branch']], from);
      assert.equal(syntax.ladder?.solve, null);
    }
  });
});

describe('writing a scalar', () => {
  it('reads back as the same phrase, in block and in flow style', () => {
    const piece = fc.oneof(fc.constantFrom('a', ' ', ': ', ' #', "'", '"', '\\', ',', '[', ']', '{', '}', '-', '- ', '|', '>', '&', '*', '!', '%', '@', '?', '---', 'Ω', '𝕏', 'null'), fc.string({ maxLength: 3 }));
    fc.assert(fc.property(fc.array(piece, { minLength: 1, maxLength: 8 }), fc.boolean(), (pieces, flow) => {
      const phrase = pieces.join('').replace(/\s+/g, ' ').trim();
      const { root, diagnostics } = yamlTree(flow ? `a: {b: ${writeScalar(phrase, true)}}\n` : `a: ${writeScalar(phrase, false)}\n`);
      assert.ok(root?.form === 'mapping');
      const value = flow && root.entries[0].value?.form === 'mapping' ? root.entries[0].value.entries[0].value : root.entries[0].value;
      assert.deepEqual(diagnostics, []);
      assert.equal(value?.form === 'scalar' ? value.phrase.text : null, phrase);
    }), { numRuns: 1_000 });
  });

  it('leaves phrases of the language without quotes', () => {
    for (const phrase of ['6.8 nH from coils', '50 Ω, 11 mm, vf 0.66', '1.2 kΩ || 2 pF', 'solve 1 .. 33 nH', '-j37 Ω', '=(1/(2*pi*f0*37 ohm)) Q 180', 'turns 1:2']) assert.ok(isPlainSafe(phrase, false), phrase);
  });
});
