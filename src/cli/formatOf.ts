import { CallError } from './callError';

/** The format asked for, the first of `known` where none is. */
export function formatOf<T extends string>(asked: string | undefined, known: readonly T[]): T {
  const found = known.find((format) => format === (asked ?? known[0]));
  if (!found) throw new CallError(`there is no format «${asked}» here; there are ${known.join(', ')}`);
  return found;
}
