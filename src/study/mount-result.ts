import { breakEven, costOfEnergy, mountCost } from '../cost/index.ts';
import { type Delivered, lightBySource } from '../energy/index.ts';
import type { Study, StudyMount } from '../inputs/index.ts';
import { crossAxisTiltOf, isTracker, type ResolvedGeometry, type SingleAxis } from '../mounts/index.ts';
import {
  type ArraySummary,
  cosDeg,
  DEG,
  MONTH_DAYS,
  MONTH_NAMES,
  type MountResult,
  type SkyModel,
} from '../shared/index.ts';
import {
  type EdgeGeometry,
  GUST_FACTOR,
  screenWind,
  steepestChordAboveSlopeDeg,
  steepestChordTiltDeg,
} from '../wind/index.ts';
import { type MountRun, shadingOf } from './mount-run.ts';
import { factorBand, programmeLimits } from './orientation.ts';
import { pointingWords } from './pointing-words.ts';
import { ALL_MODELS, type Setting } from './setting.ts';
import { slopeLimits } from './slope-limits.ts';
import { parkedWords, stuckWords } from './still-planes.ts';

/** Energy per kW of DC rating in the month that gives least a day. */
export const worstMonth = (monthlyKwhPerKw: readonly number[]): MountResult['worst_month'] => {
  const daily = monthlyKwhPerKw.map((kwh, m) => kwh / MONTH_DAYS[m]);
  const worst = daily.indexOf(Math.min(...daily));
  return { month: MONTH_NAMES[worst], kwh_per_kw_day: daily[worst] };
};

const rowsInWords = ({ geometry, gcr }: MountRun): string => {
  if (geometry.kind === 'dual-axis') return gcr === null ? 'lone mast' : `field of masts at GCR ${gcr}`;
  if (geometry.kind === 'turntable')
    return `${gcr === null ? 'alone' : `field at GCR ${gcr},`} at ${Number(geometry.planeTiltDeg.toFixed(1))}° tilt`;
  return gcr === null ? 'no rows' : `rows at GCR ${gcr}`;
};

const steepestChordOf = (mount: SingleAxis): number =>
  mount.ground
    ? steepestChordAboveSlopeDeg(mount.swingDeg, crossAxisTiltOf(mount), mount.ground.slopeDeg)
    : steepestChordTiltDeg(mount.swingDeg, mount.axisTiltDeg);

/** Shapes a mount's lengths for the wind screen. */
export const edgeGeometry = ({ mount, geometry }: MountRun, study: Study): EdgeGeometry => {
  const shape = {
    'roof-plane': { arrangement: 'roof', steepestTiltDeg: 0 },
    'fixed-tilt': {
      arrangement: 'ground-rack',
      steepestTiltDeg: geometry.kind === 'fixed-tilt' ? geometry.tiltDeg : 0,
    },
    'single-axis': {
      arrangement: 'tracker',
      steepestTiltDeg: geometry.kind === 'single-axis' ? steepestChordOf(geometry) : 0,
    },
    'dual-axis': {
      arrangement: 'tracker',
      steepestTiltDeg: 90 - (geometry.kind === 'dual-axis' ? (geometry.elevation?.lowestDeg ?? 0) : 0),
    },
    turntable: {
      arrangement: 'tracker',
      steepestTiltDeg: geometry.kind === 'turntable' ? geometry.planeTiltDeg : 0,
    },
  } as const;
  return {
    ...shape[geometry.kind],
    ...mount.lengths,
    moduleThicknessM: study.array.module?.thicknessM ?? null,
    roofHeightM: study.site.roofHeightM,
  };
};

/** How far the reading error of a rack's tilt may move its upper edge, m: the slant's rise against the tilt. */
const edgeErrorM = ({ mount, geometry, survey }: MountRun): number =>
  geometry.kind === 'fixed-tilt' && mount.lengths.slantM !== null && survey?.tiltErrorDeg
    ? mount.lengths.slantM * cosDeg(geometry.tiltDeg) * survey.tiltErrorDeg * DEG
    : 0;

const landM2 = ({ geometry, gcr }: MountRun, array: ArraySummary): number | null =>
  geometry.kind === 'roof-plane' || gcr === null || array.modules === null || array.module_area_m2 === null
    ? null
    : (array.modules * array.module_area_m2) / gcr;

export type Orientation = Pick<
  MountResult,
  | 'tilt_error_deg'
  | 'azimuth_error_deg'
  | 'orientation_factor'
  | 'orientation_factor_band'
  | 'shading_fraction'
  | 'shading_monthly'
  | 'shading_worst_point'
  | 'worst_point'
  | 'tsrf'
  | 'tsrf_worst_point'
  | 'measured_with'
  | 'readings'
  | 'survey_steps'
>;

/** How well a plane is turned to the light, what the skyline takes, and how that was read. */
export const orientationOf = (run: MountRun, { study, sun, sky, map }: Setting): Orientation => {
  const { geometry, survey, worstPoint } = run;
  const { irradiationKwhM2, irradiationMonthlyKwhM2, pastSkylineMonthlyKwhM2 } =
    run.delivered[study.sky.model];
  const past = pastSkylineMonthlyKwhM2.reduce((sum, month) => sum + month, 0);
  const shading = shadingOf(irradiationKwhM2, past);
  const atWorst = worstPoint?.shading ?? shading;
  const [tiltErrorDeg, azimuthErrorDeg] = [survey?.tiltErrorDeg ?? null, survey?.azimuthErrorDeg ?? null];
  const fixed = 'tiltDeg' in geometry ? geometry : null;
  const maximum = map.best.irradiationKwhM2;
  const factor = fixed && Math.min(1, irradiationKwhM2 / maximum);
  return {
    tilt_error_deg: tiltErrorDeg,
    azimuth_error_deg: azimuthErrorDeg,
    orientation_factor: factor,
    orientation_factor_band:
      fixed && factorBand(sun, sky, { ...fixed, tiltErrorDeg, azimuthErrorDeg }, maximum),
    shading_fraction: shading,
    shading_monthly: irradiationMonthlyKwhM2.map((open, m) =>
      open > 0 ? shadingOf(open, pastSkylineMonthlyKwhM2[m]) : null,
    ),
    shading_worst_point: atWorst,
    worst_point: worstPoint?.name ?? null,
    tsrf: factor === null ? null : factor * (1 - shading),
    tsrf_worst_point: factor === null ? null : factor * (1 - atWorst),
    measured_with: [...(survey?.measuredWith ?? [])],
    readings: [...(survey?.readings ?? [])],
    survey_steps: [...(survey?.steps ?? [])],
  };
};

const limitsOfProgramme = (o: Orientation, { study, survey }: Setting): MountResult['limits'] =>
  o.orientation_factor === null
    ? []
    : programmeLimits(
        study.programme,
        o.orientation_factor,
        o.orientation_factor_band,
        survey.skyline && o.shading_worst_point,
      );

/** One mount of the comparison, key by key of the contract. */
export const mountResult = (run: MountRun, reference: MountRun, setting: Setting): MountResult => {
  const { study, array, sky } = setting;
  const { mount, geometry } = run;
  const model = study.sky.model;
  const delivered = run.delivered[model];
  const tracker = isTracker(geometry);
  const source = lightBySource(sky, run.views.open);
  const gain = (m: SkyModel) =>
    run === reference ? 0 : run.delivered[m].energyKwhPerKw / reference.delivered[m].energyKwhPerKw - 1;
  const energyKwh = delivered.energyKwhPerKw * array.dc_kw;
  const cost = costOfEnergy(mount.cost, study.finance, array.dc_kw, energyKwh);
  const costed = (r: MountRun) => ({
    cost: r.mount.cost,
    dcKw: array.dc_kw,
    energyKwh: r.delivered[model].energyKwhPerKw * array.dc_kw,
  });
  const even = tracker && run !== reference ? breakEven(costed(run), costed(reference), study.finance) : null;
  const referenceCapital = mountCost(reference.mount.cost, array.dc_kw).capitalPerKw;
  const orientation = orientationOf(run, setting);
  const screened = screenWind(edgeGeometry(run, study), study.wind, edgeErrorM(run));
  const weakest = delivered.stages.reduce((a, b) => (b.efficiency < a.efficiency ? b : a));
  return {
    id: mount.id,
    kind: geometry.kind,
    label: mount.label,
    tilt_deg: heldTiltDeg(geometry),
    azimuth_deg: 'azimuthDeg' in geometry ? geometry.azimuthDeg : null,
    tilt_basis: tiltBasis(mount),
    pointing: pointingWords(geometry),
    ...orientation,
    gcr: run.gcr,
    rows: rowsInWords(run),
    irradiation_kwh_m2: delivered.irradiationKwhM2,
    irradiation_monthly_kwh_m2: [...delivered.irradiationMonthlyKwhM2],
    beam_kwh_m2: source.beam,
    sky_diffuse_kwh_m2: source.sky,
    ground_reflected_kwh_m2: source.ground,
    gain_over_reference: gain(model),
    gain_by_sky: Object.fromEntries(ALL_MODELS.map((m) => [m, gain(m)])) as Record<SkyModel, number>,
    dc_kw: array.dc_kw,
    ac_kw: array.ac_kw,
    modules: array.modules,
    land_m2: landM2(run, array),
    energy_kwh: energyKwh,
    energy_kwh_per_kw: delivered.energyKwhPerKw,
    energy_monthly_kwh_per_kw: [...delivered.energyMonthlyKwhPerKw],
    worst_month: worstMonth(delivered.energyMonthlyKwhPerKw),
    stages: delivered.stages.map((s) => ({
      name: s.name,
      efficiency: s.efficiency,
      kwh_per_kw_after: s.kwhPerKwAfter,
      source: STAGE_SOURCES[s.name](run),
    })),
    weakest_stage: weakest.name,
    snow: snowOf(run, setting),
    stow: stowOf(run, setting),
    downtime: downtimeOf(run, delivered),
    visits_per_year: mount.drive?.visits ?? null,
    capital: cost.capital,
    capital_per_kw: cost.capitalPerKw,
    upkeep_per_year: cost.upkeepPerYear,
    renewals: [...(mount.cost?.renewals ?? [])],
    lcoe_per_kwh: cost.lcoePerKwh,
    lcoe_at_rates: cost.lcoeAtRates,
    cost_incomplete: cost.incomplete,
    break_even_premium_per_kw: even?.premiumPerKw ?? null,
    break_even_gain: even?.gain ?? null,
    premium_per_kw:
      run === reference || cost.capitalPerKw === null || referenceCapital === null
        ? null
        : cost.capitalPerKw - referenceCapital,
    wind: screened.wind,
    limits: [...screened.limits, ...slopeLimits(geometry), ...limitsOfProgramme(orientation, setting)],
  };
};

const heldTiltDeg = (geometry: ResolvedGeometry): number | null => {
  if (geometry.kind === 'turntable') return geometry.planeTiltDeg;
  return 'tiltDeg' in geometry ? geometry.tiltDeg : null;
};

/** Whose angles a plane has; null for trackers without a held tilt. */
const tiltBasis = ({ geometry: asked, readings }: StudyMount): string | null => {
  if (asked.kind === 'single-axis' || asked.kind === 'dual-axis') return null;
  if (asked.kind === 'turntable')
    return asked.planeTiltDeg === 'best' ? 'best: most unshaded light of the year, turning' : 'given';
  const [tilt, azimuth] = [asked.tiltDeg === 'best', asked.azimuthDeg === 'best'];
  const optimum = 'best: unshaded optimum of the orientation map';
  if (tilt && azimuth) return optimum;
  if (tilt) return `${optimum} for the azimuth given`;
  if (azimuth) return `${optimum} for the tilt given`;
  return readings ? 'read on site' : 'given';
};

/** Where each stage's figure comes from. */
const STAGE_SOURCES: Record<
  MountRun['delivered']['perez']['stages'][number]['name'],
  (run: MountRun) => string
> = {
  skyline: () =>
    'sun hour by hour against the skyline, even sky by its view, horizon band of 6.5 degrees (Perez et al. 1986)',
  rows: ({ geometry }) =>
    geometry.kind === 'dual-axis' || geometry.kind === 'turntable'
      ? 'shadows of a square field of masts; plain geometry, diffuse by assumption'
      : geometry.kind === 'single-axis' && geometry.ground
        ? 'beam on sloping ground by Anderson & Mikofski 2020, eq. 32; sky and ground by crossed strings (Hottel & Sarofim 1967)'
        : 'beam by profile angle, sky and ground by crossed strings (Hottel & Sarofim 1967)',
  incidence: () => 'Martin & Ruiz 2001, a_r 0.16',
  heat: ({ chain }) => chain.heatLoss.source,
  dirt: () => 'given',
  snow: () => 'given by month; dims every hour of its month alike',
  'module spread': () => 'given',
  cables: () => 'given',
  conversion: () => 'given',
  'inverter ceiling': () => "the inverter's AC rating, hour by hour",
  stow: () =>
    'given gust and hold time against hourly wind at 10 m; parked hours take the light of the parked plane',
  drive: () => 'given',
  downtime: ({ mount, geometry }) =>
    `given share of time working; stuck ${stuckWords(mount.drive?.stuck ?? 'flat', geometry)} else`,
};

/** What snow takes from a mount; null where that is not counted. */
const snowOf = ({ mount, delivered }: MountRun, { study }: Setting): MountResult['snow'] => {
  const { stages } = delivered[study.sky.model];
  const stage = stages.find(({ name }) => name === 'snow');
  if (!mount.snow || !stage) return null;
  const before = stages[stages.indexOf(stage) - 1].kwhPerKwAfter;
  return {
    monthly_shares: [...mount.snow],
    // Sums in another order may differ in the last digit; snow never gives.
    taken_kwh_per_kw: Math.max(0, before - stage.kwhPerKwAfter),
    lower_edge_m: mount.lengths.lowerEdgeM,
  };
};

/** What parking in wind costs a tracker; null where that is not counted. */
const stowOf = ({ mount, geometry, parked, delivered }: MountRun, setting: Setting): MountResult['stow'] => {
  const lost = delivered[setting.study.sky.model].lostToStowMonthlyKwhPerKw;
  if (!mount.stow || !parked || !lost) return null;
  const { gustMs, gustFactor, releaseMs, holdH } = mount.stow;
  const lit = setting.sun.sunlit;
  return {
    gust_ms: gustMs,
    gust_factor: gustFactor ?? GUST_FACTOR,
    release_ms: releaseMs ?? gustMs,
    hold_h: holdH,
    parked: parkedWords(mount.stow, geometry, setting),
    hours: parked.hours,
    daylight_hours: parked.stowed.reduce((sum, stowed, h) => sum + (stowed && lit[h] > 0 ? 1 : 0), 0),
    events: parked.events,
    longest_h: parked.longestH,
    lost_kwh_per_kw: lost.reduce((sum, month) => sum + month, 0),
    lost_monthly_kwh_per_kw: [...lost],
  };
};

/** What a tracker delivers while it is dead; null where that is not counted. */
const downtimeOf = ({ mount, geometry }: MountRun, delivered: Delivered): MountResult['downtime'] => {
  const { working, stuck } = mount.drive ?? {};
  const { deadKwhPerKw, keptWhileDead } = delivered;
  if (working == null || stuck == null || deadKwhPerKw === null) return null;
  return {
    working,
    stuck: stuckWords(stuck, geometry),
    stuck_kwh_per_kw: deadKwhPerKw,
    kept_while_stuck: keptWhileDead,
  };
};
