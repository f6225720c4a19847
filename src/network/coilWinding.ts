import { airCoil, type AirCoil } from './airCoil';

/** How an air-core coil of a wanted inductance could be wound. */
export interface CoilWinding {
  readonly turns: number;
  /** Of the middle of the wire. */
  readonly diameterM: number;
  readonly lengthM: number;
  readonly wireM: number;
  readonly coil: AirCoil;
}

/** Formers and wire that are in every drawer; common practice. */
const diametersM = [3e-3, 4e-3, 5e-3, 6e-3, 8e-3, 10e-3, 12e-3, 16e-3];
const wiresM = [0.5e-3, 0.8e-3, 1e-3];
const turnsAtMost = 30;
/** Above this a coil on a core is what one would take; and below a hairpin. */
const reachH = { min: 2e-9, max: 5e-6 };

/**
 * Whole turns, and the length to which they are stretched so that the inductance is met: of all combinations of diameter, wire and
 * turns the one nearest to a length of its diameter, where Q is best for its size (common practice). The gap between turns is
 * from a third of the wire to three of it. Null where none does, or where nobody winds by hand.
 */
export function coilWinding(inductanceH: number): CoilWinding | null {
  if (!(inductanceH >= reachH.min && inductanceH <= reachH.max)) return null;
  let best: CoilWinding | null = null;
  for (const diameterM of diametersM) {
    for (const wireM of wiresM) {
      for (let turns = 2; turns <= turnsAtMost; turns++) {
        const lengthM = lengthFor(inductanceH, turns, diameterM, wireM);
        if (lengthM === null) continue;
        if (best && shape(best.lengthM, best.diameterM) <= shape(lengthM, diameterM)) continue;
        best = { turns, diameterM, lengthM, wireM, coil: airCoil(turns, diameterM, lengthM, wireM) };
      }
    }
  }
  return best;
}

const shape = (lengthM: number, diameterM: number): number => Math.abs(Math.log(lengthM / diameterM));

function lengthFor(inductanceH: number, turns: number, diameterM: number, wireM: number): number | null {
  let low = turns * wireM * (4 / 3);
  let high = turns * wireM * 4;
  const at = (lengthM: number): number => airCoil(turns, diameterM, lengthM, wireM).inductanceH;
  // A longer coil has less.
  if (at(low) < inductanceH || at(high) > inductanceH) return null;
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (at(middle) > inductanceH) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
