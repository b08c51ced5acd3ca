import { type Parked, type PlaneViews, planeViews, type StuckAt } from '../energy/index.ts';
import type { StudyMount } from '../inputs/index.ts';
import {
  type DualAxis,
  isTracker,
  nearestAzimuth,
  type Pointing,
  planesStoppedAt,
  pointAtTurn,
  pointMastAt,
  pointStoppedTurntable,
  type ResolvedGeometry,
  reachOf,
  type SingleAxis,
  type TurnRange,
  turnsStoppedAt,
} from '../mounts/index.ts';
import { compassWords } from '../shared/index.ts';
import { type StowHours, type StowSpec, stowHours } from '../wind/index.ts';
import { overcastHours } from './overcast.ts';
import type { Setting } from './setting.ts';

/** The azimuth towards the equator, or as near to it as a mast turns. */
const equatorward = ({ year }: Setting, turns: TurnRange | undefined): number =>
  nearestAzimuth(turns ?? null, year.place.latitudeDeg < 0 ? 0 : 180);

/**
 * A tracker that lies flat along its axis; a mast that cannot lie flat as flat as it goes, and a turntable at its tilt,
 * both facing the equator or as near to it as they turn; null for mounts that do not move.
 */
export const flatPlane = (setting: Setting, geometry: ResolvedGeometry): PlaneViews | null => {
  const { sun, shade } = setting;
  if (geometry.kind === 'turntable')
    return planeViews(sun, pointStoppedTurntable(sun, geometry, equatorward(setting, geometry.turns)), shade);
  if (geometry.kind === 'dual-axis' && flattest(geometry) > 0) {
    const facing = equatorward(setting, geometry.turns);
    return planeViews(sun, pointMastAt(sun, geometry, flattest(geometry), facing), shade);
  }
  if (geometry.kind === 'single-axis' && (geometry.axisTiltDeg !== 0 || geometry.ground))
    return planeViews(sun, pointAtTurn(sun, geometry, 0), shade);
  return isTracker(geometry) ? setting.flat : null;
};

const turnsOf = (geometry: ResolvedGeometry): TurnRange | undefined =>
  'turns' in geometry ? geometry.turns : undefined;

/** The least tilt of a mast. */
const flattest = ({ elevation }: DualAxis): number => 90 - (elevation?.highestDeg ?? 90);

/** The planes where a dead tracker may stand, each as likely as the others; none for mounts that do not move. */
export const stuckPlanes = (
  setting: Setting,
  geometry: ResolvedGeometry,
  stuck: StuckAt,
  flat: PlaneViews | null,
): PlaneViews[] => {
  if (flat === null) return [];
  if (stuck === 'flat' || stuck === 'equator') return [flat];
  if (geometry.kind === 'single-axis') return stuckTurns(setting, geometry, stuck);
  return geometry.kind === 'dual-axis' ? stuckMasts(setting, geometry, stuck) : [];
};

type StuckAside = Exclude<StuckAt, 'flat' | 'equator'>;

const stuckTurns = ({ sun, shade, year }: Setting, mount: SingleAxis, stuck: StuckAside): PlaneViews[] => {
  const flatHours = mount.cloudy === 'flat' ? overcastHours(year) : null;
  const turns =
    stuck === 'average' ? turnsStoppedAt(sun, mount, flatHours) : 'turnDeg' in stuck ? [stuck.turnDeg] : [];
  let used: Pointing | null = null;
  return turns.map((turnDeg) => {
    used = pointAtTurn(sun, mount, turnDeg, used);
    return planeViews(sun, used, shade);
  });
};

const stuckMasts = ({ sun, shade }: Setting, mount: DualAxis, stuck: StuckAside): PlaneViews[] => {
  const planes =
    stuck === 'average' ? planesStoppedAt(sun, reachOf(mount)) : 'tiltDeg' in stuck ? [stuck] : [];
  let used: Pointing | null = null;
  return planes.map(({ tiltDeg, azimuthDeg }) => {
    used = pointMastAt(sun, mount, tiltDeg, azimuthDeg, used);
    return planeViews(sun, used, shade);
  });
};

/** A tracker parked in wind: in which hours, and where it then stands; null where it never parks or wind is not known. */
export const parkedPlane = (
  setting: Setting,
  { stow }: StudyMount,
  geometry: ResolvedGeometry,
  flat: PlaneViews | null,
): (StowHours & Parked) | null => {
  const { year, sun, shade } = setting;
  if (!stow || !year.windMs || flat === null) return null;
  const at = (pointing: Pointing) => planeViews(sun, pointing, shade);
  const views =
    stow.angleDeg === 0
      ? flat
      : geometry.kind === 'single-axis'
        ? at(pointAtTurn(sun, geometry, stow.angleDeg))
        : at(pointMastAt(sun, geometry as DualAxis, stow.angleDeg, equatorward(setting, turnsOf(geometry))));
  return { ...stowHours(year.windMs, stow), views };
};

/** How a parked tracker stands, in words that follow `parked`. */
export const parkedWords = ({ angleDeg }: StowSpec, geometry: ResolvedGeometry, setting: Setting): string => {
  if (geometry.kind === 'single-axis') return turnWords(angleDeg, geometry.axisAzimuthDeg);
  return angleDeg === 0
    ? flatWords(geometry)
    : `tilted ${angleDeg}° to face ${compassWords(equatorward(setting, turnsOf(geometry)))}`;
};

const flatWords = (geometry: ResolvedGeometry): string =>
  geometry.kind === 'dual-axis' && flattest(geometry) > 0 ? 'as flat as it goes' : 'flat';

/** The way a positive turn of a single-axis tracker faces, in the words of a compass. */
const turnWords = (turnDeg: number, axisAzimuthDeg: number): string =>
  turnDeg === 0
    ? 'flat'
    : `turned ${Math.abs(turnDeg)}° to face ${compassWords(axisAzimuthDeg + (turnDeg > 0 ? 90 : -90))}`;

/** How a dead tracker stands, in words that follow `stuck`. */
export const stuckWords = (stuck: StuckAt, geometry: ResolvedGeometry): string => {
  if (stuck === 'flat') return flatWords(geometry);
  if (stuck === 'equator') return 'facing the equator';
  if (stuck === 'average') return 'where it stopped, mean over every moment of daylight';
  if ('turnDeg' in stuck)
    return turnWords(stuck.turnDeg, geometry.kind === 'single-axis' ? geometry.axisAzimuthDeg : 180);
  return `tilted ${stuck.tiltDeg}° to face ${compassWords(stuck.azimuthDeg)} (${stuck.azimuthDeg}°)`;
};
