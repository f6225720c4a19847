import { decibels, returnLossDb } from '../network/figures';
import type { BandCaseResult, BandResult } from './evaluation';
import { placeOfBand } from './place';
import { aboveTotal, settledReflection, vswrOf } from './reflectionFigures';
import type { Sampler, Trace } from './sampler';

/** The worst of each band in each case, watched bands included. */
export function bandResults(sampler: Sampler): readonly BandResult[] {
  const { bands, cases } = sampler.problem;
  return bands.map((band) => ({
    name: band.name,
    startHz: band.frequencyHz[0],
    stopHz: band.frequencyHz[band.frequencyHz.length - 1],
    cases: cases.map((_, at) => bandCase(sampler.trace(placeOfBand(band), at))),
  }));
}

function bandCase(trace: Trace): BandCaseResult {
  const nothing = { worstReflection: null, worstReturnLossDb: null, worstVswr: null, worstGainDb: null, atHz: null };
  if (trace.reason !== null) return { caseName: trace.caseName, ...nothing, reason: trace.reason };
  const reflection = trace.reflection();
  const gain = trace.gain();
  let worst = -1;
  let at = 0;
  let least = Infinity;
  for (let k = 0; k < gain.length; k++) {
    const size = settledReflection(Math.hypot(reflection.re[k], reflection.im[k]));
    if (size > worst) {
      worst = size;
      at = k;
    }
    if (gain[k] < least) least = gain[k];
  }
  return {
    caseName: trace.caseName,
    worstReflection: worst,
    worstReturnLossDb: finiteOrNull(returnLossDb(worst)),
    worstVswr: finiteOrNull(vswrOf(worst)),
    worstGainDb: finiteOrNull(decibels(least)),
    atHz: trace.frequencyHz[at],
    reason: Number.isNaN(vswrOf(worst)) ? aboveTotal : null,
  };
}

const finiteOrNull = (value: number): number | null => (Number.isFinite(value) ? value : null);
