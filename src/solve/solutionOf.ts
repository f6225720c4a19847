import type { Element } from '../network/element';
import { decibels } from '../network/figures';
import { countParts } from '../study/countParts';
import { directCurrent } from '../study/directCurrent';
import type { Evaluation } from '../study/evaluation';
import { evaluate } from '../study/evaluate';
import { isCondition, marginDb } from '../study/marginDb';
import { stressedBands } from '../study/place';
import type { Problem } from '../study/problem';
import { responseOfLadder } from './response';
import type { Solution, SolvedElement } from './solution';

/** The problem with a ladder in place of what was unknown. */
export function withLadder(problem: Problem, ladder: readonly Element[]): Problem {
  return { ...problem, ladder, unknowns: [], ladderTask: null };
}

/** How an answer was come by. */
export interface Proof {
  readonly proved: boolean;
  readonly boundDb: number | null;
  readonly nodes: number;
}

/** All figures of a ladder that was found, from a whole evaluation of it. */
export function solutionOf(problem: Problem, solved: readonly SolvedElement[], ladder: readonly Element[], proof: Proof): Solution {
  // One point is enough of the sweep: only goals and bands are asked for.
  const evaluation = evaluate({ ...withLadder(problem, ladder), sweepHz: problem.sweepHz.slice(0, 1) });
  const { worstReflection, worstGain } = worstOf(problem, evaluation);
  const path = directCurrent('dc path', ladder).met;
  const judgedGoals = evaluation.goals.filter(({ goal }) => goal.quantity !== 'yield');
  const margins = judgedGoals.filter(({ goal }) => !isCondition(goal)).map((result) => marginDb(result) ?? -Infinity);
  return {
    solved, ladder,
    marginDb: margins.length > 0 ? Math.min(...margins) : decibels(worstGain),
    conditionsMissed: judgedGoals.filter(({ goal, ok }) => isCondition(goal) && !ok).length,
    missedGoals: judgedGoals.filter(({ ok }) => !ok).map(({ goal }) => goal.text),
    holds: judgedGoals.every(({ ok }) => ok),
    yield: null,
    worstReflection, worstGain,
    parts: countParts(ladder),
    form: responseOfLadder(ladder),
    dcPath: path, dcBlock: path === null ? null : !path,
    ...proof,
  };
}

/** Over all cases and the bands that count; what is not known counts as nothing arriving. */
function worstOf(problem: Problem, { bands }: Evaluation): { worstReflection: number; worstGain: number } {
  const counted = new Set(stressedBands(problem).map(({ name }) => name));
  let worstReflection = 0;
  let worstGain = Infinity;
  for (const band of bands.filter(({ name }) => counted.has(name))) {
    for (const each of band.cases) {
      worstReflection = Math.max(worstReflection, each.worstReflection ?? 1);
      worstGain = Math.min(worstGain, each.worstGainDb === null ? 0 : 10 ** (each.worstGainDb / 10));
    }
  }
  return { worstReflection, worstGain };
}
