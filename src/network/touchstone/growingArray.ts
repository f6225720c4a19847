/** Numbers in a typed array that doubles as it fills. */
export interface GrowingArray {
  push(value: number): void;
  readonly length: number;
  at(index: number): number;
  /** A copy without slack. */
  trimmed(): Float64Array;
}

export function growingArray(): GrowingArray {
  let values = new Float64Array(256);
  let length = 0;
  return {
    push(value) {
      if (length === values.length) {
        // By half, not double: a file of 100 MB must fit into three times its size.
        const larger = new Float64Array(Math.ceil(length * 1.5));
        larger.set(values);
        values = larger;
      }
      values[length++] = value;
    },
    get length() {
      return length;
    },
    at: (index) => values[index],
    trimmed: () => values.slice(0, length),
  };
}
