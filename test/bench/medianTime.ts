export interface Timing {
  readonly runs: number;
  /** Each run repeats the work until this much time has passed, and divides. */
  readonly leastMs: number;
}

/** Median time of one call of `work` in nanoseconds, after as long a warm-up as one run. `work` takes the number of the call. */
export function medianTimeNs(work: (call: number) => void, { runs, leastMs }: Timing = { runs: 9, leastMs: 40 }): number {
  const once = (): number => {
    const start = process.hrtime.bigint();
    const end = start + BigInt(Math.round(leastMs * 1e6));
    let calls = 0;
    let now = start;
    do {
      work(calls++);
      now = process.hrtime.bigint();
    } while (now < end);
    return Number(now - start) / calls;
  };
  once();
  return median(Array.from({ length: runs }, once));
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
