import { readFileSync } from 'node:fs';
import { CallError } from './callError';
import { shownPath } from './findDescriptions';

/** What lies at a path; null where nothing does, `folder` for one that is no file. What cannot be read makes the call wrong. */
export function presentText(path: string): { readonly text: string } | 'folder' | null {
  try {
    return { text: readFileSync(path, 'utf8') };
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'EISDIR') return 'folder';
    if (code === 'ENOENT' || code === 'ENOTDIR') return null;
    throw new CallError(`${shownPath(path)}: cannot be read (${code ?? String(error)})`);
  }
}
