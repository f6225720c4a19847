import type { TextEdit } from '../base/diagnostic';
import { insertElements, setElementValue, type LadderEntry } from '../description/edits';
import type { DescriptionSyntax } from '../description/syntax';
import { writeQuantity } from '../quantity/printQuantity';
import type { Solution, SolvedElement } from '../solve/solution';
import { writeValue } from './familyMembers';

/** Digits of a value that comes from no catalogue: 0.05 % is below any tolerance. */
const freeDigits = 4;

/** What an element's phrase says of a value that was found, as a person would write it: `3.3 pF from caps`, `0 Ω`, `12.4 mm`. */
export function solvedValue({ element, part, family, label }: SolvedElement): string {
  if (element.form === 'bridge') return '0 Ω';
  if (element.form === 'not fitted') return 'not fitted';
  if (element.form === 'line' || element.form === 'stub') return writeQuantity(rounded(element.line.lengthM), 'm');
  if (!part) return '';
  const value = writeValue(part.kind, family === null ? rounded(part.value) : part.value);
  return [value, ...(family === null ? [] : [`from ${family}`]), ...(label === null ? [] : [`part ${label}`])].join(' ');
}

const rounded = (value: number): number => Number(value.toPrecision(freeDigits));

/**
 * The edits that put a solution into the text that `syntax` was read from; together one undo step. Only values change: comments,
 * layout and the figures that stand beside a `solve` stay. `only` names the elements that are meant; all without it.
 */
export function insertSolution(syntax: DescriptionSyntax, solution: Pick<Solution, 'solved'>, only?: readonly string[]): TextEdit[] {
  if (syntax.ladder?.solve) return insertElements(syntax, solution.solved.map(entryOf));
  return solution.solved
    .filter(({ name }) => only === undefined || only.includes(name))
    .filter((each) => !says(syntax, each))
    .flatMap((each) => setElementValue(syntax, each.name, solvedValue(each)));
}

/** True where the text has that very part already: solving again leaves it as it is written. */
function says(syntax: DescriptionSyntax, { name, part, family, label }: SolvedElement): boolean {
  const body = syntax.ladder?.elements.find((element) => element.name.value === name)?.body;
  if (body?.form !== 'branch' || body.branch.form !== 'part' || body.branch.value.form !== 'known' || part === null) return false;
  return Math.abs(body.branch.value.value - part.value) <= 1e-9 * part.value && body.branch.from?.value === family && (body.branch.label?.value ?? null) === label;
}

const entryOf = (solved: SolvedElement): LadderEntry => ({ key: `${solved.orientation} ${solved.name}`, phrase: solvedValue(solved) });
