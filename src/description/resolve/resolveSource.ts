import { reflectionOf, sampleImpedance } from '../../network/immittance';
import type { Impedance } from '../../network/impedance';
import type { Band, SourcePort } from '../../study/problem';
import type { DescriptionSyntax, SourceSyntax } from '../syntax';
import { conjugateImpedance } from './conjugateImpedance';
import { findName, reportTwice } from './findName';
import { problemAt, type Resolution } from './resolution';
import { resolveImpedance } from './resolveImpedance';

/** The port's own impedance, by band where the description says so; z0 where it says nothing. */
export function resolveSource(syntax: DescriptionSyntax, bands: readonly Band[], resolution: Resolution): SourcePort {
  const standard: Impedance = { form: 'constant', impedanceOhm: { re: resolution.z0Ohm, im: 0 } };
  const names = [...bands.map((band) => band.name), ...syntax.bands.map((band) => band.name.value)];
  const byBand = new Map<string, Impedance>();
  let impedance: Impedance = standard;
  reportTwice(syntax.sources.flatMap((source) => source.band ?? []), 'band', resolution.report);
  for (const source of syntax.sources) {
    const { band } = source;
    if (band && !findName(band, names, 'band', resolution.report)) continue;
    const points = band ? bands.filter((each) => each.name === band.value) : bands;
    const made = portImpedance(source, points, resolution);
    if (!band) impedance = made;
    else if (!byBand.has(band.value)) byBand.set(band.value, made);
  }
  return { impedance, byBand };
}

function portImpedance(source: SourceSyntax, bands: readonly Band[], resolution: Resolution): Impedance {
  const { report, z0Ohm } = resolution;
  const stated = resolveImpedance(source.impedance, resolution);
  const own = source.wants ? conjugateImpedance(stated) : stated;
  if (!own) {
    report(problemAt('wants-network', '«wants» takes an impedance such as 18 - j22 Ω, a gamma or a file: no coil or capacitor has the conjugate impedance at every frequency.', source.impedance.span));
    return { form: 'unknown', reason: 'the source could not be read' };
  }
  for (const { frequencyHz } of bands) {
    const sampled = sampleImpedance(own, frequencyHz);
    const { re, im } = reflectionOf(sampled, z0Ohm);
    if (frequencyHz.some((_, k) => sampled.known[k] === 1 && !(Math.hypot(re[k], im[k]) < 1 - 1e-12))) {
      report(problemAt('source-not-positive', 'The real part of the source impedance is above zero.', source.impedance.span));
      return { form: 'unknown', reason: 'the source has no positive real part' };
    }
  }
  return own;
}
