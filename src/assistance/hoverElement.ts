import type { ElementSyntax } from '../description/syntax';
import { printComplex, printPolar, printReactance } from '../quantity/printComplex';
import { nearestInSeries, nextInSeries } from '../quantity/preferredSeries';
import { printNumber, printQuantity } from '../quantity/printQuantity';
import { coilWinding } from '../network/coilWinding';
import type { ElementResult } from '../study/evaluation';
import type { Problem } from '../study/problem';
import type { Assessment } from './assess';
import type { Hover } from './hover';
import { codesOfElement } from './hoverTunables';
import { lossText, sensitivityOf } from './ladderRows';
import { plainText, rowsTable } from './markdown';
import { partWithValue } from './partWithValue';
import { familyValues, knownPart } from './steppedValue';
import { worstMarginWith } from './worstMarginWith';

/** An element: its value, what it does at the middle of the first band, its stress, and what its neighbours would do. */
export function elementHover(assessment: Assessment, entry: ElementSyntax): Hover {
  const name = entry.name.value;
  const result = assessment.evaluation?.elements.find((element) => element.name === name);
  const { problem } = assessment.model;
  const head = `**${plainText(name)}**, ${entry.keyword}`;
  if (!result) return { span: entry.span, markdown: `${head}: nothing is known of it yet.` };
  const text = [`${head}${result.value !== null && result.unit ? `, ${printQuantity(result.value, result.unit, { digits: 4 })}` : ''}`];
  for (const line of codesOfElement(assessment, name)) text.push('', line);
  const table = elementTable(result, problem);
  if (table !== '') text.push('', table);
  if (result.reason !== null) text.push('', plainText(result.reason));
  const winding = windingText(result);
  if (winding !== '') text.push('', winding);
  const candidates = problem ? neighbours(assessment, problem, name) : '';
  if (candidates !== '') text.push('', candidates);
  return { span: entry.span, markdown: text.join('\n') };
}

function elementTable(result: ElementResult, problem: Problem | null): string {
  const rows: [string, string][] = [];
  const at = printQuantity(result.frequencyHz, 'Hz', { digits: 5 });
  if (result.reactanceOhm !== null) rows.push([`reactance at ${at}`, printReactance(result.reactanceOhm, 'Ω')]);
  if (result.susceptanceS !== null) rows.push([`susceptance at ${at}`, printReactance(result.susceptanceS, 'S')]);
  if (result.impedanceAfterOhm) rows.push(['Z after it, toward the load', printComplex(result.impedanceAfterOhm, 'Ω')]);
  if (result.reflectionAfter) rows.push(['Γ after it', printPolar(result.reflectionAfter)]);
  if (result.peakVoltageV !== null) rows.push(['peak voltage', printQuantity(result.peakVoltageV, 'V', { digits: 3 })]);
  if (result.rmsCurrentA !== null) rows.push(['rms current', printQuantity(result.rmsCurrentA, 'A', { digits: 3 })]);
  if (result.dissipationW !== null) rows.push(['heat', printQuantity(result.dissipationW, 'W', { digits: 3 })]);
  if (problem && result.dissipationW !== null) rows.push(['of the power available', lossText(result.dissipationW, problem)]);
  const sensitivity = problem ? sensitivityOf(problem, result.name) : null;
  if (sensitivity !== null) rows.push(['1 % of its value costs', `${printNumber(sensitivity, 2)} dB of the worst margin`]);
  return rows.length > 0 ? rowsTable(rows) : '';
}

/** How a solved or stated inductance could be wound for the bench. */
function windingText(result: ElementResult): string {
  const winding = result.kind === 'inductor' && result.value !== null ? coilWinding(result.value) : null;
  if (!winding) return '';
  const millimetres = (value: number): string => `${printNumber(value * 1e3, 3)} mm`;
  const { turns, diameterM, lengthM, wireM, coil } = winding;
  return `On the bench it could be wound as \`coil ${turns} turns, diameter ${millimetres(diameterM)}, length ${millimetres(lengthM)}, wire ${millimetres(wireM)}\` (Lundin 1985, some per cent off where there are few turns; Q about ${printNumber(coil.qAt(result.frequencyHz), 1)}).`;
}

/** The value itself and those beside it in E24 and in its family, each with the worst margin that it would leave. */
function neighbours(assessment: Assessment, problem: Problem, name: string): string {
  const known = knownPart(assessment, name);
  const element = problem.ladder.find((each) => each.name === name);
  const now = element?.form === 'branch' && element.branch.form === 'part' ? element.branch.part : null;
  if (!known || !now || problem.goals.length === 0) return '';
  const { value, unit } = known.value;
  const family = familyValues(assessment, known);
  const nearFamily = family?.filter((other) => other !== value).sort((a, b) => Math.abs(Math.log(a / value)) - Math.abs(Math.log(b / value))).slice(0, 2) ?? [];
  const nearest = nearestInSeries(value, 'E24');
  const inSeries = [nextInSeries(value, 'E24', 'down'), nearest, nextInSeries(value, 'E24', 'up')].filter((other) => other !== null);
  const values = [...new Set([value, ...inSeries, ...nearFamily])].sort((a, b) => a - b);
  const rows = values.map((other) => {
    const margin = worstMarginWith(problem, name, partWithValue(problem, now, known.part, other));
    const from = [other === value ? 'now' : '', inSeries.includes(other) ? 'E24' : '', family?.includes(other) ? known.part.from!.value : ''].filter((word) => word !== '');
    return `| ${printQuantity(other, unit, { digits: 4 })} | ${plainText(from.join(', '))} | ${margin === null ? 'not known' : `${printNumber(margin, 3)} dB`} |`;
  });
  return ['| value | | worst margin |', '|:--|:--|--:|', ...rows].join('\n');
}
