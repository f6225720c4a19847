import { lineAtMost } from './limits';
import { refuse } from './touchstoneResult';

/** Bytes start … end − 1 are a line without its end; they are gone after the call. */
export type TakeLine = (bytes: Uint8Array, start: number, end: number) => void;

export interface LineSplitter {
  push(chunk: Uint8Array): void;
  /** The last line, where it has no end. */
  finish(): void;
  /** Of the line at hand, from 1. */
  readonly line: number;
}

const lineFeed = 10;
const carriageReturn = 13;

/**
 * Cuts bytes that come in pieces into lines. CR, LF and CR LF end one, CR LF also where it falls between two pieces. Lines
 * inside a piece are not copied.
 */
export function lineSplitter(take: TakeLine): LineSplitter {
  let line = 0;
  /** The beginning of a line that goes on in the next piece. */
  let carry = new Uint8Array(256);
  let carried = 0;
  let afterReturn = false;

  const keep = (bytes: Uint8Array, start: number, end: number) => {
    const length = carried + end - start;
    if (length > lineAtMost) {
      line++;
      refuse(`the line is longer than ${lineAtMost} characters: this is not a Touchstone file`);
    }
    if (length > carry.length) {
      const larger = new Uint8Array(Math.max(length, 2 * carry.length));
      larger.set(carry.subarray(0, carried));
      carry = larger;
    }
    carry.set(bytes.subarray(start, end), carried);
    carried = length;
  };

  const end = (bytes: Uint8Array, start: number, stop: number) => {
    if (carried === 0 && stop - start <= lineAtMost) {
      line++;
      take(bytes, start, stop);
      return;
    }
    keep(bytes, start, stop);
    line++;
    const length = carried;
    carried = 0;
    take(carry, 0, length);
  };

  return {
    push(chunk) {
      let start = 0;
      for (let at = 0; at < chunk.length; at++) {
        const byte = chunk[at];
        if (byte > carriageReturn || (byte !== lineFeed && byte !== carriageReturn)) continue;
        const secondOfTwo = byte === lineFeed && at === start && carried === 0 && afterReturn;
        if (!secondOfTwo) end(chunk, start, at);
        afterReturn = byte === carriageReturn;
        start = at + 1;
      }
      if (start < chunk.length) {
        keep(chunk, start, chunk.length);
        afterReturn = false;
      }
    },
    finish() {
      if (carried > 0) end(new Uint8Array(0), 0, 0);
    },
    get line() {
      return line;
    },
  };
}
