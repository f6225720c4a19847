import assert from 'node:assert/strict';
import { assess } from '../../src/assistance/assess';
import { hoverAt } from '../../src/assistance/hover';

// Invented.
const text = `ohmward: 1
load: 18 - j37 Ω at 868 MHz
bands:
  main: 863 .. 870 MHz
tunables:
  bank: {2: 2 pF, 5: 4 pF, 9: 7 pF}
  spare: capacitor 2 bits 1 pF .. 4 pF
ladder:
  - series L1: 9.1 nH
  - shunt C1: tunable bank
channels: 863 MHz .. 870 MHz step 1 MHz
goals:
  - return loss >= 3 dB
`;

const hovered = (description: string, piece: string, into = 1): string => hoverAt(assess(description, new Map(), { expressions: true }), description.indexOf(piece) + into)?.markdown ?? '';

describe('hovering over what codes set', () => {
  it('a tunable says what it reaches, what it sets and which codes are in use', () => {
    for (const [piece, into] of [['bank: {', 1], ['{2: 2', 4], ['tunable bank', 9]] as const) {
      assert.match(hovered(text, piece, into), /^\*\*bank\*\*, a tunable capacitor: 3 codes, 2 pF to 7 pF\. It sets C1\.\n\n8 channels take codes? \d(?: to \d)?; at 866 MHz code \d, [247] pF\.$/);
    }
    assert.match(hovered(text, 'spare:'), /4 codes, 1 pF to 4 pF\. It sets no element of the ladder\.$/);
  });

  it('an element says by which', () => {
    assert.match(hovered(text, 'shunt C1'), /^\*\*C1\*\*, shunt, [247] pF\n\nSet by bank\.\n\n8 channels take/);
    assert.doesNotMatch(hovered(text, 'series L1'), /Set by/);
  });

  it('channels say how many hold', () => {
    assert.match(hovered(text, '863 MHz .. 870 MHz step'), /^\*\*channels\*\*: (?:every goal holds at|goals hold at \d of) 8 channels; least margin .*\n\nproved/);
    // The key itself is explained.
    assert.match(hovered(text, 'channels:'), /a range with `step`/);
  });

  it('says what it can of half a description', () => {
    assert.match(hovered(text.replace('9.1 nH', 'solve'), 'bank: {'), /3 codes, 2 pF to 7 pF\. It sets C1\.$/);
    assert.equal(hovered(text.replace('{2: 2 pF, 5: 4 pF, 9: 7 pF}', '{}'), 'bank: {'), '');
  });
});
