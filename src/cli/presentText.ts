import { readFileSync } from 'node:fs';
import { CallError } from './callError';
import { shownPath } from './findDescriptions';

/** What lies at a path; null where nothing does. What cannot be read makes the call wrong. */
export function presentText(path: string): string | null {
  try {
    return readFileSync(path, 'utf8');
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'ENOENT' || code === 'ENOTDIR') return null;
    throw new CallError(`${shownPath(path)}: cannot be read (${code ?? String(error)})`);
  }
}
