import type { Span } from '../base/span';
import type { NetworkData } from '../network/networkData';

/** A file that a description names. `path` is as written there, `/` between folders, relative to the description. */
export interface FileReference {
  readonly path: string;
  readonly span: Span;
  /** `pattern`: `vendor/*.s2p`. */
  readonly kind: 'touchstone' | 'csv' | 'pattern';
  /** The description's own path for CSV rows that name files: the CSV's path. Null where the description names it. */
  readonly within: string | null;
}

/** What whoever owns the disk found there. */
export type LoadedFile =
  | { readonly form: 'touchstone'; readonly data: NetworkData; readonly warnings: readonly string[] }
  /** Read, but not a Touchstone file that can be used: `line` from 1. */
  | { readonly form: 'unreadable'; readonly message: string; readonly line: number | null }
  | { readonly form: 'csv'; readonly text: string }
  | { readonly form: 'pattern'; readonly paths: readonly string[] }
  | { readonly form: 'missing' }
  /** Not to be read here, e.g. outside the folder of an untrusted workspace. */
  | { readonly form: 'refused'; readonly reason: string };

/** Files by the path as written. A path that is not in the map has not been read yet. */
export type LoadedFiles = ReadonlyMap<string, LoadedFile>;
