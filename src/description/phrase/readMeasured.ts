import type { Located } from '../../base/span';
import type { MeasuredSyntax } from '../syntax';
import { plainPhrase, type Phrase, type PhraseContext } from './phrase';
import { pathAt } from './readPath';
import { familyNameAt } from './readSolve';
import { readCode } from './readTunable';
import { complain, expectEnd, peek, restSpan, scanner, spanOf, take, takeWord } from './scanner';

/** `FILE [for CASE] [with TUNABLE = CODE, …]` */
export function readMeasuredPhrase(name: Located<string> | null, phrase: Phrase, context: PhraseContext): Omit<MeasuredSyntax, 'fixture'> | null {
  const s = scanner(phrase, context);
  const path = pathAt(s);
  if (!path || !/\.(?:s\d+p|ts)$/i.test(path.value)) {
    complain(s, 'measured', 'A measurement is a Touchstone file, then «for CASE» and «with TUNABLE = CODE» where they apply.', path?.span ?? restSpan(s));
    return null;
  }
  let caseName: Located<string> | null = null;
  const codes: { tunable: Located<string>; code: Located<number> }[] = [];
  if (takeWord(s, 'for')) {
    caseName = familyNameAt(s);
    if (!caseName) complain(s, 'case-expected', 'After «for» comes the name of a load case.', restSpan(s));
  }
  if (takeWord(s, 'with')) {
    do {
      const tunable = familyNameAt(s);
      const written = tunable && take(s, /=\s*/y) ? take(s, /[^\s,]+/y) : null;
      if (!tunable || !written) {
        complain(s, 'measured', 'After «with» comes a tunable and its code: «with antcap = 17».', restSpan(s));
        s.at = s.text.length;
        break;
      }
      const code = readCode(plainPhrase(written[0], s.phrase.at(s.at - written[0].length)), context);
      if (code) codes.push({ tunable, code });
    } while (peek(s, /,/y) && take(s, /,/y));
  }
  expectEnd(s);
  return { span: spanOf(s, 0, phrase.text.length), upTo: name, path, caseName, codes };
}
