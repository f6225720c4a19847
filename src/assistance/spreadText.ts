import type { Tolerance } from '../network/part';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import type { Goal } from '../study/goal';
import type { WorstCorner } from '../study/spread/worstCorner';
import type { YieldRemedy } from '../study/spread/yieldRemedy';
import type { SpreadOfBuilds } from '../study/spread/spreadOfBuilds';
import type { Spread } from './spreadAssessment';
import { unitOfKind } from './familyMembers';
import { goalTitle } from './goalText';

const percent = (share: number): string => `${printNumber(100 * share, 3)} %`;
const dB = (value: number): string => `${printNumber(value, 3)} dB`;

/** `97.3 % of 10000 builds hold every goal (95 % interval: 96.9 to 97.6 %)` */
export const yieldText = ({ yield: share, low, high, builds }: SpreadOfBuilds): string =>
  `${percent(share)} of ${builds} builds hold every goal (95 % interval: ${share === 1 ? `above ${fine(low)}` : share === 0 ? `below ${fine(high)}` : `${printNumber(100 * low, 3)} to ${percent(high)}`})`;

/** Near none and all the last digits are what matters. */
const fine = (share: number): string => `${(100 * share).toFixed(2)} %`;

/** `worst corner −0.4 dB in wet bark: L1 10.5 nH, C1 4.2 pF` */
export function cornerText({ values, marginDb, caseName, proved }: WorstCorner): string {
  const where = caseName === null ? '' : ` in ${caseName}`;
  const parts = values.map(({ name, kind, value }) => `${name} ${printQuantity(value, unitOfKind[kind], { digits: 3 })}`).join(', ');
  return `${proved ? 'worst corner' : 'worst corner found (not proved)'} ${dB(marginDb)}${where}: ${parts}`;
}

const toleranceText = ({ form, up, down }: Tolerance): string => {
  const one = (value: number): string => (form === 'relative' ? `${printNumber(100 * value, 3)} %` : printNumber(value, 3));
  return up === down ? `±${one(up)}` : `+${one(up)} −${one(down)}`;
};

export const remedyText = ({ elementName, tolerance, yield: share }: YieldRemedy): string => `${elementName} at ${toleranceText(tolerance)} would make it ${percent(share)}`;

/** `held by not every build: return loss ≥ 14 dB (by 88 %), gain ≥ −1 dB (by 99.6 %)`: those that some builds miss, the worst first; empty where none does. */
export function goalYieldsText({ goalYields }: SpreadOfBuilds, goals: readonly Goal[]): string {
  const missed = goals.flatMap((goal, at) => {
    const share = goalYields[at] ?? null;
    return share === null || share === 1 ? [] : [{ text: goalTitle(goal), held: percent(share), share }];
  });
  return missed.length === 0 ? '' : `held by not every build: ${missed.sort((a, b) => a.share - b.share).map(({ text, held }) => `${text} (by ${held})`).join(', ')}`;
}

/** Yield, whole and by goal, worst corner, and what would help. */
export function spreadLines({ builds, corner, remedy }: Spread, goals: readonly Goal[]): string[] {
  return [yieldText(builds), goalYieldsText(builds, goals), cornerText(corner), ...(remedy ? [remedyText(remedy)] : [])].filter((text) => text !== '');
}
