import type { PartKind } from '../../network/part';
import { nearestWord } from '../../base/nearestWord';
import type { Located } from '../../base/span';
import { literalAt } from '../../quantity/literal';
import type { PartSyntax, PartValueSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { coilAt } from './readCoil';
import { figuresAt, kindOfQuantity, quantityOfKind } from './readFigures';
import { dimensionsOf, quantityAt, type QuantityKind } from './readQuantity';
import { rangeFollows } from './readRange';
import { familyNameAt, solveAt } from './readSolve';
import { complain, expectEnd, nextWord, peek, replaceBy, scanner, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

/** The whole phrase as one part with its figures. */
export function readPartPhrase(phrase: Phrase, expects: PartKind | null, context: PhraseContext): PartSyntax {
  const s = scanner(phrase, context);
  const part = partAt(s, expects);
  if (part.value.form === 'faulty') s.at = s.text.length;
  expectEnd(s, 'after the value come its figures, such as ±5 %, Q 35 @ 900 MHz, from FAMILY');
  return part;
}

const anyKind: readonly QuantityKind[] = ['resistance', 'inductance', 'capacitance'];

const partName = /[^\s,|+]+/y;

/** True for a designation that can stand after `part`: one word. */
export const isPartName = (text: string): boolean => /^[^\s,|+]+$/.test(text);

/** Value and figures at the scanner. The kind is the designator's, else the unit's. */
export function partAt(s: Scanner, expects: PartKind | null): PartSyntax {
  skipBlanks(s);
  const start = s.at;
  const { value, kind } = valueAt(s, expects);
  const solve = value.form === 'solve' ? value.solve : null;
  let from: Located<string> | null = null;
  let label: Located<string> | null = null;
  let fixed = false;
  let figures = figuresAt(s, kind);
  for (;;) {
    const at = s.at;
    if (takeWord(s, 'from')) {
      const name = familyNameAt(s);
      if (!name) complain(s, 'family-expected', 'After «from» comes the name of a family.', spanOf(s, at, s.at));
      else if (from || solve) complain(s, 'from-twice', '«from» is stated twice.', name.span);
      from ??= name;
    } else if (takeWord(s, 'part')) {
      const found = take(s, partName);
      if (found) label = { value: found[0], span: spanOf(s, s.at - found[0].length, s.at) };
      else complain(s, 'part-name-missing', 'After «part» comes its designation in the drawer.', spanOf(s, at, s.at));
    } else if (takeWord(s, 'fixed')) {
      fixed = true;
    } else {
      break;
    }
    figures = merged(s, figures, figuresAt(s, kind));
  }
  const span = spanOf(s, start, s.at);
  if (value.form !== 'faulty') slipAfterFigures(s);
  return { form: 'part', span, kind, value, figures, from, label, fixed };
}

/** Figures that are nearly ones, which would else be words too many: `5 %`, `+ 10 %`, `q 40`. */
function slipAfterFigures(s: Scanner): void {
  const { at } = s;
  const share = take(s, /(\+\s+)?\d[\d.]*\s*%/y);
  if (share) {
    const span = spanOf(s, s.at - share[0].length, s.at);
    const written = share[1] ? share[0].replace(/^\+\s+/, '+') : `±${share[0]}`;
    complain(s, 'tolerance-sign', share[1] ? 'No blank stands behind the sign of a tolerance.' : 'A tolerance has its sign before it: ±5 %.', span, [replaceBy(span, written)]);
    s.at = s.text.length;
    return;
  }
  const word = nextWord(s);
  const meant = word && figureWords.find((known) => known.toLowerCase() === word.value.toLowerCase());
  if (word && meant) {
    complain(s, 'figure-word', `«${word.value}» is written ${meant}; upper and lower case count.`, word.span, [replaceBy(word.span, meant)]);
    s.at = s.text.length;
  } else {
    s.at = at;
  }
}

const figureWords = ['Q', 'ESR', 'ESL', 'SRF', 'rated', 'from', 'fixed', 'part'];

function merged(s: Scanner, first: PartSyntax['figures'], second: PartSyntax['figures']): PartSyntax['figures'] {
  const result: { -readonly [K in keyof PartSyntax['figures']]: PartSyntax['figures'][K] } = { ...first };
  for (const key of Object.keys(second) as (keyof PartSyntax['figures'])[]) {
    const found = second[key];
    if (!found) continue;
    if (first[key]) complain(s, 'figure-twice', 'This figure is stated twice.', found.span);
    else result[key] = found as never;
  }
  if (result.q && result.esrOhm) {
    complain(s, 'figures-conflict', 'Q and ESR both state the loss; keep one of them.', result.esrOhm.span);
    result.esrOhm = null;
  }
  return result;
}

function valueAt(s: Scanner, expects: PartKind | null): { value: PartValueSyntax; kind: PartKind | null } {
  const start = s.at;
  const kinds = expects ? [quantityOfKind(expects)] : anyKind;
  const faulty = (): { value: PartValueSyntax; kind: PartKind | null } => ({ value: { form: 'faulty', span: spanOf(s, start, Math.max(s.at, start)) }, kind: expects });
  if (takeWord(s, 'solve')) {
    const solve = solveAt(s, start, kinds);
    const kind = expects ?? (solve.range ? kindOfRange(s.text.slice(start)) : null);
    return { value: { form: 'solve', solve, span: solve.span }, kind };
  }
  if (takeWord(s, 'tunable')) {
    const name = familyNameAt(s);
    if (!name) {
      complain(s, 'tunable-expected', 'After «tunable» comes the name of a tunable.', spanOf(s, start, s.at));
      return faulty();
    }
    return { value: { form: 'tunable', name, span: spanOf(s, start, s.at) }, kind: expects };
  }
  if (takeWord(s, 'coil')) {
    if (expects && expects !== 'inductor') complain(s, 'kind-mismatch', `A winding is an inductor, and this is a ${expects}.`, spanOf(s, start, s.at));
    const coil = coilAt(s, start);
    return coil ? { value: { form: 'coil', coil, span: coil.span }, kind: 'inductor' } : { ...faulty(), kind: 'inductor' };
  }
  if (rangeFollows(s)) {
    complain(s, 'solve-missing', 'A range stands after «solve»: the value is to be found in it.', spanOf(s, start, s.text.trimEnd().length), [
      { title: 'Write «solve» before it', edits: [{ span: spanOf(s, start, start), text: 'solve ' }], preferred: true },
    ]);
    s.at = s.text.length;
    return faulty();
  }
  if (peek(s, /[\p{L}]/uy) && wordSlip(s, kinds)) return faulty();
  const found = quantityAt(s, kinds);
  if (!found) return faulty();
  const kind = kindOfQuantity(found.kind)!;
  const unit = kind === 'resistor' ? 'Ω' : kind === 'inductor' ? 'H' : 'F';
  if (found.value < 0 || (found.value === 0 && kind !== 'resistor')) {
    complain(s, 'not-physical', found.value < 0 ? `${found.kind === 'inductance' ? 'An' : 'A'} ${found.kind} is not negative.` : `${kind === 'inductor' ? 'An' : 'A'} ${kind} of 0 ${unit} is no part; write ${kind === 'inductor' ? '0 Ω for a bridge' : 'not fitted for empty pads'}.`, found.span);
    return { ...faulty(), kind };
  }
  return { value: { form: 'known', value: found.value, unit, span: found.span }, kind };
}

/** `Solve`, `coild`: the word of the language that was meant. */
function wordSlip(s: Scanner, kinds: readonly QuantityKind[]): boolean {
  skipBlanks(s);
  const word = nextWord(s);
  if (!word || word.value.length < 3 || literalAt(s.text, s.at, dimensionsOf(kinds))) return false;
  const near = nearestWord(word.value, ['solve', 'coil', 'tunable', 'pair']);
  if (!near || near === word.value) return false;
  complain(s, 'word-unknown', `«${word.value}» is no value; ${near} was probably meant.`, word.span, [replaceBy(word.span, near)]);
  return true;
}

/** The kind that the unit of a range's upper end tells. */
function kindOfRange(text: string): PartKind | null {
  const unit = /\.\.\.?\s*[+\-−]?[\d.]+(?:[eE][+\-−]?\d+)?\s?([\p{L}\u2126]+)/u.exec(text)?.[1] ?? '';
  return /H$/.test(unit) ? 'inductor' : /F$/.test(unit) ? 'capacitor' : /(?:Ω|\u2126|ohm)$/.test(unit) ? 'resistor' : null;
}
