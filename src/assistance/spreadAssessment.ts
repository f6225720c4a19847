import { judgeYield } from '../study/judgeYield';
import { unsolvedElements } from '../study/obstacles';
import type { Problem } from '../study/problem';
import { spreadObstacle, spreadOfBuilds, type SpreadOfBuilds } from '../study/spread/spreadOfBuilds';
import { worstCorner, type WorstCorner } from '../study/spread/worstCorner';
import { yieldRemedy, type YieldRemedy } from '../study/spread/yieldRemedy';
import type { Assessment } from './assess';
import { goalDiagnostics } from './goalDiagnostics';

/** What builds with real parts do. */
export interface Spread {
  readonly builds: SpreadOfBuilds;
  readonly corner: WorstCorner;
  /** What would have to be tightened; null where the yield is reached, none is asked for, or no single part would do. */
  readonly remedy: YieldRemedy | null;
}

/** All of it at once: for where nobody waits at a keyboard. Null where there is none (`spreadObstacle`). */
export function wholeSpread(problem: Problem, onProgress: (share: number) => void = () => undefined): Spread | null {
  if (spreadObstacle(problem) !== null) return null;
  const run = spreadOfBuilds(problem);
  for (let made = buildsAtOnce; run.more(buildsAtOnce); made += buildsAtOnce) onProgress(made / problem.spread.builds);
  const builds = run.result();
  return { builds, corner: worstCorner(problem), remedy: remedyFor(problem, builds) };
}

/** Builds between two reports. */
const buildsAtOnce = 100;

/** The remedy where a lower limit on yield is missed. */
export function remedyFor(problem: Problem, builds: SpreadOfBuilds): YieldRemedy | null {
  const wanted = wantedYield(problem);
  return wanted !== null && builds.yield < wanted ? yieldRemedy(problem, wanted) : null;
}

/** The largest share that a goal asks for; null where none does. */
export function wantedYield({ goals }: Pick<Problem, 'goals'>): number | null {
  const limits = goals.filter(({ quantity, comparison }) => quantity === 'yield' && (comparison === '>=' || comparison === '>'))
    .map(({ limit, unit }) => (unit === '%' ? (limit ?? 0) / 100 : limit ?? 0));
  return limits.length === 0 ? null : Math.max(...limits);
}

/** With everything, for the command line. */
export function assessWithSpread(assessment: Assessment, onProgress?: (share: number) => void): Assessment {
  const { problem } = assessment.model;
  return problem ? withSpread(assessment, wholeSpread(problem, onProgress)) : assessment;
}

/** The assessment with its goals on yield judged by a spread, or with the reason why there is none. */
export function withSpread(assessment: Assessment, spread: Spread | null): Assessment {
  const { description, model, evaluation } = assessment;
  if (!model.problem || !evaluation) return assessment;
  const answer = spread ? { yield: spread.builds.yield } : { yieldReason: spreadObstacle(model.problem) };
  const goals = evaluation.goals.map((result) => (result.goal.quantity === 'yield' ? judgeYield(result.goal, answer) : result));
  const judged = { ...evaluation, goals, ok: goals.every(({ ok }) => ok) && unsolvedElements(model.problem).length === 0 };
  const others = assessment.diagnostics.filter(({ code }) => code !== 'goal-missed' && code !== 'goal-not-known' && code !== 'unsolved');
  const diagnostics = [...others, ...goalDiagnostics(description, model, judged)].sort((a, b) => a.span.start - b.span.start);
  return { ...assessment, evaluation: judged, diagnostics, spread };
}
