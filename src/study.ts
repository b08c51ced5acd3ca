/**
 * The whole calculation, start to finish; pure: no disk, no clock, no screen.
 *
 *     study file ─┐
 *     weather ────┼→ sun → sky → mounts → energy → wind, cost → advice → one Comparison
 *     survey ─────┘
 */
import { type AdviceMount, advise, rankingBasis } from './advice/index.ts';
import { costOfEnergy, sameEnergy } from './cost/index.ts';
import { energyUnderInverter } from './energy/index.ts';
import type { Study } from './inputs/index.ts';
import { isTracker } from './mounts/index.ts';
import type { ArraySummary, Comparison, Finding, MountResult, SameEnergy, SkyModel } from './shared/index.ts';
import { assumptionsOf } from './study/assumptions.ts';
import { mountResult, worstMonth } from './study/mount-result.ts';
import { type MountRun, runMounts } from './study/mount-run.ts';
import { notCounted } from './study/not-counted.ts';
import { type ReadyYear, readyYear } from './study/ready-year.ts';
import { referenceOf } from './study/reference.ts';
import { ALL_MODELS, type Setting, settingOf } from './study/setting.ts';
import { NO_SURVEY, type SiteSurvey } from './study/site-survey.ts';
import { skylineResult } from './study/skyline-result.ts';
import { tiltedForMonth } from './study/tilted-for-month.ts';
import type { RawYear } from './weather/index.ts';
import { windBasis } from './wind/index.ts';

export { type PlaneFacts, planeFacts } from './study/plane-facts.ts';
export { NO_SURVEY, type SiteSurvey, surveySite } from './study/site-survey.ts';
export { type ReadyYear, readyYear };

export const SCHEMA = 'trackworth-comparison-1';

/** Compares every mount of a study over one year of weather. The weather has been read with the study's place and label. */
export const compareMounts = (study: Study, raw: RawYear, survey: SiteSurvey = NO_SURVEY): Comparison => {
  // weather → sun → sky: what is the same for every mount
  const setting = settingOf(study, raw, survey);
  const { ready, year, sun, sky, map, array } = setting;

  // mounts → energy: where each points, what it collects and delivers
  const runs = runMounts(setting);
  const reference = referenceOf(study, runs);
  const facing =
    reference.geometry.kind === 'fixed-tilt' ? reference.geometry.azimuthDeg : map.best.azimuthDeg;
  const monthPlanes = tiltedForMonth(sun, sky, reference, facing, setting.shade);

  // wind and cost, mount by mount
  const mounts = runs.map((run) => mountResult(run, reference, setting));
  const fixedInstead = fixedArraysInstead(setting, runs, reference, mounts);

  // advice
  const counted = { ...setting, runs, reference };
  const blanks = notCounted(counted);
  const findings = [...ready.found.findings, ...survey.findings, ...stowFindings(setting)];
  const adviceInput = {
    mounts: mounts.map((result, i) => adviceMount(result, runs[i], study, array)),
    referenceId: reference.mount.id,
    objective: study.objective,
    skyModel: study.sky.model,
    findings,
    notCounted: blanks,
    inverterGiven: array.ac_kw !== null,
    globalOnly: ready.globalOnly,
    currency: study.finance.currency,
    realRate: study.finance.realRate,
    years: study.finance.years,
    sameEnergy: fixedInstead,
    tiltedForMonth: monthPlanes,
  };
  const basis = rankingBasis(adviceInput);
  return {
    schema: SCHEMA,
    title: study.title,
    currency: study.finance.currency,
    reference_id: reference.mount.id,
    objective: basis.objective,
    ranked_by: basis.rankedBy,
    site: {
      latitude_deg: year.place.latitudeDeg,
      longitude_deg: year.place.longitudeDeg,
      elevation_m: year.place.elevationM,
      utc_offset_h: year.place.utcOffsetH,
    },
    weather: weatherSummary(ready, findings),
    sky_model: study.sky.model,
    array,
    best_orientation: {
      tilt_deg: map.best.tiltDeg,
      azimuth_deg: map.best.azimuthDeg,
      irradiation_kwh_m2: map.best.irradiationKwhM2,
    },
    orientation_map: {
      tilts_deg: [...map.tiltsDeg],
      azimuths_deg: [...map.azimuthsDeg],
      irradiation_kwh_m2: map.irradiationKwhM2.map((row) => [...row]),
    },
    skyline: skylineResult(setting),
    declinations: [...survey.declinations],
    mounts,
    tilted_for_month: monthPlanes,
    comparisons: { same_money: null, same_energy: fixedInstead, same_land: null, own_best: null },
    finance: { real_rate: study.finance.realRate, years: study.finance.years, ageing: study.finance.ageing },
    wind_basis: windBasis(study.wind),
    not_counted: blanks,
    advice: advise(adviceInput),
    assumptions: assumptionsOf(counted),
  };
};

/** A stow that cannot be counted must not pass for one that costs nothing. */
const stowFindings = ({ study, year }: Setting): Finding[] => {
  const parking = study.mounts.filter(({ stow }) => stow !== null).map(({ id }) => id);
  if (parking.length === 0 || year.windMs) return [];
  return [
    {
      code: 'stow-without-wind',
      severity: 'warning',
      text: `The weather file has no wind, so the stow of ${parking.join(', ')} is not counted, which flatters it.`,
      fix: 'Use a year with wind at 10 m.',
    },
  ];
};

/** For each tracker, the array on the reference mount that delivers as much under the same inverter. */
const fixedArraysInstead = (
  { study, array }: Setting,
  runs: readonly MountRun[],
  reference: MountRun,
  mounts: readonly MountResult[],
): SameEnergy[] =>
  isTracker(reference.geometry)
    ? []
    : mounts
        .map((result, i) => ({ ...result, cost: runs[i].mount.cost }))
        .filter((_, i) => isTracker(runs[i].geometry))
        .map((tracker) =>
          sameEnergy({
            tracker,
            finance: study.finance,
            reference: reference.mount,
            targetKwh: tracker.energy_kwh,
            energyOfDcKw: (dcKw) =>
              energyUnderInverter(reference.delivered[study.sky.model].uncappedKwPerKw, dcKw, array.ac_kw),
            startDcKw: array.dc_kw,
            moduleKw: array.module_w === null ? null : array.module_w / 1000,
            moduleAreaM2: array.module_area_m2,
            inverterKw: array.ac_kw,
            currency: study.finance.currency,
          }),
        );

/** Half of the band that reading errors leave to a plane's light, as a share of it. */
const readingError = ({ orientation_factor: factor, orientation_factor_band: band }: MountResult): number =>
  factor && band ? (band.high - band.low) / 2 / factor : 0;

const adviceMount = (result: MountResult, run: MountRun, study: Study, array: ArraySummary): AdviceMount => ({
  ...result,
  by_sky: Object.fromEntries(
    ALL_MODELS.map((model) => {
      const { energyKwhPerKw, energyMonthlyKwhPerKw } = run.delivered[model];
      const cost = costOfEnergy(run.mount.cost, study.finance, array.dc_kw, energyKwhPerKw * array.dc_kw);
      return [
        model,
        {
          energy_kwh_per_kw: energyKwhPerKw,
          worst_month_kwh_per_kw_day: worstMonth(energyMonthlyKwhPerKw).kwh_per_kw_day,
          lcoe_per_kwh: cost.lcoePerKwh,
        },
      ];
    }),
  ) as Record<SkyModel, AdviceMount['by_sky'][SkyModel]>,
  reading_error: readingError(result),
  snow_counted: run.mount.snow !== null,
  downtime_blank: isTracker(run.geometry) && (run.mount.drive?.working ?? null) === null,
});

const weatherSummary = ({ year, found }: ReadyYear, findings: readonly Finding[]): Comparison['weather'] => ({
  source: year.source,
  format: year.format,
  station: year.station,
  ghi_kwh_m2: found.annual.ghiKwhM2,
  dni_kwh_m2: found.annual.dniKwhM2,
  dhi_kwh_m2: found.annual.dhiKwhM2,
  ghi_monthly_kwh_m2: [...found.ghiMonthlyKwhM2],
  time_shift_min: found.timeShiftMin,
  dropped_night_kwh_m2: found.droppedNightKwhM2,
  findings: [...findings],
});
