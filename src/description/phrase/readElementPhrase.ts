import type { Fix } from '../../base/diagnostic';
import type { Span } from '../../base/span';
import type { PartKind } from '../../network/part';
import type { ElementSyntax, ImpedanceSyntax } from '../syntax';
import type { Phrase, PhraseContext } from './phrase';
import { impedanceAt } from './readImpedance';
import { expressionEnd } from './readExpression';
import { lineAt } from './readLine';
import { pathAt } from './readPath';
import { quantityAt } from './readQuantity';
import { complain, expectEnd, replaceBy, restSpan, restText, scanner, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

/** What the first letter of a reference designator says (IEEE 315): R, L or C; null for others, where the unit decides. */
export const kindOfDesignator = (name: string): PartKind | null =>
  name.startsWith('R') ? 'resistor' : name.startsWith('L') ? 'inductor' : name.startsWith('C') ? 'capacitor' : null;

/** The phrase of a ladder's entry. Never null: what cannot be read is `faulty`, and reported. */
export function readElementPhrase(keyword: ElementSyntax['keyword'], name: string, phrase: Phrase, context: PhraseContext): ElementSyntax['body'] {
  const s = scanner(phrase, context);
  const body = bodyAt(s, keyword, name);
  if (body.form !== 'faulty') expectEnd(s);
  return body;
}

function bodyAt(s: Scanner, keyword: ElementSyntax['keyword'], name: string): ElementSyntax['body'] {
  if (restText(s) === '') {
    complain(s, 'phrase-missing', `${name} has no value; write «solve» where it is to be found.`, spanOf(s, 0, s.text.length));
    return { form: 'faulty' };
  }
  switch (keyword) {
    case 'series':
    case 'shunt': return branchAt(s, keyword, name);
    case 'line':
    case 'stub open':
    case 'stub short': {
      const line = lineAt(s);
      return line ? { form: 'line', line } : { form: 'faulty' };
    }
    case 'transformer': return transformerAt(s);
    case 'block': return blockAt(s);
  }
}

function branchAt(s: Scanner, keyword: 'series' | 'shunt', name: string): ElementSyntax['body'] {
  const slip = /^(DNP|DNF|DNI|NC|N\/C|none|open|not placed|not populated|unfitted)$/i.exec(restText(s));
  if (slip || takeWord(s, 'not fitted')) {
    if (slip) {
      const span = restSpan(s);
      const message = keyword === 'shunt' ? 'Empty pads across the path are «not fitted».' : 'An open position in series would cut the path; a bridge is «0 Ω».';
      complain(s, 'not-fitted-word', message, span, [replaceBy(span, keyword === 'shunt' ? 'not fitted' : '0 Ω', keyword === 'shunt')]);
      s.at = s.text.length;
      return { form: 'faulty' };
    }
    if (keyword === 'shunt') return { form: 'not fitted' };
    complain(s, 'not-fitted-in-series', 'An empty position in series would cut the path; only shunt positions are «not fitted». A bridge is «0 Ω».', spanOf(s, 0, s.text.length));
    return { form: 'faulty' };
  }
  skipBlanks(s);
  const start = s.at;
  // A bridge stands in any position, whatever its designator promises.
  if (take(s, /0+(?:\.0*)?(?:R|\s*[kmM]?(?:Ω|\u2126|ohm))(?![\p{L}\d])(?=\s*$)/uy)) return bridge(s, keyword, spanOf(s, start, s.at));
  const pair = takeWord(s, 'pair');
  const branch = impedanceAt(s, severalFollow(s) ? null : kindOfDesignator(name), 'parts');
  if (branch.form === 'faulty') return { form: 'faulty' };
  if (isZeroOhm(branch)) return bridge(s, keyword, branch.span);
  return { form: 'branch', branch, pair };
}

function bridge(s: Scanner, keyword: 'series' | 'shunt', span: Span): ElementSyntax['body'] {
  if (keyword === 'series') return { form: 'bridge' };
  complain(s, 'bridge-in-shunt', '0 Ω across the path would short it; only series positions are bridged. Empty pads are «not fitted».', span, [replaceBy(span, 'not fitted', false)]);
  return { form: 'faulty' };
}

const isZeroOhm = (branch: ImpedanceSyntax): boolean =>
  branch.form === 'part' && branch.value.form === 'known' && branch.value.unit === 'Ω' && branch.value.value === 0;

/** Several parts in one branch: the designator then tells nothing about their kinds. An expression's own sum does not count. */
function severalFollow(s: Scanner): boolean {
  skipBlanks(s);
  const rest = s.text.slice(s.text[s.at] === '=' ? expressionEnd(s.text, s.at + 1) : s.at);
  return /\|\||\+\s+(?![\d.]+\s*%)|^\(/.test(rest);
}

/** `1 : 2`: the same without blanks. */
function turnsFix(s: Scanner): Fix[] {
  const at = /(?<![\d.])([\d.]{1,20})\s*:\s*([\d.]{1,20})/.exec(s.text);
  if (!at || !(Number(at[1]) > 0 && Number(at[2]) > 0)) return [];
  const start = s.text.startsWith('turns') ? 0 : at.index;
  return [replaceBy(spanOf(s, start, at.index + at[0].length), `turns ${at[1]}:${at[2]}`)];
}

function transformerAt(s: Scanner): ElementSyntax['body'] {
  const turns = takeWord(s, 'turns') ? take(s, /([\d.]+):([\d.]+)(?![\d.])/y) : null;
  const [turnsSource, turnsLoad] = turns ? [Number(turns[1]), Number(turns[2])] : [NaN, NaN];
  if (!turns || !(turnsSource > 0) || !(turnsLoad > 0) || !Number.isFinite(turnsSource / turnsLoad)) {
    complain(s, 'transformer', 'A transformer is «turns 1:2» (source side : load side, no blank), optionally with «winding 3 µH» and «coupling 0.98».', restText(s) ? restSpan(s) : spanOf(s, 0, s.text.length), turnsFix(s));
    return { form: 'faulty' };
  }
  let windingH = null;
  let coupling = null;
  for (;;) {
    take(s, /,/y);
    if (takeWord(s, 'with')) continue;
    if (takeWord(s, 'winding')) {
      windingH = quantityAt(s, ['inductance']);
      if (!windingH) return { form: 'faulty' };
      if (!(windingH.value > 0)) {
        complain(s, 'not-physical', 'An inductance is greater than zero.', windingH.span);
        return { form: 'faulty' };
      }
    } else if (takeWord(s, 'coupling')) {
      coupling = quantityAt(s, ['number']);
      if (!coupling) return { form: 'faulty' };
      if (!(coupling.value > 0 && coupling.value <= 1)) {
        complain(s, 'not-physical', 'A coupling is above 0 and at most 1.', coupling.span);
        return { form: 'faulty' };
      }
    } else {
      break;
    }
  }
  if (coupling && !windingH) complain(s, 'coupling-without-winding', 'A coupling counts only with the inductance of the winding: «winding 3 µH».', coupling.span, [], 'warning');
  return { form: 'transformer', turnsSource, turnsLoad, windingH: windingH && { value: windingH.value, span: windingH.span }, coupling: coupling && { value: coupling.value, span: coupling.span } };
}

function blockAt(s: Scanner): ElementSyntax['body'] {
  const path = pathAt(s);
  if (!path || !/\.(?:s2p|ts)$/i.test(path.value)) {
    complain(s, 'block', 'A block is a two-port file: «filter.s2p», or «filter.s2p reversed».', path?.span ?? restSpan(s));
    return { form: 'faulty' };
  }
  return { form: 'block', path, reversed: takeWord(s, 'reversed') };
}
