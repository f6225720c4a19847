import type { Complex } from '../network/complex';
import type { Element } from '../network/element';
import { cascade } from '../network/cascade';
import { catalogueCandidates, type Candidate, type CatalogueTask } from './catalogueCandidates';
import { inverse, twoElementMatches, type ReactivePart } from './closedForms';
import { fillForm } from './fillForm';
import { isPosition, positionsOf, type Form } from './forms';
import { shapeOf } from './ladderShape';
import { refinedAtMost, refinedPerCount, leastSeedNodes, seedNodes, seedsPerForm } from './limits';
import { partOfValue, type Item, type Position } from './positions';
import { compareRanked, exactExcess } from './ranking';
import { refineLadder } from './refineLadder';
import { trialOf } from './trial';
import type { TrialPoints } from './trialPoints';

/**
 * Ladders in which some values may be anything in a range. First the closed forms, where two such parts stand side by side;
 * then each form and kind on a grid of values, whose best are refined to the least largest excess (`refineLadder`). Parts that
 * come from a catalogue stay as the grid's search chose them. Nothing of this is proved but for exact matches.
 */
export function freeCandidates(task: CatalogueTask, byDefault: boolean): Candidate[] {
  const variants = task.forms.flatMap((form, order) => byKind(form).map((variant) => ({ form: variant, order })));
  const exact = variants.flatMap(({ form, order }) => closedForms(form, order, task));
  const seeds = variants.flatMap(({ form, order }, at) => {
    task.onProgress?.((0.5 * at) / variants.length, null);
    const found = catalogueCandidates({ ...task, forms: [form], size: seedsPerForm, nodeLimit: Math.max(leastSeedNodes, seedNodes / variants.length), onProgress: undefined });
    return found.map((each) => ({ ...each, order: [order, ...each.order] }));
  });
  const rank = (a: Candidate, b: Candidate): number => compareRanked(a, b, byDefault);
  const chosen = chooseSeeds([...exact, ...seeds].sort(rank), byDefault);
  const refined = chosen.map((seed, at) => {
    task.onProgress?.(0.5 + (0.5 * at) / chosen.length, null);
    return seed.excess <= exactExcess ? { ...seed, proved: true } : refine(seed, task);
  });
  return distinct(refined.sort(rank));
}

/** A form for each combination of the kinds that its positions may take, so that the best of each is looked at. */
function byKind(form: Form): Form[] {
  return form.steps.reduce<Form[]>((forms, step, at) => {
    if (!isPosition(step)) return forms;
    const groups = [...new Set(step.groups)];
    return forms.flatMap((each) => groups.map((group): Form => {
      const kept = step.groups.map((own, i) => (own === group ? i : -1)).filter((i) => i >= 0);
      const position: Position = { ...step, items: kept.map((i) => step.items[i]), groups: kept.map(() => group) };
      return { ...each, steps: each.steps.map((other, s) => (s === at ? position : other)) };
    }));
  }, [form]);
}

/** The best for each number of parts, and the best of all; of one form and kinds no more than a few. */
function chooseSeeds(seeds: readonly Candidate[], byDefault: boolean): Candidate[] {
  const chosen = new Set<Candidate>(seeds.filter(({ excess }) => excess <= exactExcess));
  const perCount = new Map<number, number>();
  const ordered = [...seeds].sort((a, b) => a.missed - b.missed || a.excess - b.excess || compareRanked(a, b, byDefault));
  for (const seed of ordered) {
    const count = perCount.get(seed.parts) ?? 0;
    if (count >= refinedPerCount || chosen.size >= refinedAtMost) continue;
    perCount.set(seed.parts, count + 1);
    chosen.add(seed);
  }
  return [...chosen];
}

function refine(seed: Candidate, { points, conditions }: CatalogueTask): Candidate {
  const { ladder, places } = fillForm(seed.form, seed.items);
  const free = seed.items.flatMap(({ range }, s) => (range === null ? [] : [{ elementIndex: places[s], range }]));
  const result = refineLadder(ladder, free, points);
  const items = seed.items.map((item, s): Item => (item.range === null ? item : itemOf(item, result.ladder[places[s]])));
  const excess = 10 ** (result.worstDb / 10);
  if (!(excess < seed.excess)) return { ...seed, proved: false, nodes: seed.nodes + result.evaluations };
  const filled = fillForm(seed.form, items).ladder;
  return {
    ...seed, items, excess, proved: false, nodes: seed.nodes + result.evaluations, worstGain: worstGainOf(filled, points),
    missed: conditions.structureMissed(filled) + conditions.valuesMissed(filled),
  };
}

function itemOf(item: Item, element: Element): Item {
  const part = element.form === 'branch' && element.branch.form === 'part' ? element.branch.part : null;
  return { ...item, element, part };
}

const worstGainOf = (ladder: readonly Element[], points: TrialPoints): number => trialOfLadder(ladder, points).worstGain(new Int32Array(0));

const trialOfLadder = (ladder: readonly Element[], points: TrialPoints) =>
  trialOf(shapeOf([ladder], points), points, Int32Array.from({ length: points.count }, (_, k) => k));

/** Values that are this near to each other are one answer, found twice. */
const sameValue = 0.01;

/** Of several that ended at the same values the first. */
export function distinct(candidates: readonly Candidate[]): Candidate[] {
  const kept: Candidate[] = [];
  for (const each of candidates) if (!kept.some((other) => isSame(each, other))) kept.push(each);
  return kept;
}

function isSame(a: Candidate, b: Candidate): boolean {
  const [one, other] = [fillForm(a.form, a.items).solved, fillForm(b.form, b.items).solved];
  return one.length === other.length && one.every((element, i) => {
    const x = sizeOf(element.element);
    const y = sizeOf(other[i].element);
    return element.orientation === other[i].orientation && x.kind === y.kind && Math.abs(x.value - y.value) <= sameValue * Math.abs(y.value);
  });
}

function sizeOf(element: Element): { kind: string; value: number } {
  if (element.form === 'branch' && element.branch.form === 'part') return { kind: element.branch.part.kind, value: element.branch.part.value };
  if (element.form === 'line' || element.form === 'stub') return { kind: element.form, value: element.line.lengthM };
  return { kind: element.form, value: 0 };
}

/**
 * Exact matches at the first point, where two parts of any value stand side by side across and along the path. What is given
 * on both sides goes into the load and the source that they see.
 */
function closedForms(form: Form, order: number, { points, conditions }: CatalogueTask): Candidate[] {
  const at = form.steps.findIndex(isPosition);
  const pair = [form.steps[at], form.steps[at + 1]];
  if (positionsOf(form).length !== 2 || !pair.every((step) => step !== undefined && isPosition(step))) return [];
  const [near, far] = pair as Position[];
  if (near.orientation === far.orientation || [near, far].some(({ items }) => items[0].range === null || items[0].part === null)) return [];
  const given = (steps: Form['steps']): Element[] => steps.flatMap((step) => (isPosition(step) ? [] : [...step]));
  const ends = endsSeen(given(form.steps.slice(0, at)), given(form.steps.slice(at + 2)), points);
  if (!ends) return [];
  const { forms } = twoElementMatches(ends.load, ends.source, points.frequencyHz[0]);
  return forms.flatMap(({ matches }) => matches).flatMap((match, index): Candidate[] => {
    const items = [near, far].map((position, s) => exactItem(position, match.parts[s]));
    if (match.form.first !== near.orientation || items.some((item) => item === null)) return [];
    const { ladder } = fillForm(form, items as Item[]);
    const trial = trialOfLadder(ladder, points);
    return [{
      form, items: items as Item[], parts: form.parts, order: [order, -1, index], proved: false, nodes: 1,
      excess: trial.excess(new Int32Array(0), Infinity), worstGain: trial.worstGain(new Int32Array(0)),
      missed: conditions.structureMissed(ladder) + conditions.valuesMissed(ladder),
    }];
  });
}

/** The part with the exact value and the position's own figures; null where it is of another kind or out of the range. */
function exactItem({ items }: Position, wanted: ReactivePart): Item | null {
  const item = items.find(({ part }) => part?.kind === wanted.kind);
  if (!item?.part || !item.range) return null;
  const pair = item.element.form === 'branch' && item.element.pair;
  // A pair is together twice the impedance of one of its parts.
  const value = wanted.value * (!pair ? 1 : wanted.kind === 'inductor' ? 0.5 : 2);
  if (value < item.range.min * (1 - 1e-9) || value > item.range.max * (1 + 1e-9)) return null;
  const part = partOfValue(item.part, wanted.kind, value);
  return { ...item, part, element: { ...item.element, branch: { form: 'part', part } } as Element };
}

/** Load and source at the first point as two parts between given elements see them; null where one of them takes no power. */
function endsSeen(atLoad: readonly Element[], atSource: readonly Element[], points: TrialPoints): { load: Complex; source: Complex } | null {
  const here = points.frequencyHz.slice(0, 1);
  const near = cascade(atLoad, here);
  const far = cascade(atSource, here);
  const v: Complex = { re: points.voltageRe[0], im: points.voltageIm[0] };
  const i: Complex = { re: points.currentRe[0], im: points.currentIm[0] };
  const one: Complex = { re: 1, im: 0 };
  const entry = ({ re, im }: { re: Float64Array; im: Float64Array }): Complex => ({ re: re[0], im: im[0] });
  const load = quotient(sum(times(entry(near.a), v), times(entry(near.b), i)), sum(times(entry(near.c), v), times(entry(near.d), i)));
  // Looking back: the inverse direction of a reciprocal two-port exchanges A and D.
  const zs: Complex = { re: points.sourceRe[0], im: points.sourceIm[0] };
  const source = quotient(sum(times(entry(far.d), zs), times(entry(far.b), one)), sum(times(entry(far.c), zs), times(entry(far.a), one)));
  return load.re > 0 && source.re > 0 ? { load, source } : null;
}

const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const sum = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
const quotient = (a: Complex, b: Complex): Complex => times(a, inverse(b));

/** True where a value may be anything in a range. */
export const hasFreeValue = (forms: readonly Form[]): boolean => forms.some((form) => positionsOf(form).some(({ items }) => items.some(({ range }) => range !== null)));
