import { isOk } from '../assistance/assess';
import { cautions } from '../assistance/cautions';
import { goalDetail, goalMarginText, goalPlace, goalTitle, goalValueText, verdictText } from '../assistance/goalText';
import { spreadLines } from '../assistance/spreadText';
import { outOfReachNote } from '../assistance/limitText';
import { goalBefore, type CheckedFile } from './checkJson';

const paint = (colour: boolean, code: number, text: string) => (colour ? `\u001b[${code}m${text}\u001b[0m` : text);
const green = 32;
const red = 31;
const dim = 2;

/** One description for people: a line a goal, then what must be heeded. */
export function checkText({ path, assessment, earlier }: CheckedFile, colour: boolean): string {
  const { evaluation, model } = assessment;
  const results = evaluation?.goals ?? [];
  const rows = results.map((result) => [
    `${goalTitle(result.goal)}${goalPlace(result.goal) && `, ${goalPlace(result.goal)}`}`,
    goalValueText(result),
    [goalMarginText(result), earlier === undefined ? '' : beforeText(goalBefore(result, earlier)), goalDetail(result)].filter((text) => text !== '').join('; '),
  ]);
  const widths = [0, 1].map((column) => Math.max(0, ...rows.map((row) => row[column].length)));
  const lines = rows.map(([title, value, rest], i) => {
    const mark = results[i].ok ? paint(colour, green, '✓') : paint(colour, red, '✗');
    const note = model.problem ? outOfReachNote(model.problem, results[i]) : '';
    return `  ${mark} ${title.padEnd(widths[0])}  ${value.padStart(widths[1])}${rest && `  ${paint(colour, dim, rest)}`}${note && `\n      ${paint(colour, dim, note)}`}`;
  });
  const verdict = !evaluation ? 'nothing can be computed' : results.length === 0 ? 'no goals' : verdictText(results);
  const state = isOk(assessment) ? paint(colour, green, verdict) : paint(colour, red, verdict);
  const heed = model.problem && evaluation ? cautions(model.problem, evaluation).map((text) => `  ! ${text}`) : [];
  const spread = assessment.spread ? spreadLines(assessment.spread, model.problem?.goals ?? []).map((text) => `  ${text}`) : [];
  return [`${path}: ${state}`, ...lines, ...spread, ...heed, ''].join('\n');
}

const beforeText = (before: ReturnType<typeof goalBefore>): string => (before ? `was ${goalValueText(before)}${before.ok ? '' : ', missed'}` : 'not asked before');
