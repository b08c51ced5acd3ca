import { type CostBlank, mountCost } from './mount-cost.ts';
import { lcoePerKwh } from './present-value.ts';
import type { CostSpec, FinanceSpec } from './spec.ts';

/** Rates at which the cost per kWh is shown where the study gives none, keyed as the output prints them. */
export const RATES_WITHOUT_A_RATE = { '4 %': 0.04, '7 %': 0.07, '10 %': 0.1 } as const;

export interface CostOfEnergy {
  readonly capital: number | null;
  readonly capitalPerKw: number | null;
  readonly upkeepPerYear: number | null;
  /** Null without capital, years, rate or energy. */
  readonly lcoePerKwh: number | null;
  /** Filled only where the study gives no rate. */
  readonly lcoeAtRates: Record<string, number>;
  /** True where a cost that decides is blank: what is given is then from what is known. */
  readonly incomplete: boolean;
  /** Keys that the study leaves blank. Blank ageing is counted as none. */
  readonly blanks: readonly (CostBlank | 'finance.years' | 'finance.real_rate' | 'finance.ageing')[];
}

/**
 * What a mount's energy costs. `energyKwh` is the first year's AC energy of the whole array of `dcKw`. Without
 * years there is no cost per kWh, without a rate it is given at 4, 7 and 10 %; `blanks` says what is lacking.
 */
export const costOfEnergy = (
  cost: CostSpec | null,
  finance: FinanceSpec,
  dcKw: number,
  energyKwh: number,
): CostOfEnergy => {
  const { capital, capitalPerKw, upkeepPerYear, renewals, blanks } = mountCost(cost, dcKw);
  const { realRate, years, ageing } = finance;
  const financeBlanks = [
    ...(years === null ? ['finance.years' as const] : []),
    ...(realRate === null ? ['finance.real_rate' as const] : []),
    ...(ageing === null ? ['finance.ageing' as const] : []),
  ];
  const at = (rate: number): number | null =>
    capital === null || years === null || !(energyKwh > 0)
      ? null
      : lcoePerKwh({
          capital,
          upkeepPerYear: upkeepPerYear ?? 0,
          renewals,
          firstYearKwh: energyKwh,
          ageing: ageing ?? 0,
          rate,
          years,
        });
  const lcoeAtRates: Record<string, number> = {};
  if (realRate === null) {
    for (const [words, rate] of Object.entries(RATES_WITHOUT_A_RATE)) {
      const lcoe = at(rate);
      if (lcoe !== null) lcoeAtRates[words] = lcoe;
    }
  }
  return {
    capital,
    capitalPerKw,
    upkeepPerYear,
    lcoePerKwh: realRate === null ? null : at(realRate),
    lcoeAtRates,
    incomplete: blanks.length > 0,
    blanks: [...blanks, ...financeBlanks],
  };
};
