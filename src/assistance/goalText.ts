import { printQuantity } from '../quantity/printQuantity';
import type { Goal, GoalResult } from '../study/goal';
import { isPending } from '../study/judgeYield';

/** What a person reads of a goal: the same words in panel, hover, diagnostics and on the command line. */

const placeWords = /\s(?=(?:in|at|for|into|against)\s)/;

/** With the signs that the trade writes: ≥, ×, −. */
export const withSigns = (text: string) => text.replace(/>=/g, '≥').replace(/<=/g, '≤').replace(/(\d)\s*x\s/g, '$1 × ').replace(/(^|\s)-(?=\d)/g, '$1−').replace(/\s+/g, ' ').trim();

/** `return loss ≥ 12 dB` */
export function goalTitle(goal: Goal): string {
  // A comma that does not belong there is told of apart.
  return withSigns(parts(goal)[0]).replace(/[\s,;]+$/, '');
}

/** `uplink`, `2 × uplink into 50 Ω`; empty where the goal names no place. */
export function goalPlace(goal: Goal): string {
  return withSigns(parts(goal)[1]).replace(/^(in|at) /, '');
}

function parts(goal: Goal): [string, string] {
  if (goal.comparison === null) return [goal.text, ''];
  const words = goal.text.split(placeWords);
  return [words[0], words.slice(1).join(' ')];
}

/** A number in a goal's unit: `20.7 dB`, `85 %`, `1.58`, `12.4 MHz`. */
export function printInUnit(value: number, unit: string): string {
  switch (unit) {
    case '': return printPlain(value, Math.abs(value) < 1 ? 3 : 2);
    case 'dB': return `${printPlain(value, Math.abs(value) < 1 ? 2 : 1)} dB`;
    case '%': return `${printPlain(value, 1)} %`;
    default: return printQuantity(value, unit, { digits: 4 });
  }
}

function printPlain(value: number, decimals: number): string {
  if (Number.isInteger(value)) return minus(String(value));
  const text = value.toFixed(decimals);
  return minus(Number(text) === 0 ? '0' : text);
}

const minus = (text: string) => text.replace(/^-/, '−');

/** The worst value: `20.7 dB`, `∞`, `not known`, `met`. */
export function goalValueText({ goal, ok, value, reason }: GoalResult): string {
  if (value === null) {
    if (reason !== null) return 'not known';
    return ok === (goal.comparison === '>=' || goal.comparison === '>') ? '∞' : '−∞';
  }
  if (goal.comparison === null) return value > 0 ? 'met' : 'not met';
  if (goal.quantity === 'parts') return String(value);
  return printInUnit(value, goal.unit);
}

/** `worst: wet bark, 868.2 MHz`, or why it is not known; empty where there is nothing to add. */
export function goalDetail({ value, reason, caseName, frequencyHz }: GoalResult): string {
  if (reason !== null && value === null) return reason;
  const where = [caseName, frequencyHz === null ? null : printQuantity(frequencyHz, 'Hz', { digits: 5 })].filter((word) => word !== null);
  return [where.length > 0 ? `worst: ${where.join(', ')}` : '', reason ?? ''].filter((text) => text !== '').join('; ');
}

/** `8.7 dB to spare`, `2.6 dB short`; empty for conditions and where not known. */
export function goalMarginText({ goal, margin, reason, ok }: GoalResult): string {
  if (goal.comparison === null || (margin === null && reason !== null)) return '';
  if (margin === null) return ok ? '∞ to spare' : '∞ short';
  if (margin === 0) return ok ? 'just met' : 'just missed';
  return `${printInUnit(Math.abs(margin), goal.unit)} ${margin >= 0 ? 'to spare' : 'short'}`;
}

const fullBarDb = 10;

/** −1 … 1, 0 at the limit: 10 dB fill the bar, or as much as the limit itself for other units. Null for conditions and where not known. */
export function goalBar({ goal, margin, reason, ok }: GoalResult): number | null {
  if (goal.comparison === null || (margin === null && reason !== null)) return null;
  if (margin === null) return ok ? 1 : -1;
  const full = goal.unit === 'dB' ? fullBarDb : Math.abs(goal.limit ?? 0) || 1;
  return Math.min(1, Math.max(-1, margin / full));
}

/** False where something stands in the way of judging a goal. */
export const isKnownResult = ({ value, reason }: Pick<GoalResult, 'value' | 'reason'>): boolean => value !== null || reason === null;

/** `3 of 4 hold`; empty where there are no goals. */
export function verdictText(results: readonly GoalResult[]): string {
  if (results.length === 0) return '';
  const judged = results.filter((result) => !isPending(result));
  const pending = judged.length < results.length ? 'the yield is being worked out' : '';
  if (judged.length === 0) return pending;
  const held = judged.filter((result) => result.ok).length;
  const unknown = judged.filter((result) => !isKnownResult(result)).length;
  const text = held === judged.length ? (held === 1 ? 'the goal holds' : `all ${held} hold`) : unknown === judged.length ? 'no goal can be judged' : `${held} of ${judged.length} hold${unknown === 0 ? '' : `, ${unknown === 1 ? 'one is' : `${unknown} are`} not known`}`;
  return pending === '' ? text : `${text}, ${pending}`;
}
