import { cosDeg, DAYS, DEG, HOURS, MONTH_FIRST_DAY, type Place, sinDeg, wrap180 } from '../shared/index.ts';
import { julianDay, solarEphemeris } from './ephemeris.ts';
import { extraterrestrialNormalWm2 } from './extraterrestrial.ts';

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

/** Declination and (hour angle less 15 degrees an hour) of one day, as parabolas in the hour of the day. */
interface DaySun {
  readonly declination: readonly [number, number, number];
  readonly lag: readonly [number, number, number];
  readonly extraterrestrialWm2: number;
}

/** The parabola through values at 0, 12 and 24 hours, in powers of the hour. */
const parabola = (v0: number, v12: number, v24: number): [number, number, number] => [
  v0,
  (4 * v12 - 3 * v0 - v24) / 24,
  (v0 - 2 * v12 + v24) / 288,
];

/** The astronomy is worked out three times a day and bent by a parabola between: declination errs by under 0.0001 degrees. */
const daySun = (midnightUtcMs: number, longitudeDeg: number): DaySun => {
  const [a, b, c] = [0, 12, 24].map((hour) => {
    const sun = solarEphemeris(julianDay(midnightUtcMs + hour * 3_600_000));
    return { ...sun, lagDeg: sun.siderealDeg + longitudeDeg - sun.rightAscensionDeg - 15 * hour };
  });
  const lag0 = wrap180(a.lagDeg - 180) - 180; // about -180 at midnight, so that hour angles need no wrapping
  return {
    declination: parabola(a.declinationDeg, b.declinationDeg, c.declinationDeg),
    lag: parabola(lag0, lag0 + wrap180(b.lagDeg - lag0), lag0 + wrap180(c.lagDeg - lag0)),
    extraterrestrialWm2: extraterrestrialNormalWm2(b.distanceAu),
  };
};

const at = (p: readonly [number, number, number], hour: number): number => p[0] + hour * (p[1] + hour * p[2]);

/** UTC of 00:00 local standard time on day `day` (0..364, no 29 February) of a calendar year. */
const midnightUtc = (calendarYear: number, day: number, utcOffsetH: number): number => {
  const month = MONTH_FIRST_DAY.findLastIndex((firstDay) => firstDay <= day);
  return Date.UTC(calendarYear, month, day - MONTH_FIRST_DAY[month] + 1) - utcOffsetH * 3_600_000;
};

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
  let count = 0;
  for (let day = 0; day < DAYS; day++) {
    const sun = daySun(midnightUtc(calendarYear[day], day, place.utcOffsetH), place.longitudeDeg);
    for (let h = 0; h < 24; h++) {
      const hour = day * 24 + h;
      first[hour] = count;
      extraterrestrialWm2[hour] = sun.extraterrestrialWm2;
      const begins = h + offsetMin / 60;
      const declination = at(sun.declination, begins + 0.5) * DEG;
      const [sinDec, cosDec] = [Math.sin(declination), Math.cos(declination)];
      const steady = sinLat * sinDec;
      const swing = cosLat * cosDec;
      const northSteady = cosLat * sinDec;
      const northSwing = sinLat * cosDec;
      // cos z = steady + swing cos H, so the sun is up while |H| < half.
      const half = steady >= swing ? 180 : steady <= -swing ? 0 : Math.acos(-steady / swing) / DEG;
      if (half === 0) continue;
      // The hour angle gains 15 degrees an hour to within 0.005, taken up by reading the lag at mid-hour.
      const turned = 15 * begins + at(sun.lag, begins + 0.5);
      const startAngle = turned >= 180 ? turned - 360 : turned < -180 ? turned + 360 : turned;
      const endAngle = startAngle + 15;
      // Near the pole an hour can hold the last light of one day and the first of the next: two pieces.
      const from1 = Math.max(startAngle, -half);
      const length1 = Math.max(0, Math.min(endAngle, half) - from1);
      const from2 = Math.max(startAngle, 360 - half);
      const length2 = Math.max(0, Math.min(endAngle, 360 + half) - from2);
      const length = length1 + length2;
      if (length <= 0) continue;
      const step = length / samplesPerHour;
      let sum = 0;
      for (let k = 0; k < samplesPerHour; k++) {
        const along = (k + 0.5) * step;
        const angle = (along < length1 ? from1 + along : from2 + along - length1) * DEG;
        const cosAngle = Math.cos(angle);
        east[count] = -cosDec * Math.sin(angle);
        north[count] = northSteady - northSwing * cosAngle;
        up[count] = steady + swing * cosAngle;
        sum += up[count++];
      }
      sunlit[hour] = length / 15;
      cosZenith[hour] = sum / samplesPerHour;
    }
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
