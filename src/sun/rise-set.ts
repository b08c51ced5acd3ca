import { acosDeg, cosDeg, sinDeg, wrap180 } from '../shared/index.ts';
import { julianDay, solarEphemeris } from './ephemeris.ts';

/** Elevation of the sun's centre when its upper edge touches the horizon through air that lifts it by 34'. */
const RISE_ELEVATION_DEG = -50 / 60;
const MS_PER_DEGREE = 86_400_000 / 360;

export interface RiseSet {
  /** Milliseconds since 1970-01-01T00:00Z; null when the sun does not rise or set that day. */
  readonly riseUtcMs: number | null;
  readonly transitUtcMs: number;
  readonly setUtcMs: number | null;
  /** `up` or `down` all day where it neither rises nor sets. */
  readonly allDay: 'up' | 'down' | null;
}

const hourAngleAt = (utcMs: number, longitudeDeg: number) => {
  const sun = solarEphemeris(julianDay(utcMs));
  return {
    declinationDeg: sun.declinationDeg,
    hourAngleDeg: wrap180(sun.siderealDeg + longitudeDeg - sun.rightAscensionDeg),
  };
};

/** Hour angle (degrees) at which the sun's centre passes `elevationDeg`: 0 if it stays below, 180 if above. Spherical law of cosines. */
export const hourAngleOfElevation = (
  latitudeDeg: number,
  declinationDeg: number,
  elevationDeg: number,
): number =>
  acosDeg(
    (sinDeg(elevationDeg) - sinDeg(latitudeDeg) * sinDeg(declinationDeg)) /
      (cosDeg(latitudeDeg) * cosDeg(declinationDeg)),
  );

/**
 * Sunrise, noon and sunset at sea level: upper edge of the sun, 34' of refraction (the almanacs' convention).
 * @param nearUtcMs any instant within half a day of the local noon that is meant
 */
export const sunriseSunset = (nearUtcMs: number, latitudeDeg: number, longitudeDeg: number): RiseSet => {
  let transitUtcMs = nearUtcMs;
  for (let i = 0; i < 3; i++)
    transitUtcMs -= hourAngleAt(transitUtcMs, longitudeDeg).hourAngleDeg * MS_PER_DEGREE;
  const crossing = (sign: -1 | 1): number | 'up' | 'down' => {
    let utcMs = transitUtcMs;
    for (let i = 0; i < 5; i++) {
      const { declinationDeg, hourAngleDeg } = hourAngleAt(utcMs, longitudeDeg);
      const half = hourAngleOfElevation(latitudeDeg, declinationDeg, RISE_ELEVATION_DEG);
      if (half === 0 || half === 180) return half === 0 ? 'down' : 'up';
      utcMs += wrap180(sign * half - hourAngleDeg) * MS_PER_DEGREE;
    }
    return utcMs;
  };
  const [rise, set] = [crossing(-1), crossing(1)];
  return {
    riseUtcMs: typeof rise === 'number' ? rise : null,
    transitUtcMs,
    setUtcMs: typeof set === 'number' ? set : null,
    allDay: typeof rise === 'string' && rise === set ? rise : null,
  };
};
