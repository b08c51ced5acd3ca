import { type Finding, type HourlyYear, MONTH_DAYS, monthlySums } from '../shared/index.ts';

/** The sun crosses a zone 15 degrees wide in an hour. China and Spain keep clocks up to about 3 and 1.5 hours off. */
const DEGREES_PER_HOUR = 15;
const ZONE_TOLERANCE_H = 2.5;
/** Between the tropics the warm months follow the rains. */
const TROPICS_DEG = 23.5;
/** A place with less than this between summer and winter, K, does not tell its hemisphere. */
const LEAST_SEASON_K = 3;

/** Does the longitude fit the clock, and the warm half of the year the hemisphere? Wrong signs show here. */
export const placeFindings = (year: HourlyYear): Finding[] => {
  const { latitudeDeg, longitudeDeg, utcOffsetH } = year.place;
  const findings: Finding[] = [];
  const bySun = longitudeDeg / DEGREES_PER_HOUR;
  const apart = Math.abs(((((bySun - utcOffsetH + 12) % 24) + 24) % 24) - 12);
  if (apart > ZONE_TOLERANCE_H)
    findings.push({
      code: 'zone-against-longitude',
      severity: 'warning',
      text: `Longitude ${longitudeDeg.toFixed(2)} degrees goes with UTC${signed(bySun)}, but the clock is UTC${signed(utcOffsetH)}.`,
      fix: 'Check the sign of the longitude (east is positive) and the offset from UTC.',
    });
  const season = year.temperatureC ? julyLessJanuaryK(year.temperatureC) : 0;
  if (Math.abs(latitudeDeg) > TROPICS_DEG && Math.abs(season) > LEAST_SEASON_K && season * latitudeDeg < 0)
    findings.push({
      code: 'seasons-against-latitude',
      severity: 'warning',
      text: `June to August is ${Math.abs(season).toFixed(1)} K ${season > 0 ? 'warmer' : 'colder'} than December to February, yet latitude ${latitudeDeg.toFixed(2)} lies ${latitudeDeg > 0 ? 'north' : 'south'} of the equator.`,
      fix: 'Check the sign of the latitude (north is positive).',
    });
  return findings;
};

const signed = (hours: number): string => `${hours < 0 ? '-' : '+'}${Math.abs(hours).toFixed(1)}`;

/** Mean temperature of June to August less that of December to February. */
const julyLessJanuaryK = (temperatureC: Float64Array): number => {
  const sums = monthlySums(temperatureC);
  const mean = (months: readonly number[]): number =>
    months.reduce((sum, m) => sum + sums[m], 0) / months.reduce((sum, m) => sum + MONTH_DAYS[m] * 24, 0);
  return mean([5, 6, 7]) - mean([11, 0, 1]);
};
