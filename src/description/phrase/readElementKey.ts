import type { Located } from '../../base/span';
import { nearestWord } from '../../base/nearestWord';
import type { ElementSyntax } from '../syntax';
import { checkWord } from './checkName';
import type { Phrase, PhraseContext } from './phrase';
import { complain, replaceBy, restSpan, restText, scanner, spanOf, takeWord } from './scanner';

type Keyword = ElementSyntax['keyword'];

export const elementKeywords: readonly Keyword[] = ['series', 'shunt', 'line', 'stub open', 'stub short', 'transformer', 'block'];

const others: ReadonlyMap<string, Keyword> = new Map([['parallel', 'shunt'], ['open stub', 'stub open'], ['short stub', 'stub short'], ['stub shorted', 'stub short']]);

/** `series L1`, `stub open S2`; null (reported) where it is no such key. */
export function readElementKey(key: Phrase, context: PhraseContext): { keyword: Keyword; name: Located<string> } | null {
  const s = scanner(key, context);
  const keyword = elementKeywords.find((word) => takeWord(s, word));
  if (!keyword) {
    const words = key.text.trim().split(/\s+/);
    const written = words.length > 2 ? words.slice(0, 2).join(' ') : words[0];
    const meant = others.get(written) ?? nearestWord(written, elementKeywords) ?? others.get(words[0]) ?? nearestWord(words[0], elementKeywords);
    const span = spanOf(s, key.text.length - key.text.trimStart().length, key.text.trimEnd().length);
    const first = spanOf(s, key.text.indexOf(written), key.text.indexOf(written) + written.length);
    complain(s, 'element-keyword', `A ladder's entry begins with ${elementKeywords.join(', ')}, not with «${written}»${meant ? `; ${meant} was probably meant` : ''}.`, span,
      meant ? [replaceBy(first, meant)] : words[0] === 'stub' ? ['stub open', 'stub short'].map((word) => replaceBy(spanOf(s, key.text.indexOf('stub'), key.text.indexOf('stub') + 4), word, false)) : []);
    return null;
  }
  const text = restText(s);
  if (text === '') {
    complain(s, 'element-name', `After «${keyword}» comes the element's name, such as ${keyword === 'shunt' ? 'C1' : keyword === 'line' ? 'TL1' : 'L1'}.`, spanOf(s, 0, key.text.length));
    return null;
  }
  const name = { value: text, span: restSpan(s) };
  return checkWord(name, context) ? { keyword, name } : null;
}
