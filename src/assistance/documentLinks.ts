import type { Span } from '../base/span';
import type { Description } from '../description/description';

export interface FileLink {
  readonly span: Span;
  /** As written, relative to the description. */
  readonly path: string;
}

/** Every place that names one file, in the order of the text: those that are read, and those that firmware tables go to. */
export function documentLinks({ files, syntax }: Description): FileLink[] {
  const read = files.filter(({ kind, within }) => kind !== 'pattern' && within === null);
  const written = [syntax.firmware?.header ?? null, syntax.firmware?.json ?? null].filter((path) => path !== null);
  return [
    ...read.map(({ path, span }) => ({ span, path })),
    ...written.map(({ value, span }) => ({ span, path: value })),
  ].filter(({ path }) => path !== '').sort((a, b) => a.span.start - b.span.start);
}
