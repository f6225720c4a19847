import type { Element } from '../../network/element';
import type { Problem } from '../problem';
import { studiedLadder } from '../studiedLadder';
import { codesObstacle } from './bestCodes';
import { tuneChannels } from './tuneChannels';

/** The ladder as it is plotted where nobody has set a marker: tunables at the codes of the middle channel. */
export function middleLadder(problem: Problem): readonly Element[] {
  if (codesObstacle(problem) !== null) return studiedLadder(problem);
  const tuned = tuneChannels(problem);
  return tuned[(tuned.length - 1) >> 1].samples.ladder;
}
