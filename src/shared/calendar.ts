/** A typical year has 365 days of 24 hours; hour 0 begins at 00:00 local standard time on 1 January. */
export const HOURS = 8760;
export const DAYS = 365;
export const MONTH_NAMES = [
  'Jan',
  'Feb',
  'Mar',
  'Apr',
  'May',
  'Jun',
  'Jul',
  'Aug',
  'Sep',
  'Oct',
  'Nov',
  'Dec',
] as const;
const MONTHS_IN_FULL = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

/** `December` for `Dec`; any other text as it is. */
export const monthInFull = (month: string): string =>
  MONTHS_IN_FULL[(MONTH_NAMES as readonly string[]).indexOf(month)] ?? month;

export const MONTH_DAYS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;

/** Day of the year (0-based) on which each month begins; the thirteenth entry is 365. */
export const MONTH_FIRST_DAY: readonly number[] = [
  0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334, 365,
];

/** Sums an hourly column by month: 12 numbers, in the column's unit times hours. */
export const monthlySums = (column: Float64Array): number[] =>
  MONTH_DAYS.map((days, month) => {
    let sum = 0;
    const first = MONTH_FIRST_DAY[month] * 24;
    for (let h = first; h < first + days * 24; h++) sum += column[h];
    return sum;
  });

/** Sum of an hourly column over the year. */
export const yearlySum = (column: Float64Array): number => {
  let sum = 0;
  for (let h = 0; h < column.length; h++) sum += column[h];
  return sum;
};

/** `3 Mar 14:00`, the start of hour `hour` of the year. */
export const hourName = (hour: number): string => {
  const day = Math.floor(hour / 24);
  const month = MONTH_FIRST_DAY.findIndex((first, m) => day >= first && day < MONTH_FIRST_DAY[m + 1]);
  return `${day - MONTH_FIRST_DAY[month] + 1} ${MONTH_NAMES[month]} ${String(hour % 24).padStart(2, '0')}:00`;
};
