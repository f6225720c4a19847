/** One ladder that was found. */
export interface Found {
  readonly shape: number;
  readonly index: number;
  readonly choice: Int32Array;
  readonly excess: number;
  readonly worstGain: number;
  /** Conditions missed. */
  readonly missed: number;
}

/** The best so many ladders, in order. */
export interface TopList {
  readonly found: readonly Found[];
  readonly full: boolean;
  /** Excess above which nothing can enter any more that misses no more conditions than `leastMissed`; Infinity until then. */
  readonly most: number;
  offer(ladder: Found): boolean;
}

/** Slack that covers how values are rounded for comparing. */
const roundingSlack = 2e-10;

/**
 * Fewest conditions missed, then the smallest excess, then the most gain, then the order of shapes and items. Excess and
 * gain are compared as ten digits, so that ladders that are equal but for rounding go by their order, on every machine.
 * `startingMost`: an excess that so many ladders are already known not to exceed.
 */
export function topList(size: number, leastMissed = 0, startingMost = Infinity): TopList {
  const found: Found[] = [];
  let most = startingMost;
  return {
    found,
    get full() {
      return found.length === size;
    },
    get most() {
      return most;
    },
    offer(ladder) {
      if (found.length === size && compareFound(ladder, found[size - 1]) >= 0) return false;
      let at = found.length;
      while (at > 0 && compareFound(ladder, found[at - 1]) < 0) at--;
      found.splice(at, 0, ladder);
      if (found.length > size) found.pop();
      const last = found[size - 1];
      if (last !== undefined && last.missed <= leastMissed) most = Math.min(most, last.excess * (1 + roundingSlack));
      return true;
    },
  };
}

export function compareFound(a: Found, b: Found): number {
  return a.missed - b.missed || compareRounded(a.excess, b.excess) || compareRounded(b.worstGain, a.worstGain) || a.shape - b.shape || a.index - b.index;
}

/** As ten significant digits. */
export function compareRounded(a: number, b: number): number {
  if (a === b) return 0;
  const x = Number(a.toPrecision(10));
  const y = Number(b.toPrecision(10));
  return x < y ? -1 : x > y ? 1 : 0;
}
