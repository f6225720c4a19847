import type { Element } from '../../network/element';
import type { Part, Tolerance } from '../../network/part';
import type { Problem } from '../problem';
import { codesObstacle } from '../tuning/bestCodes';
import { tuneChannels, type TunedChannel } from '../tuning/tuneChannels';
import { evenlyAt } from './randomBuilds';
import { toleratedParts, valueAt, type ToleratedPart } from './toleratedParts';

/** In the place of a tuned part stands how far it is from its printed value, from 1 (lowest) over 2 to 3 (highest): tolerances differ from code to code. */
const middle = 2;
const carried: Tolerance = { form: 'absolute', up: 1, down: 1 };

/** Every channel of a problem with this ladder in it, sought once for the problem's own. */
export function tunedWith(problem: Problem, ladder: readonly Element[]): readonly TunedChannel[] {
  const set = setByCodes(problem);
  const isOwn = ladder.length === problem.ladder.length && ladder.every((element, at) => element === problem.ladder[at] || set.has(element.name));
  return tuneChannels(isOwn ? problem : { ...problem, ladder });
}

/** True where the ladder has parts that are set by codes, and codes can be had. */
export const isTuned = (problem: Problem, ladder: readonly Element[]): boolean => codesObstacle({ ...problem, ladder }) === null;

/** Names of the elements that some code sets. */
export const setByCodes = ({ tunables }: Pick<Problem, 'tunables'>): ReadonlySet<string> => new Set(tunables.flatMap(({ elements }) => elements));

/** Every part of the problem's ladder with a tolerance; of tuned parts those that have one at some code in use. */
export function partsOfBuilds(problem: Problem, ladder: readonly Element[]): readonly ToleratedPart[] {
  if (!isTuned(problem, ladder)) return toleratedParts(ladder);
  const set = setByCodes(problem);
  const tuned = tunedWith(problem, ladder);
  return toleratedParts(ladder.map((element, at): Element => {
    if (!set.has(element.name) || element.form !== 'branch' || element.branch.form !== 'part') return element;
    const isTolerated = tuned.some(({ samples }) => toleranceOf(samples.ladder[at]) !== null);
    return { ...element, branch: { form: 'part', part: { ...element.branch.part, value: middle, tolerance: isTolerated ? carried : null, measured: null } } };
  }));
}

function toleranceOf(element: Element): Tolerance | null {
  return element.form === 'branch' && element.branch.form === 'part' && !element.branch.part.measured ? element.branch.part.tolerance : null;
}

/** A part as it is at one channel, with the value that it has there in a build. */
export interface PartAtChannel {
  readonly part: ToleratedPart;
  valueAt(build: number): number;
}

/** `here`: the element as the channel's codes set it. */
export function atChannel(part: ToleratedPart, here: Element, isSet: boolean, distribution: Problem['spread']['distribution']): PartAtChannel {
  if (!isSet || here.form !== 'branch' || here.branch.form !== 'part') return { part, valueAt: (build) => build };
  const own: Part = here.branch.part;
  const tolerance = toleranceOf(here);
  const there = { ...part, part: own, tolerance: tolerance ?? part.tolerance };
  if (tolerance === null) return { part: there, valueAt: () => own.value };
  return {
    part: there,
    valueAt(build) {
      const deviation = build - middle;
      return valueAt(there, distribution === 'normal' ? deviation : evenlyAt(there, (deviation + 1) / 2));
    },
  };
}
