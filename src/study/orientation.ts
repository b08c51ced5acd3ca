import type { MountResult } from '../shared/index.ts';
import { irradiationOfPlanes, type SkyHours } from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';

/** Angles of a plane and how far each may be out, degrees; null errors count as exact. */
export interface PlaneReading {
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly tiltErrorDeg: number | null;
  readonly azimuthErrorDeg: number | null;
}

const STEPS = [-1, -0.5, 0, 0.5, 1];

/**
 * The least and the greatest orientation factor (TOF) that the reading errors allow, over the box of both errors.
 * Null where neither error is given.
 * @param maximumKwhM2 irradiation of the best plane of the map
 */
export const factorBand = (
  sun: SunHours,
  sky: SkyHours,
  plane: PlaneReading,
  maximumKwhM2: number,
): { low: number; high: number } | null => {
  if (plane.tiltErrorDeg === null && plane.azimuthErrorDeg === null) return null;
  const at = irradiationOfPlanes(sun, sky);
  const factors = STEPS.flatMap((t) =>
    STEPS.map((a) => {
      const tilt = Math.max(0, Math.min(90, plane.tiltDeg + t * (plane.tiltErrorDeg ?? 0)));
      return at(tilt, plane.azimuthDeg + a * (plane.azimuthErrorDeg ?? 0)) / maximumKwhM2;
    }),
  );
  return { low: Math.min(...factors), high: Math.min(1, Math.max(...factors)) };
};

type Limit = MountResult['limits'][number];

const percent = (share: number): string => `${Number((100 * share).toFixed(1))} %`;

/** Holds a factor against what a programme demands at least. */
const atLeast = (
  name: string,
  value: number,
  band: { low: number; high: number } | null,
  least: number,
): Limit => {
  const [low, high] = band ? [band.low, band.high] : [value, value];
  const status =
    low < least && high >= least && low < high ? 'within_reading_error' : value >= least ? 'kept' : 'broken';
  const range = band ? `, ${percent(low)} to ${percent(high)} within the reading errors` : '';
  return {
    name,
    bound: 'least',
    status,
    detail: `${percent(value)} where at least ${percent(least)} is asked${range}`,
    value,
    asked: least,
    excess_m: null,
  };
};

/** Without a skyline nobody has measured the shade: TSRF can then be ruled out by the angles alone, never confirmed. */
const withoutSkyline = (tsrf: Limit): Limit =>
  tsrf.status === 'broken'
    ? tsrf
    : {
        ...tsrf,
        status: 'not_checked',
        detail: `not checked: site.skyline is blank; without any shade ${tsrf.detail}`,
      };

/**
 * A programme's minimum TOF and TSRF for one fixed plane; TSRF at the worst point of the array.
 * @param shadingAtWorst null where the study gives no skyline
 */
export const programmeLimits = (
  programme: { readonly minimumTof: number | null; readonly minimumTsrf: number | null },
  factor: number,
  band: { low: number; high: number } | null,
  shadingAtWorst: number | null,
): Limit[] => {
  const open = 1 - (shadingAtWorst ?? 0);
  const limits: Limit[] = [];
  if (programme.minimumTof !== null) limits.push(atLeast('TOF', factor, band, programme.minimumTof));
  if (programme.minimumTsrf !== null) {
    const shaded = band && { low: band.low * open, high: band.high * open };
    const tsrf = atLeast('TSRF', factor * open, shaded, programme.minimumTsrf);
    limits.push(shadingAtWorst === null ? withoutSkyline(tsrf) : tsrf);
  }
  return limits;
};
