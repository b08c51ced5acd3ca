import {
  type ChainSpec,
  type Delivered,
  deliver,
  type HeatLoss,
  lightThrough,
  OPEN_RACK,
  onRoof,
  otherwiseIn,
  type Parked,
  type PlaneViews,
  planeViews,
  type SkylineShade,
} from '../energy/index.ts';
import type { StudyMount } from '../inputs/index.ts';
import {
  type BestAngles,
  type Pointing,
  pointAtTurn,
  pointMount,
  pointTurntable,
  type ResolvedGeometry,
  resolveAngles,
  type Turntable,
} from '../mounts/index.ts';
import { goldenMaximum, type SkyModel, sinDeg, yearlySum } from '../shared/index.ts';
import { bestAzimuthAtTilt, bestTiltFacing } from '../sky/index.ts';
import { powerLawFactor, type StowHours } from '../wind/index.ts';
import { overcastHours } from './overcast.ts';
import { ALL_MODELS, type Setting } from './setting.ts';
import type { MountSurvey } from './site-survey.ts';
import { flatPlane, parkedPlane, stuckPlanes } from './still-planes.ts';

/** One mount with all that was worked out for it before money. */
export interface MountRun {
  readonly mount: StudyMount;
  readonly geometry: ResolvedGeometry;
  readonly gcr: number | null;
  readonly views: PlaneViews;
  /** Trackers: the plane lying flat, or what comes nearest to it, see {@link flatPlane}. */
  readonly flat: PlaneViews | null;
  /** Trackers: the planes where a dead one may stand, each as likely as the others. */
  readonly stuck: readonly PlaneViews[];
  /** Trackers: the hours in which it is parked, and its plane then; null where stow is not given, or the file has no wind. */
  readonly parked: (StowHours & Parked) | null;
  readonly chain: ChainSpec;
  readonly arrayHeightM: number;
  readonly survey: MountSurvey | null;
  /** Where the array loses most to the skyline, if it was read from several points, and the share of open light lost there. */
  readonly worstPoint: { readonly name: string; readonly shading: number } | null;
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

/** The energy chain of a mount: alike for all but cooling, wind at its height, and its drive. */
const chainOf = ({ study, year, array }: Setting, mount: StudyMount, arrayHeightM: number): ChainSpec => ({
  ambient: year,
  heatLoss: heatLossOf(mount),
  windFactor: powerLawFactor(arrayHeightM),
  heatPerK: study.array.module?.heatPerK ?? USUAL_HEAT_PER_K,
  losses: study.losses,
  snow: mount.snow,
  ceilingKwPerKw: array.ac_kw === null ? null : array.ac_kw / array.dc_kw,
  drive: mount.drive,
});

const runMount = (
  mount: StudyMount,
  geometry: ResolvedGeometry,
  pointing: Pointing,
  setting: Setting,
): MountRun => {
  const viewsPast = lyingFlatWhenCloudy(geometry, pointing, setting);
  const views = viewsPast(setting.shade);
  const flat = flatPlane(setting, geometry);
  const stuck = stuckPlanes(setting, geometry, mount.drive?.stuck ?? 'flat', flat);
  const parked = parkedPlane(setting, mount, geometry, flat);
  const arrayHeightM = arrayHeight(mount, geometry, setting.study.site.roofHeightM);
  const chain = chainOf(setting, mount, arrayHeightM);
  const delivered = {} as Record<SkyModel, Delivered>;
  for (const model of ALL_MODELS)
    delivered[model] = deliver(setting.skies[model], views, chain, stuck, parked);
  const gcr = 'rows' in geometry ? (geometry.rows?.gcr ?? null) : null;
  const survey = setting.survey.mounts.get(mount.id) ?? null;
  const worstPoint = worstPointOf(setting, views, viewsPast);
  return {
    mount,
    geometry,
    gcr,
    views,
    flat,
    stuck,
    parked,
    chain,
    arrayHeightM,
    survey,
    worstPoint,
    delivered,
  };
};

/** What a mount's plane sees past a skyline, with the overcast hours of a `cloudy: flat` tracker spent lying flat. */
const lyingFlatWhenCloudy = (
  geometry: ResolvedGeometry,
  pointing: Pointing,
  { sun, year }: Setting,
): ((shade: SkylineShade | null) => PlaneViews) => {
  const tracking = (shade: SkylineShade | null) => planeViews(sun, pointing, shade);
  if (geometry.kind !== 'single-axis' || geometry.cloudy !== 'flat') return tracking;
  const overcast = overcastHours(year);
  const flat = pointAtTurn(sun, geometry, 0);
  return (shade) => otherwiseIn(overcast, tracking(shade), planeViews(sun, flat, shade));
};

const worstPointOf = (
  { sky, pointShades }: Setting,
  open: PlaneViews,
  viewsPast: (shade: SkylineShade) => PlaneViews,
): MountRun['worstPoint'] => {
  const openLight = yearlySum(lightThrough(sky, open.open));
  let worst: MountRun['worstPoint'] = null;
  for (const { name, shade } of pointShades) {
    const past = yearlySum(lightThrough(sky, viewsPast(shade).skyline));
    const shading = shadingOf(openLight, past);
    if (!worst || shading > worst.shading) worst = { name, shading };
  }
  return worst;
};

/** Share of the open light that does not come past the skyline. */
export const shadingOf = (open: number, pastSkyline: number): number =>
  open > 0 ? Math.max(0, 1 - pastSkyline / open) : 0;

/** The tilt at which a turntable collects most unshaded light in the year, to a tenth of a degree. */
const bestTiltTurning = ({ sun, sky }: Setting, mount: Turntable): number => {
  let [pointing, views]: [Pointing | null, PlaneViews | null] = [null, null];
  const light = (planeTiltDeg: number): number => {
    pointing = pointTurntable(sun, { ...mount, planeTiltDeg, rows: null }, pointing);
    views = planeViews(sun, pointing, null, views);
    return yearlySum(lightThrough(sky, views.open));
  };
  return goldenMaximum(light, 0, 90, 0.1);
};

/** Points every mount at the sun and follows its light to delivered energy, under every sky model. */
export const runMounts = (setting: Setting): MountRun[] => {
  const { sun, sky, map } = setting;
  const best: BestAngles = {
    ...map.best,
    tiltFacing: (azimuthDeg) => bestTiltFacing(sun, sky, azimuthDeg),
    azimuthAtTilt: (tiltDeg) => bestAzimuthAtTilt(sun, sky, tiltDeg),
    tiltTurning: (mount) => bestTiltTurning(setting, mount),
  };
  let pointing: Pointing | null = null;
  return setting.study.mounts.map((mount) => {
    const surveyed = setting.survey.mounts.get(mount.id)?.azimuthDeg ?? null;
    const geometry = resolveAngles(mount.geometry, best, surveyed);
    pointing = pointMount(setting.sun, geometry, pointing);
    return runMount(mount, geometry, pointing, setting);
  });
};
