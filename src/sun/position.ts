import { acosDeg, asinDeg, atan2Deg, cosDeg, sinDeg, wrap180, wrap360 } from '../shared/index.ts';
import { julianDay, solarEphemeris } from './ephemeris.ts';
import { refractionDeg } from './refraction.ts';

export interface SunPosition {
  /** Clockwise from true north, 0..360. */
  readonly azimuthDeg: number;
  /** From overhead, 0..180, without refraction, seen from the surface. */
  readonly zenithDeg: number;
  /** As seen through the air at 1013.25 mbar and 15 degrees C. */
  readonly apparentZenithDeg: number;
  readonly declinationDeg: number;
  /** West positive, -180..180: 0 when the sun crosses the meridian. */
  readonly hourAngleDeg: number;
  readonly distanceAu: number;
}

/** The sun's horizontal parallax at one astronomical unit, degrees (8.794 seconds of arc). */
const PARALLAX_DEG = 8.794 / 3600;

/**
 * The sun at one instant, good to 0.0015 degrees from 1990 to 2050 (as tested).
 * @param utcMs milliseconds since 1970-01-01T00:00Z
 * @param latitudeDeg north positive, -90..90
 * @param longitudeDeg east positive
 */
export const sunPosition = (utcMs: number, latitudeDeg: number, longitudeDeg: number): SunPosition => {
  const sun = solarEphemeris(julianDay(utcMs));
  const hourAngleDeg = wrap180(sun.siderealDeg + longitudeDeg - sun.rightAscensionDeg);
  const [sinDec, cosDec] = [sinDeg(sun.declinationDeg), cosDeg(sun.declinationDeg)];
  const [sinLat, cosLat] = [sinDeg(latitudeDeg), cosDeg(latitudeDeg)];
  const east = -cosDec * sinDeg(hourAngleDeg);
  const north = cosLat * sinDec - sinLat * cosDec * cosDeg(hourAngleDeg);
  const up = sinLat * sinDec + cosLat * cosDec * cosDeg(hourAngleDeg);
  // The arccosine loses digits near the zenith, the arcsine near the horizon: use each where it is good.
  const geocentricZenith = up > 0.7 ? asinDeg(Math.hypot(east, north)) : acosDeg(up);
  const zenithDeg = geocentricZenith + (PARALLAX_DEG / sun.distanceAu) * sinDeg(geocentricZenith);
  return {
    azimuthDeg: wrap360(atan2Deg(east, north)),
    zenithDeg,
    apparentZenithDeg: zenithDeg - refractionDeg(90 - zenithDeg),
    declinationDeg: sun.declinationDeg,
    hourAngleDeg,
    distanceAu: sun.distanceAu,
  };
};
