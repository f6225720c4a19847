import { decibels } from '../network/figures';
import { printQuantity } from '../quantity/printQuantity';
import type { Goal } from '../study/goal';
import type { Problem } from '../study/problem';
import { codeCombinationsAtMost } from '../study/limits';
import { studiedLadder } from '../study/studiedLadder';
import { codeSpace, usedTunables } from '../study/tuning/codeSpace';
import { aimOf, isLossless, type Aim } from './aim';
import { catalogueCandidates, type Candidate, type CatalogueTask } from './catalogueCandidates';
import { formsOfChosenQ } from './chosenQ';
import { conditionsOf } from './conditions';
import { fillForm } from './fillForm';
import { formsOf, positionsOf, type Form } from './forms';
import { freeCandidates, hasFreeValue } from './freeCandidates';
import { omissionsAtMost, searchNodes, yieldPool } from './limits';
import { twoElementFormsOutOfReach } from './outOfReach';
import { compareRanked, exactExcess } from './ranking';
import { defaultTop, type Solution, type SolveOptions, type SolveResult } from './solution';
import { solutionOf } from './solutionOf';
import { tunedCandidates } from './tunedCandidates';
import { betterBuild, withYields } from './yieldOfSolutions';

/**
 * Fills in what a problem leaves unknown: the best ladders first (`compareRanked`), and the best for each number of parts.
 * From catalogues the answer is the best that exists, and `proved` says whether that is proved. The same problem has the same
 * answer on every machine. Never throws but for what `onProgress` throws.
 */
export function solveProblem(problem: Problem, options: SolveOptions = {}): SolveResult {
  const nothing = (reason: string): SolveResult => ({ solutions: [], byParts: [], reason, hints: [], outOfReach: [] });
  const whole = problem.ladderTask !== null && problem.ladder.length === 0;
  if (!whole && problem.unknowns.length === 0) return nothing('nothing is left to solve');
  const faulty = whole ? undefined : problem.ladder.find(({ form }) => form === 'faulty');
  if (faulty) return nothing(`${faulty.name} could not be read`);
  const given = formsOf(problem);
  if (given.length === 0) return nothing('there is nothing to choose from');
  const task = whole ? problem.ladderTask : null;
  const chosen = task && task.form !== 'up to' && (task.q !== null || task.bandwidthHz !== null) ? formsOfChosenQ(problem, task, given[0]) : null;
  const forms = chosen?.forms ?? given;
  const outOfReach = chosen?.outOfReach ?? (task?.form === 'up to' && task.elements >= 2 ? twoElementFormsOutOfReach(problem) : []);
  if (forms.length === 0) return { ...nothing('no form reaches this'), outOfReach };
  const lossless = !studiedLadder(problem).some((element) => !isLossless(element))
    && forms.every((form) => positionsOf(form).every(({ items }) => items.every(({ element }) => isLossless(element))));
  const aim = aimOf(problem, lossless);
  if (aim.points.count === 0) return nothing(aim.notKnown[0]?.reason ?? 'the load is not known in any band');
  const top = options.top ?? defaultTop;
  const search: CatalogueTask = {
    forms, points: aim.points, conditions: conditionsOf(problem), size: top, nodeLimit: searchNodes,
    onProgress: (share, excess) => options.onProgress?.(share, excess === null ? null : -decibels(excess)),
  };
  const found = isTuned(problem) ? tunedCandidates(problem, search) : hasFreeValue(forms) ? freeCandidates(search, aim.byDefault) : catalogueCandidates(search);
  // What follows from a chosen Q is not the best of all ladders, unless it matches exactly.
  const candidates = chosen ? found.map((each) => ({ ...each, proved: each.excess <= exactExcess })) : found;
  if (candidates.length === 0) return { ...nothing('no ladder can be built from what is left of the parts'), outOfReach };
  const { solutions, byParts } = ranked(problem, candidates, aim, top);
  const hints = [...hintsOf(problem, aim, lossless), ...cutHints(problem, forms)];
  const better = betterBuild(solutions);
  if (better) hints.push(`More builds hold with ${partsText(better)} (${percent(better.yield)}) than with the first (${percent(solutions[0].yield)}), though its margin is smaller.`);
  return { solutions, byParts, reason: null, hints, outOfReach };
}

function ranked(problem: Problem, candidates: readonly Candidate[], aim: Aim, top: number): Pick<SolveResult, 'solutions' | 'byParts'> {
  const order = [...candidates].sort((a, b) => compareRanked(a, b, aim.byDefault));
  const made = new Map<Candidate, Solution>();
  const make = (candidate: Candidate): Solution => {
    const found = made.get(candidate);
    if (found) return found;
    const { solved, ladder } = fillForm(candidate.form, candidate.items);
    const equals = order.filter(({ parts, missed }) => parts === candidate.parts && missed === candidate.missed);
    const best = equals.reduce((least, each) => (each.excess < least.excess ? each : least), candidate);
    const { proved, nodes } = candidate;
    const own = solutionOf(problem, solved, ladder, { proved, nodes, boundDb: null });
    const boundDb = !proved ? null : candidate.excess <= exactExcess ? Infinity : best === candidate ? own.marginDb : make(best).marginDb;
    const solution = { ...own, boundDb };
    made.set(candidate, solution);
    return solution;
  };
  const counts = [...new Set(order.map(({ parts }) => parts))].sort((a, b) => a - b);
  const asksYield = problem.goals.some(({ quantity }) => quantity === 'yield');
  const listed = order.slice(0, asksYield ? yieldPool * top : top).map(make);
  const bests = counts.map((count) => make(order.find(({ parts }) => parts === count) as Candidate));
  const all = [...listed, ...bests.filter((each) => !listed.includes(each))];
  const yields = withYields(problem, all);
  // The best of each number of parts stays what it is by margin, and is one with its place in the list.
  const found = new Map(all.map((each) => [each.ladder, yields.find(({ ladder }) => ladder === each.ladder) as Solution]));
  const chosen = yields.filter(({ ladder }) => listed.some((each) => each.ladder === ladder)).slice(0, top);
  return { solutions: chosen, byParts: bests.map((each) => found.get(each.ladder) as Solution) };
}

/** True where codes set some of the ladder's parts, in a number of combinations that can be tried. */
const isTuned = (problem: Problem): boolean => usedTunables(problem).length > 0 && (problem.channelsHz?.length ?? 0) > 0 && codeSpace(problem).count <= codeCombinationsAtMost;

const units = { resistor: 'Ω', inductor: 'H', capacitor: 'F' } as const;

/** `L1 10 nH, C2 13 pF`: parts that were chosen; what is left out or no part goes without saying. */
const partsText = ({ solved }: Solution): string => solved.flatMap(({ name, part }) => (part ? [`${name} ${printQuantity(part.value, units[part.kind], { digits: 3 })}`] : [])).join(', ');

const percent = (share: number | null): string => `${((share ?? 0) * 100).toFixed(1)} %`;

function hintsOf(problem: Problem, aim: Aim, lossless: boolean): string[] {
  const hints = aim.notKnown.map(({ goal, reason }) => `«${goal.text}» cannot be told and was left aside: ${reason}.`);
  if (!lossless && problem.goals.some(asksReflection) && !problem.goals.some(asksGain)) {
    hints.push('The parts have loss, and a lossy match reflects little and passes little: a goal on gain, such as «gain >= -1 dB», would tell the two apart.');
  }
  return hints;
}

/** What was not looked at, and why. */
function cutHints({ ladderTask, unknowns }: Problem, forms: readonly Form[]): string[] {
  const most = Math.max(...forms.map(({ parts }) => parts));
  const hints: string[] = [];
  if (ladderTask?.form === 'up to' && ladderTask.elements > most) hints.push(`Ladders of more than ${most} elements were not looked at.`);
  if (unknowns.filter(({ mayOmit }) => mayOmit).length > omissionsAtMost) hints.push('So many places may stay empty that only ladders were looked at in which two of them stay empty, or are fitted, at most.');
  return hints;
}

const asksReflection = ({ quantity }: Goal): boolean => quantity === 'return loss' || quantity === 'VSWR' || quantity === 'reflection' || quantity === 'mismatch loss';
const asksGain = ({ quantity }: Goal): boolean => quantity === 'gain' || quantity === 'insertion loss' || quantity === 'efficiency';
