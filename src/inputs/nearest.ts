/** Letters to change, add or drop to make one word of the other (Levenshtein 1966). */
const editDistance = (a: string, b: string): number => {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++)
      next[j] = Math.min(row[j] + 1, next[j - 1] + 1, row[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1));
    row = next;
  }
  return row[b.length];
};

const bare = (word: string): string => word.toLowerCase().replace(/[\s_-]/g, '');

/** The known word nearest to `word`, case and hyphens aside; null where none is near (a third of its letters). */
export const nearest = <T extends string>(word: string, known: readonly T[], within?: number): T | null => {
  const written = bare(word.slice(0, 60)); // a longer word is no near miss, and would only cost time
  const reach = within ?? Math.max(2, Math.floor(written.length / 3));
  let best: T | null = null;
  let least = reach + 1;
  for (const candidate of known) {
    const distance = editDistance(written, bare(candidate));
    if (distance < least && distance < candidate.length) [best, least] = [candidate, distance];
  }
  return best;
};
