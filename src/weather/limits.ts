import { DEG, HOURS, type HourlyYear, hourName } from '../shared/index.ts';
import type { SunHours } from './sun-hours.ts';

/** Hours that break one limit, and the worst of them in words. */
export interface Breach {
  readonly code: string;
  readonly hours: number;
  /** `DNI above the sunlight outside the air (first 2 May 06:00, worst 9 Jun 07:00: 1100 of at most 1050 W/m2)`. */
  readonly what: string;
  /** The file's own GHI or DNI is more than the sun can send, which no haze, cloud or rounding explains. */
  readonly beyondSun: boolean;
}

const COS_75 = Math.cos(75 * DEG);

/**
 * Limits of what is physically possible, for a mean cosine of zenith over the hour `mu`, all W/m2:
 * GHI <= 1.5 E mu^1.2 + 100 (cloud edges may send more than the sun alone), DHI <= 0.95 E mu^1.2 + 50, DNI <= 1.02 E + 5, and
 * above 50 W/m2 of GHI, DHI <= 1.05 GHI, or 1.10 GHI under a sun lower than 15 degrees. Long & Dutton 2002, BSRN Global
 * Network recommended QC tests, V2.0 (limits and ratios from memory; they have DNI <= E, and the 2 % and 5 W/m2 for
 * calibration and rounding are trackworth's choice).
 */
export const breaches = (year: HourlyYear, sun: SunHours): Breach[] => {
  const { ghi, dni, dhi, origin } = year;
  const mu = (h: number): number => sun.cosZenith[h] * sun.sunlit[h];
  const outside = (h: number): number => sun.extraterrestrialWm2[h];
  const ratio = (h: number): number => (sun.cosZenith[h] > COS_75 ? 1.05 : 1.1);
  const direct = (h: number): number => 1.02 * outside(h) + 5;
  const global = (h: number): number => 1.5 * outside(h) * mu(h) ** 1.2 + 100;
  const diffuse = (h: number): number => 0.95 * outside(h) * mu(h) ** 1.2 + 50;
  const beside = (h: number): number => (ghi[h] > 50 ? ratio(h) * ghi[h] : Number.POSITIVE_INFINITY);
  const found = [
    breach('ghi-too-high', 'GHI above anything possible under that sun', ghi, global, origin.ghi === 'given'),
    breach('dni-too-high', 'DNI above the sunlight outside the air', dni, direct, origin.dni === 'given'),
    breach('dhi-too-high', 'DHI above anything possible under that sun', dhi, diffuse),
    breach('dhi-above-ghi', 'DHI above GHI', dhi, beside),
  ];
  return found.filter((b) => b.hours > 0);
};

const breach = (
  code: string,
  what: string,
  column: Float64Array,
  limit: (hour: number) => number,
  beyondSun = false,
): Breach => {
  let [hours, first, worst, worstHour] = [0, 0, 0, 0];
  for (let h = 0; h < HOURS; h++) {
    const excess = column[h] - limit(h);
    if (excess <= 0) continue;
    if (hours++ === 0) first = h;
    if (excess > worst) [worst, worstHour] = [excess, h];
  }
  const figures = `${column[worstHour].toFixed(0)} of at most ${limit(worstHour).toFixed(0)} W/m2`;
  return {
    code,
    hours,
    what: `${what} (first ${hourName(first)}, worst ${hourName(worstHour)}: ${figures})`,
    beyondSun,
  };
};
