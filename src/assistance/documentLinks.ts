import type { Span } from '../base/span';
import type { Description } from '../description/description';

/** Each file that the description names, with its path as written. Patterns lead nowhere. */
export function documentLinks({ files }: Description): { span: Span; path: string }[] {
  return files.filter(({ kind, within }) => kind !== 'pattern' && within === null).map(({ span, path }) => ({ span, path }));
}
