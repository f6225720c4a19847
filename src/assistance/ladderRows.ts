import type { ElementSyntax } from '../description/syntax';
import type { LineMap } from '../base/lineMap';
import { lineMap } from '../base/lineMap';
import type { LadderRowView, LadderSymbol } from '../messages/panel';
import { divide, complex, multiply, type Complex } from '../network/complex';
import type { Element } from '../network/element';
import { printComplex, printReactance } from '../quantity/printComplex';
import { printNumber, printQuantity } from '../quantity/printQuantity';

import type { ElementResult } from '../study/evaluation';
import { impedancePath } from '../study/impedancePath';
import { ladderObstacle } from '../study/obstacles';
import type { Problem } from '../study/problem';
import { sensitivities } from '../study/spread/sensitivities';
import type { Assessment } from './assess';

const digits = 3;
const nothing = '–';

/** The ladder as a table, from the load to the source, at the middle of the first band and in the first case. */
export function ladderRows({ description, evaluation }: Assessment, problem: Problem): LadderRowView[] {
  const lines = lineMap(description.syntax.text);
  const results = evaluation?.elements ?? [];
  const sensitive = sensitivitiesOf(problem);
  const entries = description.syntax.ladder?.elements ?? [];
  const load = description.syntax.load;
  return [
    endRow('load', loadAt(problem, results[0]?.frequencyHz ?? null), load ? lines.positionAt(load.span.start).line : null),
    ...results.map((result, at) => elementRow(result, problem.ladder.find((element) => element.name === result.name) ?? null, entries.find((entry) => entry.name.value === result.name) ?? null, lines, problem, sensitive[at] ?? null)),
    endRow('source', sourceText(problem), null),
  ];
}

const known = new WeakMap<Problem, readonly (number | null)[]>();

/** By element, in dB of worst margin for 1 %; worked out once for each problem, and not while something is unsolved. */
function sensitivitiesOf(problem: Problem): readonly (number | null)[] {
  const found = known.get(problem) ?? (ladderObstacle(problem.ladder) === null ? sensitivities(problem) : []);
  known.set(problem, found);
  return found;
}

/** What 1 % of an element's value costs; null where it has no one value. */
export const sensitivityOf = (problem: Problem, name: string): number | null => sensitivitiesOf(problem)[problem.ladder.findIndex((element) => element.name === name)] ?? null;

/** An element's heat as a share of the power available, worst over bands and cases. */
export const lossText = (dissipationW: number, { availablePowerW }: Problem): string => `${printNumber((100 * dissipationW) / availablePowerW, 2)} %`;

function endRow(id: 'load' | 'source', impedanceAfter: string, line: number | null): LadderRowView {
  return {
    id, name: id, orientation: 'end', symbol: id, value: '', reactance: '', impedanceAfter, voltage: '', current: '', heat: '', loss: '', sensitivity: '', note: '', line, editable: false,
  };
}

function loadAt(problem: Problem, frequencyHz: number | null): string {
  const load = frequencyHz === null ? null : impedancePath(problem, 0, frequencyHz).load;
  return load ? printComplex(impedanceOf(load, problem.z0Ohm), '') : nothing;
}

const impedanceOf = (reflection: Complex, z0Ohm: number): Complex =>
  multiply(complex(z0Ohm), divide({ re: 1 + reflection.re, im: reflection.im }, { re: 1 - reflection.re, im: -reflection.im }));

function sourceText({ source, z0Ohm }: Problem): string {
  if (source.impedance.form === 'constant') {
    const { impedanceOhm } = source.impedance;
    return impedanceOhm.im === 0 ? printNumber(impedanceOhm.re, digits) : printComplex(impedanceOhm, '');
  }
  return source.byBand.size > 0 ? 'by band' : printQuantity(z0Ohm, 'Ω', { digits }).replace(' Ω', '');
}

function elementRow(result: ElementResult, element: Element | null, entry: ElementSyntax | null, lines: LineMap, problem: Problem, sensitivity: number | null): LadderRowView {
  return {
    id: result.name,
    name: result.name,
    orientation: result.orientation,
    symbol: symbolOf(result, element),
    value: valueText(result, element),
    reactance: reactanceText(result),
    impedanceAfter: result.impedanceAfterOhm ? printComplex(result.impedanceAfterOhm, '') : nothing,
    voltage: result.peakVoltageV === null ? nothing : printQuantity(result.peakVoltageV, 'V', { digits: 2 }),
    current: result.rmsCurrentA === null ? nothing : printQuantity(result.rmsCurrentA, 'A', { digits: 2 }),
    heat: result.dissipationW === null ? nothing : printQuantity(result.dissipationW, 'W', { digits: 2 }),
    loss: result.dissipationW === null ? nothing : lossText(result.dissipationW, problem),
    sensitivity: sensitivity === null ? nothing : printNumber(sensitivity, 2),
    note: result.reason ?? '',
    line: entry ? lines.positionAt(entry.span.start).line : null,
    editable: entry?.body.form === 'branch' && entry.body.branch.form === 'part' && entry.body.branch.value.form === 'known',
  };
}

function symbolOf(result: ElementResult, element: Element | null): LadderSymbol {
  switch (element?.form) {
    case 'unsolved':
    case 'faulty': return 'unsolved';
    case 'not fitted': return 'open';
    case 'stub': return element.end === 'open' ? 'stub open' : 'stub short';
    default: return result.kind === 'stub' ? 'stub open' : result.kind;
  }
}

function valueText(result: ElementResult, element: Element | null): string {
  switch (element?.form) {
    case 'unsolved': return 'to solve';
    case 'faulty': return 'unreadable';
    case 'not fitted': return 'not fitted';
    case 'transformer': return `${element.turnsSource}:${element.turnsLoad}`;
    case 'branch': if (element.pair && result.value !== null && result.unit) return `2 × ${printQuantity(result.value, result.unit, { digits: 4 })}`; break;
  }
  return result.value === null || !result.unit ? nothing : printQuantity(result.value, result.unit, { digits: 4 });
}

/** Reactance for what lies in the path, susceptance for what hangs across it: what moves along the chart's circles. */
export function reactanceText({ orientation, reactanceOhm, susceptanceS }: ElementResult): string {
  if (orientation === 'series') return reactanceOhm === null ? nothing : printReactance(reactanceOhm, 'Ω');
  if (orientation === 'shunt') return susceptanceS === null ? nothing : printReactance(susceptanceS, 'S');
  return nothing;
}
