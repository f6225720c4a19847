import type { Diagnostic } from '../base/diagnostic';
import type { Description, Model } from '../description/description';
import type { Impedance } from '../network/impedance';
import type { Rating } from '../network/part';
import { printQuantity } from '../quantity/printQuantity';
import type { ElementResult, Evaluation } from '../study/evaluation';

const figures = [
  { stress: 'peakVoltageV', rated: 'peakVoltageV', unit: 'V', what: 'peak voltage' },
  { stress: 'rmsCurrentA', rated: 'rmsCurrentA', unit: 'A', what: 'rms current' },
  { stress: 'dissipationW', rated: 'dissipationW', unit: 'W', what: 'heat' },
] as const;

/** A warning on each single part that bears more than it is rated for, at the power available, over all bands and cases. */
export function ratingWarnings({ syntax }: Description, { problem }: Model, evaluation: Evaluation | null): Diagnostic[] {
  if (!problem || !evaluation) return [];
  return evaluation.elements.flatMap((result, at): Diagnostic[] => {
    const element = problem.ladder[at];
    const rating = element?.form === 'branch' ? ratingOf(element.branch) : null;
    const entry = syntax.ladder?.elements.find(({ name }) => name.value === result.name);
    if (!rating || !entry) return [];
    const above = aboveRating(result, rating);
    return above.length === 0 ? [] : [{ code: 'above-rating', severity: 'warning', message: `${result.name} bears ${above.join(' and ')}.`, span: entry.span }];
  });
}

/** `62.3 V of peak voltage, rated 50 V` */
export function aboveRating(result: Pick<ElementResult, 'peakVoltageV' | 'rmsCurrentA' | 'dissipationW'>, rating: Rating): string[] {
  return figures.flatMap(({ stress, rated, unit, what }) => {
    const [value, limit] = [result[stress], rating[rated]];
    return value !== null && limit !== null && value > limit ? [`${printQuantity(value, unit, { digits: 3 })} of ${what}, rated ${printQuantity(limit, unit, { digits: 3 })}`] : [];
  });
}

/** Of a single part: in a branch of several each bears something else. */
const ratingOf = (branch: Impedance): Rating | null => (branch.form === 'part' ? branch.part.rating : null);
