import type { NetworkData } from '../networkData';

export interface TouchstoneProblem {
  readonly message: string;
  /** From 1. */
  readonly line: number;
}

export type TouchstoneResult =
  | { readonly ok: true; readonly data: NetworkData; readonly warnings: readonly TouchstoneProblem[]; readonly noisePoints: number }
  | { readonly ok: false; readonly problem: TouchstoneProblem };

/** Ends the reading of one file; caught by the reader, where it becomes the result. */
export class TouchstoneRefusal extends Error {}

export function refuse(message: string): never {
  throw new TouchstoneRefusal(message);
}
