import { breakEven, costOfEnergy, mountCost } from '../cost/index.ts';
import { lightBySource } from '../energy/index.ts';
import type { Study } from '../inputs/index.ts';
import { isTracker } from '../mounts/index.ts';
import {
  type ArraySummary,
  MONTH_DAYS,
  MONTH_NAMES,
  type MountResult,
  type SkyModel,
} from '../shared/index.ts';
import { type EdgeGeometry, screenWind, steepestChordTiltDeg } from '../wind/index.ts';
import type { MountRun } from './mount-run.ts';
import { ALL_MODELS, type Setting } from './setting.ts';

/** Energy per kW of DC rating in the month that gives least a day. */
export const worstMonth = (monthlyKwhPerKw: readonly number[]): MountResult['worst_month'] => {
  const daily = monthlyKwhPerKw.map((kwh, m) => kwh / MONTH_DAYS[m]);
  const worst = daily.indexOf(Math.min(...daily));
  return { month: MONTH_NAMES[worst], kwh_per_kw_day: daily[worst] };
};

const rowsInWords = ({ geometry, gcr }: MountRun): string => {
  if (geometry.kind === 'dual-axis') return gcr === null ? 'lone mast' : `field of masts at GCR ${gcr}`;
  return gcr === null ? 'no rows' : `rows at GCR ${gcr}`;
};

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
      steepestTiltDeg:
        geometry.kind === 'single-axis' ? steepestChordTiltDeg(geometry.swingDeg, geometry.axisTiltDeg) : 0,
    },
    'dual-axis': { arrangement: 'tracker', steepestTiltDeg: 90 },
  } as const;
  return {
    ...shape[geometry.kind],
    ...mount.lengths,
    moduleThicknessM: study.array.module?.thicknessM ?? null,
    roofHeightM: study.site.roofHeightM,
  };
};

const landM2 = ({ geometry, gcr }: MountRun, array: ArraySummary): number | null =>
  geometry.kind === 'roof-plane' || gcr === null || array.modules === null || array.module_area_m2 === null
    ? null
    : (array.modules * array.module_area_m2) / gcr;

/** One mount of the comparison, key by key of the contract. */
export const mountResult = (
  run: MountRun,
  reference: MountRun,
  { study, array, sky }: Setting,
  mapMaximumKwhM2: number,
): MountResult => {
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
  const best =
    mount.geometry.kind === 'fixed-tilt' &&
    (mount.geometry.tiltDeg === 'best' || mount.geometry.azimuthDeg === 'best');
  const weakest = delivered.stages.reduce((a, b) => (b.efficiency < a.efficiency ? b : a));
  return {
    id: mount.id,
    kind: geometry.kind,
    label: mount.label,
    tilt_deg: 'tiltDeg' in geometry ? geometry.tiltDeg : null,
    azimuth_deg: 'azimuthDeg' in geometry ? geometry.azimuthDeg : null,
    tilt_basis: tracker ? null : best ? 'best: unshaded optimum of the orientation map' : 'given',
    orientation_factor: tracker ? null : Math.min(1, delivered.irradiationKwhM2 / mapMaximumKwhM2),
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
    ...screenWind(edgeGeometry(run, study), study.wind),
  };
};

/** Where each stage's figure comes from. */
const STAGE_SOURCES: Record<
  MountRun['delivered']['perez']['stages'][number]['name'],
  (run: MountRun) => string
> = {
  rows: ({ geometry }) =>
    geometry.kind === 'dual-axis'
      ? 'shadows of a square field of masts; plain geometry, diffuse by assumption'
      : 'beam by profile angle, sky and ground by crossed strings (Hottel & Sarofim 1967)',
  incidence: () => 'Martin & Ruiz 2001, a_r 0.16',
  heat: ({ chain }) => chain.heatLoss.source,
  dirt: () => 'given',
  'module spread': () => 'given',
  cables: () => 'given',
  conversion: () => 'given',
  'inverter ceiling': () => "the inverter's AC rating, hour by hour",
  drive: () => 'given',
  downtime: () => 'given share of time working; stuck flat else',
};
