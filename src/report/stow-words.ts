import { type Comparison, MONTH_NAMES } from '../shared/index.ts';
import { formatNumber, formatUpTo } from './numbers.ts';
import { nameOf } from './words.ts';

const count = (n: number, one: string, many: string): string => `${formatNumber(n)} ${n === 1 ? one : many}`;

/** When each tracker parks, and what that takes; plain text, unescaped. */
export const stowSentences = (c: Comparison): string[] =>
  c.mounts.flatMap((m) => {
    if (m.stow === null) return [];
    const s = m.stow;
    const lost = s.lost_kwh_per_kw;
    const hold = s.hold_h > 0 ? ` for ${formatUpTo(s.hold_h)} h` : '';
    return [
      `${nameOf(c, m)} parks ${s.parked} when hourly wind x ${formatUpTo(s.gust_factor)} reaches ${formatUpTo(s.gust_ms)} m/s, until it has been below ` +
        `${formatUpTo(s.release_ms)} m/s${hold}: ${count(s.hours, 'hour', 'hours')} (${formatNumber(s.daylight_hours)} with daylight) in ` +
        `${count(s.events, 'spell', 'spells')}, the longest ${formatNumber(s.longest_h)} h. ` +
        `That ${lost < 0 ? 'gives' : 'takes'} ${formatNumber(Math.abs(lost), 1)} kWh/kW a year.`,
    ];
  });

/** Month by month, kWh per kW that parking takes from each tracker that parks: a row a month. */
export const stowMonths = (c: Comparison): { names: string[]; rows: string[][] } => {
  const parking = c.mounts.flatMap((m) => (m.stow ? [{ name: nameOf(c, m), stow: m.stow }] : []));
  return {
    names: parking.map(({ name }) => name),
    rows: MONTH_NAMES.map((month, i) => [
      month,
      ...parking.map(({ stow }) => formatNumber(stow.lost_monthly_kwh_per_kw[i], 2)),
    ]),
  };
};
