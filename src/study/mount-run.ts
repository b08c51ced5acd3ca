import {
  type ArraySpec,
  type ChainSpec,
  type Delivered,
  deliver,
  type HeatLoss,
  OPEN_RACK,
  onRoof,
  type PlaneViews,
  planeViews,
} from '../energy/index.ts';
import type { Study, StudyMount } from '../inputs/index.ts';
import { isTracker, pointFixed, pointMount, type ResolvedGeometry, resolveBest } from '../mounts/index.ts';
import { type ArraySummary, type HourlyYear, type SkyModel, sinDeg } from '../shared/index.ts';
import { DOUBT_MODELS, type SkyHours } from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';
import { powerLawFactor } from '../wind/index.ts';

/** The four skies of a study; every mount is worked out under each. */
export type Skies = Readonly<Record<SkyModel, SkyHours>>;
export const ALL_MODELS: readonly SkyModel[] = [...DOUBT_MODELS, 'isotropic'];

/** One mount with all that was worked out for it before money. */
export interface MountRun {
  readonly mount: StudyMount;
  readonly geometry: ResolvedGeometry;
  readonly gcr: number | null;
  readonly views: PlaneViews;
  /** Trackers: the plane lying flat where it stands, among its rows. */
  readonly flat: PlaneViews | null;
  readonly chain: ChainSpec;
  readonly arrayHeightM: number;
  readonly delivered: Readonly<Record<SkyModel, Delivered>>;
}

/** Assumed where a study is silent, to bring 10 m wind to the modules. */
const GROUND_ARRAY_HEIGHT_M = 2;
const ROOF_ARRAY_HEIGHT_M = 4;
/** Crystalline silicon; common practice, no source. */
export const USUAL_HEAT_PER_K = -0.0035;

const arrayHeight = (
  { lengths }: StudyMount,
  geometry: ResolvedGeometry,
  roofHeightM: number | null,
): number => {
  if (geometry.kind === 'roof-plane') return roofHeightM ?? ROOF_ARRAY_HEIGHT_M;
  if (geometry.kind !== 'fixed-tilt') return lengths.axisHeightM ?? GROUND_ARRAY_HEIGHT_M;
  return lengths.lowerEdgeM !== null && lengths.slantM !== null
    ? lengths.lowerEdgeM + (lengths.slantM / 2) * sinDeg(geometry.tiltDeg)
    : GROUND_ARRAY_HEIGHT_M;
};

const heatLossOf = ({ lengths, geometry }: StudyMount): HeatLoss =>
  geometry.kind === 'roof-plane' ? onRoof(lengths.airBehindM) : OPEN_RACK;

/** The energy chain of a mount, alike for all but heat, wind at its height, and its drive. */
export const chainOf = (
  study: { readonly losses: Study['losses']; readonly array: ArraySpec },
  year: HourlyYear,
  array: ArraySummary,
  heatLoss: HeatLoss,
  arrayHeightM: number,
  drive: ChainSpec['drive'],
): ChainSpec => ({
  ambient: year,
  heatLoss,
  windFactor: powerLawFactor(arrayHeightM),
  heatPerK: study.array.module?.heatPerK ?? USUAL_HEAT_PER_K,
  losses: study.losses,
  ceilingKwPerKw: array.ac_kw === null ? null : array.ac_kw / array.dc_kw,
  drive,
});

/** Points one mount at the sun and follows its light to delivered energy, under every sky model. */
export const runMount = (
  mount: StudyMount,
  best: { readonly tiltDeg: number; readonly azimuthDeg: number },
  study: Study,
  ready: { readonly year: HourlyYear; readonly sun: SunHours },
  array: ArraySummary,
  skies: Skies,
): MountRun => {
  const { sun, year } = ready;
  const geometry = resolveBest(mount.geometry, best);
  const gcr = 'rows' in geometry ? (geometry.rows?.gcr ?? null) : null;
  const views = planeViews(sun, pointMount(sun, geometry));
  const flat = isTracker(geometry) ? planeViews(sun, pointFixed(sun, 0, 180, gcr)) : null;
  const arrayHeightM = arrayHeight(mount, geometry, study.site.roofHeightM);
  const chain = chainOf(study, year, array, heatLossOf(mount), arrayHeightM, mount.drive);
  const delivered = Object.fromEntries(
    ALL_MODELS.map((model) => [model, deliver(skies[model], views, chain, flat)]),
  ) as Record<SkyModel, Delivered>;
  return { mount, geometry, gcr, views, flat, chain, arrayHeightM, delivered };
};
