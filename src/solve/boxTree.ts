/** Points of a few dimensions, ordered so that those inside a box are found fast (a k-d tree: Bentley, CACM 18(9), 1975). */
export interface BoxTree {
  readonly count: number;
  /** The point at each position of the tree, by its number in the order in which they were given. */
  readonly order: Int32Array;
  /** Coordinates by position: position·dimensions + d. */
  readonly coordinates: Float64Array;
  /** Writes the positions of all points inside lower … upper (both included) into `found` and returns how many; looks at `visited()` nodes. */
  find(lower: Float64Array, upper: Float64Array, found: Int32Array): number;
  /** Nodes and points looked at by all calls so far. */
  visited(): number;
}

const leafSize = 12;

/** `coordinates`: point·dimensions + d, finite. Points outside of `within` are left out, if it is given. */
export function boxTree(coordinates: Float64Array, given: number, dimensions: number, within?: { readonly least: Float64Array; readonly largest: Float64Array }): BoxTree {
  const kept = new Int32Array(given);
  let count = 0;
  for (let i = 0; i < given; i++) {
    let inside = true;
    for (let d = 0; within !== undefined && inside && d < dimensions; d++) {
      const value = coordinates[i * dimensions + d];
      inside = value >= within.least[d] && value <= within.largest[d];
    }
    if (inside) kept[count++] = i;
  }
  const order = kept.subarray(0, count);
  // Where each node is cut, by the position of the cut: no two nodes are cut at the same one.
  const cuts = new Float64Array(count);
  split(coordinates, dimensions, order, cuts, 0, count, 0);
  const sorted = new Float64Array(count * dimensions);
  for (let i = 0; i < count; i++) {
    for (let d = 0; d < dimensions; d++) sorted[i * dimensions + d] = coordinates[order[i] * dimensions + d];
  }
  // Starts, ends and depths of what is still to be looked at.
  const stack = new Int32Array(3 * 64);
  let visited = 0;

  function find(lower: Float64Array, upper: Float64Array, found: Int32Array): number {
    let size = 0;
    let top = 0;
    let start = 0;
    let end = count;
    let depth = 0;
    for (;;) {
      visited++;
      if (end - start <= leafSize) {
        for (let i = start; i < end; i++) {
          let inside = true;
          for (let d = 0, at = i * dimensions; d < dimensions; d++, at++) {
            const value = sorted[at];
            if (value < lower[d] || value > upper[d]) {
              inside = false;
              break;
            }
          }
          if (inside) found[size++] = i;
        }
        visited += end - start;
      } else {
        const d = depth % dimensions;
        const middle = (start + end) >> 1;
        const value = cuts[middle];
        depth++;
        if (lower[d] <= value) {
          if (upper[d] >= value) {
            stack[top++] = middle;
            stack[top++] = end;
            stack[top++] = depth;
          }
          end = middle;
          continue;
        }
        if (upper[d] >= value) {
          start = middle;
          continue;
        }
      }
      if (top === 0) return size;
      depth = stack[--top];
      end = stack[--top];
      start = stack[--top];
    }
  }
  return { count, order, coordinates: sorted, find, visited: () => visited };
}

/** Orders start … end so that the middle one is where sorting by the depth's dimension would put it, and so on in both halves. */
function split(coordinates: Float64Array, dimensions: number, order: Int32Array, cuts: Float64Array, start: number, end: number, depth: number): void {
  if (end - start <= leafSize) return;
  const middle = (start + end) >> 1;
  select(coordinates, dimensions, depth % dimensions, order, start, end - 1, middle);
  cuts[middle] = coordinates[order[middle] * dimensions + (depth % dimensions)];
  split(coordinates, dimensions, order, cuts, start, middle, depth + 1);
  split(coordinates, dimensions, order, cuts, middle, end, depth + 1);
}

/** Hoare's selection, with the middle of three as pivot. */
function select(coordinates: Float64Array, dimensions: number, d: number, order: Int32Array, from: number, to: number, wanted: number): void {
  const key = (i: number): number => coordinates[order[i] * dimensions + d];
  let left = from;
  let right = to;
  while (right > left) {
    const a = key(left);
    const b = key((left + right) >> 1);
    const c = key(right);
    const pivot = a < b ? (b < c ? b : a < c ? c : a) : a < c ? a : b < c ? c : b;
    let i = left;
    let j = right;
    while (i <= j) {
      while (coordinates[order[i] * dimensions + d] < pivot) i++;
      while (coordinates[order[j] * dimensions + d] > pivot) j--;
      if (i <= j) {
        const swapped = order[i];
        order[i++] = order[j];
        order[j--] = swapped;
      }
    }
    if (wanted <= j) right = j;
    else if (wanted >= i) left = i;
    else return;
  }
}
