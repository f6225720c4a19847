import assert from 'node:assert/strict';
import { definitionAt, referencesAt } from '../../src/assistance/definition';
import { renameEdits } from '../../src/assistance/rename';
import { readDescription } from '../../src/description/readDescription';
import { after, assessed, board, cursorIn, refusalOf } from './support';

const { description } = assessed(board);
const words = (span: { start: number; end: number } | null) => span && board.slice(span.start, span.end);

describe('go to definition', () => {
  const cases: [at: string, line: string | null][] = [
    ['12 dB in upl$0ink', 'uplink: 863'],
    ['for wet$0 bark', 'wet bark: 24'],
    ['from coi$0ls', 'coils: inductor'],
    ['voltage C$01', 'C1: 3.3 pF'],
    ['$0uplink: 863', 'uplink: 863'],
    ['$0return loss >= 12', null],
    ['ohm$0ward', null],
  ];
  for (const [at, line] of cases) {
    it(`from «${at}» leads to ${line ?? 'nothing'}`, () => {
      assert.equal(definitionAt(description, cursorIn(board, at))?.start ?? null, line === null ? null : cursorIn(board, `$0${line}`));
    });
  }
});

describe('references', () => {
  it('are every place, in the order of the text', () => {
    const found = referencesAt(description, cursorIn(board, 'dB in rx$02'));
    assert.deepEqual(found.map(words), ['rx2', 'rx2']);
    assert.deepEqual(found.map(({ start }) => start), [cursorIn(board, '$0rx2: 869'), cursorIn(board, 'dB in $0rx2')]);
  });

  it('of a goal as such there are none', () => assert.deepEqual(referencesAt(description, cursorIn(board, 'ga$0in >=')), []));
});

describe('rename', () => {
  const rename = (at: string, name: string) => renameEdits(description, cursorIn(board, at), name);

  const good: [at: string, name: string, changes: [from: string, to: string][]][] = [
    ['dB in upl$0ink', 'send', [['uplink: 863', 'send: 863'], ['dB in uplink', 'dB in send']]],
    ['$0free air', 'open field', [['free air: 18', 'open field: 18']]],
    ['from co$0ils', ' wound coils ', [['from coils', 'from wound coils'], ['coils: inductor', 'wound coils: inductor']]],
    ['shunt C$01', 'C7', [['shunt C1', 'shunt C7'], ['voltage C1', 'voltage C7']]],
    ['$0uplink: 863', 'uplink', []],
  ];
  for (const [at, name, changes] of good) {
    it(`of «${at}» to «${name}» changes each place and nothing else`, () => {
      const expected = changes.reduce((text, [from, to]) => text.replace(from, to), board);
      assert.equal(after(board, rename(at, name)), expected);
      assert.deepEqual(readDescription(expected, { expressions: true }).diagnostics, description.diagnostics);
    });
  }

  const refused: [at: string, name: string, because: RegExp][] = [
    ['$0uplink: 863', 'rx2', /rx2/],
    ['$0uplink: 863', '  ', /name|letter/],
    ['$0uplink: 863', '2nd band', /begin with a letter/],
    ['$0uplink: 863', 'up in air', /«in»/],
    ['$0uplink: 863', 'a: b', /name/],
    ['$0uplink: 863', 'a\nb', /name/],
    ['shunt C$01', 'load', /taken/],
    ['shunt C$01', 'C 1', /one word/],
    ['from co$0ils', 'E24', /E24/],
    ['$0f0: 866', 'MHz', /unit/],
    ['$0return loss >= 12', 'x', /no name/i],
    ['ohm$0ward', 'x', /no name/],
  ];
  for (const [at, name, because] of refused) it(`of «${at}» to ${JSON.stringify(name)} is refused`, () => assert.match(refusalOf(rename(at, name)), because));

  it('is refused where the new letter would make another kind of part of it', () => {
    assert.match(refusalOf(rename('series L$01', 'C3')), /capacitance/);
  });

  it('reaches names of let in expressions, trusted or not', () => {
    const text = 'ohmward: 1\nload: 50 Ω\nbands:\n  a: 1 GHz\nlet:\n  f0: 866.5 MHz\nladder:\n  - shunt C1: =(1/(2*pi*f0*37 ohm)) Q 180\n';
    const untrusted = readDescription(text, { expressions: false });
    for (const each of [assessed(text).description, untrusted]) {
      assert.equal(after(text, renameEdits(each, cursorIn(text, '$0f0: 866'), 'fc')), text.replaceAll('f0', 'fc'));
    }
  });

  it('keeps quotes and flow style', () => {
    const text = 'ohmward: 1\nload: 50 Ω\nbands: {"up": "1 GHz"}\nladder: [{series L1: "13 nH"}]\ngoals: ["gain >= -1 dB in up", \'VSWR <= 2 in up\']\n';
    assert.equal(after(text, renameEdits(assessed(text).description, cursorIn(text, 'in u$0p"'), 'down')), text.replaceAll(/\bup\b/g, 'down'));
  });
});
