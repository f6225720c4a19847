import type { ComplexArray } from '../network/complex';
import { decibels } from '../network/figures';
import { impedanceOf, reflectionOf } from '../network/immittance';
import type { CaseTrace } from './evaluation';
import type { Trace } from './sampler';

/** One load case over the sweep, as it is plotted. Points that are not known hold NaN in every list. */
export function traceCase(trace: Trace, z0Ohm: number): CaseTrace {
  const { known } = trace;
  return {
    caseName: trace.caseName,
    known,
    reason: trace.reason,
    reflection: blankComplex(trace.reflection(), known),
    chartReflection: blankComplex(reflectionOf(trace.input(), z0Ohm), known),
    impedanceOhm: blankComplex(impedanceOf(trace.input()), known),
    gainDb: trace.gain().map((ratio, k) => (known[k] ? decibels(ratio) : NaN)),
    efficiency: trace.efficiency().map((share, k) => (known[k] ? share : NaN)),
  };
}

function blankComplex(values: ComplexArray, known: Uint8Array): ComplexArray {
  return { re: values.re.map((value, k) => (known[k] ? value : NaN)), im: values.im.map((value, k) => (known[k] ? value : NaN)) };
}
