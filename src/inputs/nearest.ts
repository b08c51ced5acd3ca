import { editDistance } from '../shared/index.ts';

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
