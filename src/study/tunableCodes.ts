import type { Element } from '../network/element';
import type { Part } from '../network/part';
import type { Problem } from './problem';

/** Codes by the tunable's name. */
export type TunableCodes = ReadonlyMap<string, number>;

/**
 * The ladder with each tunable at its code. A tunable without a code, or with one that it does not have, stands at its
 * first state. Without tunables this is the problem's own ladder.
 */
export function ladderAtCodes(problem: Problem, codes: TunableCodes = new Map()): readonly Element[] {
  if (problem.tunables.length === 0) return problem.ladder;
  const partByElement = new Map<string, Part>();
  for (const tunable of problem.tunables) {
    const code = codes.get(tunable.name);
    const state = tunable.states.find((each) => each.code === code) ?? tunable.states[0];
    if (state) for (const name of tunable.elements) partByElement.set(name, state.part);
  }
  return problem.ladder.map((element) => {
    const part = partByElement.get(element.name);
    return part && element.form === 'branch' ? { ...element, branch: { form: 'part', part } } : element;
  });
}
