import { MONTH_DAYS, MONTH_NAMES, monthInFull } from './calendar.ts';
import type { Comparison } from './results.ts';

/** kWh per kW and day that prints as 0.000. */
const NOTHING = 0.0005;
/** kWh/m2 in a month that prints as 0.0. */
const NO_LIGHT = 0.05;

/** Whether a day of a month yields nothing that could be printed, kWh per kW. */
export const isNothing = (kwhPerKwDay: number): boolean => kwhPerKwDay < NOTHING;

/**
 * `no mount delivers in December: the sun stays down`, for the months in which neither a mount nor the plane tilted for
 * the month yields anything; null where there is none.
 */
export const darkMonthsWords = (c: Comparison): string | null => {
  const dark = MONTH_NAMES.map((_, m) => m).filter(
    (m) =>
      c.mounts.every((mount) => isNothing(mount.energy_monthly_kwh_per_kw[m] / MONTH_DAYS[m])) &&
      c.tilted_for_month
        .filter(({ month }) => month === MONTH_NAMES[m])
        .every(({ kwh_per_kw_day }) => isNothing(kwh_per_kw_day)),
  );
  if (dark.length === 0) return null;
  const names = dark.map((m) => monthInFull(MONTH_NAMES[m]));
  const when =
    names.length === 1
      ? `in ${names[0]}`
      : `in ${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
  const sunDown = dark.every((m) => c.weather.ghi_monthly_kwh_m2[m] < NO_LIGHT);
  return `no mount delivers ${names.length === 12 ? 'in any month' : when}: ${sunDown ? 'the sun stays down' : 'no light reaches the modules'}`;
};
