import type { Located } from '../../base/span';
import { isSeriesName, seriesNames } from '../../quantity/preferredSeries';
import { nearestWord } from '../../base/nearestWord';
import type { SolveSyntax } from '../syntax';
import { rangeAt, rangeFollows } from './readRange';
import type { QuantityKind } from './readQuantity';
import { complain, peek, replaceBy, skipBlanks, spanOf, take, takeWord, type Scanner } from './scanner';

/** A family's name ends before a comma, figures, and the words that may follow it. */
const namePattern = /[\p{L}][\p{L}\d_-]*(?:[ ]+(?!(?:in|at|for|into|from|against|with|or|x|fixed|part|Q|ESR|ESL|SRF|rated)(?![\p{L}\d_-]))[\p{L}\d_-]+)*/uy;

export function familyNameAt(s: Scanner): Located<string> | null {
  skipBlanks(s);
  const start = s.at;
  const found = take(s, namePattern);
  return found && { value: found[0].trim(), span: spanOf(s, start, start + found[0].trimEnd().length) };
}

export interface Sources {
  readonly series: Located<string> | null;
  readonly families: readonly Located<string>[];
}

/** Names after `from`: one series, or families separated by commas. */
export function sourcesAt(s: Scanner): Sources {
  let series: Located<string> | null = null;
  const families: Located<string>[] = [];
  do {
    const name = familyNameAt(s);
    if (!name) {
      complain(s, 'family-expected', 'After «from» comes a preferred series such as E24, or the name of a family.', spanOf(s, s.at, s.at));
      break;
    }
    if (isSeriesName(name.value)) {
      if (series) complain(s, 'series-twice', 'One preferred series is enough.', name.span);
      else series = name;
    } else {
      if (/^E\d+$/.test(name.value)) {
        const near = nearestWord(name.value, seriesNames) ?? 'E24';
        complain(s, 'series-unknown', `${name.value} is not a preferred series of IEC 60063; there are ${seriesNames.join(', ')}.`, name.span, [replaceBy(name.span, near, false)]);
      } else {
        families.push(name);
      }
    }
  } while (peek(s, /,\s*[\p{L}]/uy) && take(s, /,/y));
  if (series && families.length > 0) complain(s, 'series-and-family', 'A choice is from a series or from families, not both.', series.span);
  return { series: families.length > 0 ? null : series, families };
}

/** After the word `solve`: range, `from …`, `or none`, in this order; figures may follow. */
export function solveAt(s: Scanner, start: number, kinds: readonly QuantityKind[]): SolveSyntax {
  const range = peek(s, /[=\d.+−-]/y) && rangeFollows(s) ? rangeAt(s, kinds, 'ends') : null;
  const noneFirst = takeWord(s, 'or none');
  const sources = takeWord(s, 'from') ? sourcesAt(s) : { series: null, families: [] };
  const orNone = takeWord(s, 'or none') || noneFirst;
  if (range && !(range.min.value > 0)) complain(s, 'not-physical', 'A value to solve for is greater than zero.', range.min.span);
  return { span: spanOf(s, start, s.at), range: range && range.min.value > 0 ? range : null, ...sources, orNone };
}
