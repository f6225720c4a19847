import type { ComplexArray } from '../network/complex';

/** A load as one resistance with one reactance, or with a resonance. */
export type LoadModelForm = 'resistor' | 'series RC' | 'series RL' | 'parallel RC' | 'parallel RL' | 'series RLC' | 'parallel RLC';

export interface LoadModel {
  readonly form: LoadModelForm;
  readonly resistanceOhm: number;
  /** Null where the form has none. */
  readonly inductanceH: number | null;
  readonly capacitanceF: number | null;
  /**
   * Largest |(Zm − Z)/(Zm + Z*)| over the points: the reflection that the load shows where the model is matched. Between 0
   * and 1.
   */
  readonly fitError: number;
}

/** A model with two reactances has to be better than this share of the best with one, to be taken for the load. */
const resonantGain = 0.7;
/** Errors below this are rounding: the simpler model is as good. */
const exact = 1e-9;

/**
 * The first-order model that is nearest to a passive load (Ω) over a band: each form fitted by least squares weighted by 1/R
 * (resistance, reactance; for parallel forms conductance, susceptance), then the best in `fitError`, a resonance only where
 * it is clearly better. Null where the load has no positive resistance somewhere.
 */
export function fitLoad(impedance: ComplexArray, frequencyHz: Float64Array): LoadModel | null {
  const z = Array.from(frequencyHz, (hz, k) => ({ omega: 2 * Math.PI * hz, re: impedance.re[k], im: impedance.im[k] }));
  if (z.length === 0 || !z.every(({ re, im }) => re > 0 && Number.isFinite(re) && Number.isFinite(im))) return null;
  const y = z.map(({ omega, re, im }) => ({ omega, re: re / (re * re + im * im), im: -im / (re * re + im * im) }));
  const candidates: LoadModel[] = [];
  for (const [side, samples] of [['series', z], ['parallel', y]] as const) {
    const level = fitLevel(samples);
    const rising = fitOne(samples, (omega) => omega);
    const falling = fitOne(samples, (omega) => -1 / omega);
    // In series the rising reactance is an inductance; in parallel the rising susceptance is a capacitance.
    const model = (form: LoadModelForm, up: number | null, down: number | null): void => {
      const inverseDown = down === null ? null : 1 / down;
      const [inductanceH, capacitanceF] = side === 'series' ? [up, inverseDown] : [inverseDown, up];
      const made = { form, resistanceOhm: side === 'series' ? level : 1 / level, inductanceH, capacitanceF };
      candidates.push({ ...made, fitError: fitError(made, impedance, frequencyHz) });
    };
    if (side === 'series') model('resistor', null, null);
    if (rising > 0) model(side === 'series' ? 'series RL' : 'parallel RC', rising, null);
    if (falling > 0) model(side === 'series' ? 'series RC' : 'parallel RL', null, falling);
    const both = frequencyHz.length < 2 ? null : fitBoth(samples);
    if (both && both[0] > 0 && both[1] > 0) model(side === 'series' ? 'series RLC' : 'parallel RLC', both[0], both[1]);
  }
  const best = (of: readonly LoadModel[]): LoadModel | null =>
    of.reduce<LoadModel | null>((least, each) => (least === null || each.fitError < least.fitError ? each : least), null);
  const resistor = candidates.find((each) => each.form === 'resistor') ?? null;
  if (resistor && resistor.fitError <= exact) return resistor;
  const simple = best(candidates.filter((each) => !each.form.endsWith('RLC')));
  const resonant = best(candidates.filter((each) => each.form.endsWith('RLC')));
  if (!simple || !resonant) return simple ?? resonant;
  return simple.fitError <= exact || simple.fitError <= resonant.fitError / resonantGain ? simple : resonant;
}

/** Impedance of a model in Ω. */
export function modelImpedance(model: Omit<LoadModel, 'fitError'>, frequencyHz: number): { re: number; im: number } {
  const omega = 2 * Math.PI * frequencyHz;
  const { form, resistanceOhm, inductanceH, capacitanceF } = model;
  if (form === 'resistor' || form.startsWith('series')) {
    return { re: resistanceOhm, im: (inductanceH === null ? 0 : omega * inductanceH) - (capacitanceF === null ? 0 : 1 / (omega * capacitanceF)) };
  }
  const conductance = 1 / resistanceOhm;
  const susceptance = (capacitanceF === null ? 0 : omega * capacitanceF) - (inductanceH === null ? 0 : 1 / (omega * inductanceH));
  const size = conductance * conductance + susceptance * susceptance;
  return { re: conductance / size, im: -susceptance / size };
}

interface Sample {
  readonly omega: number;
  readonly re: number;
  readonly im: number;
}

/** The level nearest in ratio: geometric mean. */
function fitLevel(samples: readonly Sample[]): number {
  return Math.exp(samples.reduce((sum, { re }) => sum + Math.log(re), 0) / samples.length);
}

/** The factor of `law` nearest to the imaginary part, relative to the real one. */
function fitOne(samples: readonly Sample[], law: (omega: number) => number): number {
  let top = 0;
  let bottom = 0;
  for (const { omega, re, im } of samples) {
    top += (law(omega) * im) / (re * re);
    bottom += law(omega) ** 2 / (re * re);
  }
  return top / bottom;
}

/** im ≈ up·ω − down/ω. */
function fitBoth(samples: readonly Sample[]): readonly [number, number] | null {
  // In units of a middle frequency, so that both columns have the same size.
  const middle = Math.sqrt(samples[0].omega * samples[samples.length - 1].omega);
  let [uu, ud, dd, ui, di] = [0, 0, 0, 0, 0];
  for (const { omega, re, im } of samples) {
    const u = omega / middle / re;
    const d = -middle / omega / re;
    uu += u * u;
    ud += u * d;
    dd += d * d;
    ui += (u * im) / re;
    di += (d * im) / re;
  }
  const determinant = uu * dd - ud * ud;
  if (!(determinant > 1e-14 * uu * dd)) return null;
  return [(ui * dd - di * ud) / determinant / middle, ((di * uu - ui * ud) / determinant) * middle];
}

function fitError(model: Omit<LoadModel, 'fitError'>, { re, im }: ComplexArray, frequencyHz: Float64Array): number {
  let worst = 0;
  for (let k = 0; k < frequencyHz.length; k++) {
    const m = modelImpedance(model, frequencyHz[k]);
    worst = Math.max(worst, Math.hypot(m.re - re[k], m.im - im[k]) / Math.hypot(m.re + re[k], m.im - im[k]));
  }
  return worst;
}
