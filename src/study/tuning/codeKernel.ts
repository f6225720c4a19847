import type { Element } from '../../network/element';
import type { Immittance } from '../../network/immittance';
import { ladderKernel, type LadderKernel } from '../../network/ladderKernel';
import type { Problem, Tunable } from '../problem';
import { ladderAtCodes } from '../tunableCodes';
import type { CodeSpace } from './codeSpace';

/** A `LadderKernel` that is set by codes: states by the tunables of a code space. */
export interface CodeKernel extends Pick<LadderKernel, 'reflectionMagnitude' | 'gain'> {
  evaluate(states: Int32Array): void;
  /** Another element in the place of one that no code sets. */
  setElement(index: number, element: Element): void;
}

export function codeKernel(problem: Problem, space: CodeSpace, frequencyHz: Float64Array, source: Immittance, load: Immittance): CodeKernel {
  const kernel = ladderKernel(ladderAtCodes(problem), frequencyHz, source, load);
  const knobs = space.tunables.map((tunable) => knobOf(problem, tunable));
  const current = new Int32Array(knobs.length).fill(-1);
  return {
    reflectionMagnitude: kernel.reflectionMagnitude,
    gain: kernel.gain,
    setElement: (index, element) => kernel.setElement(index, element),
    evaluate(states) {
      knobs.forEach(({ elementIndices, elements, sameLaw, tunable }, t) => {
        if (current[t] === states[t]) return;
        current[t] = states[t];
        elementIndices.forEach((index, i) => {
          if (sameLaw) kernel.setValue(index, tunable.states[states[t]].part.value);
          else kernel.setElement(index, elements[states[t]][i]);
        });
      });
      kernel.evaluate();
    },
  };
}

interface Knob {
  readonly tunable: Tunable;
  readonly elementIndices: readonly number[];
  /** By state: the elements as they then are. */
  readonly elements: readonly (readonly Element[])[];
  /** True where states differ in nothing but their value. */
  readonly sameLaw: boolean;
}

function knobOf(problem: Problem, tunable: Tunable): Knob {
  const elementIndices = problem.ladder.flatMap((element, index) => (tunable.elements.includes(element.name) && element.form === 'branch' ? [index] : []));
  const elements = tunable.states.map(({ code }) => {
    const ladder = ladderAtCodes(problem, new Map([[tunable.name, code]]));
    return elementIndices.map((index) => ladder[index]);
  });
  const law = ({ part: { loss, eslH, srfHz } }: Tunable['states'][number]): string => JSON.stringify([loss, eslH, srfHz]);
  const sameLaw = tunable.states.every((state) => state.part.measured === null && law(state) === law(tunable.states[0]));
  return { tunable, elementIndices, elements, sameLaw };
}
