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
import { codesObstacle } from './tuning/bestCodes';
import { evaluateTuned } from './tuning/evaluateTuned';

export interface EvaluateOptions extends YieldAnswer {
  /** These codes of the tunables by name, at every frequency, instead of the best ones of each channel; the first state without one. */
  readonly codes?: TunableCodes;
  /** Traces have the codes of the channel nearest to it; without, of the middle channel. */
  readonly markerHz?: number | null;
}

/**
 * What the problem's ladder does: traces over the sweep, the worst of each band, each goal, each element. With tunables goals
 * and bands are judged once a channel, with its best codes. Never throws on a problem that is well typed; what is not known
 * says so.
 */
export function evaluate(problem: Problem, options: EvaluateOptions = {}): Evaluation {
  if (options.codes === undefined && codesObstacle(problem) === null) return evaluateTuned(problem, options, options.markerHz ?? null);
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
    tuning: null,
  };
}
