/**
 * The result of one comparison. This is the JSON contract of `compare --json`, key for key, so that charts,
 * reports and readers of the file share one shape: fields may be added, never renamed. What is not known is
 * null, never 0. Shares are fractions (0.12 is 12 %). Money is in `currency`.
 */
import type { Finding } from './hourly-year.ts';

export type MountKind = 'roof-plane' | 'fixed-tilt' | 'single-axis' | 'dual-axis' | 'turntable';
export type LimitStatus = 'kept' | 'broken' | 'within_reading_error' | 'not_checked';
export type Confidence = 'clear' | 'likely' | 'too_close';
export type SkyModel = 'perez' | 'hay-davies' | 'reindl' | 'isotropic';
export type Objective = 'lowest cost per kWh' | 'most kWh per kW' | 'best worst month';

export interface Comparison {
  /** Version of this contract, `trackworth-comparison-1`. */
  schema: string;
  title: string;
  /** Null where the study gives no money. */
  currency: string | null;
  reference_id: string;
  objective: Objective;
  /** What the ranking used: the objective, or energy where its costs are lacking. */
  ranked_by: Objective;
  site: { latitude_deg: number; longitude_deg: number; elevation_m: number; utc_offset_h: number };
  weather: WeatherSummary;
  sky_model: SkyModel;
  array: ArraySummary;
  best_orientation: { tilt_deg: number; azimuth_deg: number; irradiation_kwh_m2: number };
  orientation_map: OrientationMapResult;
  /** What stands before the sky; null where the study gives no skyline. */
  skyline: SkylineResult | null;
  /** Declinations applied, in words; empty where no magnetic bearing was read. */
  declinations: string[];
  mounts: MountResult[];
  /** Twelve entries: the fixed plane that yields most in that month, on the reference's rows and losses. */
  tilted_for_month: { month: string; tilt_deg: number; azimuth_deg: number; kwh_per_kw_day: number }[];
  comparisons: { same_money: null; same_energy: SameEnergy[]; same_land: null; own_best: null };
  finance: { real_rate: number | null; years: number | null; ageing: number | null };
  wind_basis: WindBasis | null;
  not_counted: NotCounted[];
  advice: AdviceResult;
  assumptions: Assumption[];
}

export interface WeatherSummary {
  source: string;
  format: string;
  station: string;
  ghi_kwh_m2: number;
  dni_kwh_m2: number;
  dhi_kwh_m2: number;
  ghi_monthly_kwh_m2: number[];
  /** Minutes to add to the file's times so that the year fits the sun; null where it cannot be told. */
  time_shift_min: number | null;
  /** Light recorded in hours without sun, dropped and counted. */
  dropped_night_kwh_m2: number;
  findings: Finding[];
}

export interface ArraySummary {
  /** False where the study has no `array`: then everything is for 1 kW. */
  given: boolean;
  dc_kw: number;
  ac_kw: number | null;
  modules: number | null;
  module_w: number | null;
  module_area_m2: number | null;
}

/** Yearly irradiation of an unshaded fixed plane, `irradiation_kwh_m2[tilt index][azimuth index]`. */
export interface OrientationMapResult {
  tilts_deg: number[];
  azimuths_deg: number[];
  irradiation_kwh_m2: number[][];
}

export type MeasuredWith = 'compass' | 'map bearing' | 'rise and run' | 'angle';

export interface SkylineResult {
  /** One for each point of the array, straight lines between the points given; true azimuths 0..360. */
  profiles: { name: string; azimuths_deg: number[]; elevations_deg: number[]; sky_blocked: number }[];
  /** The point that sees least of the sky. */
  worst_point: string;
  /** The sun's paths on the solstices and an equinox: true azimuth and elevation, every ten minutes while it is up. */
  sun_paths: { name: string; azimuths_deg: number[]; elevations_deg: number[] }[];
}

export interface MountResult {
  id: string;
  kind: MountKind;
  label: string;
  /** Null for trackers, but for a turntable, which keeps its tilt. */
  tilt_deg: number | null;
  /** Null for all trackers. */
  azimuth_deg: number | null;
  /** Where it points, in words: `34.2° tilt, facing 186° (south)`, or the axis, its swing and what it does under a low sun. */
  pointing: string;
  /** `given`, or `best: unshaded optimum of the orientation map`; null for trackers without a held tilt. */
  tilt_basis: string | null;
  /** TOF: irradiation over the map's maximum, 0..1; null for trackers. */
  orientation_factor: number | null;
  /** Reading errors of tilt and azimuth, either way; null where none is given. */
  tilt_error_deg: number | null;
  azimuth_error_deg: number | null;
  /** TOF at the least and most favourable angles that the reading errors allow; null without reading errors. */
  orientation_factor_band: { low: number; high: number } | null;
  /** Share of the unshaded front irradiation (beam, circumsolar, sky) that the skyline takes; 0 with an open horizon given or none. */
  shading_fraction: number;
  /** The same by month; null in a month without light. */
  shading_monthly: (number | null)[];
  /** The same at the point of the array where this mount loses most, and that point's name where there are several. */
  shading_worst_point: number;
  worst_point: string | null;
  /** TOF times (1 - shading), and the same at the worst point of the array; null for trackers. */
  tsrf: number | null;
  tsrf_worst_point: number | null;
  /** How the angles were read on site; empty where the study gives them outright. */
  measured_with: MeasuredWith[];
  /** The readings as written, and how the angles follow from them. */
  readings: string[];
  survey_steps: string[];
  /** Ground coverage ratio of the rows; null without rows. */
  gcr: number | null;
  /** What the rows are in words: `rows at GCR 0.45`, `no rows`, `lone mast`. */
  rows: string;
  irradiation_kwh_m2: number;
  irradiation_monthly_kwh_m2: number[];
  beam_kwh_m2: number;
  sky_diffuse_kwh_m2: number;
  ground_reflected_kwh_m2: number;
  /** Fraction: `energy_kwh_per_kw` over the reference's, less 1. */
  gain_over_reference: number;
  /** The same gain under every sky model. */
  gain_by_sky: Record<SkyModel, number>;
  dc_kw: number;
  ac_kw: number | null;
  modules: number | null;
  land_m2: number | null;
  /** AC kWh delivered in the first year, whole array. */
  energy_kwh: number;
  energy_kwh_per_kw: number;
  energy_monthly_kwh_per_kw: number[];
  worst_month: { month: string; kwh_per_kw_day: number };
  /** Product of the efficiencies times `irradiation_kwh_m2` is `energy_kwh_per_kw`. Counted stages only. */
  stages: { name: string; efficiency: number; kwh_per_kw_after: number; source: string }[];
  weakest_stage: string;
  /** What snow on the modules takes; null where that is not counted. */
  snow: {
    /** Twelve shares of each month's light, as given. */
    monthly_shares: number[];
    /** In its place in the chain, before later stages. */
    taken_kwh_per_kw: number;
    /** Of a rack above ground, as given: room for snow that slides off. Null where blank. */
    lower_edge_m: number | null;
  } | null;
  /** When a tracker parks in wind and what that takes; null where that is not counted. */
  stow: {
    /** Gusts at 10 m: it parks at this one and is released below that one, after so many hours. */
    gust_ms: number;
    gust_factor: number;
    release_ms: number;
    hold_h: number;
    /** How it stands while it is parked, in words. */
    parked: string;
    /** Parked hours, those of them with daylight, runs of them, and the longest run. */
    hours: number;
    daylight_hours: number;
    events: number;
    longest_h: number;
    /** What parking takes, before the drive's own use and downtime; negative where it gives. */
    lost_kwh_per_kw: number;
    lost_monthly_kwh_per_kw: number[];
  } | null;
  /** What a tracker does while it does not work; null where that is not counted. */
  downtime: {
    /** Share of the time that it works. */
    working: number;
    /** How it stands while it does not, in words. */
    stuck: string;
    /** kWh per kW that it would deliver in a year of standing so, and that over a year of working; null without light. */
    stuck_kwh_per_kw: number;
    kept_while_stuck: number | null;
  } | null;
  /** Repair visits a year, as given: listed, not priced. */
  visits_per_year: number | null;
  capital: number | null;
  capital_per_kw: number | null;
  upkeep_per_year: number | null;
  /** At the end of their year, whole array. */
  renewals: { what: string; year: number; cost: number }[];
  lcoe_per_kwh: number | null;
  /** Cost per kWh at 4, 7 and 10 % where the study gives no rate; else empty. */
  lcoe_at_rates: Record<string, number>;
  /** True where a cost that decides is blank: then the cost per kWh is from what is known. */
  cost_incomplete: boolean;
  /** Trackers only: capital per kW at which costs per kWh are equal, less the reference's; may be negative. */
  break_even_premium_per_kw: number | null;
  /** Trackers only: gain in delivered energy at which costs per kWh are equal (fraction). */
  break_even_gain: number | null;
  /** Capital per kW above the reference's, as quoted. */
  premium_per_kw: number | null;
  wind: MountWind;
  /** `bound`: a value that may be at `most` or must be at `least` so much. */
  limits: {
    name: string;
    bound: 'most' | 'least';
    status: LimitStatus;
    detail: string;
    /** What the mount has and what the limit is: metres for lengths, fractions for factors and grades; null where not checked. */
    value: number | null;
    asked: number | null;
    /** `value` less `asked` for lengths; null for factors and grades. */
    excess_m: number | null;
  }[];
}

export interface MountWind {
  /** Above ground, at the steepest working angle; null where geometry is missing. */
  highest_edge_m: number | null;
  /** Above the roof surface; null for ground mounts or where geometry is missing. */
  roof_projection_m: number | null;
  /** At the highest edge. */
  velocity_pressure_pa: number | null;
  kz: number | null;
  /** Which of the geometry keys are missing. */
  missing: string[];
}

export interface WindBasis {
  edition: string;
  design_gust_ms: number;
  exposure: 'B' | 'C' | 'D';
  kzt: number;
  kd: number;
  ke: number;
  deferral: string;
}

/** The fixed array that delivers as much as one tracker in the first year, under the same inverter. */
export interface SameEnergy {
  tracker_id: string;
  reference_id: string;
  reachable: boolean;
  target_kwh: number;
  /** Null where modules are not given; then `dc_kw` is exact rather than whole modules. */
  modules: number | null;
  dc_kw: number;
  energy_kwh: number;
  module_area_m2: number | null;
  capital: number | null;
  /** Its capital less the tracker's; negative: the fixed array is cheaper. */
  capital_difference: number | null;
  /** Capital, upkeep and renewals over the life, discounted, less the tracker's; null where any of them is not known. */
  present_cost_difference: number | null;
  text: string;
}

export interface NotCounted {
  /** The study's key, for example `mounts.tracker.drive.working`. */
  what: string;
  /** What one plausible value would do, with its numbers. */
  effect: string;
}

export interface AdviceResult {
  choice: string | null;
  confidence: Confidence | null;
  headline: string;
  /** Chosen mount against each other one. */
  leads: { over: string; confidence: Confidence; lead: number; doubt: number; unit: string; why: string }[];
  reasons: string[];
  switch_points: string[];
  doubts: string[];
  cautions: string[];
  /** Mounts put aside by a hard limit, with the limit. */
  excluded: { id: string; why: string }[];
}

export interface Assumption {
  what: string;
  value: string;
  source: string;
}
