export interface Timing {
  readonly runs: number;
  /** Each run repeats the work as often as takes at least this long, and divides. */
  readonly leastMs: number;
}

/**
 * Median time of one call of `work` in nanoseconds. Warm-up and the number of calls that fill a run come first; the clock is
 * read once a run. `work` takes the number of the call.
 */
export function medianTimeNs(work: (call: number) => void, { runs, leastMs }: Timing = { runs: 15, leastMs: 40 }): number {
  const time = (calls: number): number => {
    const start = process.hrtime.bigint();
    for (let call = 0; call < calls; call++) work(call);
    return Number(process.hrtime.bigint() - start);
  };
  let calls = 1;
  while (time(calls) < leastMs * 1e6 && calls < 2 ** 24) calls *= 2;
  return median(Array.from({ length: runs }, () => time(calls) / calls));
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
