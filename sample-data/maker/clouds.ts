import { DAYS, HOURS } from '../../src/shared/index.ts';
import { betweenNoons, dayWave, yearWave } from './calendar.ts';
import { seededNumbers, withMemory } from './random.ts';

/** Days of the year, 0 is 1 January: 6 January, 10 February and 20 July. */
const FOGGIEST_DAY = 5;
const CLOUDIEST_DAY = 40;
const STORMIEST_DAY = 200;

/**
 * Hour of the day (local standard time) at which each day's fog has burnt off; 0 on days without fog. Fog comes on a
 * share of the days from autumn to spring, rather after a foggy day than after a clear one, and lies over the bench
 * from the night until mid-morning. It is what leans the site's best orientation to the west of south.
 */
export const fogEndHours = (seed: number): Float64Array => {
  const numbers = seededNumbers(seed, 1);
  let yesterday = false;
  return new Float64Array(DAYS).map((_, day) => {
    const season = Math.max(0, yearWave(day, FOGGIEST_DAY) + 0.5) / 1.5;
    const foggy = numbers.uniform() < season * (yesterday ? 0.7 : 0.4);
    const end = 9.8 + 2.2 * numbers.uniform();
    yesterday = foggy;
    return foggy ? end : 0;
  });
};

/** Mean of the fog's cover over the hour that begins at `hourOfDay`: whole until an hour before its end, then thinning. */
export const fogCover = (hourOfDay: number, endHour: number): number => {
  if (endHour === 0) return 0;
  const left = endHour - (hourOfDay + 0.5);
  return Math.min(1, Math.max(0, left));
};

/**
 * Cover of the sky, 0..1, mean over each hour of the year: a day's cloudiness with memory of the days before, banks of
 * cloud from hour to hour, a cloudier winter, mild afternoon clouds in summer, and the morning fog. Sizes are invented.
 */
export const cloudCover = (seed: number): Float64Array => {
  const fogEnd = fogEndHours(seed);
  const nextDay = withMemory(seededNumbers(seed, 2), 0.45);
  const nextHour = withMemory(seededNumbers(seed, 3), 0.7);
  // Fog forms in clear, calm nights: a foggy day is rather clear once the fog has gone.
  const daily = new Float64Array(DAYS).map((_, day) => 1.8 * nextDay() - (fogEnd[day] > 0 ? 0.9 : 0));
  return new Float64Array(HOURS).map((_, h) => {
    const day = Math.floor(h / 24);
    const hourOfDay = h % 24;
    const season = -0.45 + 0.4 * yearWave(day, CLOUDIEST_DAY);
    const storms =
      0.7 * Math.max(0, yearWave(day, STORMIEST_DAY)) * Math.max(0, dayWave(hourOfDay + 0.5, 15.5));
    const leaning = season + betweenNoons(daily, h) + 1.0 * nextHour() + storms;
    return Math.max(1 / (1 + Math.exp(-1.6 * leaning)), fogCover(hourOfDay, fogEnd[day]));
  });
};
