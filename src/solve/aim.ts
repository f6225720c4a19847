import type { Element } from '../network/element';
import { impedanceOf, sampleImpedance, type Immittance } from '../network/immittance';
import type { Impedance } from '../network/impedance';
import { casesOf } from '../study/casesOf';
import type { Goal } from '../study/goal';
import { isCondition } from '../study/marginDb';
import { placeOfBand, placesOf, stressedBands, type Place } from '../study/place';
import type { Problem } from '../study/problem';
import { reflectionOfMismatchLoss, reflectionOfReturnLoss, reflectionOfVswr } from '../study/reflectionFigures';
import { sampleLoad, sampleSource } from '../study/sampleCase';
import { wantsLarge } from '../study/verdict';
import type { RestCheck, TrialPoints } from './trialPoints';

/** What ladders are ranked by. */
export interface Aim {
  readonly points: TrialPoints;
  /** True where no goal has a margin in dB: then the worst gain counts, or |Γ| where nothing has loss. */
  readonly byDefault: boolean;
  /** Goals that no ladder can be told to meet (a load is not known there), with the reason. */
  readonly notKnown: readonly { readonly goal: Goal; readonly reason: string }[];
}

/** Smaller limits on |Γ| are this one, so that weights stay finite. */
const leastReflection = 1e-9;

/**
 * Points and weights from the goals of a problem. VSWR, reflection and mismatch loss count as the return loss that they amount
 * to; what is the same place, load and source shares its points. `lossless`: nothing that may be fitted has loss.
 */
export function aimOf(problem: Problem, lossless: boolean): Aim {
  const runs = runCollector(problem);
  const notKnown: { goal: Goal; reason: string }[] = [];
  const ranked = problem.goals.filter((goal) => !isCondition(goal));
  for (const goal of ranked) {
    const reason = addGoal(goal, problem, runs);
    if (reason !== null) notKnown.push({ goal, reason });
  }
  const byDefault = ranked.length === notKnown.length;
  if (byDefault) {
    for (const band of stressedBands(problem)) {
      for (let at = 0; at < problem.cases.length; at++) {
        const run = runs.run(placeOfBand(band), at);
        if (typeof run === 'string') continue;
        if (lossless) run.reflectionWeight = 1;
        else run.gainFloor = 1;
      }
    }
  }
  return { points: runs.points(), byDefault, notKnown };
}

interface Run {
  readonly place: Place;
  readonly load: Immittance;
  readonly source: Immittance;
  readonly start: number;
  reflectionWeight: number;
  gainFloor: number;
}

interface RunCollector {
  /** The run of a place and load, made at its first use; the reason where something is not known there. */
  run(place: Place, load: number | Impedance): Run | string;
  check(check: RestCheck): void;
  points(): TrialPoints;
}

function runCollector(problem: Problem): RunCollector {
  const runs: Run[] = [];
  const found = new Map<string, Run | string>();
  const impedances: Impedance[] = [];
  const rest: RestCheck[] = [];
  let count = 0;
  return {
    run(place, load) {
      if (typeof load !== 'number' && !impedances.includes(load)) impedances.push(load);
      const key = [place.band ?? '', [...place.frequencyHz].join(' '), typeof load === 'number' ? load : `into ${impedances.indexOf(load)}`].join('|');
      const known = found.get(key);
      if (known !== undefined) return known;
      const made = makeRun(problem, place, load, count);
      found.set(key, made);
      if (typeof made !== 'string') {
        runs.push(made);
        count += place.frequencyHz.length;
      }
      return made;
    },
    check: (check) => void rest.push(check),
    points: () => join(runs, count, rest),
  };
}

function makeRun(problem: Problem, place: Place, which: number | Impedance, start: number): Run | string {
  const { frequencyHz } = place;
  const load = typeof which === 'number' ? sampleLoad(problem.cases[which], frequencyHz) : sampleImpedance(which, frequencyHz);
  const source = sampleSource(problem.source, problem.bands, frequencyHz, place.band);
  const blind = load.known.includes(0) ? load : source.known.includes(0) ? source : null;
  if (blind) return blind.reason ?? 'not known there';
  return { place, load, source, start, reflectionWeight: 0, gainFloor: 0 };
}

function join(runs: readonly Run[], count: number, rest: readonly RestCheck[]): TrialPoints {
  const make = (): Float64Array => new Float64Array(count);
  const points = {
    count, frequencyHz: make(), sourceRe: make(), sourceIm: make(), voltageRe: make(), voltageIm: make(), currentRe: make(), currentIm: make(),
    reflectionWeight: make(), gainFloor: make(), rest, starts: runs.map(({ start }) => start),
  };
  for (const { place, load, source, start, reflectionWeight, gainFloor } of runs) {
    const z = impedanceOf(source);
    for (let k = 0; k < place.frequencyHz.length; k++) {
      points.frequencyHz[start + k] = place.frequencyHz[k];
      points.sourceRe[start + k] = z.re[k];
      points.sourceIm[start + k] = z.im[k];
      const size = Math.hypot(load.numerator.re[k], load.numerator.im[k], load.denominator.re[k], load.denominator.im[k]);
      points.voltageRe[start + k] = load.numerator.re[k] / size;
      points.voltageIm[start + k] = load.numerator.im[k] / size;
      points.currentRe[start + k] = load.denominator.re[k] / size;
      points.currentIm[start + k] = load.denominator.im[k] / size;
      points.reflectionWeight[start + k] = reflectionWeight;
      points.gainFloor[start + k] = gainFloor;
    }
  }
  return points;
}

/** Null, or why the goal cannot be told whatever the ladder. */
function addGoal(goal: Goal, problem: Problem, runs: RunCollector): string | null {
  const places = placesOf(goal, problem);
  if (typeof places === 'string') return places;
  const cases = casesOf(goal, problem);
  if (typeof cases === 'string') return cases;
  if (goal.quantity === 'rejection') return addRejection(goal, problem, places, cases, runs);
  for (const place of places) {
    for (const load of goal.into ? [goal.into] : cases) {
      const run = runs.run(place, load);
      if (typeof run === 'string') return run;
      ask(goal, run, runs);
    }
  }
  return null;
}

function ask(goal: Goal, run: Run, runs: RunCollector): void {
  const limit = goal.limit ?? 0;
  const points = indices(run);
  const large = wantsLarge(goal);
  switch (goal.quantity) {
    case 'gain':
    case 'insertion loss': {
      const ratio = 10 ** ((goal.quantity === 'gain' ? limit : -limit) / 10);
      if (large === (goal.quantity === 'gain')) run.gainFloor = Math.max(run.gainFloor, ratio);
      else runs.check({ form: 'gain at most', points, limit: ratio });
      return;
    }
    case 'efficiency': {
      const share = goal.unit === '%' ? limit / 100 : goal.unit === 'dB' ? 10 ** (limit / 10) : limit;
      runs.check({ form: large ? 'efficiency at least' : 'efficiency at most', points, limit: share });
      return;
    }
    default: {
      const magnitude = reflectionLimit(goal, limit);
      const small = goal.quantity === 'return loss' ? large : !large;
      if (small) run.reflectionWeight = Math.max(run.reflectionWeight, 1 / Math.max(magnitude, leastReflection) ** 2);
      else runs.check({ form: 'reflection at least', points, limit: magnitude ** 2 });
    }
  }
}

function reflectionLimit(goal: Goal, limit: number): number {
  switch (goal.quantity) {
    case 'VSWR': return reflectionOfVswr(limit);
    case 'mismatch loss': return reflectionOfMismatchLoss(limit);
    case 'reflection': return limit;
    default: return reflectionOfReturnLoss(limit);
  }
}

function addRejection(goal: Goal, problem: Problem, places: readonly Place[], cases: readonly number[], runs: RunCollector): string | null {
  const name = goal.place.form === 'harmonic' ? goal.place.band : goal.against;
  const band = name === null ? problem.bands[0] : problem.bands.find((each) => each.name === name);
  if (!band) return 'there is no band to compare with';
  for (const at of cases) {
    const reference = runs.run(placeOfBand(band), at);
    if (typeof reference === 'string') return reference;
    for (const place of places) {
      const run = runs.run(place, goal.into ?? at);
      if (typeof run === 'string') return run;
      runs.check({
        form: wantsLarge(goal) ? 'rejection at least' : 'rejection at most', points: indices(run), reference: indices(reference), limit: 10 ** ((goal.limit ?? 0) / 10),
      });
    }
  }
  return null;
}

const indices = ({ start, place }: Run): number[] => Array.from(place.frequencyHz, (_, k) => start + k);

/** True where an element takes no power: reactances, lossless lines, ideal transformers. */
export function isLossless(element: Element): boolean {
  switch (element.form) {
    case 'branch': return losslessImpedance(element.branch);
    case 'line':
    case 'stub': return element.line.conductorLossDb === 0 && element.line.dielectricLossDb === 0;
    case 'block': return false;
    default: return true;
  }
}

function losslessImpedance(impedance: Impedance): boolean {
  switch (impedance.form) {
    case 'open':
    case 'short': return true;
    case 'part': return impedance.part.kind !== 'resistor' && impedance.part.loss.law === 'none' && impedance.part.measured === null;
    case 'series':
    case 'parallel': return impedance.members.every(losslessImpedance);
    default: return false;
  }
}
