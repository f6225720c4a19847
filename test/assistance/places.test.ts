import assert from 'node:assert/strict';
import { documentLinks } from '../../src/assistance/documentLinks';
import { elementAt } from '../../src/assistance/elementAt';
import { readMarkerText } from '../../src/assistance/readMarkerText';
import { assessed, board, cursorIn, refusalOf } from './support';

describe('the element or goal at the cursor', () => {
  const assessment = assessed(board);
  const cases: [at: string, elementId: string | null, goalId: number | null][] = [
    ['- series L$01', 'L1', null],
    ['13 nH fr$0om', 'L1', null],
    ['  -$0 series L1', 'L1', null],
    ['# and $0me', 'C1', null],
    ['$0ladder:', null, null],
    ['in upl$0ink\n  - gain', null, 0],
    ['for wet bark$0\n', null, 1],
    ['$0  - voltage', null, 2],
    ['$0title', null, null],
    ['coils: $0inductor', null, null],
  ];
  for (const [at, elementId, goalId] of cases) {
    it(`«${at}»: ${elementId ?? goalId ?? 'none'}`, () => assert.deepEqual(elementAt(assessment, cursorIn(board, at)), { elementId, goalId }));
  }

  it('is told apart where several stand in one line', () => {
    const text = 'ohmward: 1\nload: 50 Ω\nbands: {a: 1 GHz}\nladder: [{series L1: 3 nH}, {shunt C1: 2 pF}]\n';
    assert.equal(elementAt(assessed(text), cursorIn(text, '3 n$0H')).elementId, 'L1');
    assert.equal(elementAt(assessed(text), cursorIn(text, 'C1: 2$0')).elementId, 'C1');
  });

  it('is an element even where nothing can be studied', () => {
    const text = 'ladder:\n  - series L1: 3 nH\ngoals:\n  - gain >= -1 dB\n';
    assert.deepEqual(elementAt(assessed(text), cursorIn(text, 'L$01')), { elementId: 'L1', goalId: null });
    assert.deepEqual(elementAt(assessed(text), cursorIn(text, 'ga$0in')), { elementId: null, goalId: null });
  });

  it('is none in an empty text', () => assert.deepEqual(elementAt(assessed(''), 0), { elementId: null, goalId: null }));
});

describe('links to files', () => {
  const text = `ohmward: 1
load:
  free air: frost.s1p
  bench: {file: ../data/bench.s2p, fixture: []}
ladder:
  - block FL1: "filter.s2p reversed"
parts:
  stock: stock.csv
  maker: inductor files vendor/*.s2p
firmware:
  header: ../include/codes.h
measured:
  - L1: first.s1p for free air
`;
  it('cover the path alone, and leave patterns out', () => {
    const links = documentLinks(assessed(text).description);
    assert.deepEqual(links.map(({ path }) => path), ['frost.s1p', '../data/bench.s2p', 'filter.s2p', 'stock.csv', '../include/codes.h', 'first.s1p']);
    for (const { span, path } of links) assert.equal(text.slice(span.start, span.end), path);
  });
});

describe('a frequency that is typed for the marker', () => {
  const good: [text: string, hz: number][] = [
    ['868.3 MHz', 868.3e6], [' 868.3MHz ', 868.3e6], ['2.4 GHz', 2.4e9], ['13560 kHz', 13.56e6], ['868.3', 868.3e6], ['.5 GHz', 0.5e9],
  ];
  for (const [text, hz] of good) it(`«${text}» is ${hz} Hz`, () => assert.equal(readMarkerText(text), hz));

  const refused: [text: string, because: RegExp][] = [
    ['', /frequency/], ['   ', /frequency/], ['0 MHz', /0 Hz|greater/], ['-3 MHz', /0 Hz|greater|positive/], ['868 mHz', /MHz/], ['868,3 MHz', /comma/], ['3 pF', /frequency/], ['abc', /«abc»/],
    ['868 MHz 3', /«3»/], ['1e400 Hz', /beyond/],
  ];
  for (const [text, because] of refused) it(`«${text}» is refused`, () => assert.match(refusalOf(readMarkerText(text)), because));
});
