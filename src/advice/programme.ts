import type { AdviceMount } from './input.ts';
import { isTracker, listWords } from './words.ts';

const FACTORS: readonly string[] = ['TOF', 'TSRF'];

/** `TOF and TSRF`: the factors of which the programme demands a minimum of the fixed mounts; empty where it demands none. */
const demanded = (mounts: readonly AdviceMount[]): string[] =>
  FACTORS.filter((name) =>
    mounts.some((m) => m.limits.some((limit) => limit.bound === 'least' && limit.name === name)),
  );

/**
 * `TOF and TSRF do not apply to a tracker`, where the programme demands a minimum that no tracker was held against;
 * null for a fixed mount or without a programme.
 */
export const notHeldAgainst = (m: AdviceMount, mounts: readonly AdviceMount[]): string | null => {
  const factors = demanded(mounts);
  if (!isTracker(m) || factors.length === 0) return null;
  return `${listWords(factors)} ${factors.length > 1 ? 'do' : 'does'} not apply to a tracker`;
};
