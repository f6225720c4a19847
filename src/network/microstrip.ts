import type { Line } from './line';
import { copperConductivity, surfaceResistanceOhm } from './skinDepth';

const freeSpaceOhm = 376.730313668;
const speedOfLight = 299_792_458;
/** Losses are stated at this frequency and carried to others by their laws. */
const lossAtHz = 1e9;
const dbPerNeper = 20 / Math.LN10;

export interface MicrostripGeometry {
  readonly widthM: number;
  readonly heightM: number;
  readonly permittivity: number;
  /** Thickness of the strip; null for one without thickness, which is then without conductor loss. */
  readonly copperM: number | null;
  readonly lossTangent: number | null;
  readonly lengthM: number;
}

/**
 * Impedance of a strip of u = w/h over air: E. Hammerstad and Ø. Jensen, «Accurate models for microstrip computer-aided
 * design», IEEE MTT-S Digest 1980, eqs. 1 and 2; within 0.01 % of the exact field for u ≤ 1, 0.03 % above (`test/published/microstrip.test.ts`).
 */
export function airImpedanceOhm(u: number): number {
  const f = 6 + (2 * Math.PI - 6) * Math.exp(-((30.666 / u) ** 0.7528));
  return (freeSpaceOhm / (2 * Math.PI)) * Math.log(f / u + Math.sqrt(1 + (2 / u) ** 2));
}

/** The narrowest strip that the paper's exponent was fitted to; carried on, it would turn its sign for a hair. */
const narrowest = 0.01;

/** The same paper, eq. 3: effective permittivity, static; within 0.23 % for 0.05 ≤ u ≤ 20, εr ≤ 20 (`test/published/microstrip.test.ts`). */
export function effectivePermittivity(u: number, permittivity: number): number {
  const v = Math.max(u, narrowest);
  const a = 1 + Math.log((v ** 4 + (v / 52) ** 2) / (v ** 4 + 0.432)) / 49 + Math.log(1 + (v / 18.1) ** 3) / 18.7;
  const b = 0.564 * ((permittivity - 0.9) / (permittivity + 3)) ** 0.053;
  return (permittivity + 1) / 2 + ((permittivity - 1) / 2) * (1 + 10 / u) ** (-a * b);
}

/** The same paper, eqs. 6 to 9: the strip's thickness t/h acts as extra width, less of it over a dielectric. */
function widened(u: number, t: number, permittivity: number): { air: number; filled: number } {
  if (t === 0) return { air: u, filled: u };
  const extra = (t / Math.PI) * Math.log(1 + ((4 * Math.E) / t) * Math.tanh(Math.sqrt(6.517 * u)) ** 2);
  return { air: u + extra, filled: u + (extra / 2) * (1 + 1 / Math.cosh(Math.sqrt(permittivity - 1))) };
}

/**
 * A microstrip as a line: quasi-static impedance and velocity, and two losses.
 *
 * Conductor (only where the copper's thickness is given): α = Rs·K/(Z0·w) with the surface resistance Rs of copper and the
 * current's distribution K = exp(−1.2·(Z01/η0)^0.7) of the same paper, Z01 being the strip's impedance over air, since the
 * dielectric does not move the current. It holds while the copper is some skin depths thick, and
 * lies above Wheeler's incremental inductance rule by a tenth for thin strips and up to two fifths for thick narrow ones.
 *
 * Dielectric: α = k0·εr·(εe − 1)·tan δ/(2·√εe·(εr − 1)) (Pozar, Microwave Engineering, §3.8).
 *
 * Roughness, dispersion and radiation are left out. Sizes in metres, > 0; permittivity at least 1.
 */
export function microstripLine({ widthM, heightM, permittivity, copperM, lossTangent, lengthM }: MicrostripGeometry): Line {
  const { air, filled } = widened(widthM / heightM, (copperM ?? 0) / heightM, permittivity);
  const relative = effectivePermittivity(filled, permittivity);
  const impedanceOhm = airImpedanceOhm(filled) / Math.sqrt(relative);
  // What the thickness does to the field in air counts for the wave's speed: eq. 9 of the paper.
  const effective = relative * (airImpedanceOhm(air) / airImpedanceOhm(filled)) ** 2;
  const conductor = copperM ? conductorNepersPerMetre(impedanceOhm, airImpedanceOhm(air), widthM) : 0;
  // The share of the field in the dielectric; over air there is nothing to tell, and a loss tangent would be all of it.
  const filling = permittivity > 1 ? (permittivity * (effective - 1)) / (permittivity - 1) : 1;
  const dielectric = (Math.PI * lossAtHz * filling * (lossTangent ?? 0)) / (speedOfLight * Math.sqrt(effective));
  return {
    impedanceOhm, lengthM, velocityFactor: 1 / Math.sqrt(effective),
    conductorLossDb: conductor * lengthM * dbPerNeper, dielectricLossDb: dielectric * lengthM * dbPerNeper, lossAtHz,
  };
}

function conductorNepersPerMetre(impedanceOhm: number, airOhm: number, widthM: number): number {
  const distribution = Math.exp(-1.2 * (airOhm / freeSpaceOhm) ** 0.7);
  return (surfaceResistanceOhm(lossAtHz, copperConductivity) * distribution) / (impedanceOhm * widthM);
}
