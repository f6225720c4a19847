import type { LineSyntax, Quantity } from '../syntax';
import { quantityAt } from './readQuantity';
import { rangeAt, rangeFollows } from './readRange';
import { complain, nextWord, peek, restSpan, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

const shape = '«50 Ω, 6 mm, vf 0.55», «50 Ω, 90° at 868 MHz», or «microstrip width …, height …, permittivity …, length …»';

type Draft = { -readonly [K in keyof Omit<LineSyntax, 'span'>]: LineSyntax[K] | null };

/** A line's phrase, commas between its figures; null (reported) where impedance or length is missing. */
export function lineAt(s: Scanner): LineSyntax | null {
  skipBlanks(s);
  const start = s.at;
  const draft: Draft = { medium: null, length: null, velocityFactor: null, loss: null };
  const sizes = new Map<string, Quantity>();
  const microstrip = takeWord(s, 'microstrip');
  if (!microstrip) {
    const impedance = quantityAt(s, ['resistance']);
    if (!impedance) return null;
    if (!positive(s, impedance, 'A characteristic impedance')) return null;
    draft.medium = { form: 'uniform', impedanceOhm: plain(impedance) };
  }
  for (let first = microstrip; first || take(s, /,/y); first = false) {
    if (!lineFigureAt(s, draft, sizes, microstrip)) return null;
  }
  if (commaMissing(s)) return null;
  if (microstrip) draft.medium = microstripMedium(s, sizes, start);
  const span = spanOf(s, start, s.at);
  if (!draft.medium) return null;
  if (!draft.length) {
    complain(s, 'line-length', `A line needs its length: ${shape}.`, span);
    return null;
  }
  return { span, medium: draft.medium, length: draft.length, velocityFactor: draft.velocityFactor, loss: draft.loss };
}

/** `50 Ω 6 mm`: figures without the comma between them. */
function commaMissing(s: Scanner): boolean {
  if (!peek(s, /[\d.]|(?:vf|width|height|permittivity|copper|loss|length|solve)(?![\p{L}])/uy)) return false;
  const before = s.text.slice(0, s.at).trimEnd().length;
  const place = spanOf(s, before, before);
  complain(s, 'comma-missing', 'The figures of a line are separated by commas.', restSpan(s), [{ title: 'Write a comma', edits: [{ span: place, text: ',' }], preferred: true }]);
  s.at = s.text.length;
  return true;
}

const plain = ({ value, span }: Quantity): Quantity => ({ value, span });

function positive(s: Scanner, quantity: Quantity, what: string, allowZero = false): boolean {
  if (quantity.value > 0 || (allowZero && quantity.value === 0)) return true;
  complain(s, 'not-physical', `${what} is ${allowZero ? 'not negative' : 'greater than zero'}.`, quantity.span);
  return false;
}

/** One figure between commas. False (reported) where the line cannot be made of it. */
function lineFigureAt(s: Scanner, draft: Draft, sizes: Map<string, Quantity>, microstrip: boolean): boolean {
  const at = (() => { skipBlanks(s); return s.at; })();
  if (takeWord(s, 'vf')) {
    const vf = quantityAt(s, ['number']);
    if (!vf) return false;
    if (!(vf.value > 0 && vf.value <= 1)) {
      complain(s, 'not-physical', 'A velocity factor is above 0 and at most 1.', vf.span);
      return false;
    }
    if (microstrip) complain(s, 'figure-foreign', 'The velocity on a microstrip follows from its geometry; leave vf out.', vf.span);
    draft.velocityFactor = plain(vf);
    return true;
  }
  for (const [word, kind] of [['width', 'length'], ['height', 'length'], ['permittivity', 'number'], ['copper', 'length'], ['loss tangent', 'number'], ['length', 'length']] as const) {
    if (!takeWord(s, word)) continue;
    if (word === 'length' && takeWord(s, 'solve')) return solveLength(s, draft, at);
    const size = quantityAt(s, [kind]);
    if (!size || !positive(s, size, `The ${word}`, word === 'copper' || word === 'loss tangent')) return false;
    if (word === 'permittivity' && size.value < 1) {
      complain(s, 'not-physical', 'A permittivity is at least 1.', size.span);
      return false;
    }
    if (sizes.has(word)) complain(s, 'figure-twice', `The ${word} is stated twice.`, size.span);
    sizes.set(word, plain(size));
    if (word === 'length') draft.length = { form: 'physical', lengthM: plain(size) };
    else if (!microstrip) complain(s, 'figure-foreign', `The ${word} belongs to a microstrip; write «microstrip» before it.`, size.span);
    return true;
  }
  if (takeWord(s, 'solve')) return solveLength(s, draft, at);
  if (!peek(s, /[\d.=+\-−]/y)) {
    const word = nextWord(s);
    complain(s, 'unexpected-words', `«${word?.value ?? ''}» does not belong to a line; it is ${shape}.`, word?.span ?? spanOf(s, at, s.at));
    return false;
  }
  const found = quantityAt(s, ['length', 'angle', 'wavelengths', 'decibels', 'loss per length']);
  if (!found) return false;
  if (found.kind === 'decibels' || found.kind === 'loss per length') return lossAt(s, draft, found, found.kind);
  if (!positive(s, found, 'A length', true)) return false;
  if (draft.length) complain(s, 'figure-twice', 'The length is stated twice.', found.span);
  if (found.kind === 'length') {
    draft.length = { form: 'physical', lengthM: plain(found) };
    return true;
  }
  if (!takeWord(s, 'at') && !take(s, /@/y)) {
    complain(s, 'line-length', 'An electrical length needs its frequency: «90° at 868 MHz».', found.span);
    return false;
  }
  const atHz = quantityAt(s, ['frequency']);
  if (!atHz || !positive(s, atHz, 'A frequency')) return false;
  const written = found.literal ? Number(found.literal.digits) : found.value;
  draft.length = { form: 'electrical', wavelengths: { value: found.kind === 'angle' ? written / 360 : written, span: found.span }, atHz: plain(atHz) };
  return true;
}

function solveLength(s: Scanner, draft: Draft, start: number): boolean {
  const range = rangeFollows(s) ? rangeAt(s, ['length'], 'ends') : null;
  draft.length = { form: 'solve', range, span: spanOf(s, start, s.at) };
  return true;
}

function lossAt(s: Scanner, draft: Draft, db: Quantity, kind: 'decibels' | 'loss per length'): boolean {
  if (!positive(s, db, 'A loss', true)) return false;
  if (!take(s, /@/y) && !takeWord(s, 'at')) {
    complain(s, 'line-loss', 'A loss needs the frequency that it holds at: «0.4 dB/m @ 1 GHz».', db.span);
    return false;
  }
  const atHz = quantityAt(s, ['frequency']);
  if (!atHz || !positive(s, atHz, 'A frequency')) return false;
  if (draft.loss) complain(s, 'figure-twice', 'The loss is stated twice.', db.span);
  draft.loss = { per: kind === 'decibels' ? 'whole' : 'metre', db: plain(db), atHz: plain(atHz) };
  return true;
}

function microstripMedium(s: Scanner, sizes: ReadonlyMap<string, Quantity>, start: number): LineSyntax['medium'] | null {
  const [widthM, heightM, permittivity] = ['width', 'height', 'permittivity'].map((word) => sizes.get(word));
  if (!widthM || !heightM || !permittivity) {
    complain(s, 'microstrip', `A microstrip needs its ${['width', 'height', 'permittivity'].filter((word) => !sizes.has(word)).join(', ')}.`, spanOf(s, start, s.at));
    return null;
  }
  return { form: 'microstrip', widthM, heightM, permittivity, copperM: sizes.get('copper') ?? null, lossTangent: sizes.get('loss tangent') ?? null };
}
