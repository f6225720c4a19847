import type { TextEdit } from '../base/diagnostic';
import type { Description } from '../description/description';
import { replaceInScalar } from '../description/edits';
import { namesIn } from '../description/names';
import { checkPhraseName, checkWord } from '../description/phrase/checkName';
import { plainPhrase } from '../description/phrase/phrase';
import { readLetPhrase } from '../description/phrase/readLet';
import { nameAt } from './definition';

/** Changes the name at the offset everywhere it stands; or says why the new one will not do. */
export function renameEdits(description: Description, offset: number, newName: string): TextEdit[] | { readonly refusal: string } {
  const found = nameAt(description, offset);
  if (!found?.definition) return { refusal: 'There is no name here that could be changed.' };
  const name = newName.trim();
  const complaints: string[] = [];
  const context = { report: ({ message }: { message: string }) => complaints.push(message), lets: new Map(), expressions: true };
  const located = { value: name, span: found.definition };
  switch (found.kind) {
    case 'element': checkWord(located, context); break;
    case 'let': readLetPhrase(located, plainPhrase('1'), context); break;
    case 'goal': return { refusal: 'A goal has no name.' };
    default: checkPhraseName(located, found.kind, context);
  }
  if (complaints.length > 0) return { refusal: complaints[0] };
  if (name !== found.name && namesIn(description.syntax).some((other) => other.kind === found.kind && other.name === name && other.definition)) {
    return { refusal: `There is a ${found.kind} named ${name} already.` };
  }
  return [found.definition, ...found.references].flatMap((span) => replaceInScalar(description.syntax.text, span, name));
}
