import type { Finding, MountResult, NotCounted, Objective, SameEnergy, SkyModel } from '../shared/index.ts';

/** What a mount achieves under one sky model, in the three metrics that a study may rank by. */
export interface SkyMetrics {
  readonly energy_kwh_per_kw: number;
  /** Mean day of that sky's worst month. */
  readonly worst_month_kwh_per_kw_day: number;
  /** Null where costs or finance are lacking. */
  readonly lcoe_per_kwh: number | null;
}

/** One compared mount: its results, what it achieves under every sky, and what was left blank. */
export type AdviceMount = Readonly<
  Pick<
    MountResult,
    | 'id'
    | 'kind'
    | 'label'
    | 'tilt_deg'
    | 'azimuth_deg'
    | 'gcr'
    | 'rows'
    | 'gain_over_reference'
    | 'gain_by_sky'
    | 'energy_kwh_per_kw'
    | 'worst_month'
    | 'capital_per_kw'
    | 'lcoe_per_kwh'
    | 'lcoe_at_rates'
    | 'cost_incomplete'
    | 'break_even_premium_per_kw'
    | 'break_even_gain'
    | 'premium_per_kw'
    | 'limits'
  >
> & {
  readonly by_sky: Readonly<Record<SkyModel, SkyMetrics>>;
  /** Half of what the reading errors of its angles leave open, as a share of its light (0.013 is 1.3 %); 0 without readings. */
  readonly reading_error: number;
  /** True for a tracker whose `drive.working` is blank: then its downtime is not counted. */
  readonly downtime_blank: boolean;
  /** False where the mount's snow is blank. */
  readonly snow_counted: boolean;
};

export interface AdviceInput {
  readonly mounts: readonly AdviceMount[];
  readonly referenceId: string;
  /** What the study asks for; null: lowest cost per kWh where any mount has one. */
  readonly objective: Objective | null;
  /** The study's own sky model, under which the mounts' figures stand. */
  readonly skyModel: SkyModel;
  readonly findings: readonly Finding[];
  readonly notCounted: readonly NotCounted[];
  /** False: the inverter's ceiling was not counted. */
  readonly inverterGiven: boolean;
  /** True where beam and diffuse light were split from global light. */
  readonly globalOnly: boolean;
  readonly currency: string | null;
  readonly realRate: number | null;
  readonly years: number | null;
  readonly sameEnergy: readonly SameEnergy[];
  /** Twelve entries: what the fixed plane tilted for each month would give in it. */
  readonly tiltedForMonth: readonly { readonly month: string; readonly kwh_per_kw_day: number }[];
}
