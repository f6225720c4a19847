import type { Problem } from '../study/problem';
import { spreadObstacle, spreadOfBuilds } from '../study/spread/spreadOfBuilds';
import { checkedPoints } from '../study/spread/goalChecks';
import { shareCodes } from '../study/tuning/tuneChannels';
import { quickBuilds, slowBuilds } from './limits';
import type { Solution } from './solution';
import { withLadder } from './solutionOf';

/**
 * Solutions with the share of builds that hold, where parts have tolerances: fewer builds than a whole study, for telling them
 * apart. A goal on yield counts as a condition here, so that what reaches it comes first; else the order stays.
 */
export function withYields(problem: Problem, solutions: readonly Solution[]): Solution[] {
  const wanted = wantedShare(problem);
  const slow = checkedPoints(problem).others.some((at) => !structural.has(problem.goals[at].quantity));
  const judged = solutions.map((solution): Solution => {
    const own = withLadder(problem, solution.ladder);
    if (spreadObstacle(own) !== null) return wanted === null ? solution : { ...solution, holds: false, conditionsMissed: solution.conditionsMissed + 1, missedGoals: [...solution.missedGoals, 'yield'] };
    const builds = Math.min(problem.spread.builds, slow ? slowBuilds : quickBuilds);
    const run = spreadOfBuilds(shareCodes(own, { ...own, spread: { ...own.spread, builds } }));
    run.more(builds);
    const share = run.result().yield;
    const missed = wanted !== null && share < wanted;
    return { ...solution, yield: share, holds: solution.holds && !missed, conditionsMissed: solution.conditionsMissed + (missed ? 1 : 0), missedGoals: missed ? [...solution.missedGoals, 'yield'] : solution.missedGoals };
  });
  return wanted === null ? judged : judged.map((solution, at) => ({ solution, at })).sort((a, b) => a.solution.conditionsMissed - b.solution.conditionsMissed || a.at - b.at).map(({ solution }) => solution);
}

const structural: ReadonlySet<string> = new Set(['parts', 'dc path', 'dc block', 'dc short at load']);

/** The largest yield that is asked for; null where none is. */
function wantedShare({ goals }: Problem): number | null {
  const limits = goals.flatMap(({ quantity, comparison, limit, unit }) =>
    (quantity === 'yield' && (comparison === '>=' || comparison === '>') ? [unit === '%' ? (limit ?? 0) / 100 : limit ?? 0] : []));
  return limits.length === 0 ? null : Math.max(...limits);
}

/** What to say where the best margin is not the best build; null where it is. */
export function betterBuild(solutions: readonly Solution[]): Solution | null {
  const [first] = solutions;
  if (!first || first.yield === null) return null;
  const best = solutions.reduce((most, each) => ((each.yield ?? 0) > (most.yield ?? 0) ? each : most), first);
  return best === first || (best.yield ?? 0) - first.yield < noticeable ? null : best;
}

/** Differences below this are within what so few builds can tell. */
const noticeable = 0.02;
