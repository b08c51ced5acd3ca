import type { Renewal } from './spec.ts';

/**
 * Capital recovery factor: the equal yearly payment, at the end of each year, that repays 1 over `years` at
 * `rate` (fraction per year, real or nominal but as the costs are). CRF = i (1 + i)^N / ((1 + i)^N - 1), and
 * 1 / N without interest. Source: W. Short, D. J. Packey & T. Holt, "A Manual for the Economic Evaluation of
 * Energy Efficiency and Renewable Energy Technologies", NREL/TP-462-5173 (1995), section on capital recovery.
 */
export const capitalRecoveryFactor = (rate: number, years: number): number => {
  if (rate === 0) return 1 / years;
  // expm1 and log1p keep their digits where the rate is tiny and (1 + i)^N - 1 would lose them.
  const growth = Math.expm1(years * Math.log1p(rate));
  return (rate * (growth + 1)) / growth;
};

/** What 1 paid at the end of `year` is worth at year 0. */
export const discountFactor = (rate: number, year: number): number => (1 + rate) ** -year;

/**
 * Energy over the life, each year's sum discounted from the end of its year, kWh. Year t yields
 * `firstYearKwh` (1 - ageing)^(t - 1): ageing is geometric and begins after the first year.
 */
export const presentEnergy = (firstYearKwh: number, ageing: number, rate: number, years: number): number => {
  let sum = 0;
  for (let year = 1; year <= years; year++) {
    sum += firstYearKwh * (1 - ageing) ** (year - 1) * discountFactor(rate, year);
  }
  return sum;
};

/** The money that one array takes: capital at year 0, upkeep at the end of each year, renewals at the end of theirs. */
export interface CostLines {
  readonly capital: number;
  readonly upkeepPerYear: number;
  readonly renewals: readonly Renewal[];
}

/** Upkeep and renewals over the life, discounted to year 0. A renewal after the last year is not paid. */
export const presentRunningCost = (
  { upkeepPerYear, renewals }: Pick<CostLines, 'upkeepPerYear' | 'renewals'>,
  rate: number,
  years: number,
): number =>
  upkeepPerYear / capitalRecoveryFactor(rate, years) +
  renewals
    .filter((renewal) => renewal.year <= years)
    .reduce((sum, renewal) => sum + renewal.cost * discountFactor(rate, renewal.year), 0);

/** All money over the life, discounted to year 0. */
export const presentCost = (lines: CostLines, rate: number, years: number): number =>
  lines.capital + presentRunningCost(lines, rate, years);

/**
 * Levelised cost of energy, money per kWh: present cost over present energy, so that selling every kWh at this
 * price repays capital, upkeep and renewals exactly. Source: Short, Packey & Holt, NREL/TP-462-5173 (1995),
 * total life-cycle cost over discounted energy.
 */
export const lcoePerKwh = (
  input: CostLines & {
    readonly firstYearKwh: number;
    readonly ageing: number;
    readonly rate: number;
    readonly years: number;
  },
): number =>
  presentCost(input, input.rate, input.years) /
  presentEnergy(input.firstYearKwh, input.ageing, input.rate, input.years);
