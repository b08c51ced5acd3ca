import type { SunHours } from '../sun/index.ts';
import { pointDualAxis } from './dual-axis.ts';
import { pointFixed } from './fixed.ts';
import type { Pointing } from './pointing.ts';
import { pointSingleAxis } from './single-axis.ts';
import type { DualAxis, FixedTilt, MountGeometry, RoofPlane, SingleAxis, Turntable } from './spec.ts';
import { pointTurntable, type TiltedTurntable } from './turntable.ts';

/** The same geometry with `best` and `surveyed` replaced by the angles that they stand for. */
export type ResolvedGeometry =
  | SingleAxis
  | DualAxis
  | TiltedTurntable
  | ResolvedPlane<RoofPlane>
  | ResolvedPlane<FixedTilt>;
type ResolvedPlane<G extends RoofPlane | FixedTilt> = G & { tiltDeg: number; azimuthDeg: number };

/** What `best` stands for: both angles free, or one of them with the other given. */
export interface BestAngles {
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly tiltFacing: (azimuthDeg: number) => number;
  readonly azimuthAtTilt: (tiltDeg: number) => number;
  /** The tilt at which a turntable collects most. */
  readonly tiltTurning: (mount: Turntable) => number;
}

/**
 * Puts the optimum where a study says `best`, and the azimuth that its bearing came to where it says `surveyed`. Where one
 * angle is given, the other is the best that goes with it.
 */
export const resolveAngles = (
  geometry: MountGeometry,
  best: BestAngles,
  surveyedAzimuthDeg: number | null,
): ResolvedGeometry => {
  if (geometry.kind === 'single-axis' || geometry.kind === 'dual-axis') return geometry;
  if (geometry.kind === 'turntable') {
    const { planeTiltDeg } = geometry;
    return { ...geometry, planeTiltDeg: planeTiltDeg === 'best' ? best.tiltTurning(geometry) : planeTiltDeg };
  }
  const given = geometry.azimuthDeg === 'surveyed' ? surveyedAzimuthDeg : geometry.azimuthDeg;
  if (given === null)
    throw new Error(
      'A mount with a bearing needs the survey of its site (surveySite) before it can be compared.',
    );
  const { tiltDeg } = geometry;
  const angles = bothAngles(tiltDeg, given, best);
  return { ...geometry, ...angles } as ResolvedGeometry;
};

const bothAngles = (
  tiltDeg: number | 'best',
  azimuthDeg: number | 'best',
  best: BestAngles,
): { tiltDeg: number; azimuthDeg: number } => {
  if (tiltDeg === 'best')
    return azimuthDeg === 'best'
      ? { tiltDeg: best.tiltDeg, azimuthDeg: best.azimuthDeg }
      : { tiltDeg: best.tiltFacing(azimuthDeg), azimuthDeg };
  return { tiltDeg, azimuthDeg: azimuthDeg === 'best' ? best.azimuthAtTilt(tiltDeg) : azimuthDeg };
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
    case 'turntable':
      return pointTurntable(sun, mount, used);
  }
};

export const isTracker = (mount: { readonly kind: MountGeometry['kind'] }): boolean =>
  mount.kind === 'single-axis' || mount.kind === 'dual-axis' || mount.kind === 'turntable';
