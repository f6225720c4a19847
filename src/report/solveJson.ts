import { decibels, returnLossDb } from '../network/figures';
import type { Element } from '../network/element';
import type { Solution, SolveResult } from '../solve/solution';
import { identityOf } from '../study/elementIdentity';
import { orientationOf } from '../study/orientation';

/** A description and what its unknowns came out as. */
export interface SolvedFile {
  /** Relative to the working folder, with `/`. */
  readonly path: string;
  readonly result: SolveResult;
}

/** The result of `solve` for programs: version 1. Units as in `checkJson`; a bound or margin of null without a reason is infinite. */
export function solveJson(files: readonly SolvedFile[]): object {
  return {
    version: 1,
    files: files.map(({ path, result }) => ({
      path,
      solutions: result.solutions.map(solutionJson),
      ...(result.reason === null ? {} : { reason: result.reason }),
      ...(result.hints.length === 0 ? {} : { hints: result.hints }),
      ...(result.outOfReach.length === 0 ? {} : { outOfReach: result.outOfReach.map(({ form, reason }) => ({ form, reason })) }),
    })),
  };
}

const finite = (value: number | null): number | null => (value !== null && Number.isFinite(value) ? value : null);

/** The whole ladder, from the load on: what was unknown and what stood there before. */
function solutionJson(solution: Solution): object {
  return {
    elements: solution.ladder.map(elementJson),
    worstReflection: finite(solution.worstReflection), worstReturnLoss: finite(returnLossDb(solution.worstReflection)), worstGain: finite(decibels(solution.worstGain)),
    margin: finite(solution.marginDb), parts: solution.parts, form: solution.form, dcPath: solution.dcPath, dcBlock: solution.dcBlock,
    proved: solution.proved, bound: finite(solution.boundDb), ...(solution.proved ? {} : { reason: 'the best that was found; it is not proved that nothing is better' }),
    nodes: solution.nodes, holds: solution.holds, yield: solution.yield,
  };
}

function elementJson(element: Element): object {
  const { kind, value, unit } = identityOf(element);
  return { name: element.name, orientation: orientationOf(element), kind: element.form === 'not fitted' ? 'open' : kind, value: finite(value), unit };
}
