import type { Study } from '../inputs/index.ts';
import { type Finding, MONTH_DAYS, type MountResult, TrackworthError } from '../shared/index.ts';
import { irradiationOfPlanes } from '../sky/index.ts';
import type { RawYear } from '../weather/index.ts';
import { orientationOf } from './mount-result.ts';
import { runMounts } from './mount-run.ts';
import { programmeLimits } from './orientation.ts';
import { settingOf } from './setting.ts';
import { NO_SURVEY, type SiteSurvey } from './site-survey.ts';

/** What `trackworth plane` says of one fixed plane; keys as in its JSON. */
export interface PlaneFacts {
  readonly tilt_deg: number;
  readonly azimuth_deg: number;
  readonly tilt_error_deg: number | null;
  readonly azimuth_error_deg: number | null;
  /** TOF: unshaded light over that of the best fixed plane of the site. */
  readonly orientation_factor: number;
  readonly orientation_factor_band: { readonly low: number; readonly high: number } | null;
  readonly shading_fraction: number;
  readonly shading_worst_point: number;
  /** Where the skyline was read from several points of the array: the one where the plane loses most. */
  readonly worst_point: string | null;
  /** TOF times (1 - shading). */
  readonly tsrf: number;
  readonly tsrf_worst_point: number;
  /** Light past the skyline, kWh/m2 a day (hours of 1000 W/m2), mean of the year and of each month. */
  readonly peak_sun_hours_per_day: { readonly year: number; readonly months: readonly number[] };
  /** TOF of the plane at the azimuth that a forgotten or reversed declination gives; null for a true bearing. */
  readonly declination_forgotten: number | null;
  readonly declination_reversed: number | null;
  readonly best_orientation: { readonly tilt_deg: number; readonly azimuth_deg: number };
  readonly readings: readonly string[];
  readonly survey_steps: readonly string[];
  readonly declinations: readonly string[];
  readonly limits: MountResult['limits'];
  readonly findings: readonly Finding[];
}

/**
 * How one fixed mount of a study is turned to the light.
 * @throws TrackworthError of kind `usage` where the study has no such mount or it is a tracker
 */
export const planeFacts = (
  study: Study,
  raw: RawYear,
  mountId: string,
  survey: SiteSurvey = NO_SURVEY,
): PlaneFacts => {
  const mounts = study.mounts.filter((mount) => mount.id === mountId);
  if (mounts.length === 0) throw noSuchMount(study, mountId, 'a mount of the study');
  const setting = settingOf({ ...study, mounts }, raw, survey);
  const [run] = runMounts(setting);
  if (!('tiltDeg' in run.geometry))
    throw noSuchMount(study, mountId, 'a fixed mount: a tracker has no one tilt');
  const { tiltDeg, azimuthDeg } = run.geometry;
  const o = orientationOf(run, setting);
  const maximum = setting.map.best.irradiationKwhM2;
  const at = irradiationOfPlanes(setting.sun, setting.sky);
  const factorAt = (azimuth: number | undefined) =>
    azimuth === undefined ? null : at(tiltDeg, azimuth) / maximum;
  const factor = o.orientation_factor as number;
  const past = run.delivered[study.sky.model].pastSkylineMonthlyKwhM2;
  return {
    tilt_deg: tiltDeg,
    azimuth_deg: azimuthDeg,
    tilt_error_deg: o.tilt_error_deg,
    azimuth_error_deg: o.azimuth_error_deg,
    orientation_factor: factor,
    orientation_factor_band: o.orientation_factor_band,
    shading_fraction: o.shading_fraction,
    shading_worst_point: o.shading_worst_point,
    worst_point: o.worst_point,
    tsrf: o.tsrf as number,
    tsrf_worst_point: o.tsrf_worst_point as number,
    peak_sun_hours_per_day: {
      year: past.reduce((sum, month) => sum + month, 0) / 365,
      months: past.map((month, m) => month / MONTH_DAYS[m]),
    },
    declination_forgotten: factorAt(run.survey?.mistakes?.forgottenDeg),
    declination_reversed: factorAt(run.survey?.mistakes?.reversedDeg),
    best_orientation: { tilt_deg: setting.map.best.tiltDeg, azimuth_deg: setting.map.best.azimuthDeg },
    readings: o.readings,
    survey_steps: o.survey_steps,
    declinations: survey.declinations,
    limits: programmeLimits(
      study.programme,
      factor,
      o.orientation_factor_band,
      survey.skyline && o.shading_worst_point,
    ),
    findings: [...setting.ready.found.findings, ...survey.findings],
  };
};

const noSuchMount = (study: Study, found: string, expected: string): TrackworthError =>
  new TrackworthError('usage', [
    {
      code: 'no-such-mount',
      expected,
      found,
      fix: `The study has ${study.mounts.map((mount) => mount.id).join(', ')}.`,
    },
  ]);
