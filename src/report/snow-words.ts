import { type Comparison, MONTH_NAMES } from '../shared/index.ts';
import { formatNumber, formatUpTo } from './numbers.ts';
import { nameOf } from './words.ts';

/** What snow takes from each mount, and the room below it; plain text, unescaped. */
export const snowSentences = (c: Comparison): string[] =>
  c.mounts.flatMap((m) => {
    if (m.snow === null) return [];
    const { monthly_shares: shares, taken_kwh_per_kw: taken, lower_edge_m: edge } = m.snow;
    const months = MONTH_NAMES.flatMap((month, i) =>
      shares[i] > 0 ? [`${month} ${formatUpTo(shares[i] * 100)} %`] : [],
    );
    const room =
      edge === null
        ? ''
        : ` Its lower edge is ${formatUpTo(edge)} m above ground; snow that piles up deeper than that holds longer.`;
    return [
      months.length === 0
        ? `${nameOf(c, m)}: none, as given.${room}`
        : `${nameOf(c, m)} loses ${formatNumber(taken, 1)} kWh/kW a year to snow (${months.join(', ')}).${room}`,
    ];
  });
