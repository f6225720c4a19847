import assert from 'node:assert/strict';
import { assess, type Assessment } from '../../src/assistance/assess';
import { applyEdits, type TextEdit } from '../../src/base/diagnostic';
import type { LoadedFiles } from '../../src/description/files';

const cursor = '$0';

/** A text with `$0` where the cursor stands, as the text without it and the offset. */
export function atCursor(marked: string): { text: string; offset: number } {
  const offset = marked.indexOf(cursor);
  assert.ok(offset >= 0 && marked.indexOf(cursor, offset + 1) < 0, 'one $0 marks the cursor');
  return { text: marked.slice(0, offset) + marked.slice(offset + cursor.length), offset };
}

export const assessed = (text: string, files: LoadedFiles = new Map()): Assessment => assess(text, files, { expressions: true });

/** The text with a cursor put before, or somewhere inside, the first place of some words: `at('series L$0')` in a text with `series L1`. */
export function cursorIn(text: string, marked: string): number {
  const found = atCursor(marked);
  const at = text.indexOf(found.text);
  assert.ok(at >= 0, `«${found.text}» stands in the text`);
  return at + found.offset;
}

/** The text after edits that must not be a refusal. */
export function after(text: string, edits: readonly TextEdit[] | { refusal: string }): string {
  assert.ok(!('refusal' in edits), 'refusal' in edits ? edits.refusal : '');
  return applyEdits(text, edits);
}

export function refusalOf(edits: readonly TextEdit[] | { refusal: string } | number): string {
  assert.ok(typeof edits === 'object' && 'refusal' in edits, 'a refusal was expected');
  return edits.refusal;
}

/** An invented board: two cases of one frequency each would be too little, so impedances stand for files. */
export const board = `ohmward: 1
title: Test board (invented)
z0: 50 Ω
source: wants 45 - j5 Ω
power: 14 dBm
bands:
  uplink: 863 .. 870 MHz
  rx2: 869.525 MHz
load:
  free air: 18 - j37 Ω at 868 MHz
  wet bark: 24 - j45 Ω
ladder:  # from the load
  - series L1: 13 nH from coils   # keep me
  - shunt C1: 3.3 pF ±5 % Q 200  # and me
  - line T1: 50 Ω, 6 mm, vf 0.55
parts:
  coils: inductor E12 1 nH .. 47 nH ±5 % Q 32 @ 900 MHz
  caps: capacitor [1 pF, 2.2 pF, 3.9 pF]
let:
  f0: 866.5 MHz
goals:
  - return loss >= 12 dB in uplink
  - gain >= -1.5 dB in rx2 for wet bark
  - voltage C1 <= 25 V
`;
