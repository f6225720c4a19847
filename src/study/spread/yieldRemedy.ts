import type { Element } from '../../network/element';
import type { Part, Tolerance } from '../../network/part';
import type { Problem } from '../problem';
import { studiedLadder } from '../studiedLadder';
import { spreadOfBuilds } from './spreadOfBuilds';
import { toleratedParts } from './toleratedParts';
import { setByCodes } from './tunedParts';

/** One part with a tighter tolerance, and the yield that it makes. */
export interface YieldRemedy {
  readonly elementName: string;
  readonly tolerance: Tolerance;
  readonly yield: number;
}

/** Builds for each change that is tried. */
const buildsTried = 2_000;

/**
 * What would have to be tightened to reach a yield: the cheapest single change, which is the loosest tolerance that does it
 * among those that the families have for parts of that kind; of equally loose ones the better yield. Null where none does.
 */
export function yieldRemedy(problem: Problem, wanted: number, ladder = studiedLadder(problem)): YieldRemedy | null {
  let best: (YieldRemedy & { readonly width: number }) | null = null;
  const set = setByCodes(problem);
  const elements = [...new Set(toleratedParts(ladder).map(({ elementIndex }) => elementIndex))].filter((at) => !set.has(ladder[at].name));
  for (const at of elements) {
    const element = ladder[at];
    if (element.form !== 'branch' || element.branch.form !== 'part') continue;
    const { part } = element.branch;
    for (const tolerance of tighterTolerances(problem, part)) {
      const width = widthOf(tolerance, part.value);
      if (best && width < best.width) break; // they go from loose to tight
      const changed = ladder.map((each, i): Element => (i === at ? { ...element, branch: { form: 'part', part: { ...part, tolerance } } } : each));
      const run = spreadOfBuilds({ ...problem, spread: { ...problem.spread, builds: Math.min(problem.spread.builds, buildsTried) } }, changed);
      run.more(buildsTried);
      const reached = run.result().yield;
      if (reached < wanted) continue;
      if (!best || width > best.width || reached > best.yield) best = { elementName: element.name, tolerance, yield: reached, width };
      break;
    }
  }
  return best && { elementName: best.elementName, tolerance: best.tolerance, yield: best.yield };
}

const widthOf = ({ form, up, down }: Tolerance, value: number): number => (up + down) * (form === 'relative' ? 1 : 1 / value);

/** Those of the families' parts of this kind that are tighter than the part's own, the loosest first. */
function tighterTolerances(problem: Problem, part: Part): Tolerance[] {
  const own = part.tolerance ? widthOf(part.tolerance, part.value) : 0;
  const found = new Map<string, Tolerance>();
  for (const { members } of problem.families) {
    for (const { part: member } of members) {
      const { tolerance } = member;
      if (member.kind !== part.kind || !tolerance) continue;
      if (widthOf(tolerance, part.value) < own * (1 - 1e-9)) found.set(`${tolerance.form} ${tolerance.up} ${tolerance.down}`, tolerance);
    }
  }
  return [...found.values()].sort((a, b) => widthOf(b, part.value) - widthOf(a, part.value));
}
