import type { Located } from '../../base/span';
import { nearestWord } from '../../base/nearestWord';
import type { PartKind } from '../../network/part';
import { isSeriesName, seriesNames } from '../../quantity/preferredSeries';
import type { FamilySyntax, Quantity } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { figuresAt, noFigures, quantityOfKind } from './readFigures';
import { pathFollows, wholePath } from './readPath';
import { quantityAt } from './readQuantity';
import { rangeAt, rangeFollows } from './readRange';
import { complain, expectEnd, nextWord, peek, replaceBy, restSpan, scanner, spanOf, take, takeWord, type Scanner } from './scanner';

export const partKinds: readonly PartKind[] = ['inductor', 'capacitor', 'resistor'];

const shape = '«inductor E24 1 nH .. 47 nH ±5 %», «capacitor [1 pF, 2.2 pF]», «inductor files vendor/*.s2p», or a CSV file';
const valuesAtMost = 5000;

/** A family of parts. Never null: what cannot be read is `faulty`, and reported. */
export function readFamilyPhrase(name: Located<string>, phrase: Phrase, context: PhraseContext): FamilySyntax {
  const s = scanner(phrase, context);
  const span = spanOf(s, 0, phrase.text.length);
  if (pathFollows(s) && !partKinds.some((kind) => peek(s, new RegExp(`${kind}\\b`, 'y')))) {
    const path = wholePath(s)!;
    if (/\.csv$/i.test(path.value)) return { name, span, source: { form: 'csv', path }, figures: noFigures };
    complain(s, 'file-kind', `${path.value} is no CSV file; a family is ${shape}.`, path.span);
    return { name, span, source: { form: 'faulty' }, figures: noFigures };
  }
  const kind = kindAt(s, shape);
  if (!kind) return { name, span, source: { form: 'faulty' }, figures: noFigures };
  const source = sourceAt(s, kind);
  const figures = source.form === 'faulty' ? noFigures : figuresAt(s, kind);
  if (source.form !== 'faulty') expectEnd(s);
  return { name, span, source, figures };
}

/** `inductor`, `capacitor` or `resistor` at the scanner; null (reported) otherwise. */
export function kindAt(s: Scanner, expected: string): PartKind | null {
  const found = partKinds.find((kind) => takeWord(s, kind));
  if (found) return found;
  const word = nextWord(s);
  const near = word && (/^(coil|choke)s?$/i.test(word.value) ? 'inductor' : /^(caps?|condenser)$/i.test(word.value) ? 'capacitor' : /^res$/i.test(word.value) ? 'resistor' : nearestWord(word.value, partKinds));
  complain(s, 'part-kind', `${word ? `«${word.value}» is no kind of part` : 'The kind of part is missing'}; this is ${expected}.`, word?.span ?? restSpan(s), near && word ? [replaceBy(word.span, near)] : []);
  return null;
}

function sourceAt(s: Scanner, kind: PartKind): FamilySyntax['source'] {
  if (takeWord(s, 'files')) {
    const found = take(s, /[^\s,;]+/y);
    if (found) return { form: 'files', kind, pattern: { value: found[0].replace(/\\/g, '/'), span: spanOf(s, s.at - found[0].length, s.at) } };
    complain(s, 'family', 'After «files» comes a pattern such as vendor/*.s2p.', restSpan(s));
    return { form: 'faulty' };
  }
  if (peek(s, /\[/y)) return listAt(s, kind);
  const word = nextWord(s);
  if (word && isSeriesName(word.value)) {
    take(s, /E\d+/y);
    const stated = rangeFollows(s);
    const range = stated ? rangeAt(s, [quantityOfKind(kind)], 'ends') : null;
    if (stated && !range) return { form: 'faulty' };
    if (range && !(range.min.value > 0)) {
      complain(s, 'not-physical', 'A part of a family has a value greater than zero.', range.min.span);
      return { form: 'faulty' };
    }
    return { form: 'series', kind, series: word, range };
  }
  const near = word && nearestWord(word.value, seriesNames);
  complain(s, 'family', `After «${kind}» comes a preferred series (${seriesNames.join(', ')}), a list in brackets, or «files».`, word?.span ?? restSpan(s), near && word ? [replaceBy(word.span, near)] : []);
  return { form: 'faulty' };
}

function listAt(s: Scanner, kind: PartKind): FamilySyntax['source'] {
  const start = s.at;
  take(s, /\[/y);
  const values: Quantity[] = [];
  while (!take(s, /\]/y)) {
    if (values.length > 0 && !take(s, /,/y)) {
      complain(s, 'family', 'The values of a list are separated by commas and end in «]».', restSpan(s));
      return { form: 'faulty' };
    }
    const value = quantityAt(s, [quantityOfKind(kind)]);
    if (!value || values.length >= valuesAtMost) return { form: 'faulty' };
    if (!(value.value > 0)) complain(s, 'not-physical', 'A part of a family has a value greater than zero.', value.span);
    else values.push({ value: value.value, span: value.span });
  }
  if (values.length > 0) return { form: 'list', kind, values };
  complain(s, 'family', 'A family has at least one value.', spanOf(s, start, s.at));
  return { form: 'faulty' };
}
