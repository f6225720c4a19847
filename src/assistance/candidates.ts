import type { CandidateView, CandidatesView, CoverageView } from '../messages/panel';
import { decibels, returnLossDb } from '../network/figures';
import { printNumber } from '../quantity/printQuantity';
import { depthIn } from '../solve/formReach';
import type { OutOfReach, Solution, SolveResult } from '../solve/solution';
import { withSigns } from './goalText';
import { solvedValue } from './insertSolution';

const dB = (value: number): string => `${printNumber(value, 3)} dB`;

/** `L1 6.8 nH, C1 3.3 pF`: without the families, which all candidates share. */
export function valuesText({ solved }: Pick<Solution, 'solved'>): string {
  return solved.map((each) => `${each.name} ${solvedValue({ ...each, family: null, label: null })}${each.label === null ? '' : ` (${each.label})`}`).join(', ');
}

const partsText = (count: number): string => `${count} part${count === 1 ? '' : 's'}`;
const missedText = ({ missedGoals }: Solution): string => (missedGoals.length === 0 ? '' : `misses ${missedGoals.map((text) => withSigns(text)).join(', ')}`);

/** What is known of ladders that are not listed, in a few words. */
export function proofWords({ proved, boundDb, parts }: Solution): string {
  if (!proved) return 'best found; not proved';
  if (boundDb === Infinity) return 'exact match';
  return `proved: none of ${partsText(parts)} has more than ${dB(boundDb ?? 0)}`;
}

/** `42 %, best margin so far 1.2 dB` */
export function progressText({ share, bestMarginDb }: { readonly share: number; readonly bestMarginDb: number | null }): string {
  return `${Math.floor(share * 100)} %${bestMarginDb === null || !Number.isFinite(bestMarginDb) ? '' : `, best margin so far ${dB(bestMarginDb)}`}`;
}

/** The solver's answer as the panel lists it; `stale` where the text has changed since. */
export function candidatesView(result: SolveResult, options: { readonly stale: boolean }): CandidatesView {
  const { solutions, byParts } = result;
  const others = byParts.filter((each) => !solutions.includes(each));
  return {
    stale: options.stale,
    message: result.reason === null ? '' : `No solution: ${result.reason}.`,
    notes: result.hints,
    outOfReach: result.outOfReach.map(({ form, reason, reach }) => ({ form, text: `${form}: out of reach, ${reason}.`, reach: reach ? reachView(form, reach) : null })),
    candidates: [...solutions, ...others].map((solution, id) => candidateView(solution, id, byParts.includes(solution))),
  };
}

/** Grid over the chart, as coverage has it; what counts is where it passes 0. */
const reachAcross = 41;

function reachView(form: string, { region, load }: NonNullable<OutOfReach['reach']>): CoverageView {
  const at = (i: number): number => -1 + (2 * i) / (reachAcross - 1);
  return {
    text: `Loads that ${form} matches`, across: reachAcross,
    marginDb: Array.from({ length: reachAcross ** 2 }, (_, i) => Math.round(1e3 * depthIn(region, { re: at(i % reachAcross), im: at(Math.floor(i / reachAcross)) })) / 1e3),
    cases: [{ caseName: 'load', text: 'out of reach', holds: false, reflection: load }],
  };
}

function candidateView(solution: Solution, id: number, bestOfParts: boolean): CandidateView {
  return {
    id,
    values: valuesText(solution),
    holds: solution.holds,
    margin: dB(solution.marginDb),
    returnLoss: dB(returnLossDb(solution.worstReflection)),
    gain: dB(decibels(solution.worstGain)),
    parts: String(solution.parts),
    response: solution.form,
    directCurrent: solution.dcPath === null ? 'not known' : solution.dcPath ? 'passes' : 'blocked',
    // Said once for each number of parts: of the others it follows.
    proof: bestOfParts ? proofWords(solution) : '',
    note: [missedText(solution), solution.yield === null ? '' : `${printNumber(100 * solution.yield, 3)} % of builds hold`, bestOfParts ? `best of ${partsText(solution.parts)}` : ''].filter((text) => text !== '').join(' · '),
  };
}

/** All that `candidatesView` lists, in its order: an id is an index into it. */
export const listedSolutions = ({ solutions, byParts }: SolveResult): readonly Solution[] => [...solutions, ...byParts.filter((each) => !solutions.includes(each))];
