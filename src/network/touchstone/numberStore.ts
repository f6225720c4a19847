/** Numbers one after the other, in blocks, so that growing copies nothing. */
export interface NumberStore {
  push(value: number): void;
  readonly length: number;
  /** All of them in one array. Empties the store as it copies: at most one block is held twice. */
  drain(): Float64Array;
}

const firstBlock = 256;
const largestBlock = 1 << 16;

export function numberStore(): NumberStore {
  const full: (Float64Array | null)[] = [];
  let block = new Float64Array(firstBlock);
  let used = 0;
  let before = 0;
  return {
    push(value) {
      if (used === block.length) {
        full.push(block);
        before += used;
        block = new Float64Array(Math.min(4 * used, largestBlock));
        used = 0;
      }
      block[used++] = value;
    },
    get length() {
      return before + used;
    },
    drain() {
      const all = new Float64Array(before + used);
      let at = 0;
      for (let i = 0; i < full.length; i++) {
        all.set(full[i]!, at);
        at += full[i]!.length;
        full[i] = null;
      }
      all.set(block.subarray(0, used), at);
      full.length = 0;
      block = new Float64Array(firstBlock);
      used = before = 0;
      return all;
    },
  };
}
