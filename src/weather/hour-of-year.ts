import { MONTH_DAYS, MONTH_FIRST_DAY } from '../shared/index.ts';

/** Day of a 365-day year, 0-based; -1 where there is no such day (29 February included). */
export const dayOfYear = (month: number, day: number): number =>
  Number.isInteger(month) &&
  month >= 1 &&
  month <= 12 &&
  Number.isInteger(day) &&
  day >= 1 &&
  day <= MONTH_DAYS[month - 1]
    ? MONTH_FIRST_DAY[month - 1] + day - 1
    : -1;

export const isLeapDay = (month: number, day: number): boolean => month === 2 && day === 29;
