/** Invented mounts and studies, so that each rule of the advice can be seen alone. No figure here is from a real site. */
import type { AdviceInput, AdviceMount } from '../../src/advice/index.ts';
import type { SkyModel } from '../../src/shared/index.ts';

export interface Sketch extends Partial<Omit<AdviceMount, 'by_sky'>> {
  readonly id: string;
  /** Cost per kWh by Perez, Hay-Davies, Reindl; one number: the same by all. Null: no cost. */
  readonly cost?: number | readonly [number, number, number] | null;
  /** Yearly kWh per kW by the same three. */
  readonly energy?: number | readonly [number, number, number];
  readonly worst?: number | readonly [number, number, number];
}

const three = (x: number | readonly [number, number, number]): readonly [number, number, number] =>
  typeof x === 'number' ? [x, x, x] : x;
const REFERENCE_ENERGY = 1600;

export const mount = (sketch: Sketch): AdviceMount => {
  const { cost = 0.1, energy = REFERENCE_ENERGY, worst = 2.9, ...rest } = sketch;
  const [costs, energies, worsts] = [cost === null ? null : three(cost), three(energy), three(worst)];
  const sky = (i: number, share = 1) => ({
    energy_kwh_per_kw: energies[i] * share,
    worst_month_kwh_per_kw_day: worsts[i] * share,
    lcoe_per_kwh: costs && costs[i] / share,
  });
  const by_sky = { perez: sky(0), 'hay-davies': sky(1), reindl: sky(2), isotropic: sky(0, 0.97) };
  const gain = (model: SkyModel) => by_sky[model].energy_kwh_per_kw / REFERENCE_ENERGY - 1;
  return {
    kind: 'fixed-tilt',
    label: sketch.id,
    tilt_deg: 34,
    azimuth_deg: 186,
    gcr: 0.45,
    rows: 'rows at GCR 0.45',
    gain_over_reference: gain('perez'),
    gain_by_sky: {
      perez: gain('perez'),
      'hay-davies': gain('hay-davies'),
      reindl: gain('reindl'),
      isotropic: gain('isotropic'),
    },
    energy_kwh_per_kw: energies[0],
    worst_month: { month: 'Dec', kwh_per_kw_day: worsts[0] },
    capital_per_kw: costs && 1900,
    lcoe_per_kwh: costs === null ? null : costs[0],
    lcoe_at_rates: {},
    cost_incomplete: costs === null,
    break_even_premium_per_kw: null,
    break_even_gain: null,
    premium_per_kw: null,
    limits: [],
    reading_error: 0,
    downtime_blank: false,
    snow_counted: false,
    ...rest,
    by_sky,
  };
};

export const tracker = (sketch: Partial<Sketch>): AdviceMount =>
  mount({
    id: 'tracker',
    kind: 'single-axis',
    tilt_deg: null,
    azimuth_deg: null,
    gcr: 0.4,
    rows: 'rows at GCR 0.40',
    ...sketch,
  });

export const mast = (sketch: Partial<Sketch>): AdviceMount =>
  tracker({ id: 'mast', kind: 'dual-axis', gcr: null, rows: 'lone mast', ...sketch });

export const roof = (sketch: Partial<Sketch>): AdviceMount =>
  mount({
    id: 'roof',
    kind: 'roof-plane',
    tilt_deg: 14,
    azimuth_deg: 166,
    gcr: null,
    rows: 'no rows',
    ...sketch,
  });

export const study = (mounts: readonly AdviceMount[], over: Partial<AdviceInput> = {}): AdviceInput => ({
  mounts,
  referenceId: mounts[0].id,
  objective: null,
  skyModel: 'perez',
  findings: [],
  notCounted: [],
  inverterGiven: true,
  globalOnly: false,
  currency: 'USD',
  realRate: 0.06,
  years: 25,
  sameEnergy: [],
  tiltedForMonth: [],
  ...over,
});
