import { DAYS, HOURS } from '../../src/shared/index.ts';
import { betweenNoons, dayWave, yearWave } from './calendar.ts';
import { seededNumbers, withMemory } from './random.ts';

const HOTTEST_DAY = 202;
const WINDIEST_DAY = 100;

/**
 * Dry-bulb temperature, degrees C, mean over each hour: a yearly wave, spells of warm and cold days (wider in winter), a
 * daily wave that peaks at 15:00 and is flatter under cloud, and a little noise. Shapes and sizes are invented.
 */
export const temperatures = (seed: number, cover: Float64Array): Float64Array => {
  const nextDay = withMemory(seededNumbers(seed, 4), 0.7);
  const nextHour = withMemory(seededNumbers(seed, 5), 0.8);
  const daily = new Float64Array(DAYS).map(
    (_, day) => 10 + 11.5 * yearWave(day, HOTTEST_DAY) + (3.6 - 1.2 * yearWave(day, HOTTEST_DAY)) * nextDay(),
  );
  const dailyCover = new Float64Array(DAYS).map((_, day) => {
    let sum = 0;
    for (let h = 24 * day + 7; h < 24 * day + 18; h++) sum += cover[h];
    return sum / 11;
  });
  return new Float64Array(HOURS).map((_, h) => {
    const middle = (h % 24) + 0.5;
    const swing = 8.5 - 5 * betweenNoons(dailyCover, h);
    // The second wave makes the rise after sunrise quicker than the fall after sunset, as measured days have it.
    const wave = 0.9 * dayWave(middle, 15) + 0.2 * Math.cos((4 * Math.PI * (middle - 14)) / 24);
    return betweenNoons(daily, h) + swing * wave + 0.6 * nextHour();
  });
};

/** Shape of the Weibull distribution of wind speeds; 2 would be Rayleigh's. */
const WIND_SHAPE = 1.8;

/**
 * Wind speed 10 m above ground, m/s, mean over each hour. Two perpendicular normal components with memory have a
 * speed that is Rayleigh, that is Weibull with shape 2; its power 2/k is Weibull with shape k (Weibull 1951, Journal of
 * Applied Mechanics 18, 293-297). The scale is larger in spring and in the afternoon, and on a few gusty days from
 * autumn to spring. Sizes are invented.
 */
export const windSpeeds = (seed: number): Float64Array => {
  const along = withMemory(seededNumbers(seed, 6), 0.85);
  const across = withMemory(seededNumbers(seed, 7), 0.85);
  const gusts = seededNumbers(seed, 8);
  const gustiness = new Float64Array(DAYS).map((_, day) => {
    const gusty = gusts.uniform() < 0.05 - 0.04 * yearWave(day, HOTTEST_DAY);
    return gusty ? 1.8 + 0.6 * gusts.uniform() : 1;
  });
  return new Float64Array(HOURS).map((_, h) => {
    const day = Math.floor(h / 24);
    const scale = (4 + 0.5 * yearWave(day, WINDIEST_DAY)) * (1 + 0.28 * dayWave((h % 24) + 0.5, 15));
    const rayleigh = Math.hypot(along(), across()) / Math.SQRT2;
    return scale * betweenNoons(gustiness, h) * rayleigh ** (2 / WIND_SHAPE);
  });
};
