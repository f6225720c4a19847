import { copperConductivity, skinDepthM } from './skinDepth';

const vacuumPermeability = 4e-7 * Math.PI;

export interface AirCoil {
  readonly inductanceH: number;
  readonly selfCapacitanceF: number;
  /** Estimate; the true Q may well be half or twice of it. */
  qAt(frequencyHz: number): number;
}

const f1 = (x: number) => (1 + 0.383901 * x + 0.017108 * x * x) / (1 + 0.258952 * x);
const f2 = (x: number) => 0.093842 * x + 0.002029 * x * x - 0.000801 * x ** 3;

/**
 * Inductance (H) of a single-layer winding as a current sheet, which is Nagaoka's, by R. Lundin, «A handbook formula for the
 * inductance of a single-layer circular coil», Proc. IEEE 73, 1985: within 2.5e-6 of the exact sheet
 * (`test/published/coils.test.ts`). A real winding of round wire differs from the sheet by a few per cent where there are few
 * turns. The diameter is that of the wire's centre; sizes in metres.
 */
export function currentSheetInductanceH(turns: number, diameterM: number, lengthM: number): number {
  const a = diameterM / 2;
  if (diameterM <= lengthM) {
    return (vacuumPermeability * turns ** 2 * Math.PI * a ** 2 * (f1((diameterM / lengthM) ** 2) - (4 * diameterM) / (3 * Math.PI * lengthM))) / lengthM;
  }
  const x = (lengthM / diameterM) ** 2;
  return vacuumPermeability * turns ** 2 * a * ((Math.log((8 * a) / lengthM) - 0.5) * f1(x) + f2(x));
}

/**
 * A winding for the bench. Self-capacitance after R. G. Medhurst, «H.F. resistance and self-capacitance of single-layer
 * solenoids», Wireless Engineer 24, 1947 (formula from memory: C/pF = D/cm · (0.1126 l/D + 0.08 + 0.27 √(D/l)), about 5 %), loss
 * from the skin effect in the wire (current in a ring as deep as the skin, at low frequency in all of it) with a proximity
 * factor of the same paper's order. In free air; sizes in metres, all > 0.
 */
export function airCoil(turns: number, diameterM: number, lengthM: number, wireM: number): AirCoil {
  const inductanceH = currentSheetInductanceH(turns, diameterM, lengthM);
  const slimness = lengthM / diameterM;
  const selfCapacitanceF = diameterM * 100 * (0.1126 * slimness + 0.08 + 0.27 / Math.sqrt(slimness)) * 1e-12;
  const wireLengthM = turns * Math.hypot(Math.PI * diameterM, lengthM / turns);
  // Close turns push the current aside: about a doubling where they touch, nothing where they stand far apart.
  const proximity = 1 + 1.3 * Math.min(1, (turns * wireM) / lengthM) ** 2;
  return {
    inductanceH,
    selfCapacitanceF,
    qAt(frequencyHz) {
      const skinM = Math.min(wireM / 2, skinDepthM(frequencyHz, copperConductivity));
      const area = Math.PI * skinM * (wireM - skinM);
      return (2 * Math.PI * frequencyHz * inductanceH * area * copperConductivity) / (wireLengthM * proximity);
    },
  };
}
