import type { Objective, SkyModel } from '../shared/index.ts';
import { siftByLimits } from './hard-limits.ts';
import type { AdviceInput, AdviceMount, SkyMetrics } from './input.ts';
import { currencyOf, listWords, nameOf } from './words.ts';

/** How mounts are measured for one objective. */
export interface Metric {
  readonly objective: Objective;
  /** As sentences say it. */
  readonly words: string;
  readonly unit: string;
  /** Whether less is better. */
  readonly lowWins: boolean;
  /** Null where the study gives too little. */
  readonly of: (m: AdviceMount) => number | null;
  readonly underSky: (m: AdviceMount, sky: SkyModel) => number | null;
}

const metricOf = (objective: Objective, currency: string): Metric => {
  const underSky = (key: keyof SkyMetrics) => (m: AdviceMount, sky: SkyModel) => m.by_sky[sky][key];
  switch (objective) {
    case 'lowest cost per kWh':
      return {
        objective,
        words: 'cost per kWh',
        unit: `${currency} per kWh`,
        lowWins: true,
        of: (m) => m.lcoe_per_kwh,
        underSky: underSky('lcoe_per_kwh'),
      };
    case 'most kWh per kW':
      return {
        objective,
        words: 'energy delivered in the first year',
        unit: 'kWh per kW',
        lowWins: false,
        of: (m) => m.energy_kwh_per_kw,
        underSky: underSky('energy_kwh_per_kw'),
      };
    case 'best worst month':
      return {
        objective,
        words: 'the worst month',
        unit: 'kWh per kW a day',
        lowWins: false,
        of: (m) => m.worst_month.kwh_per_kw_day,
        underSky: underSky('worst_month_kwh_per_kw_day'),
      };
  }
};

export interface RankingBasis {
  /** What the study asks for; lowest cost per kWh where it does not say. */
  readonly objective: Objective;
  /** What the ranking uses: the objective, or energy where costs are lacking. */
  readonly rankedBy: Objective;
  /** Which study keys would let it rank by cost; null where nothing is lacking. */
  readonly lacking: string | null;
}

/** A cost ranking needs a cost per kWh for every mount; where one is lacking all are ranked by energy. */
const basisFor = (
  mounts: readonly AdviceMount[],
  input: Pick<AdviceInput, 'objective' | 'realRate' | 'years'>,
): RankingBasis => {
  const objective = input.objective ?? 'lowest cost per kWh';
  const unpriced = mounts.filter((m) => m.lcoe_per_kwh === null);
  if (objective !== 'lowest cost per kWh' || unpriced.length === 0) {
    return { objective, rankedBy: objective, lacking: null };
  }
  const finance = [
    ...(input.realRate === null ? ['finance.real_rate'] : []),
    ...(input.years === null ? ['finance.years'] : []),
  ];
  const noCost = unpriced.filter((m) => m.capital_per_kw === null);
  const lines = noCost.length > 0 ? [`the capital cost of ${listWords(noCost.map(nameOf))}`] : [];
  return { objective, rankedBy: 'most kWh per kW', lacking: listWords([...finance, ...lines]) };
};

/** What the mounts that keep their limits can be ranked by, and what the study lacks to rank by cost. */
export const rankingBasis = (input: AdviceInput): RankingBasis => {
  const { kept } = siftByLimits(input.mounts);
  return basisFor(kept.length > 0 ? kept : input.mounts, input);
};

export interface Ranking extends RankingBasis {
  readonly metric: Metric;
  /** Best first; the reference first among equals, then the study's order. */
  readonly order: readonly AdviceMount[];
}

/** Ranks the mounts that keep their limits. */
export const rank = (
  mounts: readonly AdviceMount[],
  input: Pick<AdviceInput, 'objective' | 'realRate' | 'years' | 'referenceId' | 'currency'>,
): Ranking => {
  const basis = basisFor(mounts, input);
  const metric = metricOf(basis.rankedBy, currencyOf(input));
  const score = (m: AdviceMount): number => {
    const value = metric.of(m) ?? Number.NaN;
    return metric.lowWins ? value : -value;
  };
  const behindReference = (m: AdviceMount): number => (m.id === input.referenceId ? 0 : 1);
  const order = [...mounts].sort((a, b) => score(a) - score(b) || behindReference(a) - behindReference(b));
  return { ...basis, metric, order };
};
