import type { Comparison, MountResult } from '../shared/index.ts';
import { formatNumber, formatPercent, formatUpTo } from './numbers.ts';
import { nameOf } from './words.ts';

const visitWords = (visits: number | null): string =>
  visits === null
    ? ''
    : `${formatUpTo(visits)} repair ${visits === 1 ? 'visit' : 'visits'} a year, listed and not priced`;

const stuckSentence = (name: string, m: MountResult): string => {
  if (m.downtime === null) return '';
  const { working, stuck, stuck_kwh_per_kw: energy, kept_while_stuck: kept } = m.downtime;
  const share = kept === null ? '' : `, ${formatPercent(kept)} of what it delivers working`;
  return (
    `${name} works ${formatUpTo(working * 100)} % of the time; else it is stuck ${stuck}: ` +
    `${formatNumber(energy)} kWh/kW in a year of it${share}`
  );
};

/** What each tracker does while it does not work, and how often someone must come; plain text, unescaped. */
export const downtimeSentences = (c: Comparison): string[] =>
  c.mounts.flatMap((m) => {
    const name = nameOf(c, m);
    const [stuck, visits] = [stuckSentence(name, m), visitWords(m.visits_per_year)];
    if (stuck === '') return visits === '' ? [] : [`${name}: ${visits}.`];
    return [`${stuck}${visits === '' ? '' : `; ${visits}`}.`];
  });
