import { deliver, planeViews } from '../energy/index.ts';
import { pointFixed } from '../mounts/index.ts';
import { type Comparison, MONTH_DAYS, MONTH_NAMES } from '../shared/index.ts';
import type { SkyHours } from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';
import type { MountRun } from './mount-run.ts';

const STEP_DEG = 10;

/** Where the parabola through three equally spaced values peaks, in steps from the middle one, -0.5..0.5. */
const peak = (before: number, middle: number, after: number): number => {
  const bend = before - 2 * middle + after;
  return bend < 0 ? Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend))) : 0;
};

/**
 * For each month the fixed plane that delivers most in it, on the reference's rows and losses: the honest rival of a
 * tracker in its worst month. Tilts in steps of 10 degrees and a parabola between, to the degree.
 * @param azimuthDeg the way the planes face
 */
export const tiltedForMonth = (
  sun: SunHours,
  sky: SkyHours,
  reference: MountRun,
  azimuthDeg: number,
): Comparison['tilted_for_month'] => {
  const chain = { ...reference.chain, drive: null };
  const monthly = (tiltDeg: number) =>
    deliver(sky, planeViews(sun, pointFixed(sun, tiltDeg, azimuthDeg, reference.gcr)), chain)
      .energyMonthlyKwhPerKw;
  const coarse = Array.from({ length: 90 / STEP_DEG + 1 }, (_, i) => monthly(i * STEP_DEG));
  const fine = new Map<number, readonly number[]>();
  return MONTH_NAMES.map((month, m) => {
    const column = coarse.map((tilt) => tilt[m]);
    const top = column.indexOf(Math.max(...column));
    const inside = top > 0 && top < column.length - 1;
    const shift = inside ? peak(column[top - 1], column[top], column[top + 1]) : 0;
    const tiltDeg = Math.round((top + shift) * STEP_DEG);
    if (!fine.has(tiltDeg)) fine.set(tiltDeg, monthly(tiltDeg));
    const kwh = Math.max(column[top], fine.get(tiltDeg)?.[m] ?? 0);
    return { month, tilt_deg: tiltDeg, azimuth_deg: azimuthDeg, kwh_per_kw_day: kwh / MONTH_DAYS[m] };
  });
};
