import type { SunHours } from '../sun/index.ts';
import { pointDualAxis } from './dual-axis.ts';
import { pointFixed } from './fixed.ts';
import type { Pointing } from './pointing.ts';
import { pointSingleAxis } from './single-axis.ts';
import type { MountGeometry } from './spec.ts';

/** The same geometry with `best` replaced by the angles that it stands for. */
export type ResolvedGeometry = Exclude<MountGeometry, { kind: 'fixed-tilt' }> | ResolvedFixedTilt;
export type ResolvedFixedTilt = Extract<MountGeometry, { kind: 'fixed-tilt' }> & {
  tiltDeg: number;
  azimuthDeg: number;
};

/** Puts the optimum of the orientation map where a study says `best`. A given tilt keeps the map's azimuth and the reverse. */
export const resolveBest = (
  geometry: MountGeometry,
  best: { readonly tiltDeg: number; readonly azimuthDeg: number },
): ResolvedGeometry =>
  geometry.kind === 'fixed-tilt'
    ? {
        ...geometry,
        tiltDeg: geometry.tiltDeg === 'best' ? best.tiltDeg : geometry.tiltDeg,
        azimuthDeg: geometry.azimuthDeg === 'best' ? best.azimuthDeg : geometry.azimuthDeg,
      }
    : geometry;

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
