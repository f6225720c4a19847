import type { Element } from '../network/element';
import type { Problem } from './problem';
import { ladderAtCodes, type TunableCodes } from './tunableCodes';

/**
 * The ladder that a study goes through: tunables at their codes; where the whole ladder is to be found, one unsolved
 * element stands for it, so that nothing is known beyond the load.
 */
export function studiedLadder(problem: Problem, codes?: TunableCodes): readonly Element[] {
  if (problem.ladder.length === 0 && problem.ladderTask !== null) {
    return [{ form: 'unsolved', name: 'the ladder', orientation: 'through', kind: null }];
  }
  return ladderAtCodes(problem, codes);
}
