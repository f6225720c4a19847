/** Files of more ports are refused by name. */
export const portsAtMost = 4;
/** A whole point of the largest matrix on one line. */
export const numbersPerLine = 1 + 2 * portsAtMost * portsAtMost;
/** Bytes; a longer line is no text. */
export const lineAtMost = 1 << 16;
/** No number that anyone writes is longer. */
export const numberAtMost = 400;
/** Each is said once, at the first line that gives cause for it. */
export const warningsAtMost = 20;
