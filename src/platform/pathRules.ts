/** A path cut at its separators, from the root of whatever it is in: `/home/a` is `['home', 'a']`. */
export type PathSegments = readonly string[];

export const pathSegments = (path: string): PathSegments => path.split('/').filter((segment) => segment !== '');

/**
 * Where a path as written in a description leads, seen from `folder`. A backslash separates too: on Windows the file system
 * reads it so, and whoever checks a path must not see less than who opens it. An absolute path starts over at the root.
 * Null where it climbs above the root or holds a NUL.
 */
export function resolveReference(folder: PathSegments, reference: string): PathSegments | null {
  if (reference.includes('\0')) return null;
  const written = reference.replaceAll('\\', '/');
  const resolved: string[] = isAbsolute(written) ? [] : [...folder];
  for (const segment of pathSegments(written)) {
    if (segment === '.') continue;
    if (segment !== '..') resolved.push(segment);
    else if (resolved.pop() === undefined) return null;
  }
  return resolved;
}

const isAbsolute = (path: string): boolean => path.startsWith('/') || /^[A-Za-z]:/.test(path);

/** True for the folder itself and for what is in it, at any depth. Segments are compared, so `boards-old` is not in `boards`. */
export function isInside(folder: PathSegments, path: PathSegments): boolean {
  return path.length >= folder.length && folder.every((segment, i) => segment === path[i]);
}

/** Whether a name fits a pattern in which `*` stands for any run of characters and `?` for one. Takes time linear in pattern × name. */
export function fitsPattern(pattern: string, name: string): boolean {
  let at = 0;
  let p = 0;
  let star = -1;
  let starAt = 0;
  while (at < name.length) {
    if (p < pattern.length && pattern[p] === '*') {
      star = p++;
      starAt = at;
    } else if (p < pattern.length && (pattern[p] === '?' || pattern[p] === name[at])) {
      p++;
      at++;
    } else if (star >= 0) {
      p = star + 1;
      at = ++starAt;
    } else {
      return false;
    }
  }
  while (pattern[p] === '*') p++;
  return p === pattern.length;
}
