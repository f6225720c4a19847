import type { Located } from '../../base/span';
import type { PartKind } from '../../network/part';
import type { PartSyntax, TunableSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { kindAt } from './readFamily';
import { figuresAt, noFigures, quantityOfKind } from './readFigures';
import { readPartPhrase } from './readPart';
import { quantityAt } from './readQuantity';
import { rangeAt } from './readRange';
import { complain, expectEnd, scanner, spanOf, takeWord } from './scanner';

const bitsAtMost = 12;

/** `capacitor 5 bits 0.9 pF .. 4.6 pF Q 60 @ 900 MHz` */
export function readTunablePhrase(name: Located<string>, phrase: Phrase, context: PhraseContext): TunableSyntax {
  const s = scanner(phrase, context);
  const span = spanOf(s, 0, phrase.text.length);
  const faulty = (kind: PartKind | null): TunableSyntax => ({ name, span, kind, states: { form: 'faulty' }, figures: noFigures });
  const kind = kindAt(s, '«capacitor 5 bits 0.9 pF .. 4.6 pF», or a mapping of codes to values');
  if (!kind) return faulty(null);
  const bits = quantityAt(s, ['integer']);
  if (!bits) return faulty(kind);
  if (!takeWord(s, 'bits') && !takeWord(s, 'bit')) {
    complain(s, 'tunable', 'A tunable states its resolution: «5 bits».', bits.span);
    return faulty(kind);
  }
  if (bits.value < 1 || bits.value > bitsAtMost) {
    complain(s, 'tunable', `A tunable has 1 to ${bitsAtMost} bits.`, bits.span);
    return faulty(kind);
  }
  const range = rangeAt(s, [quantityOfKind(kind)], 'ends');
  if (!range) return faulty(kind);
  if (!(range.min.value > 0)) {
    complain(s, 'not-physical', 'The values of a tunable are greater than zero.', range.min.span);
    return faulty(kind);
  }
  const figures = figuresAt(s, kind);
  expectEnd(s);
  return { name, span, kind, states: { form: 'linear', bits: bits.value, range }, figures };
}

/** One row of a table of codes: decimal, 0x or 0b. Null (reported) where code or value cannot be read. */
export function readTunableRow(code: Phrase, value: Phrase, kind: PartKind | null, context: PhraseContext): { code: Located<number>; part: PartSyntax } | null {
  const number = readCode(code, context);
  const part = readPartPhrase(value, kind, context);
  if (part.value.form === 'known') return number && { code: number, part };
  // What is faulty has been told.
  if (part.value.form !== 'faulty') {
    context.report({ code: 'tunable-value', severity: 'error', message: 'A code stands for one value: what is to be solved, another tunable or a winding cannot stand here.', span: part.value.span });
  }
  return null;
}

const codeAtMost = 0xffff_ffff;

/** `17`, `0x11`, `0b10001` */
export function readCode(phrase: Phrase, context: PhraseContext): Located<number> | null {
  const text = phrase.text.trim();
  const start = phrase.text.indexOf(text);
  const span = { start: phrase.at(start), end: phrase.at(start + text.length) };
  const value = /^(?:0x[\da-f]+|0b[01]+|\d+)$/i.test(text) ? Number(text) : NaN;
  if (value <= codeAtMost) return { value, span };
  context.report({ code: 'code', severity: 'error', message: `«${text}» is no code; codes are decimal, 0x or 0b, up to 32 bits.`, span });
  return null;
}
