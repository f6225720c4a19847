import type { Located } from '../../base/span';
import { nearestWord } from '../../base/nearestWord';
import type { Comparison } from '../../study/goal';
import type { GoalSyntax, Quantity } from '../syntax';
import { goalConditions, goalSlips, goalWords, signedSlips, type GoalWord } from './goalQuantities';
import { goalClausesAt } from './readGoalClauses';
import type { Phrase, PhraseContext } from './phrase';
import { quantityAt } from './readQuantity';
import { complain, expectEnd, nextWord, replaceBy, restSpan, restText, scanner, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

/** One goal; null (reported) where quantity or limit cannot be read. */
export function readGoalPhrase(phrase: Phrase, context: PhraseContext): GoalSyntax | null {
  const s = scanner(phrase, context);
  skipBlanks(s);
  const start = s.at;
  const text = phrase.text.trim();
  const span = spanOf(s, start, start + text.length);
  if (signedSlip(s)) return null;
  const condition = goalConditions.find((words) => takeWord(s, words));
  if (condition) {
    const clauses = goalClausesAt(s, null);
    expectEnd(s);
    return clauses && { span, text, quantity: condition, comparison: null, limit: null, unit: '', elementName: null, ...clauses };
  }
  const word = goalWords.find((candidate) => takeWord(s, candidate.quantity)) ?? slipAt(s);
  if (!word) return null;
  const elementName = word.ofElement ? elementAt(s, word) : null;
  if (word.ofElement && !elementName) return null;
  const comparison = comparisonAt(s, word);
  if (!comparison) return null;
  const limit = limitAt(s, word, comparison, start);
  if (!limit) return null;
  const clauses = goalClausesAt(s, word.quantity);
  if (!clauses) return null;
  expectEnd(s, 'after the limit come in BAND, at FREQUENCY, at 2 x BAND, for CASE, into IMPEDANCE, against BAND');
  return { span, text, quantity: word.quantity, comparison: comparison.value, ...limit, elementName, ...clauses };
}

const comparisons: Readonly<Record<string, Comparison>> = { '>=': '>=', '≥': '>=', '=>': '>=', '<=': '<=', '≤': '<=', '=<': '<=', '>': '>', '<': '<' };

function comparisonAt(s: Scanner, word: GoalWord): Located<Comparison> | null {
  skipBlanks(s);
  const start = s.at;
  const found = take(s, />=|<=|=>|=<|≥|≤|>|<|==?/y);
  const span = spanOf(s, start, s.at);
  if (found && Object.hasOwn(comparisons, found[0])) return { value: comparisons[found[0]], span };
  if (found) complain(s, 'comparison', 'A goal is a limit and not an exact value: >=, <=, > or <.', span, [replaceBy(span, word.usual)]);
  else complain(s, 'comparison', `After «${word.quantity}» comes >=, <=, > or < and a limit, as in «${word.example}».`, restText(s) ? nextWord(s)?.span ?? restSpan(s) : spanOf(s, s.text.trimEnd().length, s.text.trimEnd().length));
  return null;
}

function elementAt(s: Scanner, word: GoalWord): Located<string> | null {
  const found = take(s, /[\p{L}][\p{L}\d_.-]*/uy);
  if (found) return { value: found[0], span: spanOf(s, s.at - found[0].length, s.at) };
  complain(s, 'goal-element', `«${word.quantity}» is that of an element: «${word.example}».`, restText(s) ? nextWord(s)?.span ?? restSpan(s) : restSpan(s));
  return null;
}

function limitAt(s: Scanner, word: GoalWord, comparison: Located<Comparison>, start: number): { limit: Quantity; unit: string } | null {
  const found = quantityAt(s, word.kinds);
  if (!found) return null;
  const { literal } = found;
  const written = literal ? Number(literal.digits) : found.value;
  const plain = (value: number, unit: string) => ({ limit: { value, span: found.span }, unit });
  if (word.quantity === 'VSWR' && take(s, /\s*:\s*1(?![\d.])/y)) {
    const span = { start: found.span.start, end: spanOf(s, s.at, s.at).end };
    complain(s, 'vswr-ratio', 'A VSWR is the number alone: 2 for 2:1.', span, [replaceBy(span, literal?.digits ?? String(found.value))]);
    return plain(found.value, '');
  }
  if ((word.quantity === 'return loss' || word.quantity === 'mismatch loss' || word.quantity === 'insertion loss') && written < 0) {
    // The sign is what slipped: whoever writes a loss below zero still wants a good match and little loss.
    const turned = word.usual[0] + comparison.value.slice(1);
    const span = { start: comparison.span.start, end: found.span.end };
    complain(s, 'loss-negative', `${word.quantity.startsWith('i') ? 'An' : 'A'} ${word.quantity} is positive for a passive ladder: more of it is ${word.quantity === 'return loss' ? 'better' : 'worse'}.`, spanOf(s, start, s.at), [replaceBy(span, `${turned} ${Math.abs(written)} dB`)]);
    return null;
  }
  if ((word.quantity === 'yield' || word.quantity === 'efficiency') && literal?.form === 'bare') {
    complain(s, 'unit-missing', word.quantity === 'yield' ? 'A yield is in %.' : 'An efficiency is in % or dB.', found.span, [replaceBy(found.span, `${written <= 1 ? Number((written * 100).toPrecision(12)) : written} %`)]);
    return null;
  }
  const unit = unitOfGoal(found.kind);
  const value = unit === '%' ? (literal?.form === 'unit' ? written : found.value * 100) : unit === 'dB' ? written : found.value;
  const wrong = wrongLimit(word, value, unit);
  if (wrong) complain(s, 'goal-limit', wrong.message, found.span, [], wrong.severity);
  return wrong?.severity === 'error' ? null : plain(value, unit);
}

function unitOfGoal(kind: string): string {
  switch (kind) {
    case 'decibels': return 'dB';
    case 'ratio': return '%';
    case 'resistance': return 'Ω';
    case 'frequency': return 'Hz';
    case 'voltage': return 'V';
    case 'current': return 'A';
    case 'power': return 'W';
    default: return '';
  }
}

function wrongLimit(word: GoalWord, value: number, unit: string): { message: string; severity: 'error' | 'warning' } | null {
  if (word.quantity === 'VSWR' && value < 1) return { message: 'A VSWR is at least 1.', severity: 'error' };
  if (word.quantity === 'reflection' && value < 0) return { message: 'The magnitude of a reflection is not negative.', severity: 'error' };
  if (unit === '%' && (value < 0 || value > 100)) return { message: 'A share is between 0 % and 100 %.', severity: 'error' };
  if (word.quantity === 'gain' && value > 0 && word.usual === '>=') return { message: 'A passive ladder has no gain above 0 dB.', severity: 'warning' };
  if (['voltage', 'current', 'dissipation', 'bandwidth', 'parts'].includes(word.quantity) && value < 0) return { message: `A ${word.quantity} is not negative.`, severity: 'error' };
  return null;
}

/** `S11 <= -10 dB`: reported with the goal that says it here. */
function signedSlip(s: Scanner): boolean {
  const { at } = s;
  const found = take(s, /\|?(S11|s11|S22|S21|s21)\|?\s*(>=|<=|≥|≤|>|<)\s*([-−+]?[\d.]+)\s*dB/y);
  if (!found) {
    s.at = at;
    return false;
  }
  const [written, name, comparison, number] = found;
  const ours = signedSlips[name];
  const value = Number(number.replace('−', '-'));
  const turned = ours === 'gain' ? comparisons[comparison] : ({ '>=': '<=', '<=': '>=', '>': '<', '<': '>' } as const)[comparisons[comparison]];
  const span = spanOf(s, s.at - written.length, s.at);
  complain(s, 'goal-word', `«${name}» in dB is ${ours === 'gain' ? 'the gain' : 'the negative of the return loss'} here.`, span, [replaceBy(span, `${ours} ${turned} ${ours === 'gain' ? value : -value || 0} dB`)]);
  s.at = s.text.length;
  return true;
}

function slipAt(s: Scanner): GoalWord | null {
  const text = restText(s).split(/\s*(?:>=|<=|=>|=<|≥|≤|>|<|=)/)[0].trim();
  const names = [...goalWords.map((word) => word.quantity as string), ...goalConditions];
  const limit = restText(s).slice(text.length);
  // As a plain number the magnitude is meant.
  const own = /^\|?[Ss](?:11|22)\|?$/.test(text) && !/dB/.test(limit) ? 'reflection' : Object.hasOwn(goalSlips, text) ? goalSlips[text] : Object.hasOwn(signedSlips, text) ? signedSlips[text] : null;
  const first = text.split(/\s+/)[0] ?? '';
  const meant = own ?? nearestWord(text, names) ?? nearestWord(first, ['voltage', 'current', 'dissipation']);
  skipBlanks(s);
  const length = meant && ['voltage', 'current', 'dissipation'].includes(meant) ? first.length : text.length;
  const span = spanOf(s, s.at, s.at + Math.max(length, 1));
  complain(s, 'goal-word', `«${text}» is nothing that can be asked for${meant ? `; ${meant} was probably meant` : `; there are ${names.join(', ')}`}.`, text === '' ? restSpan(s) : span, meant ? [replaceBy(span, meant)] : []);
  s.at = s.text.length;
  return null;
}
