import type { Evaluation } from '../study/evaluation';
import type { Problem } from '../study/problem';

const powerLimitW = 1;
const voltageLimitV = 30;

/** What a person must be told before touching the board; empty at small signals. */
export function cautions(problem: Problem, evaluation: Evaluation): string[] {
  const highest = Math.max(0, ...evaluation.elements.map((element) => element.peakVoltageV ?? 0));
  if (problem.availablePowerW <= powerLimitW && highest <= voltageLimitV) return [];
  return [
    'Radio-frequency voltages burn and arc, at powers where direct current would do nothing: check the ratings of the parts and the spacing between conductors.',
    'Exposure limits, local codes and licensed practice govern what may be transmitted.',
    'A design is a calculation until it has been measured.',
  ];
}
