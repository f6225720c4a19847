import type { Element } from '../../network/element';
import type { Problem } from '../problem';
import { marginMeter, type Meter } from './marginMeter';
import type { ToleratedPart } from './toleratedParts';
import { tunedMeter } from './tunedMeter';
import { isTuned } from './tunedParts';

/** The meter of a problem's ladder: of each channel with its codes where parts are tuned. */
export const meterOf = (problem: Problem, ladder: readonly Element[], parts: readonly ToleratedPart[]): Meter =>
  isTuned(problem, ladder) ? tunedMeter(problem, ladder, parts) : marginMeter(problem, ladder, parts);
