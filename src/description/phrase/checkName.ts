import type { Located } from '../../base/span';
import type { PhraseContext } from './phrase';

const reservedInNames = ['in', 'at', 'for', 'into', 'from', 'against', 'with', 'or', 'x'];
const lengthAtMost = 80;

/** An element's name: one word, a letter first; `load` and `source` are taken. Reports what is wrong. */
export function checkWord(name: Located<string>, context: PhraseContext): boolean {
  const wrong = /^(load|source)$/.test(name.value) ? `«${name.value}» is taken: it is an end of the ladder.`
    : !/^[\p{L}][\p{L}\d_.-]*$/u.test(name.value) || name.value.length > lengthAtMost ? `«${name.value}» is no reference designator; it is one word that begins with a letter, such as L1.` : null;
  if (wrong) context.report({ code: 'name', severity: 'error', message: wrong, span: name.span });
  return wrong === null;
}

/** A name of several words: letters, digits, blanks, - and _, a letter first, without the words that phrases are built with. */
export function checkPhraseName(name: Located<string>, what: 'band' | 'case' | 'family' | 'tunable', context: PhraseContext): boolean {
  const report = (message: string) => {
    context.report({ code: 'name', severity: 'error', message, span: name.span });
    return false;
  };
  if (!/^[\p{L}][\p{L}\d _-]*$/u.test(name.value) || name.value.length > lengthAtMost) {
    return report(`«${name.value}» cannot name a ${what}: names have letters, digits, blanks, - and _, and begin with a letter.`);
  }
  const word = name.value.split(/ +/).find((part) => reservedInNames.includes(part));
  if (word) return report(`A ${what}'s name may not have the word «${word}», which phrases are built with.`);
  return true;
}
