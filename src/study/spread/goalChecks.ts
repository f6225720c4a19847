import { sampleImpedance, type Immittance } from '../../network/immittance';
import type { ComplexArray } from '../../network/complex';
import type { Impedance } from '../../network/impedance';
import { casesOf } from '../casesOf';
import { reflectionLimit } from '../discs';
import type { Goal } from '../goal';
import { isCondition } from '../marginDb';
import { middleOf, placeOfBand, placesOf, stressedBands, type Place } from '../place';
import type { Problem } from '../problem';
import { sampleLoad, sampleSource } from '../sampleCase';
import { wantsLarge } from '../verdict';

/** Some points at which one goal is judged from |Γ| and gain alone. */
export interface GoalCheck {
  /** Index of the goal; −1 for the aim that stands in where no goal has a margin in dB. */
  readonly goalIndex: number;
  readonly quantity: 'reflection' | 'gain' | 'rejection';
  readonly side: 'at most' | 'at least';
  /** |Γ|² or power ratio. */
  readonly limit: number;
  readonly points: Int32Array;
  /** Of a rejection: the points of its reference band. */
  readonly reference: Int32Array;
  readonly caseName: string | null;
}

/** Some points over which the bandwidth around a middle is read off. */
export interface BandwidthCheck {
  readonly goalIndex: number;
  /** Increasing in frequency. */
  readonly points: Int32Array;
  /** Which of them is the middle. */
  readonly middle: number;
  /** Null: where |Γ|² is at most 0.1; else where the gain is at least this share of its largest. */
  readonly share: number | null;
  readonly side: 'at most' | 'at least';
  readonly limitHz: number;
}

/** The points of every goal that |Γ| and gain decide, one after the other, with their loads and sources. */
export interface CheckedPoints {
  readonly frequencyHz: Float64Array;
  readonly load: Immittance;
  readonly source: Immittance;
  readonly checks: readonly GoalCheck[];
  readonly bandwidths: readonly BandwidthCheck[];
  /** Goals that need more than that: structure, stress, resistance, bandwidth, efficiency; yield is in neither. */
  readonly others: readonly number[];
}

interface Run {
  readonly start: number;
  readonly place: Place;
  readonly load: Immittance;
  readonly source: Immittance;
}

/** A goal that is not known at some point (a file ends) is among the others, which say so. */
export function checkedPoints(problem: Problem): CheckedPoints {
  const runs = new Map<string, Run>();
  const impedances: Impedance[] = [];
  let count = 0;
  const runOf = (place: Place, which: number | Impedance, partly = false): Run | null => {
    if (typeof which !== 'number' && !impedances.includes(which)) impedances.push(which);
    const key = [place.band ?? '', place.frequencyHz.join(' '), typeof which === 'number' ? which : `into ${impedances.indexOf(which)}`].join('|');
    const found = runs.get(key);
    if (found) return found;
    const load = typeof which === 'number' ? sampleLoad(problem.cases[which], place.frequencyHz) : sampleImpedance(which, place.frequencyHz);
    const source = sampleSource(problem.source, problem.bands, place.frequencyHz, place.band);
    if (!partly && (load.known.includes(0) || source.known.includes(0))) return null;
    const run = { start: count, place, load, source };
    count += place.frequencyHz.length;
    runs.set(key, run);
    return run;
  };
  const checks: GoalCheck[] = [];
  const bandwidths: BandwidthCheck[] = [];
  const others: number[] = [];
  problem.goals.forEach((goal, goalIndex) => {
    if (goal.quantity === 'yield') return;
    if (goal.quantity === 'bandwidth') {
      const own = bandwidthsOf(goal, goalIndex, problem, runOf);
      if (own === null) others.push(goalIndex);
      else bandwidths.push(...own);
      return;
    }
    const own = checksOf(goal, goalIndex, problem, runOf);
    if (own === null) others.push(goalIndex);
    else checks.push(...own);
  });
  if (problem.goals.every(isCondition)) {
    for (const band of stressedBands(problem)) {
      problem.cases.forEach((each, at) => {
        const run = runOf(placeOfBand(band), at);
        if (run) checks.push({ goalIndex: -1, quantity: 'gain', side: 'at least', limit: 1, points: indices(run), reference: nowhere, caseName: each.name });
      });
    }
  }
  const all = [...runs.values()];
  return {
    frequencyHz: Float64Array.from(all.flatMap(({ place }) => [...place.frequencyHz])),
    load: joined(all.map(({ load }) => load)), source: joined(all.map(({ source }) => source)), checks, bandwidths, others,
  };
}

const nowhere = new Int32Array(0);
const indices = ({ start, place }: Run): Int32Array => Int32Array.from(place.frequencyHz, (_, k) => start + k);

/** Null where |Γ| and gain do not decide. */
function checksOf(goal: Goal, goalIndex: number, problem: Problem, runOf: (place: Place, which: number | Impedance) => Run | null): GoalCheck[] | null {
  const places = placesOf(goal, problem);
  const cases = casesOf(goal, problem);
  const law = lawOf(goal);
  if (law === null || typeof places === 'string' || typeof cases === 'string') return null;
  const checks: GoalCheck[] = [];
  for (const at of cases) {
    const reference = goal.quantity === 'rejection' ? referenceRun(goal, problem, at, runOf) : nowhere;
    if (reference === null) return null;
    for (const place of places) {
      const run = runOf(place, goal.into ?? at);
      if (!run) return null;
      checks.push({ goalIndex, ...law, points: indices(run), reference, caseName: goal.into && goal.quantity !== 'rejection' ? null : problem.cases[at].name });
    }
  }
  return checks;
}

/** Points on each side of the middle, and how far beyond the limit they go: a span that leaves them is wide enough. */
const pointsAside = 100;
const beyond = 1.05;

/** Null where the middle itself is not known. */
function bandwidthsOf(goal: Goal, goalIndex: number, problem: Problem, runOf: (place: Place, which: number | Impedance, partly?: boolean) => Run | null): BandwidthCheck[] | null {
  const places = placesOf(goal, problem);
  const cases = casesOf(goal, problem);
  const limitHz = goal.limit ?? 0;
  if (typeof places === 'string' || typeof cases === 'string' || !(limitHz > 0)) return null;
  const checks: BandwidthCheck[] = [];
  for (const place of places) {
    const middleHz = middleOf(place.frequencyHz);
    const step = (limitHz * beyond) / pointsAside;
    const below = Math.min(pointsAside, Math.ceil(middleHz / step) - 1);
    const frequencyHz = Float64Array.from({ length: below + 1 + pointsAside }, (_, i) => middleHz + (i - below) * step);
    for (const load of goal.into ? [goal.into] : cases) {
      const run = runOf({ key: null, frequencyHz, band: place.band }, load, true);
      if (!run || run.load.known[below] === 0) return null;
      checks.push({
        goalIndex, points: indices(run), middle: below, limitHz, side: wantsLarge(goal) ? 'at least' : 'at most',
        share: goal.bandwidthDropDb === null ? null : 10 ** (-goal.bandwidthDropDb / 10),
      });
    }
  }
  return checks;
}

function referenceRun(goal: Goal, problem: Problem, at: number, runOf: (place: Place, which: number) => Run | null): Int32Array | null {
  const name = goal.place.form === 'harmonic' ? goal.place.band : goal.against;
  const band = name === null ? problem.bands[0] : problem.bands.find((each) => each.name === name);
  const run = band && runOf(placeOfBand(band), at);
  return run ? indices(run) : null;
}

/** What a goal asks of |Γ|² or of gain at a point; null where something else decides. */
export function lawOf(goal: Goal): Pick<GoalCheck, 'quantity' | 'side' | 'limit'> | null {
  const large = wantsLarge(goal);
  const limit = goal.limit ?? 0;
  switch (goal.quantity) {
    case 'gain': return { quantity: 'gain', side: large ? 'at least' : 'at most', limit: 10 ** (limit / 10) };
    case 'insertion loss': return { quantity: 'gain', side: large ? 'at most' : 'at least', limit: 10 ** (-limit / 10) };
    case 'rejection': return { quantity: 'rejection', side: large ? 'at least' : 'at most', limit: 10 ** (limit / 10) };
    default: {
      const reflection = reflectionLimit(goal);
      return reflection === null ? null : { quantity: 'reflection', side: large === (goal.quantity === 'return loss') ? 'at most' : 'at least', limit: reflection ** 2 };
    }
  }
}

/** Several runs of points one after the other; reasons are left behind. */
export function joined(parts: readonly Immittance[]): Immittance {
  const join = (pick: (z: Immittance) => ComplexArray): ComplexArray => ({
    re: Float64Array.from(parts.flatMap((z) => [...pick(z).re])), im: Float64Array.from(parts.flatMap((z) => [...pick(z).im])),
  });
  return { numerator: join((z) => z.numerator), denominator: join((z) => z.denominator), known: Uint8Array.from(parts.flatMap((z) => [...z.known])), reason: null };
}
