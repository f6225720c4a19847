import type { Element } from '../../network/element';
import type { Problem } from '../problem';
import { codesObstacle } from '../tuning/bestCodes';
import { marginMeter, type Meter } from './marginMeter';
import type { ToleratedPart } from './toleratedParts';
import { tunedMeter } from './tunedMeter';

/** The meter of a problem's ladder: of each channel with its codes where parts are tuned. */
export const meterOf = (problem: Problem, ladder: readonly Element[], parts: readonly ToleratedPart[]): Meter =>
  codesObstacle({ ...problem, ladder }) === null ? tunedMeter(problem, ladder, parts) : marginMeter(problem, ladder, parts);
