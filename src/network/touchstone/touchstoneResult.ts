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
export class TouchstoneRefusal extends Error {
  /** `line` where the mistake stands on another line than the one being read. */
  constructor(message: string, readonly line?: number) {
    super(message);
  }
}

export function refuse(message: string, line?: number): never {
  throw new TouchstoneRefusal(message, line);
}

/** A word of the file inside a message. */
export const quoted = (word: string): string => `«${word.length > 40 ? `${word.slice(0, 40)}…` : word}»`;
