import { statSync } from 'node:fs';
import { assessDescription, type Assessment } from '../assistance/assess';
import { readDescription } from '../description/readDescription';
import { CallError } from './callError';
import { shownPath } from './findDescriptions';
import { loadFiles } from './loadFiles';
import { textOfFile, type TextOfFile } from './textOfFile';

const maxDescriptionBytes = 8 << 20;

/** Text of a description; a file that cannot be read makes the call wrong. */
export const readText = (path: string): string => readTextFile(path).text;

/** The same, and whether it may be written back. */
export function readTextFile(path: string): TextOfFile {
  try {
    if (statSync(path).size > maxDescriptionBytes) throw new CallError(`${shownPath(path)}: larger than a description may be (8 MiB)`);
    return textOfFile(path);
  } catch (error) {
    if (error instanceof CallError) throw error;
    const { code } = error as NodeJS.ErrnoException;
    throw new CallError(`${shownPath(path)}: ${code === 'ENOENT' ? 'there is no such file' : `cannot be read (${code ?? String(error)})`}`);
  }
}

/** Its files are looked for in `folders`, in turn. */
export function assessFile(path: string, folders: readonly string[]): Assessment {
  const description = readDescription(readText(path), { expressions: true });
  return assessDescription(description, loadFiles(description, folders));
}
