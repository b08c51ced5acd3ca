import { DAYS, MONTH_FIRST_DAY, type Place, wrap180 } from '../shared/index.ts';
import { julianDay, type SolarEphemeris, solarEphemeris } from './ephemeris.ts';
import { extraterrestrialNormalWm2 } from './extraterrestrial.ts';

/** Declination and (hour angle less 15 degrees an hour) of one day, as parabolas in the hour of the day. */
export interface DaySun {
  readonly declination: Parabola;
  readonly lag: Parabola;
  readonly extraterrestrialWm2: number;
}
export type Parabola = readonly [number, number, number];

/** The parabola through values at 0, 12 and 24 hours, in powers of the hour. */
const parabola = (v0: number, v12: number, v24: number): Parabola => [
  v0,
  (4 * v12 - 3 * v0 - v24) / 24,
  (v0 - 2 * v12 + v24) / 288,
];
export const parabolaAt = (p: Parabola, hour: number): number => p[0] + hour * (p[1] + hour * p[2]);

/** The astronomy is worked out three times a day and bent by a parabola between: declination errs by under 0.0001 degrees. */
const daySun = (
  midnight: SolarEphemeris,
  noon: SolarEphemeris,
  next: SolarEphemeris,
  longitudeDeg: number,
): DaySun => {
  const lag = (sun: SolarEphemeris, hour: number) =>
    sun.siderealDeg + longitudeDeg - sun.rightAscensionDeg - 15 * hour;
  const lag0 = wrap180(lag(midnight, 0) - 180) - 180; // about -180 at midnight, so that hour angles need no wrapping
  return {
    declination: parabola(midnight.declinationDeg, noon.declinationDeg, next.declinationDeg),
    lag: parabola(lag0, lag0 + wrap180(lag(noon, 12) - lag0), lag0 + wrap180(lag(next, 24) - lag0)),
    extraterrestrialWm2: extraterrestrialNormalWm2(noon.distanceAu),
  };
};

const HALF_DAY_MS = 43_200_000;

/** The sun of each of the 365 days; where one day follows the other, they share the midnight between. */
export const daySuns = (place: Place, calendarYear: ArrayLike<number>): DaySun[] => {
  let [lastMs, last] = [Number.NaN, solarEphemeris(0)];
  return Array.from({ length: DAYS }, (_, day) => {
    const startMs = midnightUtc(calendarYear[day], day, place.utcOffsetH);
    const midnight = startMs === lastMs ? last : solarEphemeris(julianDay(startMs));
    lastMs = startMs + 2 * HALF_DAY_MS;
    last = solarEphemeris(julianDay(lastMs));
    return daySun(midnight, solarEphemeris(julianDay(startMs + HALF_DAY_MS)), last, place.longitudeDeg);
  });
};

/** UTC of 00:00 local standard time on day `day` (0..364, no 29 February) of a calendar year. */
const midnightUtc = (calendarYear: number, day: number, utcOffsetH: number): number => {
  const month = MONTH_FIRST_DAY.findLastIndex((firstDay) => firstDay <= day);
  return Date.UTC(calendarYear, month, day - MONTH_FIRST_DAY[month] + 1) - utcOffsetH * 3_600_000;
};
