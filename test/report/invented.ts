/**
 * Invented results for the tests of the report: an invented place, invented mounts, invented figures. Nothing here
 * comes from a run; the figures only agree with each other (stages multiply to energy, months add up to the year).
 */
import {
  type Comparison,
  MONTH_DAYS,
  MONTH_NAMES,
  type MountResult,
  type SkyModel,
} from '../../src/shared/index.ts';

const SEASON = [0.55, 0.68, 0.92, 1.1, 1.25, 1.33, 1.35, 1.28, 1.12, 0.88, 0.62, 0.5];

/** Spreads a yearly sum over the months by the invented season (shifted half a year in the south). */
const overMonths = (year: number, south = false): number[] => {
  const weights = SEASON.map((_, m) => SEASON[south ? (m + 6) % 12 : m] * MONTH_DAYS[m]);
  const all = weights.reduce((a, b) => a + b, 0);
  return weights.map((w) => (year * w) / all);
};

const STAGES: Record<string, number> = {
  rows: 0.975,
  incidence: 0.972,
  heat: 0.957,
  dirt: 0.98,
  'module spread': 0.99,
  cables: 0.985,
  conversion: 0.965,
  'inverter ceiling': 0.998,
};

interface Invented {
  id: string;
  kind: MountResult['kind'];
  label?: string;
  irradiation: number;
  stages?: Record<string, number>;
  capitalPerKw?: number | null;
  lcoe?: number | null;
}

const REFERENCE_YIELD = 1650.4 * Object.values(STAGES).reduce((a, b) => a * b, 1);

const NOT_SURVEYED = {
  tilt_error_deg: null,
  azimuth_error_deg: null,
  orientation_factor_band: null,
  shading_fraction: 0,
  shading_monthly: MONTH_NAMES.map(() => 0),
  shading_worst_point: 0,
  worst_point: null,
  measured_with: [],
  readings: [],
  survey_steps: [],
};

export const inventedMount = (m: Invented): MountResult => {
  const tracker = m.kind === 'single-axis' || m.kind === 'dual-axis';
  const factor = tracker ? null : 0.9987654321;
  let left = m.irradiation;
  const stages = Object.entries(m.stages ?? STAGES).map(([name, efficiency]) => {
    left *= efficiency;
    return { name, efficiency, kwh_per_kw_after: left, source: 'invented' };
  });
  const perKw = left;
  const months = overMonths(perKw);
  const daily = months.map((sum, i) => sum / MONTH_DAYS[i]);
  const worst = daily.indexOf(Math.min(...daily));
  const gain = perKw / REFERENCE_YIELD - 1;
  const capital = m.capitalPerKw ?? null;
  return {
    id: m.id,
    kind: m.kind,
    label: m.label ?? m.id,
    tilt_deg: tracker ? null : 34.2,
    azimuth_deg: tracker ? null : 186,
    pointing: tracker ? 'axis level, north-south, swing 60°, backtracks' : '34.2° tilt, facing 186° (south)',
    tilt_basis: tracker ? null : 'best: unshaded optimum of the orientation map',
    orientation_factor: factor,
    ...NOT_SURVEYED,
    tsrf: factor,
    tsrf_worst_point: factor,
    gcr: m.kind === 'dual-axis' ? null : 0.45,
    rows: m.kind === 'dual-axis' ? 'lone mast' : 'rows at GCR 0.45',
    irradiation_kwh_m2: m.irradiation,
    irradiation_monthly_kwh_m2: overMonths(m.irradiation),
    beam_kwh_m2: m.irradiation * 0.62,
    sky_diffuse_kwh_m2: m.irradiation * 0.35,
    ground_reflected_kwh_m2: m.irradiation * 0.03,
    gain_over_reference: gain,
    gain_by_sky: {
      perez: gain,
      'hay-davies': gain * 0.96,
      reindl: gain * 0.97,
      isotropic: gain * 0.8,
    } satisfies Record<SkyModel, number>,
    dc_kw: 12.04,
    ac_kw: 10,
    modules: 28,
    land_m2: m.kind === 'roof-plane' ? null : 124.3,
    energy_kwh: perKw * 12.04,
    energy_kwh_per_kw: perKw,
    energy_monthly_kwh_per_kw: months,
    worst_month: { month: MONTH_NAMES[worst], kwh_per_kw_day: daily[worst] },
    stages,
    weakest_stage: stages.reduce((a, b) => (b.efficiency < a.efficiency ? b : a)).name,
    snow: null,
    stow: null,
    downtime: null,
    visits_per_year: null,
    capital: capital === null ? null : capital * 12.04,
    capital_per_kw: capital,
    upkeep_per_year: capital === null ? null : 216.72,
    renewals: [],
    lcoe_per_kwh: m.lcoe ?? null,
    lcoe_at_rates: {},
    cost_incomplete: false,
    break_even_premium_per_kw: tracker && capital !== null ? 66.7 : null,
    break_even_gain: tracker && capital !== null ? 0.2789 : null,
    premium_per_kw: capital === null ? null : capital - 1900,
    wind: {
      highest_edge_m: tracker ? 2.31 : null,
      roof_projection_m: m.kind === 'roof-plane' ? 0.135 : null,
      velocity_pressure_pa: tracker ? 1123.4 : null,
      kz: tracker ? 0.849 : null,
      missing: tracker ? [] : ['slant', 'lower_edge'],
    },
    limits: [
      {
        name: 'height',
        bound: 'most',
        status: 'not_checked',
        detail: 'not checked: slant and lower_edge are blank',
        value: null,
        asked: null,
        excess_m: null,
      },
    ],
  };
};

/** Trackers and fixed mounts with all costs, a note, a warning, and things not counted. */
export const invented = (): Comparison => {
  const drive = { ...STAGES, drive: 0.997 };
  const mounts = [
    inventedMount({ id: 'ground', kind: 'fixed-tilt', label: 'Ground rack', irradiation: 1650.4, capitalPerKw: 1900, lcoe: 0.10912 }),
    inventedMount({ id: 'roof', kind: 'roof-plane', label: 'Barn roof', irradiation: 1533.1, stages: { ...STAGES, rows: 1, heat: 0.931 }, capitalPerKw: 1850, lcoe: 0.11344 }),
    inventedMount({ id: 'tracker', kind: 'single-axis', label: 'Tracker', irradiation: 1871.9, stages: drive, capitalPerKw: 2300, lcoe: 0.12401 }),
    inventedMount({ id: 'mast', kind: 'dual-axis', label: 'Mast', irradiation: 2090.2, stages: { incidence: 0.989, ...drive, rows: 1 }, capitalPerKw: 3400, lcoe: 0.16322 }),
  ]; // biome-ignore format: a mount a line
  mounts[1].limits = [
    {
      name: 'roof projection',
      bound: 'most',
      status: 'kept',
      detail: 'within: 0.135 of 0.254 m',
      value: 0.135,
      asked: 0.254,
      excess_m: null,
    },
  ];
  mounts[3].limits = [
    {
      name: 'height',
      bound: 'most',
      status: 'broken',
      detail: 'exceeds 3 m by 0.9 m',
      value: 3.9,
      asked: 3,
      excess_m: 0.9,
    },
    {
      name: 'roof projection',
      bound: 'most',
      status: 'not_checked',
      detail: 'not checked: not on a roof',
      value: null,
      asked: null,
      excess_m: null,
    },
  ];
  return {
    schema: 'trackworth-comparison-1',
    title: 'Orlin Bench',
    currency: 'USD',
    reference_id: 'ground',
    objective: 'lowest cost per kWh',
    ranked_by: 'lowest cost per kWh',
    site: { latitude_deg: 40.1, longitude_deg: -104.92, elevation_m: 1634, utc_offset_h: -7 },
    weather: {
      source: 'orlin.epw',
      format: 'EPW',
      station: 'Orlin Bench (invented)',
      ghi_kwh_m2: 1421.5,
      dni_kwh_m2: 1602.2,
      dhi_kwh_m2: 560.9,
      ghi_monthly_kwh_m2: overMonths(1421.5),
      time_shift_min: 2.4,
      dropped_night_kwh_m2: 0,
      findings: [
        { code: 'closure', severity: 'warning', text: 'GHI exceeds DNI·cos z + DHI by 2.1 % over the year.', fix: 'Ask which two were measured.' },
        { code: 'day-symmetry', severity: 'note', text: 'Afternoons are 3 % brighter than mornings.', fix: '' },
      ], // biome-ignore format: a finding a line
    },
    sky_model: 'perez',
    array: { given: true, dc_kw: 12.04, ac_kw: 10, modules: 28, module_w: 430, module_area_m2: 1.9888 },
    best_orientation: { tilt_deg: 34.2, azimuth_deg: 186, irradiation_kwh_m2: 1652.4 },
    orientation_map: { tilts_deg: [0, 45], azimuths_deg: [90, 180], irradiation_kwh_m2: [[1421.5, 1421.5], [1301.2, 1640.3]] },
    skyline: null,
    declinations: [],
    mounts,
    tilted_for_month: MONTH_NAMES.map((month, m) => ({
      month,
      tilt_deg: [64, 57, 43, 27, 13, 5, 8, 20, 37, 52, 62, 66][m],
      azimuth_deg: 186,
      kwh_per_kw_day: 3.3 + SEASON[m],
    })),
    comparisons: {
      same_money: null,
      same_energy: ['tracker', 'mast'].map((tracker_id, i) => ({
        tracker_id,
        reference_id: 'ground',
        reachable: true,
        target_kwh: 19800,
        modules: 32 + 4 * i,
        dc_kw: 13.76 + 1.72 * i,
        energy_kwh: 19850,
        module_area_m2: 63.6,
        capital: 26144,
        capital_difference: -1548,
        present_cost_difference: -2960,
        text: `${32 + 4 * i} modules on Ground rack in place of 28 deliver the 19 800 kWh a year (under the same 10 kW inverter): 1 550 USD less capital.`,
      })),
      same_land: null,
      own_best: null,
    },
    finance: { real_rate: 0.06, years: 25, ageing: 0.005 },
    wind_basis: {
      edition: 'ASCE 7-16',
      design_gust_ms: 51.4,
      exposure: 'C',
      kzt: 1,
      kd: 0.85,
      ke: 1,
      deferral: 'Screening only: structure belongs to the local code and a licensed engineer.',
    },
    not_counted: [
      { what: 'mounts.tracker.drive.working', effect: '5 % of the year stuck flat costs Tracker 1.2 % of its energy' },
      { what: 'losses.snow', effect: '' },
    ],
    advice: {
      choice: 'ground',
      confidence: 'clear',
      headline: 'CHOOSE Ground rack: 34° tilt, facing 186° (south). Lead: CLEAR over Tracker, LIKELY over Barn roof.',
      leads: [
        { over: 'tracker', confidence: 'clear', lead: 0.0149, doubt: 0.0021, unit: 'USD per kWh', why: 'the lead is over twice the doubt' },
        { over: 'roof', confidence: 'likely', lead: 0.0043, doubt: 0.0026, unit: 'USD per kWh', why: 'rows differ' },
      ],
      reasons: [
        'Tracker delivers 13.1 % more per kW than Ground rack and costs 13.6 % more per kWh.',
        'Mast is put aside: its height exceeds 3 m by 0.90 m.',
      ],
      switch_points: ['Tracker wins if its premium over Ground rack falls below 67 USD/kW (quoted 400).'],
      doubts: ['The sky models move the gain of Tracker over Ground rack from 12.6 % to 13.1 %.'],
      cautions: ['Falls: work above 1.8 m needs protection.', 'Modules are live in daylight.'],
      excluded: [{ id: 'mast', why: 'height exceeds 3 m by 0.9 m' }],
    },
    assumptions: [
      { what: 'sky.albedo', value: '0.2', source: 'assumption: common ground, default of the study file' },
      { what: 'Kd', value: '0.85', source: 'ASCE 7-16, table 26.6-1' },
    ],
  }; // biome-ignore format: an invented entry a line
};

const withoutMoney = (mount: MountResult): MountResult => ({
  ...mount,
  capital: null,
  capital_per_kw: null,
  upkeep_per_year: null,
  lcoe_per_kwh: null,
  lcoe_at_rates: {},
  break_even_gain: null,
  break_even_premium_per_kw: null,
  premium_per_kw: null,
});

/** No cost, no array, no inverter, no wind: what the simplest study gives. */
export const inventedBare = (): Comparison => {
  const c = invented();
  return {
    ...c,
    currency: null,
    ranked_by: 'most kWh per kW',
    array: { given: false, dc_kw: 1, ac_kw: null, modules: null, module_w: null, module_area_m2: null },
    finance: { real_rate: null, years: null, ageing: null },
    wind_basis: null,
    weather: { ...c.weather, time_shift_min: null, dropped_night_kwh_m2: 0.31, findings: [] },
    mounts: c.mounts.map((mount) => ({
      ...withoutMoney(mount),
      dc_kw: 1,
      ac_kw: null,
      modules: null,
      land_m2: null,
      energy_kwh: mount.energy_kwh_per_kw,
      limits: [],
      wind: {
        highest_edge_m: null,
        roof_projection_m: null,
        velocity_pressure_pa: null,
        kz: null,
        missing: [],
      },
    })),
    comparisons: {
      ...c.comparisons,
      same_energy: c.comparisons.same_energy.map((s) => ({
        ...s,
        modules: null,
        module_area_m2: null,
        capital: null,
        capital_difference: null,
        present_cost_difference: null,
        text: '1.13 kW of Ground rack in place of 1 kW deliver the 1 560 kWh a year of Tracker (no inverter is given, so its ceiling was not counted): the difference in capital is not known.',
      })),
    },
    not_counted: [
      'inverter',
      'drive.working',
      'drive.own_use',
      'dirt',
      'cables',
      'snow',
      'conversion',
      'costs',
    ].map((what) => ({
      what,
      effect: `one plausible value of ${what} would take 1 to 2 % of the energy of every mount`,
    })),
    advice: {
      ...c.advice,
      headline: 'CHOOSE Tracker by energy: 13.1 % more per kW than Ground rack. Costs are not given.',
      choice: 'tracker',
      leads: [],
      reasons: ['Tracker delivers 13.1 % more per kW than Ground rack.'],
      switch_points: [],
      excluded: [],
    },
  };
};

/** Costs without a rate: 4, 7 and 10 %, upkeep blank on the tracker. */
export const inventedWithoutRate = (): Comparison => {
  const c = invented();
  const mounts = c.mounts.map((mount) => ({
    ...mount,
    lcoe_per_kwh: null,
    lcoe_at_rates: { '4 %': 0.0912, '7 %': 0.1131, '10 %': 0.1377 },
    break_even_gain: null,
    break_even_premium_per_kw: null,
  }));
  mounts[2].cost_incomplete = true;
  mounts[2].upkeep_per_year = null;
  return { ...c, mounts, finance: { ...c.finance, real_rate: null } };
};

/** A clock that is off withholds the recommendation. */
export const inventedBlocked = (): Comparison => {
  const c = invented();
  return {
    ...c,
    weather: {
      ...c.weather,
      time_shift_min: 58.7,
      findings: [
        ...c.weather.findings,
        {
          code: 'clock-shift',
          severity: 'block',
          text: 'The file fits the sun best 59 min later than it says.',
          fix: 'Write weather: { add_minutes: 60 }, or accept_clock: true if the clock is right.',
        },
      ],
    },
    advice: {
      ...c.advice,
      choice: null,
      confidence: null,
      headline: 'NO RECOMMENDATION: the clock of the weather file is off by 59 min.',
      leads: [],
    },
  };
};

/** South of the equator, facing north. */
export const inventedSouth = (): Comparison => {
  const c = invented();
  return {
    ...c,
    title: 'Kessa Flat (invented)',
    site: { latitude_deg: -33.2, longitude_deg: 20.55, elevation_m: 12, utc_offset_h: 5.75 },
    mounts: c.mounts.map((m) => ({
      ...m,
      azimuth_deg: m.azimuth_deg === null ? null : 354.04,
      energy_monthly_kwh_per_kw: overMonths(m.energy_kwh_per_kw, true),
      worst_month: { ...m.worst_month, month: 'Jun' },
    })),
  };
};

/** The day of an invented reading: user text, and the only date in a memo. */
export const READ_ON = '2026-05-01';

/** Bearings and slopes read on site, a skyline seen from two points, a programme's minimum factors. */
export const inventedSurveyed = (): Comparison => {
  const c = invented();
  const mounts = c.mounts.map((m, i): MountResult => {
    const shading = [0.021, 0.034, 0.0624, 0.071][i];
    const worst = shading * 1.5;
    const tof = m.orientation_factor;
    return {
      ...m,
      shading_fraction: shading,
      shading_worst_point: worst,
      worst_point: 'east row',
      shading_monthly: MONTH_NAMES.map((_, month) => (month === 11 ? null : shading / SEASON[month])),
      tsrf: tof === null ? null : tof * (1 - shading),
      tsrf_worst_point: tof === null ? null : tof * (1 - worst),
      stages: [{ name: 'skyline', efficiency: 1 - shading, kwh_per_kw_after: m.irradiation_kwh_m2 * (1 - shading), source: 'invented' }, ...m.stages.map((s) => ({ ...s, kwh_per_kw_after: s.kwh_per_kw_after * (1 - shading) }))],
      energy_kwh_per_kw: m.energy_kwh_per_kw * (1 - shading),
      energy_monthly_kwh_per_kw: m.energy_monthly_kwh_per_kw.map((kwh) => kwh * (1 - shading)),
    };
  }); // biome-ignore format: stages on one line
  mounts[0].limits = [
    {
      name: 'TOF',
      bound: 'least',
      status: 'kept',
      detail: '99.9 % where at least 75 % is asked',
      value: 0.999,
      asked: 0.75,
      excess_m: null,
    },
    {
      name: 'TSRF',
      bound: 'least',
      status: 'kept',
      detail: '96.7 % where at least 75 % is asked',
      value: 0.967,
      asked: 0.75,
      excess_m: null,
    },
  ];
  mounts[1] = {
    ...mounts[1],
    tilt_deg: 14.04,
    azimuth_deg: 166,
    tilt_error_deg: 2,
    azimuth_error_deg: 5,
    orientation_factor: 0.712,
    orientation_factor_band: { low: 0.703, high: 0.7234 },
    tsrf: 0.712 * (1 - 0.034),
    tsrf_worst_point: 0.712 * (1 - 0.051),
    tilt_basis: 'given',
    measured_with: ['compass', 'rise and run'],
    readings: [`bearing 150 magnetic, taken facing, dated ${READ_ON}, error 5 deg`, 'slope 3:12'],
    survey_steps: ['150 + 16 E = 166 true', 'faces south-south-east', '3:12 = 25 % = 14 degrees, +- 2'],
    limits: [
      { name: 'roof projection', bound: 'most', status: 'kept', detail: 'within: 0.135 of 0.254 m', value: 0.135, asked: 0.254, excess_m: null },
      { name: 'TOF', bound: 'least', status: 'broken', detail: '71.2 % where at least 75 % is asked, 70.3 % to 72.3 % within the reading errors', value: 0.712, asked: 0.75, excess_m: null },
      { name: 'TSRF', bound: 'least', status: 'within_reading_error', detail: '67.6 % where at least 68 % is asked, 66.7 % to 68.6 % within the reading errors', value: 0.676, asked: 0.68, excess_m: null },
    ],
  }; // biome-ignore format: a limit a line
  const points = [[0, 4], [100, 17], [180, 3], [262, 22.25], [360, 4]]; // biome-ignore format: points
  const profile = (name: string, factor: number) => ({
    name,
    azimuths_deg: points.map(([azimuth]) => azimuth),
    elevations_deg: points.map(([, elevation]) => elevation * factor),
    sky_blocked: 0.031 * factor,
  });
  return {
    ...c,
    mounts,
    declinations: [`16.02 E by an invented model at 40.1 N 104.92 W on ${READ_ON}, 0.11 degrees a year toward west, +- 0.4`],
    skyline: {
      profiles: [profile('west row', 1), profile('east row', 1.5)],
      worst_point: 'east row',
      sun_paths: [{ name: '21 December', azimuths_deg: [150, 180, 210], elevations_deg: [20, 26, 20] }],
    },
  }; // biome-ignore format: a long line
};

/** One fixed mount, which is its own reference. */
export const inventedAlone = (): Comparison => {
  const c = invented();
  return {
    ...c,
    mounts: [c.mounts[0]],
    comparisons: { ...c.comparisons, same_energy: [] },
    advice: {
      ...c.advice,
      leads: [],
      switch_points: [],
      excluded: [],
      doubts: [],
      reasons: ['It is the only mount.'],
    },
  };
};

export const HOSTILE =
  '=HYPERLINK("x")</script>|\n\r\n# `code` [x](javascript:alert(1)) ![i](http://x.invalid) \u001b[31m\u202e&lt; *b* 横浜の屋根|‮ end';

/** Every text that a user or a file may choose, hostile. */
export const inventedHostile = (): Comparison => {
  const c = inventedSurveyed();
  const h = HOSTILE;
  return {
    ...c,
    title: h,
    currency: '|USD\n',
    weather: {
      ...c.weather,
      source: `${h}.epw`,
      station: h,
      findings: [{ code: 'x', severity: 'warning', text: h, fix: h }],
    },
    mounts: c.mounts.map((m) => ({
      ...m,
      label: `${m.id} ${h}`,
      limits: m.limits.map((l) => ({ ...l, detail: h })),
      readings: m.readings.map((r) => `${r}${h}`),
      survey_steps: m.survey_steps.map((s) => `${s}${h}`),
    })),
    declinations: [h],
    skyline: {
      ...c.skyline!,
      worst_point: h,
      profiles: c.skyline!.profiles.map((p, i) => ({ ...p, name: i === 0 ? h : `${h}${i}` })),
    },
    comparisons: {
      ...c.comparisons,
      same_energy: c.comparisons.same_energy.map((s) => ({ ...s, text: `32 modules on ${h}` })),
    },
    not_counted: [{ what: h, effect: h }],
    advice: {
      ...c.advice,
      headline: `CHOOSE ${h}`,
      reasons: [h],
      switch_points: [h],
      doubts: [h],
      cautions: [h],
      excluded: [{ id: 'mast', why: h }],
      leads: c.advice.leads.map((l) => ({ ...l, why: h })),
    },
    assumptions: [{ what: h, value: h, source: h }],
  };
};

export const VARIANTS: readonly (readonly [string, () => Comparison])[] = [
  ['all costs', invented],
  ['nothing but energy', inventedBare],
  ['no rate', inventedWithoutRate],
  ['blocked', inventedBlocked],
  ['south of the equator', inventedSouth],
  ['one mount', inventedAlone],
  ['surveyed', inventedSurveyed],
  ['hostile text', inventedHostile],
];

export const EXTRAS = {
  version: '0.0.0-invented',
  chartFiles: ['irradiation', 'months', 'cost', 'dial'].map((name) => ({
    name,
    title: `Finding of ${name}`,
    altText: `What ${name} shows`,
    file: `charts/${name}.svg`,
  })),
  inputs: [{ name: 'study.yaml', sha256: 'ab12'.repeat(16) }],
};
