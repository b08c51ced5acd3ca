import type { DualAxis, ResolvedGeometry, SingleAxis } from '../mounts/index.ts';
import { compassWords } from '../shared/index.ts';

const degrees = (deg: number): string => `${Number(deg.toFixed(1)) + 0}°`;

const axisWords = ({ axisAzimuthDeg, axisTiltDeg }: SingleAxis): string =>
  Math.abs(axisTiltDeg) < 0.05
    ? `a level axis at azimuth ${degrees(axisAzimuthDeg)}`
    : `an axis falling ${degrees(axisTiltDeg)} toward azimuth ${degrees(axisAzimuthDeg)}`;

const singleAxisWords = (mount: SingleAxis): string => {
  const low =
    mount.rows === null
      ? 'true tracking'
      : mount.rows.lowSun === 'backtrack'
        ? 'turning back from its neighbours when the sun is low'
        : 'staying on a low sun in the shade of its neighbours';
  return `turns about ${axisWords(mount)}, swing ${degrees(mount.swingDeg)} either way, ${low}${mount.cloudy === 'flat' ? ', flat under cloud' : ''}`;
};

const turnsWords = ({ turns }: Pick<DualAxis, 'turns'>): string =>
  turns ? `, azimuth from ${degrees(turns.fromDeg)} to ${degrees(turns.toDeg)}` : '';

/** Where a mount points, in words that a reviewer can check: the defaults that the study did not write are in it. */
export const pointingWords = (mount: ResolvedGeometry): string => {
  switch (mount.kind) {
    case 'single-axis':
      return singleAxisWords(mount);
    case 'dual-axis':
      return `faces the sun${turnsWords(mount)}`;
    case 'turntable':
      return `turns about an upright axis at ${degrees(mount.planeTiltDeg)} tilt${turnsWords(mount)}`;
    default:
      return mount.tiltDeg < 0.5
        ? 'lies flat'
        : `${degrees(mount.tiltDeg)} tilt, facing ${degrees(mount.azimuthDeg)} (${compassWords(mount.azimuthDeg)})`;
  }
};
