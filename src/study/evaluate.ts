import { bandResults } from './bandResults';
import { elementTable } from './elementTable';
import type { Evaluation } from './evaluation';
import { judgeGoal } from './judgeGoal';
import type { YieldAnswer } from './judgeYield';
import { unsolvedElements } from './obstacles';
import { sweepPlace } from './place';
import type { Problem } from './problem';
import { sampler } from './sampler';
import { studiedLadder } from './studiedLadder';
import { traceCase } from './traceCase';
import type { TunableCodes } from './tunableCodes';

export interface EvaluateOptions extends YieldAnswer {
  /** Codes of the tunables by name; each stands at its first state where nothing is said (see `tunableHint`). */
  readonly codes?: TunableCodes;
}

/**
 * What the problem's ladder does: traces over the sweep, the worst of each band, each goal, each element. Never throws on a
 * problem that is well typed; what is not known says so.
 */
export function evaluate(problem: Problem, options: EvaluateOptions = {}): Evaluation {
  const samples = sampler(problem, studiedLadder(problem, options.codes));
  const goals = problem.goals.map((goal) => judgeGoal(goal, samples, options));
  const sweep = sweepPlace(problem);
  return {
    frequencyHz: problem.sweepHz,
    traces: problem.cases.map((_, at) => traceCase(samples.trace(sweep, at), problem.z0Ohm)),
    bands: bandResults(samples),
    goals,
    elements: problem.ladder.length === 0 ? [] : elementTable(samples),
    ok: goals.every((goal) => goal.ok) && unsolvedElements(problem).length === 0,
  };
}
