import type { ComplexArray } from '../network/complex';
import { bodeFanoReflection, equalRipple } from './equalRipple';
import { fitLoad, type LoadModel } from './fitLoad';
import { limitReactances, poorFit } from './limits';

/** The smallest worst-case |Γ| over a band that a lossless ladder can reach with one load. */
export interface MatchLimit {
  /** The first-order model that it rests on; null where the load has no positive resistance or is not known. */
  readonly model: LoadModel | null;
  /** |Γ| that no lossless ladder gets below; null with a `reason`. */
  readonly reflection: number | null;
  /** The same with the model's error taken off: holds whatever the load does between it and the model. Null like `reflection`. */
  readonly certain: number | null;
  /** Equal-ripple |Γ| with 1, 2, 3, 4 reactances, the load's own counted, each made resonant in the band by another. */
  readonly byReactances: readonly number[];
  /** Q at the band's middle (geometric mean) times the fractional bandwidth. */
  readonly qw: number | null;
  readonly reason: string | null;
}

/**
 * Bode–Fano from the load's own impedance (Ω) at the points of one band (Hz, increasing).
 *
 * ln(1/|Γ|) ≤ π/(Q·w) with w = (f2 − f1)/√(f1 f2) and Q at √(f1 f2), for one reactance in series or parallel with the
 * resistance. A resonance bounds through both of its reactances; the larger Q decides, as the smaller can be made up for.
 * Bode 1945; Fano 1950; Pozar, Microwave Engineering, Fig. 5.22. A single point, or a plain resistance, has no limit but 0.
 * Where the model is further from the load than `poorFit`, there is no limit but the reason why.
 *
 * Mismatch is a distance d with d(a, c) ≤ (d(a, b) + d(b, c))/(1 + d(a, b) d(b, c)), the same on both sides of a lossless
 * network: a load within e of a model of limit g cannot be matched better than (g − e)/(1 − g e), `certain`. From memory: the
 * pseudo-hyperbolic distance of the half-plane of positive resistance.
 */
export function bodeFanoLimit(impedance: ComplexArray, frequencyHz: Float64Array): MatchLimit {
  const none = { reflection: null, certain: null, byReactances: [], qw: null };
  const model = fitLoad(impedance, frequencyHz);
  if (!model) return { ...none, model, reason: 'the load has no positive resistance everywhere in the band' };
  const startHz = frequencyHz[0];
  const stopHz = frequencyHz[frequencyHz.length - 1];
  if (startHz === stopHz) return { model, reflection: 0, certain: 0, byReactances: new Array<number>(limitReactances).fill(0), qw: 0, reason: null };
  if (model.fitError > poorFit) {
    return { ...none, model, reason: `a ${model.form} is not much like this load (its mismatch to it reaches ${model.fitError.toFixed(2)})` };
  }
  const qw = qualityOf(model, 2 * Math.PI * Math.sqrt(startHz * stopHz)) * ((stopHz - startHz) / Math.sqrt(startHz * stopHz));
  if (qw === 0) return { model, reflection: 0, certain: 0, byReactances: new Array<number>(limitReactances).fill(0), qw, reason: null };
  const byReactances = Array.from({ length: limitReactances }, (_, i) => equalRipple(i + 1, qw).largest);
  const reflection = bodeFanoReflection(qw);
  return { model, reflection, certain: Math.max(0, (reflection - model.fitError) / (1 - reflection * model.fitError)), byReactances, qw, reason: null };
}

/** The larger Q of a model's reactances. */
function qualityOf({ form, resistanceOhm, inductanceH, capacitanceF }: LoadModel, omega: number): number {
  const ofL = inductanceH === null ? 0 : (omega * inductanceH) / resistanceOhm;
  const ofC = capacitanceF === null ? 0 : 1 / (omega * capacitanceF * resistanceOhm);
  if (!form.startsWith('parallel')) return Math.max(ofL, ofC);
  return Math.max(ofL === 0 ? 0 : 1 / ofL, ofC === 0 ? 0 : 1 / ofC);
}
