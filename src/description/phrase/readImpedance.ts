import type { PartKind } from '../../network/part';
import type { ImpedanceSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { complexAt, complexFollows } from './readComplex';
import { partAt } from './readPart';
import { pathAt, pathFollows } from './readPath';
import { quantityAt } from './readQuantity';
import { complain, expectEnd, nextWord, peek, scanner, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

const nestingAtMost = 30;
const membersAtMost = 60;

/** A load, a source or what a goal looks into: files, complex numbers, reflection, networks of R, L and C, open, short. */
export function readImpedancePhrase(phrase: Phrase, context: PhraseContext, expects: PartKind | null): ImpedanceSyntax {
  const s = scanner(phrase, context);
  const found = impedanceAt(s, expects, 'any');
  if (found.form !== 'faulty') expectEnd(s);
  return found;
}

/** `parts`: a ladder's branch, which holds parts only. */
export type Vocabulary = 'any' | 'parts';

export function impedanceAt(s: Scanner, expects: PartKind | null, vocabulary: Vocabulary, depth = 0): ImpedanceSyntax {
  skipBlanks(s);
  const start = s.at;
  const members = [parallelAt(s, expects, vocabulary, depth)];
  while (members.length < membersAtMost && plusAt(s)) members.push(parallelAt(s, expects, vocabulary, depth));
  return joined(s, 'series', members, start);
}

/** A + between two members. Without blanks it is reported, and counts all the same. */
function plusAt(s: Scanner): boolean {
  if (take(s, /\+(?=\s)/y)) return true;
  skipBlanks(s);
  const before = s.text.slice(0, s.at).trimEnd().length;
  if (!take(s, /\+(?=[\d.(])/y)) return false;
  const span = { start: s.phrase.at(before), end: s.phrase.at(s.at) };
  complain(s, 'plus-without-blanks', 'A + between parts has a blank on either side.', spanOf(s, s.at - 1, s.at), [{ title: 'Write « + »', edits: [{ span, text: ' + ' }], preferred: true }]);
  return true;
}

function parallelAt(s: Scanner, expects: PartKind | null, vocabulary: Vocabulary, depth: number): ImpedanceSyntax {
  skipBlanks(s);
  const start = s.at;
  const members = [atomAt(s, expects, vocabulary, depth)];
  while (members.length < membersAtMost && take(s, /\|\|/y)) members.push(atomAt(s, expects, vocabulary, depth));
  return joined(s, 'parallel', members, start);
}

function joined(s: Scanner, form: 'series' | 'parallel', members: ImpedanceSyntax[], start: number): ImpedanceSyntax {
  if (members.length === 1) return members[0];
  const span = spanOf(s, start, s.at);
  return members.some((member) => member.form === 'faulty') ? { form: 'faulty', span } : { form, members, span };
}

function atomAt(s: Scanner, expects: PartKind | null, vocabulary: Vocabulary, depth: number): ImpedanceSyntax {
  skipBlanks(s);
  const start = s.at;
  if (peek(s, /\(/y)) return groupAt(s, vocabulary, depth, start);
  if (vocabulary === 'any') {
    for (const form of ['open', 'short'] as const) {
      if (!pathFollows(s) && takeWord(s, form)) return { form, span: spanOf(s, start, s.at) };
    }
    if (!pathFollows(s) && takeWord(s, 'gamma')) return gammaAt(s, start);
    if (!peek(s, /[\d.]+\s*[\p{L}Ω\u2126%]+\s*(?:\+|\|\||at\b)/uy) && pathFollows(s)) return fileAt(s, start);
    if (complexFollows(s)) return complexAt(s);
    if (!peek(s, /[\d.=+\-−RL]|solve|coil|tunable/y)) return strangerAt(s, start);
  } else if (complexFollows(s)) {
    const span = complexAt(s).span;
    complain(s, 'parts-only', 'A branch of the ladder is made of parts: R, L and C with their values.', span);
    return { form: 'faulty', span };
  }
  const part = partAt(s, expects);
  if (part.value.form === 'faulty') {
    s.at = s.text.length;
    return part;
  }
  return part;
}

function strangerAt(s: Scanner, start: number): ImpedanceSyntax {
  const word = nextWord(s);
  s.at = s.text.length;
  const span = spanOf(s, start, s.text.trimEnd().length);
  complain(s, 'impedance-expected', `«${word?.value ?? ''}» is no impedance. There are files (antenna.s1p), «18 - j37 Ω», «gamma 0.62 at -38°», networks such as «12 Ω + 3.3 pF», open and short.`, word?.span ?? span);
  return { form: 'faulty', span };
}

function groupAt(s: Scanner, vocabulary: Vocabulary, depth: number, start: number): ImpedanceSyntax {
  take(s, /\(/y);
  if (depth >= nestingAtMost) {
    s.at = s.text.length;
    const span = spanOf(s, start, s.at);
    complain(s, 'nested-too-deeply', 'The parentheses are nested too deeply.', span);
    return { form: 'faulty', span };
  }
  // In parentheses a network mixes kinds, so the designator says nothing about its members.
  const inner = impedanceAt(s, null, vocabulary, depth + 1);
  if (!take(s, /\)/y)) {
    const span = spanOf(s, start, s.text.trimEnd().length);
    if (inner.form !== 'faulty') complain(s, 'parenthesis-missing', 'The closing parenthesis is missing.', span);
    s.at = s.text.length;
    return { form: 'faulty', span };
  }
  return inner;
}

/** After the word: `0.62 at -38°`. */
function gammaAt(s: Scanner, start: number): ImpedanceSyntax {
  const magnitude = quantityAt(s, ['number']);
  const joined = magnitude !== null && (takeWord(s, 'at') || take(s, /∠/y) !== null);
  const angle = joined ? quantityAt(s, ['angle']) : null;
  const span = spanOf(s, start, s.at);
  if (!magnitude || !angle) {
    if (magnitude && !joined) complain(s, 'gamma', 'A reflection is «gamma 0.62 at -38°».', span);
    return { form: 'faulty', span };
  }
  if (magnitude.value < 0 || magnitude.value > 1) {
    complain(s, 'not-passive', magnitude.value < 0 ? 'The magnitude of a reflection is not negative.' : 'The magnitude of a passive reflection is at most 1.', magnitude.span, [], magnitude.value < 0 ? 'error' : 'warning');
    if (magnitude.value < 0) return { form: 'faulty', span };
  }
  const degrees = angle.literal ? Number(angle.literal.digits) : angle.value;
  const radians = (degrees * Math.PI) / 180;
  return { form: 'gamma', reflection: { re: magnitude.value * Math.cos(radians), im: magnitude.value * Math.sin(radians) }, span };
}

function fileAt(s: Scanner, start: number): ImpedanceSyntax {
  const path = pathAt(s)!;
  let port: number | 'differential' | null = null;
  if (takeWord(s, 'differential')) {
    port = 'differential';
  } else if (takeWord(s, 'port')) {
    const number = quantityAt(s, ['integer']);
    if (number && number.value >= 1) port = number.value;
    else if (number) complain(s, 'port', 'Ports are counted from 1.', number.span);
    else s.at = s.text.length;
  }
  if (!/\.(?:s\d+p|ts)$/i.test(path.value)) {
    complain(s, 'file-kind', `${path.value} is no Touchstone file; an impedance comes from .s1p to .s4p or .ts.`, path.span);
    return { form: 'faulty', span: spanOf(s, start, s.at) };
  }
  return { form: 'file', span: spanOf(s, start, s.at), path, port };
}
