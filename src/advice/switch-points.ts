import { inWords } from '../cost/index.ts';
import type { AdviceInput, AdviceMount } from './input.ts';
import { MIDDLE_RATE } from './metric.ts';
import type { Ranking } from './ranking.ts';
import { holdsAtAllRates, winnersWords } from './rates.ts';
import { currencyOf, isTracker, listWords, nameOf, percent } from './words.ts';

/** `; its height limit stands against it all the same`: no price mends a broken limit. */
const despiteLimits = (m: AdviceMount): string => {
  const broken = [...new Set(m.limits.filter(({ status }) => status === 'broken').map(({ name }) => name))];
  if (broken.length === 0) return '';
  return `; its ${listWords(broken)} ${broken.length > 1 ? 'limits stand' : 'limit stands'} against it all the same`;
};

/** The premium and the gain at which a tracker and the reference cost the same per kWh, and which side it is on. */
const trackerSwitch = (m: AdviceMount, reference: AdviceMount, currency: string): string[] => {
  const { break_even_gain: gain, break_even_premium_per_kw: premium } = m;
  if (premium === null) return [];
  const quoted = m.premium_per_kw === null ? 'not quoted' : `quoted ${inWords(m.premium_per_kw)}`;
  const ahead = gain !== null && m.gain_over_reference > gain;
  const [verb, past, under] = ahead
    ? ['loses to', 'passes', 'falls below']
    : ['wins over', 'falls below', 'passes'];
  const byGain =
    gain === null ? '' : ` or its gain ${under} ${percent(gain)} (now ${percent(m.gain_over_reference)})`;
  return [
    `On cost per kWh ${nameOf(m)} ${verb} ${nameOf(reference)} if its premium ${past} ${inWords(premium)} ` +
      `${currency} per kW (${quoted})${byGain}${despiteLimits(m)}.`,
  ];
};

/** How much dearer or how much weaker the chosen mount may turn out before the next one draws level. */
const margin = ({ metric, order, withoutRate }: Ranking): string[] => {
  const [chosen, next] = order;
  const [a, b] = [metric.of(chosen), next ? metric.of(next) : null];
  if (a === null || b === null || a === b || a === 0 || b === 0) return [];
  // cost per kWh goes with money and with one over energy; the other two metrics go with energy
  const lessEnergy = metric.lowWins ? 1 - a / b : 1 - b / a;
  const dearer = metric.lowWins ? `all it costs turns out ${percent(b / a - 1)} dearer or ` : '';
  return [
    `${nameOf(chosen)} falls level with ${nameOf(next)} if ${dearer}it delivers ${percent(lessEnergy)} less than ` +
      `counted${withoutRate ? `, at a rate of ${MIDDLE_RATE}` : ''}.`,
  ];
};

/** Without a rate: who is cheapest at which, where that is not always the same. */
const rateSwitch = ({ order, withoutRate }: Ranking): string[] =>
  withoutRate && !holdsAtAllRates(order)
    ? [`The answer turns on the discount rate: the lowest cost per kWh is that of ${winnersWords(order)}.`]
    : [];

/** What would change the answer, with the numbers at which it does. */
export const switchPoints = (input: AdviceInput, reference: AdviceMount, ranking: Ranking): string[] => [
  ...input.mounts
    .filter((m) => isTracker(m) && m.id !== reference.id)
    .flatMap((m) => trackerSwitch(m, reference, currencyOf(input))),
  ...rateSwitch(ranking),
  ...margin(ranking),
];
