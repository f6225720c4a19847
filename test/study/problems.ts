import type { Element } from '../../src/network/element';
import type { Impedance } from '../../src/network/impedance';
import type { NetworkData } from '../../src/network/networkData';
import { idealPart, type Part, type PartKind } from '../../src/network/part';
import type { Goal, GoalResult } from '../../src/study/goal';
import type { Band, LoadCase, Problem } from '../../src/study/problem';
import { evaluate, type EvaluateOptions } from '../../src/study/evaluate';

/** Small problems for the tests of this room. */

export const ohms = (re: number, im = 0): Impedance => ({ form: 'constant', impedanceOhm: { re, im } });
export const partOf = (kind: PartKind, value: number, more: Partial<Part> = {}): Impedance => ({ form: 'part', part: { ...idealPart(kind, value), ...more } });
export const inductor = (value: number, more: Partial<Part> = {}): Impedance => partOf('inductor', value, more);
export const capacitor = (value: number, more: Partial<Part> = {}): Impedance => partOf('capacitor', value, more);
export const resistor = (value: number): Impedance => partOf('resistor', value);

export const series = (name: string, branch: Impedance, pair = false): Element => ({ form: 'branch', name, orientation: 'series', branch, pair });
export const shunt = (name: string, branch: Impedance, pair = false): Element => ({ form: 'branch', name, orientation: 'shunt', branch, pair });
export const bridge = (name: string): Element => ({ form: 'bridge', name, orientation: 'series' });
export const notFitted = (name: string): Element => ({ form: 'not fitted', name, orientation: 'shunt', kind: 'capacitor' });

/** A lossless line that is `turns` wavelengths long at `atHz`. */
export const lineOf = (impedanceOhm: number, turns: number, atHz: number, lossDb = 0) => ({
  impedanceOhm, lengthM: (turns * 299_792_458) / atHz, velocityFactor: 1, conductorLossDb: lossDb, dielectricLossDb: 0, lossAtHz: atHz,
});

export const points = (...frequencyHz: number[]): Float64Array => Float64Array.from(frequencyHz);

export function evenly(startHz: number, stopHz: number, count: number): Float64Array {
  return Float64Array.from({ length: count }, (_, k) => startHz + ((stopHz - startHz) * k) / (count - 1));
}

export const band = (name: string, frequencyHz: Float64Array, watch = false): Band => ({ name, frequencyHz, watch });

/** Several loads by name, or one. */
export function cases(loads: Impedance | Record<string, Impedance>): LoadCase[] {
  if ('form' in loads && typeof loads.form === 'string') return [{ name: null, load: loads as Impedance, fixture: [] }];
  return Object.entries(loads as Record<string, Impedance>).map(([name, load]) => ({ name, load, fixture: [] }));
}

export function problemOf(more: Partial<Problem> & { load?: Impedance | Record<string, Impedance>; sourceOhm?: Impedance }): Problem {
  const { load, sourceOhm, ...rest } = more;
  return {
    title: null, z0Ohm: 50, source: { impedance: sourceOhm ?? ohms(more.z0Ohm ?? 50), byBand: new Map() }, availablePowerW: 1e-3,
    bands: [band('main', points(1e9))], sweepHz: points(0.9e9, 1e9, 1.1e9), cases: cases(load ?? ohms(50)), ladder: [], goals: [],
    unknowns: [], ladderTask: null, families: [], tunables: [], channelsHz: null, firmware: null,
    spread: { distribution: 'uniform', builds: 10_000, seed: 1 }, measured: [], ...rest,
  };
}

export function goalOf(quantity: Goal['quantity'], comparison: Goal['comparison'] = null, limit: number | null = null, more: Partial<Goal> = {}): Goal {
  return {
    text: `${quantity} ${comparison ?? ''} ${limit ?? ''}`.trim(), line: 1, quantity, comparison, limit, unit: '', place: { form: 'bands' },
    caseName: null, into: null, against: null, elementName: null, bandwidthDropDb: null, ...more,
  };
}

/** The one goal of a problem, judged. */
export function judge(problem: Problem, goal: Goal, options?: EvaluateOptions): GoalResult {
  return evaluate({ ...problem, goals: [goal] }, options).goals[0];
}

/** A one-port file whose reflection against 50 Ω is `reflection` at each frequency. Invented. */
export function onePort(frequencyHz: Float64Array, reflection: (frequencyHz: number) => { re: number; im: number }): NetworkData {
  const values = Array.from(frequencyHz, reflection);
  return {
    ports: 1, frequencyHz, referenceOhm: Float64Array.of(50), sRe: Float64Array.from(values, ({ re }) => re), sIm: Float64Array.from(values, ({ im }) => im),
  };
}

export const fileOf = (data: NetworkData, port: number | 'differential' = 1): Impedance => ({ form: 'file', data, port });

export function near(actual: number | null, expected: number, relative: number, what = ''): void {
  const error = actual === null ? Infinity : Math.abs(actual - expected);
  if (!(error <= relative * Math.max(Math.abs(expected), 1e-300))) throw new Error(`${what} ${actual} is not ${expected} to ${relative}`);
}
