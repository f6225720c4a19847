import type { BandCaseResult, BandResult } from '../evaluation';
import type { Band } from '../problem';

/** The worst of each band over the channels; `byChannel` holds of each channel the bands that count there. */
export function mergeBands(bands: readonly Band[], byChannel: readonly (readonly BandResult[])[]): readonly BandResult[] {
  return bands.map(({ name, frequencyHz }) => {
    const found = byChannel.flatMap((results) => results.filter((result) => result.name === name));
    const [first] = found;
    return {
      name, startHz: frequencyHz[0], stopHz: frequencyHz[frequencyHz.length - 1],
      cases: first === undefined ? [] : first.cases.map((_, at) => found.map(({ cases }) => cases[at]).reduce(worseBandCase)),
    };
  });
}

const isUnknown = ({ worstReflection }: BandCaseResult): boolean => worstReflection === null;

/** The larger reflection with its place, and the lesser gain; what is not known somewhere is not known. */
function worseBandCase(before: BandCaseResult, after: BandCaseResult): BandCaseResult {
  if (isUnknown(before)) return before;
  if (isUnknown(after)) return after;
  const worse = (after.worstReflection ?? 0) > (before.worstReflection ?? 0) ? after : before;
  const worstGainDb = before.worstGainDb === null || after.worstGainDb === null ? null : Math.min(before.worstGainDb, after.worstGainDb);
  return { ...worse, worstGainDb };
}
