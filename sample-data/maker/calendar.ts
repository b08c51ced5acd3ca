import { DAYS } from '../../src/shared/index.ts';

/** A yearly wave between -1 and 1 that peaks on day `peakDay` (0 is 1 January). */
export const yearWave = (day: number, peakDay: number): number =>
  Math.cos((2 * Math.PI * (day - peakDay)) / DAYS);

/** A daily wave between -1 and 1 that peaks at `peakHour`, local standard time. */
export const dayWave = (hourOfDay: number, peakHour: number): number =>
  Math.cos((2 * Math.PI * (hourOfDay - peakHour)) / 24);

/** Reads a column of daily values, meant for noon, in the middle of hour `h`: a straight line from noon to noon. */
export const betweenNoons = (daily: Float64Array, h: number): number => {
  const position = (h + 0.5) / 24 - 0.5;
  const before = Math.floor(position);
  const share = position - before;
  return daily[(before + DAYS) % DAYS] * (1 - share) + daily[(before + 1) % DAYS] * share;
};
