import type { Element } from '../network/element';
import type { Problem } from './problem';

/** Stands for the whole ladder in `unsolvedElements` where all of it is to be found (`ladder: solve …`). */
export const wholeLadder = 'ladder';

/** Names of the elements that are still `solve`, from the load on; `ladder` where the whole ladder is. */
export function unsolvedElements(problem: Pick<Problem, 'ladder' | 'ladderTask'>): readonly string[] {
  return problem.ladderTask && problem.ladder.length === 0 ? [wholeLadder] : unsolvedNames(problem.ladder);
}

/** True where nothing is unknown, neither left to solve nor reopened. */
export const isSettled = (problem: Pick<Problem, 'ladder' | 'ladderTask' | 'unknowns'>): boolean => unsolvedElements(problem).length === 0 && problem.unknowns.length === 0;

const unsolvedNames = (ladder: readonly Element[]): readonly string[] =>
  ladder.filter((element) => element.form === 'unsolved').map((element) => element.name);

/** Why no goal can have a value: what is unsolved, or could not be read, by name. Null where nothing stands in the way. */
export function ladderObstacle(ladder: readonly Element[]): string | null {
  const unsolved = unsolvedNames(ladder);
  if (unsolved.length > 1) return `${unsolved.slice(0, -1).join(', ')} and ${unsolved[unsolved.length - 1]} are still to be solved`;
  const blocking = ladder.find((element) => element.form === 'unsolved') ?? ladder.find((element) => element.form === 'faulty');
  return blocking ? elementObstacle(blocking) : null;
}

/** Why nothing is known beyond this element; null where it stands in nobody's way. */
export function elementObstacle(element: Element): string | null {
  if (element.form === 'unsolved') return `${element.name} is still to be solved`;
  return element.form === 'faulty' ? named(element.name, element.reason) : null;
}

/** The reason with its owner in front, unless it names it already. */
export function named(owner: string, reason: string): string {
  return reason.startsWith(owner) ? reason : `${owner}: ${reason}`;
}
