import type { SunHours } from '../sun/index.ts';
import { pointOnMast } from './mast.ts';
import type { Pointing } from './pointing.ts';
import type { Turntable } from './spec.ts';

/** A turntable whose tilt is known. */
export type TiltedTurntable = Turntable & { readonly planeTiltDeg: number };

/** A plane at a held tilt that turns about an upright axis to the sun's azimuth, or as near as it can turn. */
export const pointTurntable = (
  sun: SunHours,
  { planeTiltDeg, turns, rows }: TiltedTurntable,
  used: Pointing | null = null,
): Pointing => {
  const held = 90 - planeTiltDeg;
  const reach = { turns: turns ?? null, elevation: { lowestDeg: held, highestDeg: held } };
  return pointOnMast(sun, reach, rows?.gcr ?? null, used);
};

/** A turntable that has stopped: it keeps its tilt and faces one way, or as near to it as it can turn. */
export const pointStoppedTurntable = (sun: SunHours, mount: TiltedTurntable, azimuthDeg: number): Pointing =>
  pointTurntable(sun, { ...mount, turns: { fromDeg: azimuthDeg, toDeg: azimuthDeg } });
