import { existsSync, readdirSync, readFileSync, statSync, type Dirent } from 'node:fs';
import { dirname, join, relative, resolve, sep } from 'node:path';
import ignore, { type Ignore } from 'ignore';
import { CallError } from './callError';

/** Relative to the working folder, with `/`. */
export const shownPath = (path: string): string => relative(process.cwd(), path).split(sep).join('/');

export const isDescriptionName = (name: string): boolean => /\.match\.ya?ml$/i.test(name);

/**
 * Paths as called: a file stands for itself, a folder for every description under it, except what lies in `node_modules`,
 * `.git` or what a `.gitignore` on the way (up to the repository's top) leaves out. In the order of the call, then of the names.
 * Nothing at all is told, since a check of nothing would pass unnoticed.
 */
export function findDescriptions(paths: readonly string[], tell: (message: string) => void): string[] {
  const found = new Set<string>();
  for (const path of paths) {
    let folder: boolean;
    try {
      folder = statSync(path).isDirectory();
    } catch {
      throw new CallError(`${path}: there is no such file or folder`);
    }
    if (folder) walk(resolve(path), ignoresAbove(resolve(path)), found);
    else found.add(resolve(path));
  }
  if (found.size === 0) tell(`ohmward: there is no description (*.match.yaml, *.match.yml) under ${paths.join(', ')}\n`);
  return [...found];
}

interface IgnoreFile {
  readonly folder: string;
  readonly rules: Ignore;
}

function ignoresAbove(folder: string): IgnoreFile[] {
  const chain: IgnoreFile[] = [];
  for (let at = folder; ; at = dirname(at)) {
    if (at !== folder) chain.unshift(...ignoreFileOf(at));
    if (existsSync(join(at, '.git'))) return chain;
    // Outside a repository only what lies below the folder itself counts.
    if (dirname(at) === at) return [];
  }
}

function ignoreFileOf(folder: string): IgnoreFile[] {
  const path = join(folder, '.gitignore');
  return existsSync(path) ? [{ folder, rules: ignore().add(readFileSync(path, 'utf8')) }] : [];
}

function isIgnored(path: string, isFolder: boolean, chain: readonly IgnoreFile[]): boolean {
  let ignored = false;
  for (const { folder, rules } of chain) {
    const inside = relative(folder, path).split(sep).join('/') + (isFolder ? '/' : '');
    const verdict = rules.test(inside);
    if (verdict.ignored) ignored = true;
    else if (verdict.unignored) ignored = false;
  }
  return ignored;
}

function walk(folder: string, above: readonly IgnoreFile[], found: Set<string>): void {
  const chain = [...above, ...ignoreFileOf(folder)];
  const entries = entriesOf(folder).sort((a, b) => (a.name < b.name ? -1 : 1));
  for (const entry of entries) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) {
      if (entry.name !== 'node_modules' && entry.name !== '.git' && !isIgnored(path, true, chain)) walk(path, chain, found);
    } else if (isDescriptionName(entry.name) && (entry.isFile() || leadsToFile(entry, path)) && !isIgnored(path, false, chain)) {
      found.add(path);
    }
  }
}

function entriesOf(folder: string): Dirent[] {
  try {
    return readdirSync(folder, { withFileTypes: true });
  } catch (error) {
    throw new CallError(`${shownPath(folder)}: the folder cannot be read (${(error as NodeJS.ErrnoException).code ?? String(error)})`);
  }
}

/** A link to a file counts as the file; links to folders are not followed, since they may lead round in circles. */
function leadsToFile(entry: Dirent, path: string): boolean {
  return entry.isSymbolicLink() && (statSync(path, { throwIfNoEntry: false })?.isFile() ?? false);
}
