import type { Part } from './part';

/**
 * The impedance law of a part as numbers: with ω = 2πf,
 *
 *     Z = R0 + R1·√f + R2·ω + R3/ω + j(ω·L − S/ω),  and Cp across that.
 *
 * Every value, loss law, ESL and SRF of the language has this form, so one formula serves them all.
 */
export interface PartModel {
  /** Ω: a resistor, or ESR. */
  readonly constantOhm: number;
  /** Ω/√Hz: the skin effect's law. */
  readonly skinOhm: number;
  /** Ω·s: a coil with the same Q everywhere. */
  readonly risingOhm: number;
  /** Ω/s: a capacitor with the same Q everywhere. */
  readonly fallingOhm: number;
  readonly inductanceH: number;
  /** 1/C in 1/F; infinite for a capacitor of 0 F, which is an open. */
  readonly elastance: number;
  /** What the self-resonance of a coil implies across both. */
  readonly acrossF: number;
}

/**
 * Reduces a part's figures (not its measured data) to its law, at its own value or at another with the same figures.
 *
 * - Q is that of the value alone: R = |X|/q, with X = ωL or 1/(ωC), without SRF's capacitance or ESL.
 * - Skin effect: R(f) = |X(atHz)|/q · √(f/atHz).
 * - SRF: C = 1/((2π·SRF)²·L) across L and its loss.
 */
export function partModel(part: Part, value = part.value): PartModel {
  const { kind, loss, eslH } = part;
  const coil = kind === 'inductor';
  const elastance = kind === 'capacitor' ? 1 / value : 0;
  let constantOhm = kind === 'resistor' ? value : 0;
  let skinOhm = 0;
  let risingOhm = 0;
  let fallingOhm = 0;
  if (kind !== 'resistor') {
    switch (loss.law) {
      case 'none': break;
      case 'resistance': constantOhm = loss.resistanceOhm; break;
      case 'constant q':
        if (coil) risingOhm = value / loss.q;
        else fallingOhm = elastance / loss.q;
        break;
      case 'skin effect': {
        const omega = 2 * Math.PI * loss.atHz;
        const reactance = coil ? omega * value : elastance / omega;
        skinOhm = reactance / (loss.q * Math.sqrt(loss.atHz));
      }
    }
  }
  const inductanceH = coil ? value : eslH;
  const acrossF = coil && part.srfHz !== null && value > 0 ? 1 / ((2 * Math.PI * part.srfHz) ** 2 * value) : 0;
  return { constantOhm, skinOhm, risingOhm, fallingOhm, inductanceH, elastance, acrossF };
}
