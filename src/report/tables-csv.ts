import { type Comparison, MONTH_DAYS, MONTH_NAMES, type MountResult } from '../shared/index.ts';
import { type Cell, csvText } from './csv.ts';
import { limitWords } from './limit-words.ts';

const mountRecord = (c: Comparison, rates: readonly string[], m: MountResult): Record<string, Cell> => ({
  id: m.id,
  label: m.label,
  kind: m.kind,
  reference_id: c.reference_id,
  tilt_deg: m.tilt_deg,
  azimuth_deg: m.azimuth_deg,
  pointing: m.pointing,
  tilt_basis: m.tilt_basis,
  tilt_error_deg: m.tilt_error_deg,
  azimuth_error_deg: m.azimuth_error_deg,
  orientation_factor_fraction: m.orientation_factor,
  orientation_factor_low_fraction: m.orientation_factor_band?.low ?? null,
  orientation_factor_high_fraction: m.orientation_factor_band?.high ?? null,
  // Without a skyline shading is not counted, which is not 0.
  shading_fraction: c.skyline && m.shading_fraction,
  shading_worst_point_fraction: c.skyline && m.shading_worst_point,
  tsrf_fraction: m.tsrf,
  tsrf_worst_point_fraction: m.tsrf_worst_point,
  gcr_fraction: m.gcr,
  rows: m.rows,
  dc_kw: m.dc_kw,
  ac_kw: m.ac_kw,
  modules_count: m.modules,
  land_m2: m.land_m2,
  irradiation_kwh_m2: m.irradiation_kwh_m2,
  beam_kwh_m2: m.beam_kwh_m2,
  sky_diffuse_kwh_m2: m.sky_diffuse_kwh_m2,
  ground_reflected_kwh_m2: m.ground_reflected_kwh_m2,
  energy_kwh: m.energy_kwh,
  energy_kwh_per_kw: m.energy_kwh_per_kw,
  gain_over_reference_fraction: m.gain_over_reference,
  gain_perez_fraction: m.gain_by_sky.perez,
  gain_hay_davies_fraction: m.gain_by_sky['hay-davies'],
  gain_reindl_fraction: m.gain_by_sky.reindl,
  gain_isotropic_fraction: m.gain_by_sky.isotropic,
  worst_month: m.worst_month.month,
  worst_month_kwh_per_kw_day: m.worst_month.kwh_per_kw_day,
  weakest_stage: m.weakest_stage,
  currency: c.currency,
  capital_currency: m.capital,
  capital_currency_per_kw: m.capital_per_kw,
  upkeep_currency_per_year: m.upkeep_per_year,
  lcoe_currency_per_kwh: m.lcoe_per_kwh,
  ...Object.fromEntries(
    rates.map((rate) => [
      `lcoe_at_${rate.replace(/\s*%/, '_percent')}_currency_per_kwh`,
      m.lcoe_at_rates[rate] ?? null,
    ]),
  ),
  cost_incomplete: m.cost_incomplete,
  premium_currency_per_kw: m.premium_per_kw,
  break_even_premium_currency_per_kw: m.break_even_premium_per_kw,
  break_even_gain_fraction: m.break_even_gain,
  highest_edge_m: m.wind.highest_edge_m,
  roof_projection_m: m.wind.roof_projection_m,
  kz_factor: m.wind.kz,
  velocity_pressure_pa: m.wind.velocity_pressure_pa,
  limits: listOrNull(m.limits.map((limit) => limitWords(limit))),
  readings: listOrNull(m.readings),
  survey_steps: listOrNull(m.survey_steps),
});

const listOrNull = (texts: readonly string[]): string | null =>
  texts.length === 0 ? null : texts.join('; ');

/** `data/mounts.csv`: a row a mount, units in the column names; money is in the column `currency`. */
export const mountsCsv = (c: Comparison): string => {
  const rates = [...new Set(c.mounts.flatMap((m) => Object.keys(m.lcoe_at_rates)))];
  return csvText(c.mounts.map((mount) => mountRecord(c, rates, mount)));
};

/** `data/monthly.csv`: a row a mount and month, with the fixed plane tilted for that month beside it. */
export const monthlyCsv = (c: Comparison): string =>
  csvText(
    c.mounts.flatMap((mount) =>
      MONTH_NAMES.map((month, m): Record<string, Cell> => {
        const plane = c.tilted_for_month.find((entry) => entry.month === month);
        return {
          mount_id: mount.id,
          month_number: m + 1,
          month,
          irradiation_kwh_m2: mount.irradiation_monthly_kwh_m2[m],
          energy_kwh_per_kw: mount.energy_monthly_kwh_per_kw[m],
          energy_kwh_per_kw_day: mount.energy_monthly_kwh_per_kw[m] / MONTH_DAYS[m],
          shading_fraction: c.skyline && mount.shading_monthly[m],
          tilted_for_month_kwh_per_kw_day: plane?.kwh_per_kw_day ?? null,
          tilted_for_month_tilt_deg: plane?.tilt_deg ?? null,
          tilted_for_month_azimuth_deg: plane?.azimuth_deg ?? null,
        };
      }),
    ),
  );
