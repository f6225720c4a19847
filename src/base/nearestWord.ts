/** Characters to insert, delete, replace or swap with a neighbour to get from one word to the other. */
export function editDistance(a: string, b: string): number {
  const rows: number[][] = [Array.from({ length: b.length + 1 }, (_, j) => j)];
  for (let i = 1; i <= a.length; i++) {
    rows[i] = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1];
      let best = Math.min(rows[i - 1][j] + 1, rows[i][j - 1] + 1, rows[i - 1][j - 1] + (same ? 0 : 1));
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) best = Math.min(best, rows[i - 2][j - 2] + 1);
      rows[i][j] = best;
    }
  }
  return rows[a.length][b.length];
}

const longestWord = 60;

/**
 * The candidate that was probably meant by `word`: differing in case only, or by about one slip in three characters, begun ones counted. Null
 * where none is that near. Of equally near ones the first.
 */
export function nearestWord(word: string, candidates: readonly string[]): string | null {
  if (word.length > longestWord) return null;
  const lower = word.toLowerCase();
  let best: string | null = null;
  let least = Math.max(1, Math.floor((word.length + 2) / 3)) + 1;
  for (const candidate of candidates) {
    if (candidate.length > longestWord) continue;
    const distance = candidate.toLowerCase() === lower ? 0 : editDistance(lower, candidate.toLowerCase());
    if (distance < least) {
      least = distance;
      best = candidate;
    }
  }
  return best;
}
