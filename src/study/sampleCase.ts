import { removeFixture } from '../network/cascade';
import { complexArray } from '../network/complex';
import { sampleImpedance, type Immittance } from '../network/immittance';
import type { Impedance } from '../network/impedance';
import type { Band, LoadCase, SourcePort } from './problem';

/**
 * What a load case is at `frequencyHz`. The fixture is removed from a load that is a Touchstone file and from nothing
 * else. Points that the file does not cover are not known.
 */
export function sampleLoad(loadCase: LoadCase, frequencyHz: Float64Array): Immittance {
  const seen = sampleImpedance(loadCase.load, frequencyHz);
  if (loadCase.load.form !== 'file' || loadCase.fixture.length === 0) return seen;
  return removeFixture(seen, loadCase.fixture, frequencyHz);
}

/**
 * The source's own impedance at `frequencyHz`. With an impedance by band each frequency takes that of the first band that
 * holds it, or else that of the band nearest to it on a logarithmic scale. `band` names a band whose points are judged:
 * all of them take that band's, also where bands overlap.
 */
export function sampleSource(source: SourcePort, bands: readonly Band[], frequencyHz: Float64Array, band: string | null = null): Immittance {
  if (source.byBand.size === 0) return sampleImpedance(source.impedance, frequencyHz);
  if (band !== null) return sampleImpedance(source.byBand.get(band) ?? source.impedance, frequencyHz);
  const owners: Impedance[] = [];
  for (let k = 0; k < frequencyHz.length; k++) {
    const nearest = nearestBand(source.nearestAmong ?? bands, frequencyHz[k]);
    owners.push((nearest && source.byBand.get(nearest.name)) ?? source.impedance);
  }
  return sampleEach(owners, frequencyHz);
}

/** The first band that holds the frequency, or the one that is fewest octaves away; null without bands. */
export function nearestBand(bands: readonly Band[], frequencyHz: number): Band | null {
  let nearest: Band | null = null;
  let least = Infinity;
  for (const band of bands) {
    const startHz = band.frequencyHz[0];
    const stopHz = band.frequencyHz[band.frequencyHz.length - 1];
    const distance = frequencyHz < startHz ? Math.log(startHz / frequencyHz) : frequencyHz > stopHz ? Math.log(frequencyHz / stopHz) : 0;
    if (distance < least) {
      least = distance;
      nearest = band;
    }
  }
  return nearest;
}

/** Each point from its own impedance: those that share one are sampled together. */
function sampleEach(owners: readonly Impedance[], frequencyHz: Float64Array): Immittance {
  const numerator = complexArray(frequencyHz.length);
  const denominator = complexArray(frequencyHz.length);
  const known = new Uint8Array(frequencyHz.length);
  let reason: string | null = null;
  for (const owner of new Set(owners)) {
    const places = owners.flatMap((each, k) => (each === owner ? [k] : []));
    const part = sampleImpedance(owner, Float64Array.from(places, (k) => frequencyHz[k]));
    reason ??= part.reason;
    places.forEach((k, at) => {
      numerator.re[k] = part.numerator.re[at];
      numerator.im[k] = part.numerator.im[at];
      denominator.re[k] = part.denominator.re[at];
      denominator.im[k] = part.denominator.im[at];
      known[k] = part.known[at];
    });
  }
  return { numerator, denominator, known, reason };
}
