import { type Comparison, MONTH_DAYS, MONTH_NAMES, type MountResult } from '../../src/shared/index.ts';

/** An invented comparison at an invented place, Orlin Bench: every figure here is made up, and only hangs together. */

const DEG = Math.PI / 180;
export const TILTS = Array.from({ length: 46 }, (_, i) => i * 2);
export const AZIMUTHS = Array.from({ length: 72 }, (_, i) => i * 5);
const PEAK = 2000;

/** Invented closed form: 300 from all round plus 1 700 times the cosine of the angle to the best direction, never below 0.15. */
export const irradiationAt = (
  tilt: number,
  azimuth: number,
  bestTilt: number,
  bestAzimuth: number,
): number => {
  const cos =
    Math.cos(tilt * DEG) * Math.cos(bestTilt * DEG) +
    Math.sin(tilt * DEG) * Math.sin(bestTilt * DEG) * Math.cos((azimuth - bestAzimuth) * DEG);
  return 300 + (PEAK - 300) * Math.max(0.15, cos);
};

export const orientationMap = (bestTilt: number, bestAzimuth: number) => ({
  tilts_deg: TILTS,
  azimuths_deg: AZIMUTHS,
  irradiation_kwh_m2: TILTS.map((t) => AZIMUTHS.map((a) => irradiationAt(t, a, bestTilt, bestAzimuth))),
});

const SHAPE = [0.62, 0.72, 0.95, 1.08, 1.2, 1.3, 1.32, 1.24, 1.1, 0.9, 0.67, 0.55];

export interface InventedMount {
  id: string;
  label?: string;
  kind?: MountResult['kind'];
  tilt?: number | null;
  azimuth?: number | null;
  light?: number;
  lcoe?: number | null;
  swingOfYear?: number;
  clipped?: number;
  tof?: number | null;
  tiltError?: number;
  azimuthError?: number;
  band?: { low: number; high: number };
  shading?: number;
}

/** Reading errors as given, shade that is longest in winter, TSRF by its definition. */
const inventedSurvey = (m: InventedMount, tof: number | null, season: number[] | null) => {
  const shading = m.shading ?? 0;
  const tsrf = (shade: number) => (tof === null ? null : tof * (1 - shade));
  return {
    tilt_error_deg: m.tiltError ?? null,
    azimuth_error_deg: m.azimuthError ?? null,
    orientation_factor_band: m.band ?? null,
    shading_fraction: shading,
    shading_monthly: SHAPE.map((_, i) => season && shading / season[i]),
    shading_worst_point: shading * 1.5,
    worst_point: null,
    measured_with: [],
    tsrf: tsrf(shading),
    tsrf_worst_point: tsrf(shading * 1.5),
    readings: [],
    survey_steps: [],
  };
};

export const inventedMount = (m: InventedMount): MountResult => {
  const light = m.light ?? 2000;
  const tracker = m.kind === 'single-axis' || m.kind === 'dual-axis';
  const list: [string, number][] = [
    ...(m.shading === undefined ? [] : ([['skyline', 1 - m.shading]] as [string, number][])),
    ['rows', 0.97],
    ['incidence', 0.975],
    ['heat', m.kind === 'roof-plane' ? 0.91 : 0.94],
    ['dirt', 0.98],
    ['module spread', 0.99],
    ['cables', 0.985],
    ['conversion', 0.965],
    ['inverter ceiling', 1 - (m.clipped ?? 0.004)],
    ...(tracker ? ([['drive', 0.997]] as [string, number][]) : []),
  ];
  let after = light;
  const stages = list.map(([name, efficiency]) => {
    after *= efficiency;
    return { name, efficiency, kwh_per_kw_after: after, source: 'invented' };
  });
  const season = SHAPE.map((s) => 1 + (s - 1) * (m.swingOfYear ?? 1));
  const whole = season.reduce((sum, s, i) => sum + s * MONTH_DAYS[i], 0);
  const monthly = season.map((s, i) => (after * s * MONTH_DAYS[i]) / whole);
  const perDay = monthly.map((kwh, i) => kwh / MONTH_DAYS[i]);
  const worst = perDay.indexOf(Math.min(...perDay));
  return {
    id: m.id,
    kind: m.kind ?? 'fixed-tilt',
    label: m.label ?? m.id,
    tilt_deg: tracker ? null : (m.tilt ?? 34),
    azimuth_deg: tracker ? null : (m.azimuth ?? 186),
    pointing: tracker ? 'axis level, north-south' : 'as given',
    tilt_basis: tracker ? null : 'given',
    orientation_factor: tracker ? null : (m.tof ?? light / PEAK),
    ...inventedSurvey(m, tracker ? null : (m.tof ?? light / PEAK), light > 0 ? season : null),
    gcr: null,
    rows: 'no rows',
    irradiation_kwh_m2: light,
    irradiation_monthly_kwh_m2: season.map((s, i) => (light * s * MONTH_DAYS[i]) / whole),
    beam_kwh_m2: light * (tracker ? 0.66 : 0.6),
    sky_diffuse_kwh_m2: light * (tracker ? 0.32 : 0.38),
    ground_reflected_kwh_m2: light * 0.02,
    gain_over_reference: 0,
    gain_by_sky: { perez: 0, 'hay-davies': 0, reindl: 0, isotropic: 0 },
    dc_kw: 12.04,
    ac_kw: 10,
    modules: 28,
    land_m2: null,
    energy_kwh: after * 12.04,
    energy_kwh_per_kw: after,
    energy_monthly_kwh_per_kw: monthly,
    worst_month: { month: MONTH_NAMES[worst], kwh_per_kw_day: perDay[worst] },
    stages,
    weakest_stage: m.kind === 'roof-plane' ? 'heat' : 'heat',
    snow: null,
    stow: null,
    downtime: null,
    visits_per_year: null,
    capital: null,
    capital_per_kw: null,
    upkeep_per_year: null,
    renewals: [],
    lcoe_per_kwh: m.lcoe ?? null,
    lcoe_at_rates: {},
    cost_incomplete: false,
    break_even_premium_per_kw: null,
    break_even_gain: null,
    premium_per_kw: null,
    wind: {
      highest_edge_m: null,
      roof_projection_m: null,
      velocity_pressure_pa: null,
      kz: null,
      missing: [],
    },
    limits: [],
  };
};

export const inventedComparison = (
  mounts: readonly InventedMount[],
  best: { tilt: number; azimuth: number } = { tilt: 34, azimuth: 186 },
): Comparison => {
  const results = mounts.map(inventedMount);
  const south = best.azimuth < 90 || best.azimuth > 270;
  if (south)
    for (const mount of results) {
      const turned = mount.energy_monthly_kwh_per_kw.map((_, i) => {
        const opposite = (i + 6) % 12;
        return (mount.energy_monthly_kwh_per_kw[opposite] / MONTH_DAYS[opposite]) * MONTH_DAYS[i];
      });
      mount.energy_monthly_kwh_per_kw = turned;
      const perDay = turned.map((kwh, i) => kwh / MONTH_DAYS[i]);
      const worst = perDay.indexOf(Math.min(...perDay));
      mount.worst_month = { month: MONTH_NAMES[worst], kwh_per_kw_day: perDay[worst] };
    }
  const reference = results.find((m) => m.kind === 'fixed-tilt') ?? results[0];
  for (const m of results)
    m.gain_over_reference =
      reference.energy_kwh_per_kw > 0 ? m.energy_kwh_per_kw / reference.energy_kwh_per_kw - 1 : 0;
  return {
    schema: 'trackworth-comparison-1',
    title: 'Orlin Bench (invented)',
    currency: results.some((m) => m.lcoe_per_kwh !== null) ? 'USD' : null,
    reference_id: reference.id,
    objective: 'lowest cost per kWh',
    ranked_by: 'lowest cost per kWh',
    site: { latitude_deg: south ? -40.1 : 40.1, longitude_deg: -104.92, elevation_m: 1500, utc_offset_h: -7 },
    weather: {
      source: 'orlin.epw',
      format: 'EPW',
      station: 'Orlin Bench',
      ghi_kwh_m2: 1700,
      dni_kwh_m2: 2000,
      dhi_kwh_m2: 550,
      ghi_monthly_kwh_m2: SHAPE.map((s) => s * 140),
      time_shift_min: 0,
      dropped_night_kwh_m2: 0,
      findings: [],
    },
    sky_model: 'perez',
    array: { given: true, dc_kw: 12.04, ac_kw: 10, modules: 28, module_w: 430, module_area_m2: 55.7 },
    best_orientation: { tilt_deg: best.tilt, azimuth_deg: best.azimuth, irradiation_kwh_m2: PEAK },
    orientation_map: orientationMap(best.tilt, best.azimuth),
    skyline: null,
    declinations: [],
    mounts: results,
    tilted_for_month: MONTH_NAMES.map((month, i) => ({
      month,
      tilt_deg: 30,
      azimuth_deg: best.azimuth,
      kwh_per_kw_day: (reference.energy_monthly_kwh_per_kw[i] / MONTH_DAYS[i]) * (1.02 + 0.07 * Math.abs(1 - SHAPE[(i + (south ? 6 : 0)) % 12])),
    })), // biome-ignore format: one formula
    comparisons: { same_money: null, same_energy: [], same_land: null, own_best: null },
    finance: { real_rate: 0.06, years: 25, ageing: 0.005 },
    wind_basis: null,
    not_counted: [],
    advice: { choice: null, confidence: null, headline: '', leads: [], reasons: [], switch_points: [], doubts: [], cautions: [], excluded: [] },
    assumptions: [],
  }; // biome-ignore format: a record
};

/** Four mounts as in a usual study. */
export const USUAL: InventedMount[] = [
  { id: 'ground', lcoe: 0.109, light: 1998 },
  { id: 'roof', label: 'Shop roof', kind: 'roof-plane', tilt: 14.04, azimuth: 166, light: 1870, lcoe: 0.113 },
  { id: 'tracker', kind: 'single-axis', light: 2350, lcoe: 0.124, swingOfYear: 1.25, clipped: 0.02 },
  { id: 'mast', label: 'Dual-axis mast', kind: 'dual-axis', light: 2680, lcoe: 0.163, swingOfYear: 0.9, clipped: 0.05 },
]; // biome-ignore format: one mount a line

/** Eight mounts with long and hard labels, one without any energy. */
export const EIGHT: InventedMount[] = [
  { id: 'ground', label: 'Ground rack on the old orchard terrace, driven posts, two modules high', light: 1996, lcoe: 0.1 },
  { id: 'roof', label: 'Shop roof south pitch', kind: 'roof-plane', tilt: 14, azimuth: 166, light: 1870, lcoe: 0.113 },
  { id: 'barn', label: 'Barn roof east pitch with the standing seam', kind: 'roof-plane', tilt: 30, azimuth: 96, light: 1600, lcoe: 0.131 },
  { id: 'west', label: 'Barn roof west pitch', kind: 'roof-plane', tilt: 30, azimuth: 276, light: 1580, lcoe: 0.133 },
  { id: 'steep', label: 'Steep winter rack', tilt: 60, azimuth: 186, light: 1830, lcoe: 0.117, swingOfYear: 0.5 },
  { id: 'tracker', kind: 'single-axis', light: 2350, lcoe: 0.124, swingOfYear: 1.25, clipped: 0.02 },
  { id: 'mast', label: 'Donaudampfschifffahrtsgesellschaftsnachführmast am Südhang', kind: 'dual-axis', light: 2680, lcoe: 0.163 },
  { id: 'cellar', label: 'Wall in the shade', kind: 'roof-plane', tilt: 90, azimuth: 6, light: 0, lcoe: null, tof: 0 },
]; // biome-ignore format: one mount a line
