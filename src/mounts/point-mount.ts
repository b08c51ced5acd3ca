import type { SunHours } from '../sun/index.ts';
import { pointDualAxis } from './dual-axis.ts';
import { pointFixed } from './fixed.ts';
import type { Pointing } from './pointing.ts';
import { pointSingleAxis } from './single-axis.ts';
import type { DualAxis, FixedTilt, MountGeometry, RoofPlane, SingleAxis } from './spec.ts';

/** The same geometry with `best` and `surveyed` replaced by the angles that they stand for. */
export type ResolvedGeometry = SingleAxis | DualAxis | ResolvedPlane<RoofPlane> | ResolvedPlane<FixedTilt>;
type ResolvedPlane<G extends RoofPlane | FixedTilt> = G & { tiltDeg: number; azimuthDeg: number };

/**
 * Puts the optimum of the orientation map where a study says `best`, and the azimuth that its bearing came to where it
 * says `surveyed`. A given tilt keeps the map's azimuth and the reverse.
 */
export const resolveAngles = (
  geometry: MountGeometry,
  best: { readonly tiltDeg: number; readonly azimuthDeg: number },
  surveyedAzimuthDeg: number | null,
): ResolvedGeometry => {
  if (geometry.kind === 'single-axis' || geometry.kind === 'dual-axis') return geometry;
  if (geometry.azimuthDeg === 'surveyed' && surveyedAzimuthDeg === null)
    throw new Error(
      'A mount with a bearing needs the survey of its site (surveySite) before it can be compared.',
    );
  const tiltDeg = geometry.tiltDeg === 'best' ? best.tiltDeg : geometry.tiltDeg;
  const azimuthDeg =
    geometry.azimuthDeg === 'best'
      ? best.azimuthDeg
      : geometry.azimuthDeg === 'surveyed'
        ? (surveyedAzimuthDeg as number)
        : geometry.azimuthDeg;
  return { ...geometry, tiltDeg, azimuthDeg } as ResolvedGeometry;
};

/** Where a mount points in every sample of the sun; `used` as for {@link emptyPointing}. */
export const pointMount = (
  sun: SunHours,
  mount: ResolvedGeometry,
  used: Pointing | null = null,
): Pointing => {
  switch (mount.kind) {
    case 'roof-plane':
      return pointFixed(sun, mount.tiltDeg, mount.azimuthDeg, null, used);
    case 'fixed-tilt':
      return pointFixed(sun, mount.tiltDeg, mount.azimuthDeg, mount.rows?.gcr ?? null, used);
    case 'single-axis':
      return pointSingleAxis(sun, mount, used);
    case 'dual-axis':
      return pointDualAxis(sun, mount, used);
  }
};

export const isTracker = (mount: { readonly kind: MountGeometry['kind'] }): boolean =>
  mount.kind === 'single-axis' || mount.kind === 'dual-axis';
