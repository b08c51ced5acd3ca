/** Letters to change, add, drop or swap with their neighbour (Damerau 1964, each letter moved at most once). */
const editDistance = (a: string, b: string): number => {
  const d = Array.from({ length: a.length + 1 }, (_, i) => [i]);
  for (let j = 1; j <= b.length; j++) d[0][j] = j;
  for (let i = 1; i <= a.length; i++)
    for (let j = 1; j <= b.length; j++) {
      const change = a[i - 1] === b[j - 1] ? 0 : 1;
      d[i][j] = Math.min(d[i - 1][j] + 1, d[i][j - 1] + 1, d[i - 1][j - 1] + change);
      const swapped = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1];
      if (swapped) d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
    }
  return d[a.length][b.length];
};

const bare = (word: string): string => word.toLowerCase().replace(/[\s_-]/g, '');

/** The known word nearest to `word`, case and hyphens aside; null where none is near (a third of its letters). */
export const nearest = <T extends string>(word: string, known: readonly T[], within?: number): T | null => {
  const written = bare(word.slice(0, 60)); // a longer word is no near miss, and would only cost time
  const reach = within ?? Math.max(2, Math.floor(written.length / 3));
  let best: T | null = null;
  let least = reach + 0.75;
  for (const candidate of known) {
    const other = bare(candidate);
    const sameStart = written[0] === other[0]; // few people mistype the first letter, so it breaks a tie
    const distance = editDistance(written, other) + (sameStart ? 0 : 0.5);
    if (distance < least && distance < candidate.length) [best, least] = [candidate, distance];
  }
  return best;
};
