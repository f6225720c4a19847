import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, relative, resolve, sep } from 'node:path';
import ignore, { type Ignore } from 'ignore';
import { CallError } from './callError';

export const isDescriptionName = (name: string): boolean => /\.match\.ya?ml$/i.test(name);

/**
 * Paths as called: a file stands for itself, a folder for every description under it, except what lies in `node_modules`,
 * `.git` or what a `.gitignore` on the way (up to the repository's top) leaves out. In the order of the call, then of the names.
 */
export function findDescriptions(paths: readonly string[]): string[] {
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
  const entries = readdirSync(folder, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1));
  for (const entry of entries) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) {
      if (entry.name !== 'node_modules' && entry.name !== '.git' && !isIgnored(path, true, chain)) walk(path, chain, found);
    } else if (entry.isFile() && isDescriptionName(entry.name) && !isIgnored(path, false, chain)) {
      found.add(path);
    }
  }
}
