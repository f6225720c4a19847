/** A half-open range of UTF-16 offsets into a text. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

/** A value together with the place in the text that it was read from. */
export interface Located<T> {
  readonly value: T;
  readonly span: Span;
}

/** Zero-based line and UTF-16 column, as editors count. */
export interface Position {
  readonly line: number;
  readonly character: number;
}

export const span = (start: number, end: number): Span => ({ start, end });

export const contains = (outer: Span, offset: number): boolean => outer.start <= offset && offset <= outer.end;

export const overlaps = (a: Span, b: Span): boolean => a.start < b.end && b.start < a.end;
