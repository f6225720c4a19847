import type { ChannelCodes } from '../study/tuning/bestCodes';

/** A description and the codes of its channels. */
export interface CodedFile {
  /** Relative to the working folder, with `/`. */
  readonly path: string;
  readonly channels: readonly ChannelCodes[];
  /** Why there are none; null where there are. */
  readonly reason: string | null;
}

/**
 * The result of `codes` for programs: version 1. Hz and dB; `worstReflection` is |Γ| against the source at the channel; `null`
 * with a `reason` beside it is not known, without is infinite. `steps`: the margin one code lower and higher, null at an end.
 */
export function codesJson(files: readonly CodedFile[]): object {
  return { version: 1, files: files.map(({ path, channels, reason }) => ({ path, channels: channels.map(channelJson), ...because(reason) })) };
}

const finite = (value: number | null): number | null => (value !== null && Number.isFinite(value) ? value : null);
const because = (reason: string | null): object => (reason === null ? {} : { reason });

function channelJson({ frequencyHz, codes, worstReflection, worstGainDb, marginDb, conditionsMissed, steps, proved, reason }: ChannelCodes): object {
  return {
    frequency: frequencyHz, codes: Object.fromEntries(codes), worstReflection: finite(worstReflection), worstGain: finite(worstGainDb), margin: finite(marginDb),
    conditionsMissed, proved, steps: Object.fromEntries(steps.map(({ tunable, lowerDb, higherDb }) => [tunable, { lower: finite(lowerDb), higher: finite(higherDb) }])),
    ...because(reason),
  };
}
