import { decibels, returnLossDb } from '../network/figures';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import { bandLimits, type BandLimit } from '../solve/bandLimits';
import type { LoadModel } from '../solve/fitLoad';
import { reflectionLimit } from '../study/discs';
import type { Goal, GoalResult } from '../study/goal';
import { judgedBands } from '../study/place';
import type { Problem } from '../study/problem';
import { wantsLarge } from '../study/verdict';

const magnitude = (value: number): string => printNumber(value, 2);
const inDb = (value: number): string => `${printNumber(value, 3)} dB`;

/**
 * Why a goal on reflection or gain that is missed cannot be met in its band by any lossless ladder: one sentence without a full
 * stop. Empty where it could be, or where that is not known.
 */
export function outOfReachNote(problem: Problem, { goal, ok }: Pick<GoalResult, 'goal' | 'ok'>): string {
  if (ok || goal.into !== null) return '';
  const limits = limitsOfGoal(problem, goal);
  const worst = limits.reduce<BandLimit | null>((most, each) => ((each.limit.reflection ?? 0) > (most?.limit.reflection ?? 0) ? each : most), null);
  const reflection = worst?.limit.reflection ?? 0;
  if (!worst || reflection === 0) return '';
  const where = worst.caseName === null ? '' : ` of ${worst.caseName}`;
  const asked = reflectionLimit(goal);
  if (asked !== null && wantsLarge(goal) === (goal.quantity === 'return loss') && asked < reflection) {
    return `out of reach without loss: over this band no lossless ladder gets below |Γ| ${magnitude(reflection)} (${inDb(returnLossDb(reflection))})${where}`;
  }
  const most = decibels(1 - reflection * reflection);
  const gainDb = goal.quantity === 'gain' && wantsLarge(goal) ? goal.limit : goal.quantity === 'insertion loss' && !wantsLarge(goal) ? -(goal.limit ?? 0) : null;
  return gainDb !== null && gainDb > most ? `out of reach: over this band no ladder gets above ${inDb(most)} of gain${where}` : '';
}

/** Limits of the bands that a goal is asked in; those of ranges and single frequencies are not worked out. */
function limitsOfGoal(problem: Problem, { place, caseName }: Goal): readonly BandLimit[] {
  if (place.form !== 'band' && place.form !== 'bands') return [];
  const bands = place.form === 'band' ? problem.bands.filter(({ name }) => name === place.band) : judgedBands(problem);
  const cases = caseName === null ? problem.cases : problem.cases.filter(({ name }) => name === caseName);
  return cases.length === 0 ? [] : bandLimits({ bands, cases });
}

/** `24.1 Ω in series with 1.9 pF`. */
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
  const [{ caseName, limit }] = bandLimits({ bands: [band], cases: problem.cases });
  const of = caseName === null ? 'The load' : `${caseName}`;
  if (limit.reflection === null) return [`How good the match could be is not known: ${limit.reason ?? ''}.`];
  if (limit.reflection === 0 || !limit.model) return [`${of} is as good as a plain resistance here: nothing limits the match.`];
  const few = limit.byReactances.map((value, i) => `${i + 1}: ${inDb(returnLossDb(value))}`).join(', ');
  return [
    `No lossless ladder gets below |Γ| ${magnitude(limit.reflection)} (${inDb(returnLossDb(limit.reflection))}) over this band (Bode–Fano). ${of} is taken as ${modelText(limit.model)}, whose mismatch to it is at most ${magnitude(limit.model.fitError)}.`,
    `Equal ripple with so many reactances, the load’s own counted: ${few}.`,
  ];
}
