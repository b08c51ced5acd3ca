import type { AdviceMount } from './input.ts';
import { listWords, nameOf } from './words.ts';

/** A lead under this share of the metric itself is the rounding of sums. */
export const ROUNDING = 1e-9;

/** `4, 7 and 10 %`. */
const ratesWords = (rates: readonly string[]): string =>
  `${listWords(rates.map((rate) => rate.replace(/ %$/, '')))} %`;

/** The mount with the lowest cost per kWh at each rate that all have; the first named among equals. */
export const cheapestAtRates = (
  mounts: readonly AdviceMount[],
): { readonly rate: string; readonly best: AdviceMount; readonly cost: number }[] =>
  Object.keys(mounts[0]?.lcoe_at_rates ?? {})
    .filter((rate) => mounts.every((m) => m.lcoe_at_rates[rate] !== undefined))
    .map((rate) => {
      const costOf = (m: AdviceMount): number => m.lcoe_at_rates[rate];
      const best = mounts.reduce((a, b) => (costOf(b) < costOf(a) * (1 - ROUNDING) ? b : a));
      return { rate, best, cost: costOf(best) };
    });

/** Whether the first of the mounts is the cheapest at every rate. */
export const holdsAtAllRates = (mounts: readonly AdviceMount[]): boolean =>
  cheapestAtRates(mounts).every(({ best }) => best === mounts[0]);

/** `4, 7 and 10 %`: the rates at which all these mounts have a cost. */
export const ratesOf = (mounts: readonly AdviceMount[]): string =>
  ratesWords(cheapestAtRates(mounts).map(({ rate }) => rate));

/** `ground at 4 and 7 % and tracker at 10 %`: who is cheapest at which rate. */
export const winnersWords = (mounts: readonly AdviceMount[]): string => {
  const cheapest = cheapestAtRates(mounts);
  const winners = [...new Set(cheapest.map(({ best }) => best))];
  return listWords(
    winners.map((m) => {
      const rates = cheapest.filter(({ best }) => best === m).map(({ rate }) => rate);
      return `${nameOf(m)} at ${ratesWords(rates)}`;
    }),
  );
};
