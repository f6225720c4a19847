import { ladderDerivatives } from '../../network/ladderDerivative';
import type { Problem } from '../problem';
import { studiedLadder } from '../studiedLadder';
import { excessOf, marginMeter } from './marginMeter';

/** The change of value that a sensitivity is stated for. */
const onePercent = 0.01;

/**
 * By element of the ladder: the larger loss of worst margin, in dB, for +1 % or −1 % of its value; 0 where neither loses. From
 * exact derivatives of the cascade, every point and goal to first order, so that it does not matter which of them is worst
 * now. Null where an element has no one value, or where the margin is not known. Goals that |Γ| and gain do not decide (stress,
 * resistance, efficiency, bandwidth) are not in it.
 */
export function sensitivities(problem: Problem, ladder = studiedLadder(problem)): readonly (number | null)[] {
  const meter = marginMeter(problem, ladder, []);
  meter.measure(new Float64Array(0));
  const { points, reflectionSquare, gain } = meter;
  const worst = (gamma2: Float64Array, passed: Float64Array): number =>
    points.checks.reduce((least, check) => Math.min(least, -10 * Math.log10(excessOf(check, gamma2, passed))), Infinity);
  const now = worst(reflectionSquare, gain);
  if (!Number.isFinite(now)) return ladder.map(() => null);
  return ladderDerivatives(ladder, points.frequencyHz, points.source, points.load).map((derivative) => {
    if (!derivative) return null;
    const losses = [onePercent, -onePercent].map((change) => {
      const gamma2 = reflectionSquare.map((value, k) => Math.max(0, value + derivative.reflectionSquare[k] * change));
      const passed = gain.map((value, k) => value * Math.exp(derivative.logGain[k] * change));
      return now - worst(gamma2, passed);
    });
    const loss = Math.max(0, ...losses);
    return Number.isFinite(loss) ? loss : null;
  });
}
