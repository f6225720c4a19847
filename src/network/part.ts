/**
 * What one real part is, in SI units. The physics of a part (its impedance over frequency) is in `partImpedance.ts`.
 */
export type PartKind = 'resistor' | 'inductor' | 'capacitor';

/** How the loss of a coil or capacitor goes with frequency. */
export type Loss =
  | { readonly law: 'none' }
  /** R = |X(f)| / q at every frequency. */
  | { readonly law: 'constant q'; readonly q: number }
  /** R = |X(atHz)| / q · √(f / atHz): the skin effect's law. */
  | { readonly law: 'skin effect'; readonly q: number; readonly atHz: number }
  | { readonly law: 'resistance'; readonly resistanceOhm: number };

/** Relative (0.05 is 5 %) or in the part's own SI unit; both `up` and `down` are ≥ 0. */
export interface Tolerance {
  readonly form: 'relative' | 'absolute';
  readonly up: number;
  readonly down: number;
}

/** Limits that the maker prints; each null where not stated. */
export interface Rating {
  readonly peakVoltageV: number | null;
  readonly rmsCurrentA: number | null;
  readonly dissipationW: number | null;
}

export interface Part {
  readonly kind: PartKind;
  /** Ω, H or F; without the capacitance that `srfHz` implies and without `eslH`. */
  readonly value: number;
  readonly loss: Loss;
  /** Inductance in series (capacitors, resistors); 0 where none. */
  readonly eslH: number;
  /** Inductors only: self-resonance, from which the capacitance across follows; null where not stated. */
  readonly srfHz: number | null;
  readonly tolerance: Tolerance | null;
  readonly rating: Rating | null;
  /** A part measured in series between two ports takes its impedance from here and not from the figures. */
  readonly measured: import('./networkData').NetworkData | null;
}

export const idealPart = (kind: PartKind, value: number): Part => ({
  kind, value, loss: { law: 'none' }, eslH: 0, srfHz: null, tolerance: null, rating: null, measured: null,
});
