import { mismatchLossDb, vswr } from '../network/figures';
import { totalReflectionSlack } from './limits';

/** Why VSWR and mismatch loss have no value where more comes back than was sent. */
export const aboveTotal = 'the reflection is above 1, where VSWR and mismatch loss have no value';

/** VSWR of |Γ|: infinite at total reflection (within rounding), NaN above it. */
export const vswrOf = (magnitude: number): number => totalOr(magnitude, vswr);

/** Mismatch loss of |Γ| in dB: infinite at total reflection (within rounding), NaN above it. */
export const mismatchLossOf = (magnitude: number): number => totalOr(magnitude, mismatchLossDb);

/** |Γ| as it is given out: 1 where only rounding puts total reflection above it. */
export const settledReflection = (magnitude: number): number => (magnitude > 1 && magnitude <= 1 + totalReflectionSlack ? 1 : magnitude);

function totalOr(magnitude: number, figure: (magnitude: number) => number): number {
  if (magnitude < 1 - totalReflectionSlack) return figure(magnitude);
  return magnitude <= 1 + totalReflectionSlack ? Infinity : NaN;
}

/** |Γ| of a VSWR (≥ 1, may be infinite). Source: Pozar, Microwave Engineering, §2.4. */
export const reflectionOfVswr = (ratio: number): number => (ratio === Infinity ? 1 : (ratio - 1) / (ratio + 1));

/** |Γ| of a mismatch loss in dB (≥ 0, may be infinite): √(1 − 10^(−L/10)). */
export const reflectionOfMismatchLoss = (lossDb: number): number => Math.sqrt(-Math.expm1((-lossDb * Math.LN10) / 10));

/** |Γ| of a return loss in dB (may be infinite). */
export const reflectionOfReturnLoss = (lossDb: number): number => 10 ** (-lossDb / 20);
