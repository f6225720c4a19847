/** The worst value met so far: of equal ones the first frequency, then the first case. */
export interface Worst {
  readonly value: number;
  readonly frequencyHz: number;
  readonly caseName: string | null;
}

/** `after` or `before`, whichever is worse; cases are to be offered in their own order. */
export function worseOf(before: Worst | null, after: Worst, smallIsBad: boolean): Worst {
  if (before === null) return after;
  if (after.value === before.value) return after.frequencyHz < before.frequencyHz ? after : before;
  return (smallIsBad ? after.value < before.value : after.value > before.value) ? after : before;
}

/** Index of the worst of several values, the first of equal ones; −1 where there is none. NaN counts as worst of all. */
export function worstIndex(values: Float64Array, smallIsBad: boolean): number {
  let at = -1;
  for (let k = 0; k < values.length; k++) {
    if (Number.isNaN(values[k])) return k;
    if (at < 0 || (smallIsBad ? values[k] < values[at] : values[k] > values[at])) at = k;
  }
  return at;
}
