import { decibels, returnLossDb } from '../network/figures';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import { bandLimits, type BandLimit } from '../solve/bandLimits';
import type { LoadModel } from '../solve/fitLoad';
import { pointsOfRange } from '../solve/limits';
import { reflectionLimit } from '../study/discs';
import type { Goal, GoalResult } from '../study/goal';
import { placesOf } from '../study/place';
import type { Problem } from '../study/problem';
import { wantsLarge } from '../study/verdict';

const magnitude = (value: number): string => printNumber(value, 2);
const inDb = (value: number): string => `${printNumber(value, 3)} dB`;

/** Loads this near to their model need no word about it. */
const asGoodAsItsModel = 0.005;
/** Limits on |Γ| below this are no limit in practice. */
export const leastNamed = 0.01;

/**
 * Why a goal on reflection or gain that is missed cannot be met over its frequencies by any lossless ladder: one sentence
 * without a full stop; «probably» where only the error of the load's model decides. Empty where it could be met, or where
 * that is not known, or where it is judged at too few points to stand for the range between. Losses lower the reflection but never raise the gain, hence the two wordings.
 */
export function outOfReachNote(problem: Problem, { goal, ok }: Pick<GoalResult, 'goal' | 'ok'>): string {
  if (ok) return '';
  const worst = limitOfGoal(problem, goal, pointsOfRange);
  const { reflection, certain, model } = worst?.limit ?? {};
  if (!worst || !reflection || !model) return '';
  const taken = model.fitError < asGoodAsItsModel ? '' : `taken as ${modelText(model)} (within |Γ| ${magnitude(model.fitError)})`;
  const where = worst.caseName === null ? taken && `, the load ${taken}` : ` with ${worst.caseName}${taken && `, ${taken}`}`;
  const { form } = goal.place;
  const over = form === 'band' ? 'this band' : form !== 'bands' ? 'these frequencies' : problem.bands.length > 1 ? worst.band : 'this band';
  const asked = reflectionLimit(goal);
  if (asked !== null && wantsLarge(goal) === (goal.quantity === 'return loss') && asked < reflection) {
    return `${asked < (certain ?? 0) ? '' : 'probably '}out of reach without loss: over ${over} no lossless ladder gets below |Γ| ${magnitude(reflection)} (${inDb(returnLossDb(reflection))})${where}`;
  }
  const most = decibels(1 - reflection * reflection);
  const gainDb = goal.quantity === 'gain' && wantsLarge(goal) ? goal.limit : goal.quantity === 'insertion loss' && !wantsLarge(goal) ? -(goal.limit ?? 0) : null;
  return gainDb !== null && gainDb > most ? `${gainDb > decibels(1 - (certain ?? 0) ** 2) ? '' : 'probably '}out of reach: over ${over} no ladder gets above ${inDb(most)} of gain${where}` : '';
}

/** The largest limit among the bands, of so many points at least, or the range that a goal is asked in; null where there is none, as for a single frequency. */
function limitOfGoal(problem: Problem, goal: Goal, leastPoints: number): BandLimit | null {
  const places = placesOf(goal, problem);
  const cases = goal.caseName === null ? problem.cases : problem.cases.filter(({ name }) => name === goal.caseName);
  if (goal.into !== null || typeof places === 'string' || cases.length === 0) return null;
  const bands = places.filter(({ frequencyHz }) => frequencyHz.length >= leastPoints)
    .map(({ band, frequencyHz }) => ({ name: band ?? '', frequencyHz, watch: false }));
  return bandLimits({ bands, cases, tunables: problem.tunables })
    .reduce<BandLimit | null>((most, each) => ((each.limit.reflection ?? 0) > (most?.limit.reflection ?? 0) ? each : most), null);
}

/** `24.1 Ω + 1.9 pF`, `50 Ω || 5 pF`. */
export function modelText({ form, resistanceOhm, inductanceH, capacitanceF }: LoadModel): string {
  const parts = [
    printQuantity(resistanceOhm, 'Ω', { digits: 3 }),
    ...(inductanceH === null ? [] : [printQuantity(inductanceH, 'H', { digits: 3 })]),
    ...(capacitanceF === null ? [] : [printQuantity(capacitanceF, 'F', { digits: 3 })]),
  ];
  return form === 'resistor' ? parts[0] : parts.join(form.startsWith('series') ? ' + ' : ' || ');
}

/** For a hover on a band: the limit, the model it rests on, and what a few reactances can do. Empty for a band of one point. */
export function limitLines(problem: Problem, bandName: string): string[] {
  const band = problem.bands.find(({ name }) => name === bandName);
  if (!band || band.frequencyHz.length < 2 || problem.cases.length === 0) return [];
  const [found] = bandLimits({ ...problem, bands: [band] });
  return found.limit.reflection === null ? [`No limit is known: ${found.limit.reason ?? ''}.`] : [limitLine(found), ...limitGrounds(found)];
}

/** For a hover on a missed goal on reflection or gain: the same, with the sentence that says where it is out of reach. */
export function goalLimitLines(problem: Problem, result: Pick<GoalResult, 'goal' | 'ok'>): string[] {
  const { goal, ok } = result;
  const concerned = reflectionLimit(goal) !== null || goal.quantity === 'gain' || goal.quantity === 'insertion loss';
  const found = ok || !concerned ? null : limitOfGoal(problem, goal, 1);
  if (!found) return [];
  const note = outOfReachNote(problem, result);
  return [note === '' ? limitLine(found) : `${note.charAt(0).toUpperCase()}${note.slice(1)}.`, ...limitGrounds(found)];
}

function limitLine({ limit: { reflection } }: BandLimit): string {
  if (reflection === 0) return 'Nothing limits the match over these frequencies: the load is as good as a plain resistance.';
  if ((reflection ?? 0) < leastNamed) return `Enough reactances could bring |Γ| below ${leastNamed} over these frequencies, without loss (Bode–Fano).`;
  return `No lossless ladder gets below |Γ| ${magnitude(reflection ?? 0)} (${inDb(returnLossDb(reflection ?? 0))}) over these frequencies (Bode–Fano).`;
}

function limitGrounds({ caseName, points, limit: { model, reflection, byReactances } }: BandLimit): string[] {
  if (!model || !reflection) return [];
  const enough = byReactances.findIndex((value) => value < leastNamed);
  const few = byReactances.slice(0, enough < 0 ? undefined : enough + 1)
    .map((value, i) => `${value < leastNamed ? `below ${leastNamed}` : `${magnitude(value)} (${inDb(returnLossDb(value))})`} with ${i + 1}`);
  const mismatch = model.fitError < asGoodAsItsModel ? `below ${asGoodAsItsModel}` : `at most ${magnitude(model.fitError)}`;
  return [
    `${caseName ?? 'The load'} is taken as ${modelText(model)}; between the two |Γ| is ${mismatch}.`,
    `Equal ripple reaches |Γ| ${few.join(', ')} reactances in all, each made resonant in the band, the load’s own counted.`,
    ...(points < pointsOfRange ? [`Judged at ${points} points only: a ladder can be better at them and worse between.`] : []),
  ];
}
