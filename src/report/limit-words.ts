import type { LimitStatus, MountResult } from '../shared/index.ts';
import { formatNumber } from './numbers.ts';
import { oneLine } from './plain-text.ts';
import { LIMIT_WORDS } from './words.ts';

type Limit = MountResult['limits'][number];

const WORST_FIRST: readonly LimitStatus[] = ['broken', 'within_reading_error', 'not_checked', 'kept'];

/** Limits with the one that matters most first. */
export const worstFirst = (limits: readonly Limit[]): Limit[] =>
  WORST_FIRST.flatMap((status) => limits.filter((limit) => limit.status === status));

/** `height within`, `height not checked`, `height exceeds by 0.90 m`. */
export const limitWords = ({ name, status, excess_m }: Limit): string => {
  const over = status === 'broken' && excess_m !== null ? ` by ${formatNumber(excess_m, 2)} m` : '';
  return `${oneLine(name)} ${LIMIT_WORDS[status]}${over}`;
};

/** All limits of a mount in a few words, the worst first; says so where the study gives none. */
export const limitsInWords = (mount: MountResult): string =>
  mount.limits.length === 0 ? 'no limit given' : worstFirst(mount.limits).map(limitWords).join(', ');
