import { type PlaneViews, planeViews, type SkylineShade, skylineShade } from '../energy/index.ts';
import type { Study } from '../inputs/index.ts';
import { pointFixed } from '../mounts/index.ts';
import { type ArraySummary, type HourlyYear, type SkyModel, TrackworthError } from '../shared/index.ts';
import {
  DOUBT_MODELS,
  type OrientationMap,
  orientationMap,
  type SkyHours,
  skiesOverHours,
} from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';
import type { RawYear } from '../weather/index.ts';
import { arrayOf } from './array.ts';
import { type ReadyYear, readyYear } from './ready-year.ts';
import type { SiteSurvey } from './site-survey.ts';

/** The four skies of a study; every mount is worked out under each. */
export type Skies = Readonly<Record<SkyModel, SkyHours>>;
export const ALL_MODELS: readonly SkyModel[] = [...DOUBT_MODELS, 'isotropic'];

/** What is the same for every mount of a study: its year, its sun, its skies, its array. */
export interface Setting {
  readonly study: Study;
  readonly ready: ReadyYear;
  readonly year: HourlyYear;
  readonly sun: SunHours;
  readonly skies: Skies;
  /** The sky of the study's own model. */
  readonly sky: SkyHours;
  readonly map: OrientationMap;
  readonly array: ArraySummary;
  readonly survey: SiteSurvey;
  /** What the skyline takes, all points of the array together; null: open. */
  readonly shade: SkylineShade | null;
  /** The same for each point of the array alone, by name; none where there is only one. */
  readonly pointShades: readonly { readonly name: string; readonly shade: SkylineShade }[];
  /** A level plane: where a dead tracker lies. Level rows neither shade nor mask each other, so it serves them all. */
  readonly flat: PlaneViews;
}

const albedoOf = (study: Study, year: HourlyYear): number | Float64Array => {
  if (study.sky.albedo !== 'file') return study.sky.albedo;
  if (year.albedo) return year.albedo;
  throw new TrackworthError('input', [
    {
      code: 'no-albedo',
      file: year.source,
      field: 'sky.albedo',
      expected: 'a ground reflectance column, since the study says `albedo: file`',
      found: 'none in the weather file',
      fix: 'Write a number such as `albedo: 0.2`.',
    },
  ]);
};

/** weather → sun → sky: the study's clock applied, gaps closed, every model asked, the best fixed plane found. */
export const settingOf = (study: Study, raw: RawYear, survey: SiteSurvey): Setting => {
  const ready = readyYear(raw, study.weather);
  const { year, sun } = ready;
  const skies = skiesOverHours(sun, year, albedoOf(study, year), ALL_MODELS);
  const sky = skies[study.sky.model];
  const map = orientationMap(sun, sky, year.place.latitudeDeg);
  const shade = survey.skyline && skylineShade(sun, survey.skyline.profiles);
  const profiles = survey.skyline?.profiles ?? [];
  const pointShades =
    profiles.length < 2 ? [] : profiles.map((p) => ({ name: p.name, shade: skylineShade(sun, [p]) }));
  const flat = planeViews(sun, pointFixed(sun, 0, 180, null), shade);
  return {
    study,
    ready,
    year,
    sun,
    skies,
    sky,
    map,
    array: arrayOf(study.array),
    survey,
    shade,
    pointShades,
    flat,
  };
};
