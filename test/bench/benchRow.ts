/** One figure of a bench run: a ratio, so that it means the same on every machine, beside the bar it is held to. */
export interface BenchRow {
  readonly name: string;
  readonly ratio: number;
  /** What the ratio counts, e.g. `× faster than mathjs`. */
  readonly unit: string;
  readonly bar: number;
  readonly held: boolean;
}

/** What a file of this folder exports as `bench`. */
export type Bench = () => BenchRow[] | Promise<BenchRow[]>;

/** Good where the ratio reaches the bar. */
export const atLeast = (name: string, ratio: number, unit: string, bar: number): BenchRow => ({ name, ratio, unit, bar, held: ratio >= bar });

/** Good where the ratio stays within the bar. */
export const atMost = (name: string, ratio: number, unit: string, bar: number): BenchRow => ({ name, ratio, unit, bar, held: ratio <= bar });
