import { DEG } from '../shared/index.ts';

/** Where the sun stands among the stars, seen from the centre of the earth, and how far the earth has turned. Degrees. */
export interface SolarEphemeris {
  /** Apparent right ascension, -180..180. */
  readonly rightAscensionDeg: number;
  /** Apparent declination, north positive. */
  readonly declinationDeg: number;
  /** Earth to sun, astronomical units. */
  readonly distanceAu: number;
  /** Apparent sidereal time at Greenwich, not wrapped. */
  readonly siderealDeg: number;
}

const J2000 = 2451545;
const DAYS_PER_MILLENNIUM = 365250;
/** Terrestrial time less universal time: 57 s in 1990, 69 s in 2017. The sun moves 0.0003 degrees in the 27 s that this rounds away. */
const DELTA_T_DAYS = 66 / 86400;

/**
 * The earth's heliocentric longitude (rad) and distance (au) as sums of `amplitude * cos(phase + frequency * t)`,
 * t in Julian millennia from J2000: the leading terms of VSOP87 (Bretagnon & Francou 1988, Astron. Astrophys.
 * 202, 309), amplitudes in units of 1e-8, as tabled in Reda & Andreas, NREL/TP-560-34302 (2008), table A4.2.
 */
const LONGITUDE_0 = [
  175347046, 0, 0,  3341656, 4.6692568, 6283.07585,  34894, 4.6261, 12566.1517,  3497, 2.7441, 5753.3849,
  3418, 2.8289, 3.5231,  3136, 3.6277, 77713.7715,  2676, 4.4181, 7860.4194,  2343, 6.1352, 3930.2097,
  1324, 0.7425, 11506.7698,  1273, 2.0371, 529.691,  1199, 1.1096, 1577.3435,  990, 5.233, 5884.927,
  902, 2.045, 26.298,  857, 3.508, 398.149,  780, 1.179, 5223.694,  753, 2.533, 5507.553,
]; // biome-ignore format: triples of amplitude, phase, frequency
const LONGITUDE_1 = [
  628331966747, 0, 0, 206059, 2.678235, 6283.07585, 4303, 2.6351, 12566.1517, 425, 1.59, 3.523,
];
const LONGITUDE_2 = [52919, 0, 0, 8720, 1.0721, 6283.0758];
const DISTANCE_0 = [
  100013989, 0, 0, 1670700, 3.0984635, 6283.07585, 13956, 3.05525, 12566.1517, 3084, 5.1985, 77713.7715,
];
const DISTANCE_1 = [103019, 1.10749, 6283.07585];

const series = (terms: readonly number[], t: number): number => {
  let sum = 0;
  for (let i = 0; i < terms.length; i += 3) sum += terms[i] * Math.cos(terms[i + 1] + terms[i + 2] * t);
  return sum * 1e-8;
};

/** Julian day of an instant given as milliseconds since 1970-01-01T00:00Z (as JavaScript dates count). */
export const julianDay = (utcMs: number): number => utcMs / 86_400_000 + 2440587.5;

/**
 * The sun by the leading VSOP87 terms, with aberration and the main terms of nutation (Meeus, Astronomical
 * Algorithms, 2nd ed. 1998, ch. 22 and eq. 25.10) and sidereal time by its eq. 12.4. The earth's latitude (under
 * 0.0003 degrees) is left out. Against an independent library: within 0.0015 degrees from 1990 to 2050
 * (test/sun/position.test.ts).
 */
export const solarEphemeris = (julianDayUt: number): SolarEphemeris => {
  const t = (julianDayUt + DELTA_T_DAYS - J2000) / DAYS_PER_MILLENNIUM;
  const heliocentric = series(LONGITUDE_0, t) + t * (series(LONGITUDE_1, t) + t * series(LONGITUDE_2, t));
  const distanceAu = series(DISTANCE_0, t) + t * series(DISTANCE_1, t);
  const moonNode = (125.04452 - 19341.36261 * t) * DEG;
  const twiceSun = 2 * (280.4665 + 360007.698 * t) * DEG;
  const nutationDeg = (-17.2 * Math.sin(moonNode) - 1.32 * Math.sin(twiceSun)) / 3600;
  const obliquity =
    (23.4392911 - 0.130042 * t + (9.2 * Math.cos(moonNode) + 0.57 * Math.cos(twiceSun)) / 3600) * DEG;
  const aberrationDeg = -20.4898 / 3600 / distanceAu;
  const longitude = heliocentric + Math.PI + (nutationDeg + aberrationDeg) * DEG;
  return {
    rightAscensionDeg: Math.atan2(Math.cos(obliquity) * Math.sin(longitude), Math.cos(longitude)) / DEG,
    declinationDeg: Math.asin(Math.sin(obliquity) * Math.sin(longitude)) / DEG,
    distanceAu,
    siderealDeg:
      280.46061837 +
      360.98564736629 * (julianDayUt - J2000) +
      0.0387933 * t * t +
      nutationDeg * Math.cos(obliquity),
  };
};
