import { deliver, type PlaneViews, planeViews, type SkylineShade } from '../energy/index.ts';
import { type Pointing, pointFixed } from '../mounts/index.ts';
import { type Comparison, MONTH_DAYS, MONTH_NAMES } from '../shared/index.ts';
import type { SkyHours } from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';
import type { MountRun } from './mount-run.ts';

const STEP_DEG = 10;

/** The parabola through three values one step apart: how far from the middle it peaks (steps, -0.5..0.5), and how high. */
const peak = (before: number, middle: number, after: number): { shift: number; value: number } => {
  const bend = before - 2 * middle + after;
  const shift = bend < 0 ? Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend))) : 0;
  return { shift, value: middle + shift * ((after - before) / 2 + (shift * bend) / 2) };
};

/**
 * For each month the fixed plane that delivers most in it, on the reference's rows and losses: the honest rival of a
 * tracker in its worst month. Energy is worked out at tilts of 0, 10 .. 90 degrees and a parabola drawn between, which
 * is within 0.2 % of working out the peak itself (test/study/tilted-for-month.test.ts).
 * @param azimuthDeg the way the planes face
 * @param shade the skyline, which stands before these planes as before all others
 */
export const tiltedForMonth = (
  sun: SunHours,
  sky: SkyHours,
  reference: Pick<MountRun, 'chain' | 'gcr'>,
  azimuthDeg: number,
  shade: SkylineShade | null = null,
): Comparison['tilted_for_month'] => {
  const chain = { ...reference.chain, drive: null };
  let [pointing, views]: [Pointing | null, PlaneViews | null] = [null, null];
  const byTilt = Array.from({ length: 90 / STEP_DEG + 1 }, (_, i) => {
    pointing = pointFixed(sun, i * STEP_DEG, azimuthDeg, reference.gcr, pointing);
    views = planeViews(sun, pointing, shade, views);
    return deliver(sky, views, chain).energyMonthlyKwhPerKw;
  });
  return MONTH_NAMES.map((month, m) => {
    const column = byTilt.map((monthly) => monthly[m]);
    const top = column.indexOf(Math.max(...column));
    const inside = top > 0 && top < column.length - 1;
    const { shift, value } = inside
      ? peak(column[top - 1], column[top], column[top + 1])
      : { shift: 0, value: column[top] };
    return {
      month,
      tilt_deg: Math.round((top + shift) * STEP_DEG),
      azimuth_deg: azimuthDeg,
      kwh_per_kw_day: value / MONTH_DAYS[m],
    };
  });
};
