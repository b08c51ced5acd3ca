import type { RATES_WITHOUT_A_RATE } from '../cost/index.ts';
import type { Objective, SkyModel } from '../shared/index.ts';
import type { AdviceMount, SkyMetrics } from './input.ts';

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

const underSky = (key: keyof SkyMetrics) => (m: AdviceMount, sky: SkyModel) => m.by_sky[sky][key];

/** The rate of the three whose costs rank the mounts where the study gives none. */
export const MIDDLE_RATE: keyof typeof RATES_WITHOUT_A_RATE = '7 %';

export const costMetric = (currency: string): Metric => ({
  objective: 'lowest cost per kWh',
  words: 'cost per kWh',
  unit: `${currency} per kWh`,
  lowWins: true,
  of: (m) => m.lcoe_per_kwh,
  underSky: underSky('lcoe_per_kwh'),
});

const atMiddleRate = (m: AdviceMount): number | null => m.lcoe_at_rates[MIDDLE_RATE] ?? null;

/** Cost per kWh at the middle rate; under another sky it goes with one over the energy, for the money stays the same. */
export const middleRateMetric = (currency: string): Metric => ({
  ...costMetric(currency),
  unit: `${currency} per kWh at ${MIDDLE_RATE}`,
  of: atMiddleRate,
  underSky: (m, sky) => {
    const cost = atMiddleRate(m);
    return cost === null ? null : (cost * m.energy_kwh_per_kw) / m.by_sky[sky].energy_kwh_per_kw;
  },
});

export const energyMetric: Metric = {
  objective: 'most kWh per kW',
  words: 'energy delivered in the first year',
  unit: 'kWh per kW',
  lowWins: false,
  of: (m) => m.energy_kwh_per_kw,
  underSky: underSky('energy_kwh_per_kw'),
};

export const worstMonthMetric: Metric = {
  objective: 'best worst month',
  words: 'the worst month',
  unit: 'kWh per kW a day',
  lowWins: false,
  of: (m) => m.worst_month.kwh_per_kw_day,
  underSky: underSky('worst_month_kwh_per_kw_day'),
};
