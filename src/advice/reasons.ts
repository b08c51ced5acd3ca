import { inWords } from '../cost/index.ts';
import type { AdviceInput, AdviceMount } from './input.ts';
import { DOUBT_SKIES } from './leads.ts';
import { MIDDLE_RATE } from './metric.ts';
import { onEnergyAlone, type Ranking, unrankedWords } from './ranking.ts';
import { cheapestAtRates } from './rates.ts';
import { currencyOf, isTracker, listWords, moreOrLess, nameOf, percentRange } from './words.ts';

const ranked = ({ metric, order }: Ranking): string =>
  `By ${metric.words}: ${order.map((m) => `${nameOf(m)} ${inWords(metric.of(m) ?? Number.NaN, 4)}`).join(', ')} ${metric.unit}.`;

/** `tracker delivers 12 % more per kW than ground, the reference (9 to 15 % over ...), and costs 28 % more over 25 years.` */
const gain = (m: AdviceMount, reference: AdviceMount, years: number | null): string => {
  const gains = DOUBT_SKIES.map((sky) => m.gain_by_sky[sky]);
  const range = percentRange(Math.min(...gains), Math.max(...gains));
  const cost =
    m.break_even_gain === null
      ? ''
      : `, and costs ${moreOrLess(m.break_even_gain)} per kW over ${years} years` +
        (m.cost_incomplete || reference.cost_incomplete ? ' (from what is known)' : '');
  return (
    `${nameOf(m)} delivers ${moreOrLess(m.gain_over_reference)} per kW than ${nameOf(reference)}, the reference ` +
    `(${range} over the Perez, Hay-Davies and Reindl skies)${cost}.`
  );
};

const worstMonths = (input: AdviceInput): string => {
  const months = [...new Set(input.mounts.map((m) => m.worst_month.month))];
  const tilted = input.tiltedForMonth
    .filter(({ month }) => months.includes(month))
    .map(({ month, kwh_per_kw_day }) => `${inWords(kwh_per_kw_day)} in ${month}`);
  const each = input.mounts.map(
    (m) => `${nameOf(m)} ${inWords(m.worst_month.kwh_per_kw_day)} (${m.worst_month.month})`,
  );
  const against =
    tilted.length === 0 ? '' : ` A fixed plane tilted for the month would give ${listWords(tilted)}.`;
  return `Worst month, kWh per kW a day: ${each.join(', ')}.${against}`;
};

const breakEven = (m: AdviceMount, reference: AdviceMount, currency: string): string => {
  const premium = m.break_even_premium_per_kw ?? Number.NaN;
  const quoted =
    m.premium_per_kw === null ? 'no quote is given' : `quoted premium ${inWords(m.premium_per_kw)}`;
  const known = m.cost_incomplete || reference.cost_incomplete ? ', from what is known' : '';
  const size = `${inWords(Math.abs(premium))} ${currency} per kW`;
  const at = premium < 0 ? `only if its capital is ${size} lower` : `at a premium of ${size}`;
  return `${nameOf(m)} equals ${nameOf(reference)} in cost per kWh ${at} (${quoted}${known}).`;
};

/** Cheapest priced mount at each rate that the output shows where the study gives none; of those that may be chosen. */
const atRates = (mounts: readonly AdviceMount[], all: readonly AdviceMount[], currency: string): string[] => {
  const priced = mounts.filter((m) => Object.keys(m.lcoe_at_rates).length > 0);
  if (priced.length === 0) return [];
  const among = priced.length === all.length ? '' : ` among ${listWords(priced.map(nameOf))}`;
  const cheapest = cheapestAtRates(priced).map(
    ({ rate, best, cost }) => `${nameOf(best)} at ${rate} (${inWords(cost, 4)})`,
  );
  return [`Without a rate, the lowest ${currency} per kWh${among} is that of ${listWords(cheapest)}.`];
};

/** How the ranking had to make do with what the study gives. */
const makingDo = (ranking: Ranking): string[] => {
  const unranked = unrankedWords(ranking);
  return [
    ...(onEnergyAlone(ranking)
      ? [`Ranked by energy alone: to weigh costs the study lacks ${ranking.lacking}.`]
      : []),
    ...(ranking.withoutRate
      ? [`No discount rate is given (finance.real_rate): costs are ranked as they stand at ${MIDDLE_RATE}.`]
      : []),
    ...(unranked === null ? [] : [`${unranked}.`]),
  ];
};

/** Why: the ranking, then each figure that it rests on, each with its numbers and its reference. */
export const reasonsFor = (input: AdviceInput, reference: AdviceMount, ranking: Ranking | null): string[] => {
  const currency = currencyOf(input);
  const others = input.mounts.filter((m) => m.id !== reference.id);
  return [
    ...(ranking === null ? [] : [ranked(ranking), ...makingDo(ranking)]),
    ...atRates(ranking?.order ?? input.mounts, input.mounts, currency),
    ...others.map((m) => gain(m, reference, input.years)),
    worstMonths(input),
    ...others
      .filter((m) => isTracker(m) && m.break_even_premium_per_kw !== null)
      .map((m) => breakEven(m, reference, currency)),
    ...input.sameEnergy.map((same) => `Same energy as ${same.tracker_id}: ${same.text}`),
  ];
};
