import { placeOfBand, stressedBands, type Place } from './place';
import type { Sampler } from './sampler';

/** Where the stress of elements is taken: in every band, but for a band that is only watched and not known in all cases. */
export function stressedPlaces(sampler: Sampler): readonly Place[] {
  const { problem } = sampler;
  const judged = new Set(stressedBands(problem));
  return problem.bands.flatMap((band) => {
    const place = placeOfBand(band);
    return judged.has(band) || problem.cases.every((_, at) => sampler.trace(place, at).reason === null) ? [place] : [];
  });
}
