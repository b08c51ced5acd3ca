import type { Comparison, MountResult } from '../shared/index.ts';
import { decimalsFor, formatNumber, formatPercent, UNKNOWN } from './numbers.ts';
import { listed } from './plain-text.ts';
import { nameOf } from './words.ts';

/** Marks a cost per kWh that rests on part of the costs only. */
export const INCOMPLETE_MARK = '*';
const INCOMPLETE_NOTE = `${INCOMPLETE_MARK} from the costs that are given: a cost that decides is blank and not counted`;

export interface CostColumn {
  /** `at 6.0 %` or, where the study gives no rate, `at 4 %`. */
  readonly name: string;
  readonly cell: (mount: MountResult) => string;
}

const ratesOf = (c: Comparison): string[] => [
  ...new Set(c.mounts.flatMap((m) => Object.keys(m.lcoe_at_rates))),
];

/** Columns of cost per kWh: one at the study's rate, else one a rate; none where no cost per kWh is known. */
export const lcoeColumns = (c: Comparison): CostColumn[] => {
  const rates = ratesOf(c);
  const atOwnRate = c.mounts.some((mount) => mount.lcoe_per_kwh !== null);
  const columns: [string, (mount: MountResult) => number | null][] = [
    ...(atOwnRate
      ? [
          [`at ${formatPercent(c.finance.real_rate)}`, (m: MountResult) => m.lcoe_per_kwh] as [
            string,
            (m: MountResult) => number | null,
          ],
        ]
      : []),
    ...rates.map((rate): [string, (m: MountResult) => number | null] => [
      `at ${rate}`,
      (m) => m.lcoe_at_rates[rate] ?? null,
    ]),
  ];
  const decimals = decimalsFor(columns.flatMap(([, value]) => c.mounts.map(value)));
  return columns.map(([name, value]) => ({
    name,
    cell: (mount) => {
      const text = formatNumber(value(mount), decimals);
      return mount.cost_incomplete && text !== UNKNOWN ? text + INCOMPLETE_MARK : text;
    },
  }));
};

/** What the mark means; null where no cost per kWh bears it. */
export const incompleteNote = (c: Comparison): string | null =>
  c.mounts.some((mount) => lcoeColumns(c).some(({ cell }) => cell(mount).endsWith(INCOMPLETE_MARK)))
    ? INCOMPLETE_NOTE
    : null;

export const hasCapital = (c: Comparison): boolean => c.mounts.some((mount) => mount.capital_per_kw !== null);

/** What is lacking before costs per kWh can be compared; null where nothing is. */
export const costLack = (c: Comparison): string | null => {
  const unpriced = c.mounts.filter((mount) => mount.capital_per_kw === null).map((mount) => nameOf(c, mount));
  const lacking = [
    ...(c.finance.real_rate === null ? ['finance.real_rate'] : []),
    ...(c.finance.years === null ? ['finance.years'] : []),
    ...(unpriced.length > 0 ? [`the capital of ${listed(unpriced)}`] : []),
  ];
  if (lacking.length > 0) return `the study lacks ${listed(lacking)}, so costs are not fully weighed`;
  return c.currency === null ? 'the study does not name its currency' : null;
};

/** The money of a result; a study may leave its name blank. */
export const currencyOf = (c: Comparison): string => c.currency ?? 'money';
