import type { Located } from '../../base/span';
import type { GoalQuantity } from '../../study/goal';
import type { GoalSyntax, ImpedanceSyntax, PlaceSyntax } from '../syntax';
import { impedanceAt } from './readImpedance';
import { quantityAt } from './readQuantity';
import { rangeAt, rangeFollows } from './readRange';
import { familyNameAt } from './readSolve';
import { complain, peek, restSpan, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

export type GoalClauses = Pick<GoalSyntax, 'place' | 'caseName' | 'into' | 'against' | 'bandwidthDropDb'>;

const orderAtMost = 50;

/** What follows a goal's limit, in any order; null (reported) where one of them cannot be read. */
export function goalClausesAt(s: Scanner, quantity: GoalQuantity | null): GoalClauses | null {
  let place: PlaceSyntax | null = null;
  let caseName: Located<string> | null = null;
  let into: ImpedanceSyntax | null = null;
  let against: Located<string> | null = null;
  let bandwidthDropDb: number | null = null;
  for (;;) {
    skipBlanks(s);
    const start = s.at;
    const twice = (stated: unknown) => {
      if (stated !== null) complain(s, 'clause-twice', 'This is stated twice.', spanOf(s, start, s.at));
    };
    if (takeWord(s, 'into')) {
      twice(into);
      into = impedanceAt(s, null, 'any');
      if (into.form === 'faulty') return null;
    } else if (takeWord(s, 'in')) {
      twice(place);
      place = inAt(s);
      if (!place) return null;
    } else if (takeWord(s, 'at')) {
      if (quantity === 'bandwidth' && peek(s, /[-−+]?[\d.]+\s*dB/y)) {
        const drop = quantityAt(s, ['decibels']);
        if (!drop) return null;
        if (drop.value === 0) {
          complain(s, 'not-physical', 'A bandwidth lies between two points some decibels down: «at 3 dB».', drop.span);
          return null;
        }
        bandwidthDropDb = Math.abs(drop.value);
        continue;
      }
      twice(place);
      place = atAt(s);
      if (!place) return null;
    } else if (takeWord(s, 'for')) {
      twice(caseName);
      caseName = nameAt(s, 'for', 'a load case');
      if (!caseName) return null;
    } else if (takeWord(s, 'against')) {
      twice(against);
      against = nameAt(s, 'against', 'a band');
      if (!against) return null;
      if (quantity !== 'rejection') complain(s, 'against-without-rejection', '«against» names the reference of a rejection; here it says nothing.', spanOf(s, start, s.at), [], 'warning');
    } else {
      break;
    }
  }
  if (into && caseName) {
    complain(s, 'into-with-for', '«into» replaces the load, so «for CASE» cannot stand beside it.', caseName.span);
    return null;
  }
  return { place: place ?? { form: 'bands' }, caseName, into, against, bandwidthDropDb };
}

function nameAt(s: Scanner, word: string, what: string): Located<string> | null {
  const name = familyNameAt(s);
  if (!name) complain(s, 'name-expected', `After «${word}» comes the name of ${what}.`, restSpan(s));
  return name;
}

function inAt(s: Scanner): PlaceSyntax | null {
  if (peek(s, /[\p{L}]/uy)) {
    const band = nameAt(s, 'in', 'a band');
    return band && { form: 'band', band };
  }
  if (rangeFollows(s)) {
    const range = rangeAt(s, ['frequency'], 'whole');
    return range && { form: 'range', range };
  }
  const start = s.at;
  const single = quantityAt(s, ['frequency']);
  if (!single) return null;
  const span = spanOf(s, start, s.at);
  complain(s, 'in-frequency', 'A single frequency stands after «at», a band or a range after «in».', span, [], 'warning');
  return { form: 'frequency', frequencyHz: { value: single.value, span: single.span } };
}

function atAt(s: Scanner): PlaceSyntax | null {
  const harmonic = take(s, /(\d+(?:\.\d+)?)\s*[x×]\s+(?=[\p{L}])/uy) ?? take(s, /(\d+(?:\.\d+)?)\s*×\s*(?=[\p{L}])/uy);
  if (harmonic) {
    const band = nameAt(s, `${harmonic[1]} x`, 'a band');
    const order = Number(harmonic[1]);
    if (!band) return null;
    if (!(order > 0 && order <= orderAtMost)) {
      complain(s, 'harmonic', `A multiple of a band is above 0 and at most ${orderAtMost}.`, band.span);
      return null;
    }
    return { form: 'harmonic', order, band };
  }
  if (peek(s, /[\p{L}]/uy)) {
    // `at uplink` is what one says of a band, too.
    const band = nameAt(s, 'at', 'a band');
    return band && { form: 'band', band };
  }
  if (rangeFollows(s)) {
    const range = rangeAt(s, ['frequency'], 'whole');
    return range && { form: 'range', range };
  }
  const frequencyHz = quantityAt(s, ['frequency']);
  if (!frequencyHz) return null;
  if (frequencyHz.value > 0) return { form: 'frequency', frequencyHz: { value: frequencyHz.value, span: frequencyHz.span } };
  complain(s, 'frequency-not-positive', 'A frequency is greater than zero.', frequencyHz.span);
  return null;
}
