import { atan2Deg, cosDeg, DEG, HOURS, type Place, sinDeg, wrap360 } from '../shared/index.ts';
import { daySuns, parabolaAt } from './day-sun.ts';
import { alongPieces, HOUR_DEG, sunlitPieces } from './sunlit-pieces.ts';

/**
 * The sun over a year of hours. Each hour in which the sun's centre is above the horizon carries the same number
 * of samples, at the midpoints of equal parts of its sunlit time, so that the mean over an hour's samples is the
 * mean over its sunlit part. Elements of an hour are indexed by hour, elements of a sample by sample.
 */
export interface SunHours {
  /** Samples of hour h are `first[h] .. first[h + 1] - 1`; none where the sun stays down. Length hours + 1. */
  readonly first: Int32Array;
  /** Direction cosines of each sample, from the ground towards the sun. */
  readonly east: Float64Array;
  readonly north: Float64Array;
  readonly up: Float64Array;
  /** Share of each hour that the sun is up, 0..1. */
  readonly sunlit: Float64Array;
  /** Mean cosine of the zenith angle over the sunlit part; 0 in a dark hour. */
  readonly cosZenith: Float64Array;
  /** Irradiance on a plane facing the sun above the air, W/m2. */
  readonly extraterrestrialWm2: Float64Array;
}

/** Four midpoints keep every mount within 0.1 % of one-minute integration (test/energy/within-the-hour.test.ts). */
export const SAMPLES_PER_HOUR = 4;

/**
 * Where the sun is in every hour of a year.
 * @param calendarYear calendar year of each of the 365 days
 * @param offsetMin minutes by which every hour begins later than its index says
 */
export const sunOverHours = (
  place: Place,
  calendarYear: ArrayLike<number>,
  offsetMin = 0,
  samplesPerHour = SAMPLES_PER_HOUR,
): SunHours => {
  const [sinLat, cosLat] = [sinDeg(place.latitudeDeg), cosDeg(place.latitudeDeg)];
  const first = new Int32Array(HOURS + 1);
  const room = HOURS * samplesPerHour;
  const [east, north, up] = [new Float64Array(room), new Float64Array(room), new Float64Array(room)];
  const [sunlit, cosZenith, extraterrestrialWm2] = [0, 0, 0].map(() => new Float64Array(HOURS));
  const days = daySuns(place, calendarYear);
  let count = 0;
  for (let hour = 0; hour < HOURS; hour++) {
    const sun = days[Math.floor(hour / 24)];
    first[hour] = count;
    extraterrestrialWm2[hour] = sun.extraterrestrialWm2;
    const begins = (hour % 24) + offsetMin / 60;
    const declination = parabolaAt(sun.declination, begins + 0.5) * DEG;
    const sinDec = Math.sin(declination);
    const cosDec = Math.cos(declination);
    // cos z = steady + swing cos(hour angle)
    const steady = sinLat * sinDec;
    const swing = cosLat * cosDec;
    const northSteady = cosLat * sinDec;
    const northSwing = sinLat * cosDec;
    const turned = HOUR_DEG * begins + parabolaAt(sun.lag, begins + 0.5);
    const startDeg = turned >= 180 ? turned - 360 : turned < -180 ? turned + 360 : turned;
    const pieces = sunlitPieces(startDeg, steady, swing);
    const lengthDeg = pieces.length1 + pieces.length2;
    if (lengthDeg <= 0) continue;
    const stepDeg = lengthDeg / samplesPerHour;
    let sum = 0;
    for (let k = 0; k < samplesPerHour; k++) {
      const angle = alongPieces(pieces, (k + 0.5) * stepDeg) * DEG;
      const cosAngle = Math.cos(angle);
      east[count] = -cosDec * Math.sin(angle);
      north[count] = northSteady - northSwing * cosAngle;
      up[count] = steady + swing * cosAngle;
      sum += up[count++];
    }
    sunlit[hour] = lengthDeg / HOUR_DEG;
    cosZenith[hour] = sum / samplesPerHour;
  }
  first[HOURS] = count;
  return {
    first,
    east: east.subarray(0, count),
    north: north.subarray(0, count),
    up: up.subarray(0, count),
    sunlit,
    cosZenith,
    extraterrestrialWm2,
  };
};

/** True azimuth of the sun in one sample, 0..360. */
export const sunAzimuthDeg = (sun: SunHours, sample: number): number =>
  wrap360(atan2Deg(sun.east[sample], sun.north[sample]));
