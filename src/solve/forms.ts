import type { Element, Orientation } from '../network/element';
import type { PartKind } from '../network/part';
import { countParts } from '../study/countParts';
import type { Problem } from '../study/problem';
import { studiedLadder } from '../study/studiedLadder';
import type { LadderTask, Unknown } from '../study/unknown';
import { omissionsAtMost, wholeFreeElementsAtMost } from './limits';
import { positionOf, type Position } from './positions';
import type { SolvedElement } from './solution';

/** Ladders that differ only in what stands in their positions. */
export interface Form {
  /** Load first: a position to fill, or elements that are given. */
  readonly steps: readonly (Position | readonly Element[])[];
  /** Fitted parts, those of the given elements included. */
  readonly parts: number;
  /** The unknown ones in the order of the ladder: a position by its number among the form's positions, or what is left out. */
  readonly unknowns: readonly (number | SolvedElement)[];
}

export const isPosition = (step: Position | readonly Element[]): step is Position => 'items' in step;
export const positionsOf = (form: Form): readonly Position[] => form.steps.filter(isPosition);

/** Every form that a problem's unknowns allow: each `or none` filled or not, or each ladder that its task allows. */
export function formsOf(problem: Problem): readonly Form[] {
  if (problem.ladderTask && problem.ladder.length === 0) return wholeLadders(problem.ladderTask);
  const ladder = studiedLadder(problem);
  const { unknowns } = problem;
  const made = new Map(unknowns.map((unknown) => [unknown, positionOfUnknown(unknown, ladder[unknown.elementIndex])]));
  const optional = unknowns.filter(({ mayOmit }) => mayOmit);
  const forms: Form[] = [];
  for (const omitted of omissions(optional)) forms.push(formWithout(new Set(omitted), unknowns, made, ladder));
  return forms.filter((form) => positionsOf(form).every(({ items }) => items.length > 0));
}

/** Every subset of the places that may stay empty; of many such places, those of up to two, and what they leave. */
export function omissions<T>(optional: readonly T[]): readonly (readonly T[])[] {
  if (optional.length <= omissionsAtMost) return Array.from({ length: 2 ** optional.length }, (_, mask) => optional.filter((__, i) => (mask >> i) & 1));
  const few: T[][] = [[], ...optional.map((one) => [one]), ...optional.flatMap((one, i) => optional.slice(i + 1).map((other) => [one, other]))];
  return [...few, ...few.map((kept) => optional.filter((each) => !kept.includes(each)))];
}

function formWithout(omitted: ReadonlySet<Unknown>, unknowns: readonly Unknown[], made: ReadonlyMap<Unknown, Position>, ladder: readonly Element[]): Form {
  const steps: (Position | Element[])[] = [];
  const order: (number | SolvedElement)[] = [];
  let positions = 0;
  let parts = 0;
  ladder.forEach((element, index) => {
    const unknown = unknowns.find(({ elementIndex }) => elementIndex === index);
    const position = unknown && made.get(unknown);
    if (unknown && position && !omitted.has(unknown)) {
      steps.push(position);
      order.push(positions++);
      parts += position.items.length > 0 ? countParts([position.items[0].element]) : 1;
      return;
    }
    const given = unknown ? leftOut(unknown.name, position?.orientation ?? 'series', kindOfUnknown(unknown)) : element;
    if (unknown) order.push({ name: unknown.name, orientation: position?.orientation ?? 'series', element: given, part: null, family: null, label: null });
    parts += countParts([given]);
    const last = steps[steps.length - 1];
    if (Array.isArray(last)) last.push(given);
    else steps.push([given]);
  });
  return { steps, parts, unknowns: order };
}

function kindOfUnknown({ choices }: Unknown): PartKind | null {
  const kinds = new Set(choices.map(({ kind }) => kind));
  const [kind] = kinds;
  return kinds.size === 1 && kind !== 'line' && kind !== 'stub' ? kind : null;
}

const leftOut = (name: string, orientation: Orientation, kind: PartKind | null): Element =>
  (orientation === 'shunt' ? { form: 'not fitted', name, orientation: 'shunt', kind } : { form: 'bridge', name, orientation: 'series' });

function positionOfUnknown(unknown: Unknown, element: Element): Position {
  const orientation: Orientation = 'orientation' in element ? element.orientation : element.form === 'stub' ? 'shunt' : 'through';
  const pair = (element.form === 'unsolved' || element.form === 'branch') && element.pair === true;
  const end = element.form === 'unsolved' && element.end !== undefined ? element.end : null;
  return positionOf(unknown.name, orientation, unknown.choices, pair, end);
}

/** Series and shunt elements alternate, either first; a pi begins and ends with a shunt one, a tee with a series one. */
function wholeLadders(task: LadderTask): readonly Form[] {
  const series = positionOf(null, 'series', task.choices, false, null);
  const shunt = positionOf(null, 'shunt', task.choices, false, null);
  if (series.items.length === 0) return [];
  const ladderOf = (count: number, first: 'series' | 'shunt'): Form => ({
    steps: Array.from({ length: count }, (_, i) => ((i % 2 === 0) === (first === 'series') ? series : shunt)),
    parts: count,
    unknowns: Array.from({ length: count }, (_, i) => i),
  });
  if (task.form !== 'up to') return [ladderOf(3, task.form === 'pi' ? 'shunt' : 'series')];
  const most = series.items.some(({ range }) => range !== null) ? Math.min(task.elements, wholeFreeElementsAtMost) : task.elements;
  return Array.from({ length: most }, (_, i) => i + 1).flatMap((count) => [ladderOf(count, 'series'), ladderOf(count, 'shunt')]);
}
