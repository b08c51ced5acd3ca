import { DAYS, HOURS, type Place } from '../../src/shared/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';
import { temperatures, windSpeeds } from './air.ts';
import { yearWave } from './calendar.ts';
import { type ClearAir, clearSky } from './clear-sky.ts';
import { cloudCover } from './clouds.ts';
import { belowClouds } from './cloudy-sky.ts';

/** An invented place. */
export const ORLIN_BENCH: Place = {
  latitudeDeg: 40.1,
  longitudeDeg: -104.92,
  elevationM: 1600,
  utcOffsetH: -7,
};
/** The seed of the committed file. */
export const SEED = 12;
/** Any year of 365 days would do: it only fixes the sun's place on each date. */
export const CALENDAR_YEAR = 2021;
export const GROUND_ALBEDO = 0.2;

/** An invented hourly year, rounded as the file has it. Columns hold the mean over each of the 8,760 hours. */
export interface SampleYear {
  readonly place: Place;
  /** W/m2, whole numbers. */
  readonly ghi: Float64Array;
  readonly dni: Float64Array;
  readonly dhi: Float64Array;
  /** Degrees C and m/s at 10 m, to a tenth. */
  readonly temperatureC: Float64Array;
  readonly windMs: Float64Array;
  /** Tenths of the sky, 0..10. */
  readonly coverTenths: Float64Array;
  readonly pressurePa: number;
}

/** Pressure of the air at a height in the troposphere, Pa: U.S. Standard Atmosphere 1976, eq. 33a. */
const standardPressure = (elevationM: number): number =>
  101325 * (1 - (0.0065 * elevationM) / 288.15) ** 5.25588;

/** Clear air above the bench: damper and hazier in summer. Sizes are invented, within what the clear-sky model was made for. */
const airOn = (day: number, pressurePa: number): ClearAir => {
  const summer = yearWave(day, 200);
  return {
    pressureHpa: pressurePa / 100,
    ozoneCm: 0.31,
    waterCm: 1.2 + 0.7 * summer,
    aerosol380: 0.15 + 0.05 * summer,
    aerosol500: 0.1 + 0.035 * summer,
    groundAlbedo: GROUND_ALBEDO,
  };
};

const rounded = (column: Float64Array, perUnit: number): Float64Array =>
  column.map((x) => Math.round(x * perUnit) / perUnit + 0); // + 0 turns -0 into 0

/**
 * Makes the invented year of Orlin Bench: the same seed gives the same year. The beam reaches the ground during the
 * sunlit part of an hour, so `ghi` is `dni` times the mean cosine of the zenith over that part, plus `dhi`, to rounding.
 */
export const makeSampleYear = (seed: number): SampleYear => {
  const sun = sunOverHours(ORLIN_BENCH, new Int16Array(DAYS).fill(CALENDAR_YEAR));
  const pressurePa = Math.round(standardPressure(ORLIN_BENCH.elevationM));
  const cover = cloudCover(seed);
  const [ghi, dni, dhi] = [new Float64Array(HOURS), new Float64Array(HOURS), new Float64Array(HOURS)];
  for (let h = 0; h < HOURS; h++) {
    const [cosZenith, sunlit] = [sun.cosZenith[h], sun.sunlit[h]];
    if (sunlit <= 0 || cosZenith <= 0) continue;
    const clear = clearSky(cosZenith, sun.extraterrestrialWm2[h], airOn(Math.floor(h / 24), pressurePa));
    const light = belowClouds(clear, cover[h], cosZenith);
    dni[h] = Math.round(light.dni * sunlit);
    dhi[h] = Math.round(light.dhi * sunlit);
    ghi[h] = Math.round(dni[h] * cosZenith + dhi[h]);
  }
  return {
    place: ORLIN_BENCH,
    ghi,
    dni,
    dhi,
    temperatureC: rounded(temperatures(seed, cover), 10),
    windMs: rounded(windSpeeds(seed), 10),
    coverTenths: cover.map((share) => Math.round(share * 10)),
    pressurePa,
  };
};
