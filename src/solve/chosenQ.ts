import type { Element } from '../network/element';
import { idealPart } from '../network/part';
import { judgeBandwidth } from '../study/bandwidth';
import type { Goal } from '../study/goal';
import type { Problem } from '../study/problem';
import { sampler } from '../study/sampler';
import type { LadderTask } from '../study/unknown';
import { positionsOf, type Form } from './forms';
import { nearestOfEach } from './limits';
import type { Position } from './positions';
import { endsAtMiddle } from './outOfReach';
import type { OutOfReach } from './solution';
import { leastQ, threeElementMatches, type ThreeElementMatch } from './threeElements';
import { withLadder } from './solutionOf';

export type PiOrTee = Extract<LadderTask, { form: 'pi' | 'tee' }>;

/** A pi or tee whose values follow from a chosen Q or bandwidth, as a form that is left little choice. */
export interface ChosenForms {
  /** One for each combination of signs: positions hold the exact value, or the nearest of the catalogue. */
  readonly forms: readonly Form[];
  readonly outOfReach: readonly OutOfReach[];
}

/**
 * The matches of the first case's load at the middle of the first band. A bandwidth is that of 3 dB of gain, with the load's
 * own data; the Q that has it is found by halving.
 */
export function formsOfChosenQ(problem: Problem, task: PiOrTee, form: Form): ChosenForms {
  const { load, source, frequencyHz: middleHz } = endsAtMiddle(problem);
  const name = task.form;
  if (!(load.re > 0 && source.re > 0)) return { forms: [], outOfReach: [{ form: name, reason: 'the load takes no power at the middle of the first band' }] };
  const least = leastQ(name, load, source);
  const matches = (q: number): readonly ThreeElementMatch[] => threeElementMatches(name, load, source, middleHz, q);
  const outOfReach: OutOfReach[] = [];
  let found: ThreeElementMatch[] = [];
  if (task.q !== null) {
    found = [...matches(task.q)];
    if (found.length === 0) outOfReach.push({ form: `${name} of Q ${task.q}`, reason: `between this load and source its Q is at least ${three(least)}` });
  } else if (task.bandwidthHz !== null) {
    const wanted = task.bandwidthHz;
    for (const signs of ['11', '10', '01', '00']) {
      const match = ofBandwidth((q) => matches(q).find((each) => signsOf(each) === signs) ?? null, (each) => bandwidthOf(problem, each, middleHz), least, wanted);
      if (typeof match === 'number') outOfReach.push({ form: `${name} ${kindsOf(signs)}`, reason: `its bandwidth is ${three(match / 1e6)} MHz at most` });
      else if (match) found.push(match);
    }
  }
  const forms = found.filter(({ parts }) => parts.length === 3).flatMap((match) => {
    const made = restricted(form, match);
    return made ? [made] : [];
  });
  if (found.length > 0 && forms.length === 0) outOfReach.push({ form: name, reason: 'the values that it needs are of kinds, or beyond the range, of what may be chosen' });
  return { forms, outOfReach };
}

const three = (value: number): string => String(Number(value.toPrecision(3)));

/** Which way the parts at the load and at the source go: 1 inductor, 0 capacitor. */
const signsOf = ({ parts }: ThreeElementMatch): string => (parts.length === 3 ? [parts[0], parts[2]].map(({ kind }) => (kind === 'inductor' ? '1' : '0')).join('') : '');
const kindsOf = (signs: string): string => [...signs].map((sign) => (sign === '1' ? 'L' : 'C')).join(' … ');

/** The match with that bandwidth; its largest bandwidth where that is smaller; null where these signs have no match. */
function ofBandwidth(
  matchAt: (q: number) => ThreeElementMatch | null, widthOf: (match: ThreeElementMatch) => number, least: number, wanted: number,
): ThreeElementMatch | number | null {
  let low = Math.max(least * (1 + 1e-6), 1e-3);
  let match = matchAt(low);
  if (!match) return null;
  const largest = widthOf(match);
  if (largest < wanted) return largest;
  let high = low;
  for (let step = 0; step < 20 && match && widthOf(match) >= wanted; step++) {
    low = high;
    high *= 2;
    match = matchAt(high);
  }
  for (let step = 0; step < 40 && high / low > 1 + 1e-6; step++) {
    const middle = Math.sqrt(low * high);
    match = matchAt(middle);
    if (match && widthOf(match) >= wanted) low = middle;
    else high = middle;
  }
  return matchAt(low);
}

/** Of the ideal parts, 3 dB of gain, in the first case. */
function bandwidthOf(problem: Problem, { parts }: ThreeElementMatch, middleHz: number): number {
  const ladder = parts.map(({ orientation, kind, value }, i): Element => ({
    form: 'branch', name: `X${i + 1}`, orientation, branch: { form: 'part', part: idealPart(kind, value) }, pair: false,
  }));
  const goal: Goal = {
    text: '', line: 1, quantity: 'bandwidth', comparison: '>=', limit: 0, unit: 'Hz', place: { form: 'frequency', frequencyHz: middleHz },
    caseName: problem.cases[0].name, into: null, against: null, elementName: null, bandwidthDropDb: 3,
  };
  return judgeBandwidth(goal, sampler(withLadder(problem, ladder), ladder)).value ?? Infinity;
}

/** The form with little choice: each position holds what is nearest to the match's value. Null where there is nothing of that kind. */
function restricted(form: Form, match: ThreeElementMatch): Form | null {
  const positions = positionsOf(form).map((position, s) => nearTo(position, match.parts[s].kind, match.parts[s].value));
  if (positions.some(({ items }) => items.length === 0)) return null;
  return { ...form, steps: positions };
}

function nearTo(position: Position, kind: string, value: number): Position {
  const of = position.items.map((item, i) => ({ item, group: position.groups[i] })).filter(({ item }) => item.part?.kind === kind);
  const distance = (each: (typeof of)[number]): number => Math.abs(Math.log((each.item.part?.value ?? 0) / value));
  const free = of.filter(({ item }) => item.range !== null && value >= item.range.min * (1 - 1e-9) && value <= item.range.max * (1 + 1e-9));
  if (free.length > 0) {
    const [{ item, group }] = free;
    const part = item.part && { ...item.part, value };
    const element = { ...item.element, branch: { form: 'part', part } } as Element;
    // No longer free: the value follows from the Q.
    return { ...position, items: [{ ...item, part, element, range: null }], groups: [group] };
  }
  const near = of.filter(({ item }) => item.range === null).sort((a, b) => distance(a) - distance(b)).slice(0, nearestOfEach);
  return { ...position, items: near.map(({ item }) => item), groups: near.map(({ group }) => group) };
}
