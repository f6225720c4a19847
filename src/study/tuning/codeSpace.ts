import type { Problem, Tunable } from '../problem';
import type { TunableCodes } from '../tunableCodes';

/** All combinations of codes, numbered: the last tunable's code goes fastest, so that a smaller number is a smaller code. */
export interface CodeSpace {
  /** Those that set something and have a state to stand at. */
  readonly tunables: readonly Tunable[];
  /** How many combinations; may be more than can be tried, or than a number can count exactly. */
  readonly count: number;
  /** Indices of the states at a combination. */
  statesOf(combination: number, into: Int32Array): void;
  combinationOf(states: Int32Array): number;
  codesOf(states: Int32Array): TunableCodes;
  /** How far two combinations are from each other: the sum over the tunables of the difference of their codes. */
  distance(first: Int32Array, second: Int32Array): number;
}

export function codeSpace(problem: Pick<Problem, 'tunables'>): CodeSpace {
  const tunables = usedTunables(problem);
  const sizes = tunables.map(({ states }) => states.length);
  return {
    tunables,
    count: sizes.reduce((product, size) => product * size, 1),
    statesOf(combination, into) {
      let rest = combination;
      for (let t = sizes.length - 1; t >= 0; t--) {
        into[t] = rest % sizes[t];
        rest = Math.floor(rest / sizes[t]);
      }
    },
    combinationOf: (states) => sizes.reduce((sum, size, t) => sum * size + states[t], 0),
    codesOf: (states) => new Map(tunables.map(({ name, states: own }, t) => [name, own[states[t]].code])),
    distance: (first, second) => tunables.reduce((sum, { states: own }, t) => sum + Math.abs(own[first[t]].code - own[second[t]].code), 0),
  };
}

export const usedTunables = ({ tunables }: Pick<Problem, 'tunables'>): readonly Tunable[] =>
  tunables.filter(({ elements, states }) => elements.length > 0 && states.length > 0);
