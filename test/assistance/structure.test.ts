import assert from 'node:assert/strict';
import { foldingSpans } from '../../src/assistance/folding';
import { inlayHints } from '../../src/assistance/inlayHints';
import { outline, type OutlineItem } from '../../src/assistance/outline';
import { assessed, board, cursorIn } from './support';

const whole = { start: 0, end: board.length };

describe('inlay hints', () => {
  const hints = inlayHints(assessed(board), whole);
  const after = (marked: string) => hints.find(({ offset }) => offset === cursorIn(board, marked))?.label ?? null;

  it('tell reactance in series, susceptance across, and margins', () => {
    assert.equal(after('13 nH from coils$0'), '+j70.8 Ω');
    // ωC of 3.3 pF at 866.49 MHz: 5.4443e9·3.3e-12 = 17.97 mS.
    assert.equal(after('Q 200$0  # and me'), '+j18.0 mS');
    assert.equal(after('vf 0.55$0'), null);
    assert.match(after('in uplink$0\n  - gain') ?? '', /^✗ 1\.5 dB short$/);
    assert.match(after('C1 <= 25 V$0') ?? '', /^✓ 23\.\d+ V to spare$/);
    assert.ok(hints.every(({ tooltip }) => tooltip !== ''));
  });

  it('are only those in view', () => {
    const from = cursorIn(board, '$0goals:');
    assert.deepEqual(inlayHints(assessed(board), { start: from, end: board.length }), hints.filter(({ offset }) => offset >= from));
    assert.equal(inlayHints(assessed(board), { start: 0, end: 10 }).length, 0);
  });

  it('are none where nothing is known', () => {
    assert.deepEqual(inlayHints(assessed('ladder:\n  - series L1: 3 nH\n'), whole), []);
    const unsolved = inlayHints(assessed(board.replace('13 nH from coils', 'solve from coils')), whole);
    assert.ok(!unsolved.some(({ label }) => label.endsWith('Ω')));
  });
});

describe('outline', () => {
  const flat = (items: readonly OutlineItem[], depth = 0): string[] =>
    items.flatMap((item) => [`${'  '.repeat(depth)}${item.kind} ${item.name}${item.detail && ` | ${item.detail}`}`, ...flat(item.children, depth + 1)]);

  it('is the description as a tree, in the order of the text', () => {
    assert.deepEqual(flat(outline(assessed(board).description)), [
      'section bands', '  band uplink | 863 .. 870 MHz', '  band rx2 | 869.525 MHz',
      'section load', '  case free air | 18 - j37 Ω at 868 MHz', '  case wet bark | 24 - j45 Ω',
      'section ladder', '  element L1 | series: 13 nH from coils', '  element C1 | shunt: 3.3 pF ±5 % Q 200', '  element T1 | line: 50 Ω, 6 mm, vf 0.55',
      'section parts', '  family coils | inductor E12 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz', '  family caps | capacitor [1 pF, 2.2 pF, 3.9 pF]',
      'section let', '  let f0 | 866.5 MHz',
      'section goals', '  goal return loss >= 12 dB in uplink', '  goal gain >= -1.5 dB in rx2 for wet bark', '  goal voltage C1 <= 25 V',
    ]);
  });

  it('keeps each selection inside its range and each child inside its parent', () => {
    const check = (items: readonly OutlineItem[], outer: { start: number; end: number }) => {
      for (const { span, selectionSpan, children, name } of items) {
        assert.ok(span.start >= outer.start && span.end <= outer.end, name);
        assert.ok(selectionSpan.start >= span.start && selectionSpan.end <= span.end, name);
        check(children, span);
      }
    };
    check(outline(assessed(board).description), whole);
  });

  it('is empty for an empty text', () => assert.deepEqual(outline(assessed('').description), []));
});

describe('folding', () => {
  const folds = (text: string) => foldingSpans(assessed(text).description).map(({ start, end }) => {
    const lineOf = (offset: number) => text.slice(0, offset).split('\n').length;
    return `${lineOf(start)}-${lineOf(end)}`;
  });

  const cases: [what: string, text: string, expected: string[]][] = [
    ['sections', 'a: 1\nbands:\n  x: 1 GHz\n  y: 2 GHz\n\ngoals:\n  - gain >= -1 dB\n', ['2-4', '6-7']],
    ['lists that stand as far left as their key', 'ladder:\n- series L1: 3 nH\n- shunt C1: 2 pF\nz0: 50 Ω\n', ['1-3']],
    ['what lies inside', 'load:\n  wet:\n    file: a.s1p\n    fixture:\n      - line F1: 50 Ω, 1 mm\n  dry: 50 Ω\n', ['1-6', '2-5', '4-5']],
    ['comments with what they stand in', 'ladder:\n  # first\n  - series L1: 3 nH\n# of the goals\ngoals:\n  - dc path\n', ['1-3', '5-6']],
    ['nothing in one line', 'z0: 50 Ω\n', []],
    ['Windows line ends', 'bands:\r\n  x: 1 GHz\r\n', ['1-2']],
  ];
  for (const [what, text, expected] of cases) it(`takes ${what}`, () => assert.deepEqual(folds(text), expected));
});
