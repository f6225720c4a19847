import type { Complex, ComplexArray } from '../network/complex';
import type { Orientation } from '../network/element';
import type { GoalResult } from './goal';
import type { TunableCodes } from './tunableCodes';

/** What a ladder does, over the sweep, in the bands, against the goals, element by element. SI units. */
export interface Evaluation {
  readonly frequencyHz: Float64Array;
  readonly traces: readonly CaseTrace[];
  readonly bands: readonly BandResult[];
  readonly goals: readonly GoalResult[];
  /** From the load to the source. */
  readonly elements: readonly ElementResult[];
  /** True where every goal holds and nothing is unsolved. */
  readonly ok: boolean;
  /** The codes that tunable parts were judged with, channel by channel; null where there are none or the codes were given. */
  readonly tuning: Tuning | null;
}

export interface Tuning {
  /** Increasing. */
  readonly channelsHz: Float64Array;
  /** By channel. */
  readonly codes: readonly TunableCodes[];
  /** True where every combination was looked at. */
  readonly proved: boolean;
  /** The channel whose codes the traces and the table of elements have. */
  readonly shown: number;
}

/** One load case over the sweep. Points where `known` is 0 hold NaN. */
export interface CaseTrace {
  readonly caseName: string | null;
  readonly known: Uint8Array;
  /** Why points are not known; null where all are. */
  readonly reason: string | null;
  /** Power-wave reflection at the source's plane against the source. */
  readonly reflection: ComplexArray;
  /** (Zin − z0)/(Zin + z0): what the chart plots. */
  readonly chartReflection: ComplexArray;
  /** Zin; infinite where the input is open. */
  readonly impedanceOhm: ComplexArray;
  readonly gainDb: Float64Array;
  /** 0 … 1; NaN where the ladder takes no power. */
  readonly efficiency: Float64Array;
}

export interface BandResult {
  readonly name: string;
  readonly startHz: number;
  readonly stopHz: number;
  readonly cases: readonly BandCaseResult[];
}

export interface BandCaseResult {
  readonly caseName: string | null;
  /** Magnitudes and dB; null with a `reason` where not known; null without: infinite. */
  readonly worstReflection: number | null;
  readonly worstReturnLossDb: number | null;
  readonly worstVswr: number | null;
  readonly worstGainDb: number | null;
  /** Frequency of the worst reflection. */
  readonly atHz: number | null;
  readonly reason: string | null;
}

export type ElementKind = 'resistor' | 'inductor' | 'capacitor' | 'branch' | 'line' | 'stub' | 'transformer' | 'block' | 'bridge';

export interface ElementResult {
  readonly name: string;
  readonly orientation: Orientation;
  readonly kind: ElementKind;
  /** Ω, H, F, or metres; one part's for a pair; null for branches, blocks, transformers, unsolved and not fitted ones. */
  readonly value: number | null;
  readonly unit: 'Ω' | 'H' | 'F' | 'm' | null;
  readonly fitted: boolean;
  /** Middle of the first band (geometric mean of its ends). */
  readonly frequencyHz: number;
  /** Imaginary part of the element's impedance (series) there; null where it has none of its own. */
  readonly reactanceOhm: number | null;
  /** Imaginary part of the element's admittance there. */
  readonly susceptanceS: number | null;
  /** Looking toward the load just after the element, first case; null where not known. */
  readonly impedanceAfterOhm: Complex | null;
  /** Against z0. */
  readonly reflectionAfter: Complex | null;
  /** Worst over all bands and cases at the available power; null where not known. */
  readonly peakVoltageV: number | null;
  readonly rmsCurrentA: number | null;
  readonly dissipationW: number | null;
  readonly reason: string | null;
}

/** The way from the load through each element to the source at one frequency, for the chart. */
export interface ImpedancePath {
  readonly caseName: string | null;
  readonly frequencyHz: number;
  /** Reflection of the load against z0; null where it is not known there (then there are no steps). */
  readonly load: Complex | null;
  readonly steps: readonly PathStep[];
}

export interface PathStep {
  readonly name: string;
  readonly orientation: Orientation;
  /** Reflection against z0 along the element's arc, from before to after it. */
  readonly arc: ComplexArray;
  readonly reflectionAfter: Complex;
  readonly impedanceAfterOhm: Complex;
}
