import type { Objective } from '../shared/index.ts';
import { siftByLimits } from './hard-limits.ts';
import type { AdviceInput, AdviceMount } from './input.ts';
import { costMetric, energyMetric, type Metric, middleRateMetric, worstMonthMetric } from './metric.ts';
import { currencyOf, listWords, nameOf } from './words.ts';

export interface RankingBasis {
  /** What the study asks for; lowest cost per kWh where it does not say. */
  readonly objective: Objective;
  /** What the ranking uses: the objective, or energy where no mount has a cost per kWh. */
  readonly rankedBy: Objective;
  /** What the study would have to give to rank every mount by cost at its own rate; null where nothing is lacking. */
  readonly lacking: string | null;
}

export interface Ranking extends RankingBasis {
  readonly metric: Metric;
  /** True where costs are ranked without a discount rate, at the middle of the three that the output shows. */
  readonly withoutRate: boolean;
  /** Best first; the reference first among equals, then the study's order. */
  readonly order: readonly AdviceMount[];
  /** Mounts that keep their limits and have no cost per kWh while others have one. */
  readonly unranked: readonly AdviceMount[];
}

type RankingInput = Pick<AdviceInput, 'objective' | 'realRate' | 'years' | 'referenceId' | 'currency'>;

/** By what, and which of the mounts: the priced ones at the study's rate, else at the middle rate, else all by energy. */
const chooseMetric = (mounts: readonly AdviceMount[], objective: Objective, currency: string) => {
  if (objective === 'most kWh per kW') return { metric: energyMetric, ranked: mounts };
  if (objective === 'best worst month') return { metric: worstMonthMetric, ranked: mounts };
  for (const metric of [costMetric(currency), middleRateMetric(currency)]) {
    const ranked = mounts.filter((m) => metric.of(m) !== null);
    if (ranked.length > 0) return { metric, ranked };
  }
  return { metric: energyMetric, ranked: mounts };
};

const lackingFor = (mounts: readonly AdviceMount[], input: RankingInput): string | null => {
  if (mounts.every((m) => m.lcoe_per_kwh !== null)) return null;
  const noCapital = mounts.filter((m) => m.capital_per_kw === null);
  const keys = [
    ...(input.realRate === null ? ['finance.real_rate'] : []),
    ...(input.years === null ? ['finance.years'] : []),
    ...(noCapital.length > 0 ? [`the capital cost of ${listWords(noCapital.map(nameOf))}`] : []),
  ];
  return keys.length > 0 ? listWords(keys) : 'a cost per kWh';
};

/**
 * Ranks the mounts that keep their limits. By cost, those without a cost per kWh are left unranked; only where none has
 * one are all ranked by energy.
 */
export const rank = (mounts: readonly AdviceMount[], input: RankingInput): Ranking => {
  const objective = input.objective ?? 'lowest cost per kWh';
  const { metric, ranked } = chooseMetric(mounts, objective, currencyOf(input));
  const score = (m: AdviceMount): number => {
    const value = metric.of(m) ?? Number.NaN;
    return metric.lowWins ? value : -value;
  };
  const behindReference = (m: AdviceMount): number => (m.id === input.referenceId ? 0 : 1);
  return {
    objective,
    rankedBy: metric.objective,
    lacking: objective === 'lowest cost per kWh' ? lackingFor(mounts, input) : null,
    metric,
    withoutRate: metric.lowWins && ranked.every((m) => m.lcoe_per_kwh === null),
    order: [...ranked].sort((a, b) => score(a) - score(b) || behindReference(a) - behindReference(b)),
    unranked: mounts.filter((m) => !ranked.includes(m)),
  };
};

/** What the mounts that keep their limits can be ranked by, and what the study lacks to rank all of them by cost. */
export const rankingBasis = (input: AdviceInput): RankingBasis => {
  const { kept } = siftByLimits(input.mounts);
  const { objective, rankedBy, lacking } = rank(kept.length > 0 ? kept : input.mounts, input);
  return { objective, rankedBy, lacking };
};

/** Whether energy stands in for a cost that the study does not give. */
export const onEnergyAlone = ({ objective, rankedBy }: RankingBasis): boolean => objective !== rankedBy;

/** `Not ranked, for lack of the capital cost: roof`; null where every mount is ranked. */
export const unrankedWords = ({ unranked }: Ranking): string | null =>
  unranked.length === 0
    ? null
    : `Not ranked, for lack of ${unranked.every((m) => m.capital_per_kw === null) ? 'the capital cost' : 'a cost per kWh'}: ` +
      listWords(unranked.map(nameOf));
