import type { LimitStatus, MountResult } from '../shared/index.ts';
import { formatNumber } from './numbers.ts';
import { oneLine } from './plain-text.ts';

type Limit = MountResult['limits'][number];

const WORST_FIRST: readonly LimitStatus[] = ['broken', 'within_reading_error', 'not_checked', 'kept'];

const STATUS_WORDS: Record<Exclude<LimitStatus, 'broken'>, string> = {
  kept: 'within',
  within_reading_error: 'too near to tell',
  not_checked: 'not checked',
};
const BROKEN_WORDS: Record<Limit['bound'], string> = { most: 'exceeds', least: 'below' };

/** Limits with the one that matters most first. */
export const worstFirst = (limits: readonly Limit[]): Limit[] =>
  WORST_FIRST.flatMap((status) => limits.filter((limit) => limit.status === status));

/** Limits of one bound: lengths, heights and grades may be at most, a programme's factors must be at least. */
export const limitsOf = (mount: MountResult, bound: Limit['bound']): Limit[] =>
  worstFirst(mount.limits.filter((limit) => limit.bound === bound));

/** True for a limit of the ground's slope: a share, where the other things that may be at most so much are lengths. */
export const isGrade = ({ bound, name }: Limit): boolean => bound === 'most' && name.startsWith('slope ');

/** ` by 0.90 m`, ` by 3.8 points`; nothing where the results do not say by how much. */
const byHowMuch = (limit: Limit): string => {
  const { bound, value, asked } = limit;
  if (value === null || asked === null) return '';
  if (bound === 'most' && !isGrade(limit)) return ` by ${formatNumber(value - asked, 2)} m`;
  const points = formatNumber(100 * Math.abs(value - asked), 1);
  return points === '0.0' ? ' by under 0.1 points' : ` by ${points} points`;
};

/** `height within`, `height not checked`, `height exceeds by 0.90 m`, `TOF below by 3.8 points`; loud: `height EXCEEDS by`. */
export const limitWords = (limit: Limit, loud = false): string => {
  if (limit.status !== 'broken') return `${oneLine(limit.name)} ${STATUS_WORDS[limit.status]}`;
  const verb = BROKEN_WORDS[limit.bound];
  return `${oneLine(limit.name)} ${loud ? verb.toUpperCase() : verb}${byHowMuch(limit)}`;
};

/** All limits of a mount in a few words, the worst first; says so where the study gives none. */
export const limitsInWords = (mount: MountResult, loud = false): string =>
  mount.limits.length === 0
    ? 'no limit given'
    : worstFirst(mount.limits)
        .map((limit) => limitWords(limit, loud))
        .join(', ');
