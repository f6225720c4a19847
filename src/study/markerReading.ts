import type { Complex, ComplexArray } from '../network/complex';
import { decibels, returnLossDb } from '../network/figures';
import { impedanceOf, reflectionOf } from '../network/immittance';
import type { Problem } from './problem';
import { vswrOf } from './reflectionFigures';
import { sampler } from './sampler';
import { studiedLadder } from './studiedLadder';
import type { TunableCodes } from './tunableCodes';

/** One case at one frequency. Everything is null, with a reason, where not known. */
export interface MarkerReading {
  readonly caseName: string | null;
  readonly frequencyHz: number;
  /** Against the source, power waves. */
  readonly reflection: Complex | null;
  /** (Zin − z0)/(Zin + z0). */
  readonly chartReflection: Complex | null;
  /** Infinite where the input is open. */
  readonly impedanceOhm: Complex | null;
  /** May be infinite, like the figures below. */
  readonly returnLossDb: number | null;
  /** NaN where |Γ| is above 1. */
  readonly vswr: number | null;
  readonly gainDb: number | null;
  /** NaN where no power enters the ladder. */
  readonly efficiency: number | null;
  readonly reason: string | null;
}

/** What each case does at one frequency (Hz, > 0), worked out there and not read off the sweep. */
export function markerReading(problem: Problem, frequencyHz: number, codes?: TunableCodes): readonly MarkerReading[] {
  const samples = sampler(problem, studiedLadder(problem, codes));
  const place = { key: 'marker', frequencyHz: Float64Array.of(frequencyHz), band: null };
  return problem.cases.map((_, at) => {
    const trace = samples.trace(place, at);
    if (trace.reason !== null) return { caseName: trace.caseName, frequencyHz, ...nothing, reason: trace.reason };
    const reflection = first(trace.reflection());
    const magnitude = Math.hypot(reflection.re, reflection.im);
    return {
      caseName: trace.caseName,
      frequencyHz,
      reflection,
      chartReflection: first(reflectionOf(trace.input(), problem.z0Ohm)),
      impedanceOhm: first(impedanceOf(trace.input())),
      returnLossDb: returnLossDb(magnitude),
      vswr: vswrOf(magnitude),
      gainDb: decibels(trace.gain()[0]),
      efficiency: trace.efficiency()[0],
      reason: null,
    };
  });
}

const nothing = { reflection: null, chartReflection: null, impedanceOhm: null, returnLossDb: null, vswr: null, gainDb: null, efficiency: null };

const first = (values: ComplexArray): Complex => ({ re: values.re[0], im: values.im[0] });
