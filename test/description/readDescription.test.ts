import assert from 'node:assert/strict';
import { applyEdits } from '../../src/base/diagnostic';
import { keysAt } from '../../src/description/keys';
import { readDescription } from '../../src/description/readDescription';
import { seeds } from '../hostile/descriptionSeeds';
import { checkMarked, marks, read } from './support';

const head = 'ohmward: 1\nload: 18 - j37 Ω\nladder: []\n';
const told = (text: string) => marks(text, read(text).diagnostics);
/** What is told about a text after the first fix of each mistake. */
const afterFixes = (text: string) => told(applyEdits(text, read(text).diagnostics.flatMap(({ fixes }) => fixes?.[0]?.edits ?? [])));

describe('reading a description', () => {
  it('reads descriptions that use every key without a mistake', () => {
    for (const text of seeds) assert.deepEqual(told(text), []);
    const all = seeds.join('\n');
    for (const { name } of keysAt('description')) assert.match(all, new RegExp(`^${name}:`, 'm'));
  });

  it('keeps names and phrases with their places', () => {
    const text = seeds[0];
    const { syntax } = read(text);
    const at = (span: { start: number; end: number } | undefined) => span && text.slice(span.start, span.end);
    assert.equal(syntax.title?.value, 'Orchard frost sensor, antenna port');
    assert.equal(at(syntax.z0Ohm?.span), '50 Ω');
    assert.deepEqual(syntax.bands.map((band) => at(band.name.span)), ['uplink', 'rx2']);
    assert.deepEqual(syntax.load?.cases.map((each) => at(each.name?.span)), ['free air', 'wet bark']);
    assert.equal(at(syntax.load?.cases[1].fixture?.[0].phrase), '"50 Ω, 14 mm, vf 0.66"');
    assert.deepEqual(syntax.ladder?.elements.map((element) => at(element.span)), ['series L1: 13 nH from coils', 'shunt C1: solve from caps', 'series C2: solve from caps or none']);
    assert.equal(at(syntax.ladder?.keySpan), 'ladder');
    assert.deepEqual(syntax.goals.map((goal) => at(goal.span)), syntax.goals.map((goal) => goal.text));
    assert.deepEqual(syntax.families.map((family) => at(family.name.span)), ['coils', 'caps', 'drawer', 'measured']);
  });

  it('lists the files that a description names, in the order of the text', () => {
    assert.deepEqual(read(seeds[0]).files.map(({ path, kind }) => `${kind} ${path}`), ['touchstone free.s1p', 'touchstone wet.s1p', 'csv stock.csv', 'pattern vendor/*.s2p']);
    assert.deepEqual(read(seeds[1]).files.map(({ path }) => path), ['filter.s2p', 'free.s1p', 'wet.s1p']);
  });

  it('serves names of let to the whole text, and to those after them in let', () => {
    const text = 'ohmward: 1\nload: = r\nladder:\n  - series L1: =(2*l)\nlet:\n  l: 3 nH\n  r: 12 Ω\n';
    const { syntax, diagnostics } = read(text);
    assert.deepEqual(marks(text, diagnostics), []);
    const body = syntax.ladder?.elements[0].body;
    assert.ok(body?.form === 'branch' && body.branch.form === 'part' && body.branch.value.form === 'known');
    assert.ok(Math.abs(body.branch.value.value - 6e-9) < 1e-20);
    assert.equal(told(`${head}let:\n  b: = 2*a\n  a: 3 nH\n`).length, 1, 'a name that is defined later');
  });

  it('refuses expressions where they may not run', () => {
    const text = `${head}let:\n  b: = 2*3 nH\n`;
    assert.equal(readDescription(text, { expressions: true }).diagnostics.length, 0);
    assert.equal(readDescription(text, { expressions: false }).diagnostics.length, 1);
  });
});

describe('mistakes and their places', () => {
  const cases: [string, string][] = [
    ['an unknown key', `titel: x
^^^^^ unknown-key
${head}`],
    ['an unknown key inside a case', `ohmward: 1
ladder: []
load:
  wet: {file: a.s1p, fixtur: []}
                     ^^^^^^ unknown-key
`],
    ['another version', `ohmward: 2
         ^ language-version
load: 18 - j37 Ω
ladder: []
`],
    ['no version', `load: 18 - j37 Ω
^^^^^^^^^^^^^^^^ missing-key
ladder: []
`],
    ['neither load nor ladder', `ohmward: 1
^^^^^^^^^^ missing-key
^^^^^^^^^^ missing-key
`],
    ['a key without a value', `ohmward: 1
load: 18 - j37 Ω
ladder:
^^^^^^ missing-value
`],
    ['a list where a phrase belongs', `${head}z0:
  - 50 Ω
  ^^^^^^ wrong-shape
`],
    ['a phrase where lines belong', `${head}bands: 863 .. 870 MHz
       ^^^^^^^^^^^^^^ wrong-shape
`],
    ['a ladder without dashes', `ohmward: 1
load: 18 - j37 Ω
ladder:
  series L1: 3 nH
  ^^^^^^^^^ ladder-without-dashes
  shunt C1: 2 pF
`],
    ['two keys in one entry', `ohmward: 1
load: 18 - j37 Ω
ladder:
  - series L1: 3 nH
    shunt C1: 2 pF
    ^^^^^^^^ two-keys
`],
    ['a missing space in a ladder', `ohmward: 1
load: 18 - j37 Ω
ladder:
  - series L1:6.8 nH
             ^ missing-space
`],
    ['a dash alone', `ohmward: 1
load: 18 - j37 Ω
ladder:
  - series L1: 3 nH
  -
  ^ missing-value
`],
    ['an element without a phrase', `ohmward: 1
load: 18 - j37 Ω
ladder:
  - series L1:
    ^^^^^^^^^ missing-value
  - L2
    ^^ element-without-phrase
`],
    ['z0 of zero', `${head}z0: 0 Ω
    ^^^ not-positive
`],
    ['an unknown spread', `${head}spread: gaussian
        ^^^^^^^^ unknown-word
`],
    ['builds that are none', `${head}builds: 0
        ^ out-of-range
`],
    ['a symbol that C does not take', `${head}firmware:
  header: a.h
  symbol: 2codes
          ^^^^^^ bad-symbol
`],
    ['firmware without a file', `${head}firmware:
^^^^^^^^ missing-key
  symbol: codes
`],
    ['a band among listed channels', `${head}channels: [863 MHz, uplink]
                    ^^^^^^ band-in-list
`],
    ['another impedance after file', `ohmward: 1
ladder: []
load:
  wet: {file: 12 Ω}
              ^^^^ not-a-file
`],
    ['a goal that is a mapping', `${head}goals:
  - gain: 3 dB
    ^^^^^^^^^^ wrong-shape
`],
    ['a measurement without a file', `${head}measured:
  - fixture: []
    ^^^^^^^^^^^ missing-key
`],
  ];
  for (const [name, marked] of cases) it(`marks ${name}`, () => checkMarked(marked, (text) => read(text).diagnostics));

  it('says something about a text that is no mapping, and about one that is empty', () => {
    assert.deepEqual(read('- a\n- b').diagnostics.map((each) => each.code), ['wrong-shape']);
    assert.deepEqual(read('hello').diagnostics.map((each) => each.code), ['wrong-shape']);
    for (const text of ['', '# later\n', '---\n']) assert.deepEqual(read(text).diagnostics.map((each) => each.code), ['empty-description'], JSON.stringify(text));
  });

  it('mends what it can', () => {
    const mended = [
      'titel: x\nohmward: 1\nload: 18 - j37 Ω\nladder: []\n',
      'load: 18 - j37 Ω\nladder: []\n',
      'ohmward: 2\nload: 18 - j37 Ω\nladder: []\n',
      'ohmward: 1\nload: 18 - j37 Ω\nladder:\n  series L1: 3 nH\n  shunt C1: 2 pF\n',
      'ohmward: 1\nload: 18 - j37 Ω\nladder:\n  - series L1: 3 nH\n    shunt C1: 2 pF\n',
      'ohmward: 1\nload: 18 - j37 Ω\nladder:\n  - series L1:6.8 nH\n',
      'ohmward: 1\nload: 18 - j37 Ω\nladder: []\nfixture: [line F1: 50 Ω, 11 mm, vf 0.66]\n',
    ];
    for (const text of mended) {
      assert.equal(told(text).length, 1, text);
      assert.deepEqual(afterFixes(text), [], text);
    }
  });

  it('reads on behind a mistake', () => {
    const { syntax } = read('ohmward: 1\nload: 18 - j37 Ω\nladder:\n  series L1: 3 nH\n  shunt C1:2 pF\n  seris C2: 3 pF\n');
    assert.deepEqual(syntax.ladder?.elements.map(({ name, body }) => `${name.value} ${body.form}`), ['L1 branch', 'C1 branch', 'seris C2 faulty']);
  });

  it('finds many mistakes in one pass', () => {
    const text = 'ohmward: 3\ntitel: x\nz0: -1 Ω\nload: - j37 Ω\nbands:\n  up: 870 .. 863 MHz\n  in x: 1 GHz\nladder:\n  - series L1: 4.7 nF\n  - seris C1: 3 pF\n  - shunt C2: solve form caps\ngoals:\n  - S11 <= -10 dB\n  - gain\nspread: even\nspread: odd\n';
    const codes = read(text).diagnostics.map(({ span }) => text.slice(0, span.start).split('\n').length);
    assert.deepEqual([...new Set(codes)], [1, 2, 3, 4, 6, 7, 9, 10, 11, 13, 14, 15, 16], 'a mistake on each of these lines');
  });

  it('stops after the first hundred, in the order of the text', () => {
    const text = `${head}${Array.from({ length: 300 }, (_, i) => `key${i}: 1`).join('\n')}\n`;
    const { diagnostics } = read(text);
    assert.equal(diagnostics.length, 100);
    assert.deepEqual(diagnostics.map(({ span }) => span.start), diagnostics.map(({ span }) => span.start).sort((a, b) => a - b));
    assert.equal(text.slice(diagnostics[99].span.start, diagnostics[99].span.end), 'key99');
  });

  it('takes no key of JavaScript for one of ours', () => {
    for (const name of ['constructor', '__proto__', 'toString', 'hasOwnProperty']) {
      const text = `${head}${name}: x\n`;
      assert.deepEqual(told(text), [`unknown-key: ${name}`]);
    }
  });

  it('does not echo what YAML cannot read', () => {
    const text = 'ohmward: 1\nload: 18 - j37 Ω\nladder: []\nbands:\n    up: 1 GHz\n   down: 2 GHz\n';
    assert.deepEqual(read(text).diagnostics.map((each) => each.code), ['bad-indentation']);
  });
});

describe('limits of a description', () => {
  it('leaves out what comes after the last entry that is read', () => {
    const text = `${head}goals:\n${'  - dc path\n'.repeat(600)}`;
    const { syntax, diagnostics } = read(text);
    assert.equal(syntax.goals.length, 500);
    assert.deepEqual(diagnostics.map((each) => each.code), ['too-many']);
  });
});
