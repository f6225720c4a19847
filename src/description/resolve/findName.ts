import { nearestWord } from '../../base/nearestWord';
import type { Report } from '../../base/diagnostic';
import type { Located } from '../../base/span';
import { problemAt } from './resolution';

/** True where a name is among those known; otherwise it is reported, with the nearest one as a fix. */
export function findName(name: Located<string>, known: readonly string[], what: string, report: Report): boolean {
  if (known.includes(name.value)) return true;
  const nearest = nearestWord(name.value, known);
  const hint = nearest ? `did you mean «${nearest}»?` : known.length > 0 ? `known: ${known.slice(0, 8).join(', ')}${known.length > 8 ? ', …' : ''}.` : `no ${what} is defined.`;
  report(problemAt(`unknown-${what.replace(/ /g, '-')}`, `There is no ${what} «${name.value}»; ${hint}`, name.span, {
    fixes: nearest ? [{ title: `Change to «${nearest}»`, edits: [{ span: name.span, text: nearest }], preferred: true }] : undefined,
  }));
  return false;
}

/** Reports each name that stands twice, at its later places. */
export function reportTwice(names: readonly Located<string>[], what: string, report: Report): void {
  const seen = new Set<string>();
  for (const { value, span } of names) {
    if (seen.has(value)) report(problemAt('duplicate-name', `The ${what} «${value}» stands here twice; each needs a name of its own.`, span));
    seen.add(value);
  }
}
