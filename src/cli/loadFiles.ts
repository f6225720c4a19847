import { closeSync, fstatSync, openSync, readdirSync, readSync, statSync } from 'node:fs';
import { dirname, isAbsolute, join, resolve } from 'node:path';
import type { FileReference, LoadedFile, LoadedFiles } from '../description/files';
import { filesNeeded } from '../assistance/assess';
import type { Description } from '../description/description';
import { touchstoneReader } from '../network/touchstone/readTouchstone';
import { textOfFile } from './textOfFile';

const chunkBytes = 1 << 20;
/** A drawer may name further files; more rounds than this would be a circle. */
const maxRounds = 4;
const maxCsvBytes = 16 << 20;

/** Reads every file that a description names, relative to the folders in turn. The command line is trusted: any path will do. */
export function loadFiles(description: Description, folders: readonly string[]): LoadedFiles {
  const files = new Map<string, LoadedFile>();
  for (let round = 0; round < maxRounds; round++) {
    const needed = filesNeeded(description, files).filter((reference) => !files.has(reference.path));
    if (needed.length === 0) break;
    for (const reference of needed) files.set(reference.path, loadOne(reference, folders));
  }
  return files;
}

function loadOne(reference: FileReference, folders: readonly string[]): LoadedFile {
  if (reference.kind === 'pattern') return loadPattern(reference.path, folders);
  for (const folder of folders) {
    const path = isAbsolute(reference.path) ? reference.path : resolve(folder, reference.path);
    try {
      if (!statSync(path).isFile()) continue;
    } catch {
      continue; // Not there: the next folder, and in the end «missing», which the reader reports at its place.
    }
    try {
      return reference.kind === 'csv' ? readDrawer(path) : readNetwork(path);
    } catch (error) {
      return { form: 'unreadable', message: `cannot be read (${(error as NodeJS.ErrnoException).code ?? String(error)})`, line: null };
    }
  }
  return { form: 'missing' };
}

function readDrawer(path: string): LoadedFile {
  if (statSync(path).size > maxCsvBytes) return { form: 'unreadable', message: 'is larger than a drawer may be (16 MiB)', line: null };
  return { form: 'csv', text: textOfFile(path).text };
}

/** In chunks, so that a large file is never held whole beside its numbers. */
function readNetwork(path: string): LoadedFile {
  const reader = touchstoneReader(path);
  const handle = openSync(path, 'r');
  // Most measurements are some kilobytes: no need to clear a megabyte for each.
  const size = Math.min(chunkBytes, fstatSync(handle).size + 1);
  const buffer = new Uint8Array(size); // the reader keeps nothing of it
  try {
    for (;;) {
      const count = readSync(handle, buffer, 0, size, null);
      if (count === 0) break;
      reader.push(buffer.subarray(0, count));
    }
  } finally {
    closeSync(handle);
  }
  const result = reader.finish();
  return result.ok
    ? { form: 'touchstone', data: result.data, warnings: result.warnings.map((warning) => `line ${warning.line}: ${warning.message}`) }
    : { form: 'unreadable', message: result.problem.message, line: result.problem.line };
}

/** `vendor/*.s2p`: a star in the last part of the path only, in the order of the names. */
function loadPattern(pattern: string, folders: readonly string[]): LoadedFile {
  const within = dirname(pattern);
  const name = pattern.slice(pattern.lastIndexOf('/') + 1);
  const matcher = new RegExp(`^${name.split('*').map((piece) => piece.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')).join('.*')}$`, 'i');
  for (const folder of folders) {
    let names: string[];
    try {
      names = readdirSync(resolve(folder, within));
    } catch {
      continue; // As for a file: the next folder, then «missing».
    }
    return { form: 'pattern', paths: names.filter((entry) => matcher.test(entry)).sort().map((entry) => join(within, entry).split('\\').join('/')) };
  }
  return { form: 'missing' };
}
