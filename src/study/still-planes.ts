import { type Parked, type PlaneViews, planeViews, type StuckAt } from '../energy/index.ts';
import type { StudyMount } from '../inputs/index.ts';
import {
  type DualAxis,
  isTracker,
  type Pointing,
  planesStoppedAt,
  pointAtTurn,
  pointMastAt,
  type ResolvedGeometry,
  type SingleAxis,
  turnsStoppedAt,
} from '../mounts/index.ts';
import { compassWords } from '../shared/index.ts';
import { type StowHours, type StowSpec, stowHours } from '../wind/index.ts';
import type { Setting } from './setting.ts';

/** A tracker that lies flat along its axis; null for mounts that do not move. */
export const flatPlane = (setting: Setting, geometry: ResolvedGeometry): PlaneViews | null => {
  if (!isTracker(geometry)) return null;
  return geometry.kind === 'single-axis' && geometry.axisTiltDeg !== 0
    ? planeViews(setting.sun, pointAtTurn(setting.sun, geometry, 0), setting.shade)
    : setting.flat;
};

/** The planes where a dead tracker may stand, each as likely as the others; none for mounts that do not move. */
export const stuckPlanes = (
  setting: Setting,
  geometry: ResolvedGeometry,
  stuck: StuckAt,
  flat: PlaneViews | null,
): PlaneViews[] => {
  if (flat === null) return [];
  if (stuck === 'flat') return [flat];
  if (geometry.kind === 'single-axis') return stuckTurns(setting, geometry, stuck);
  return geometry.kind === 'dual-axis' ? stuckMasts(setting, geometry, stuck) : [];
};

type StuckAside = Exclude<StuckAt, 'flat'>;

const stuckTurns = ({ sun, shade }: Setting, mount: SingleAxis, stuck: StuckAside): PlaneViews[] => {
  const turns = stuck === 'average' ? turnsStoppedAt(sun, mount) : 'turnDeg' in stuck ? [stuck.turnDeg] : [];
  let used: Pointing | null = null;
  return turns.map((turnDeg) => {
    used = pointAtTurn(sun, mount, turnDeg, used);
    return planeViews(sun, used, shade);
  });
};

const stuckMasts = ({ sun, shade }: Setting, mount: DualAxis, stuck: StuckAside): PlaneViews[] => {
  const planes = stuck === 'average' ? planesStoppedAt(sun) : 'tiltDeg' in stuck ? [stuck] : [];
  let used: Pointing | null = null;
  return planes.map(({ tiltDeg, azimuthDeg }) => {
    used = pointMastAt(sun, mount, tiltDeg, azimuthDeg, used);
    return planeViews(sun, used, shade);
  });
};

/** The azimuth towards the equator. */
const equatorward = ({ year }: Setting): number => (year.place.latitudeDeg < 0 ? 0 : 180);

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
        : at(pointMastAt(sun, geometry as DualAxis, stow.angleDeg, equatorward(setting)));
  return { ...stowHours(year.windMs, stow), views };
};

/** How a parked tracker stands, in words that follow `parked`. */
export const parkedWords = ({ angleDeg }: StowSpec, geometry: ResolvedGeometry, setting: Setting): string => {
  if (geometry.kind === 'single-axis') return turnWords(angleDeg, geometry.axisAzimuthDeg);
  return angleDeg === 0 ? 'flat' : `tilted ${angleDeg}° to face ${compassWords(equatorward(setting))}`;
};

/** The way a positive turn of a single-axis tracker faces, in the words of a compass. */
const turnWords = (turnDeg: number, axisAzimuthDeg: number): string =>
  turnDeg === 0
    ? 'flat'
    : `turned ${Math.abs(turnDeg)}° to face ${compassWords(axisAzimuthDeg + (turnDeg > 0 ? 90 : -90))}`;

/** How a dead tracker stands, in words that follow `stuck`. */
export const stuckWords = (stuck: StuckAt, geometry: ResolvedGeometry): string => {
  if (stuck === 'flat') return 'flat';
  if (stuck === 'average') return 'where it stopped, mean over every moment of daylight';
  if ('turnDeg' in stuck)
    return turnWords(stuck.turnDeg, geometry.kind === 'single-axis' ? geometry.axisAzimuthDeg : 180);
  return `tilted ${stuck.tiltDeg}° to face ${compassWords(stuck.azimuthDeg)} (${stuck.azimuthDeg}°)`;
};
