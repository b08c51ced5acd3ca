import { DEG } from '../shared/index.ts';

/** Degrees that the hour angle gains in an hour, to within 0.005: the rest is taken up by reading the lag at mid-hour. */
export const HOUR_DEG = 15;

/**
 * The sunlit part of an hour as hour angles, degrees. Near the pole an hour can hold the last light of one day and the
 * first of the next: two pieces. Lengths are 0 where there is none.
 */
export interface Pieces {
  readonly from1: number;
  readonly length1: number;
  readonly from2: number;
  readonly length2: number;
}

/** @param steady and `swing`: cos z = steady + swing cos(hour angle) */
export const sunlitPieces = (startDeg: number, steady: number, swing: number): Pieces => {
  // The sun is up while the hour angle is within `half` of noon.
  const half = steady >= swing ? 180 : steady <= -swing ? 0 : Math.acos(-steady / swing) / DEG;
  const endDeg = startDeg + HOUR_DEG;
  const from1 = Math.max(startDeg, -half);
  const from2 = Math.max(startDeg, 360 - half);
  return {
    from1,
    length1: Math.max(0, Math.min(endDeg, half) - from1),
    from2,
    length2: Math.max(0, Math.min(endDeg, 360 + half) - from2),
  };
};

/** The hour angle at `along` degrees of sunlight from the beginning. */
export const alongPieces = (p: Pieces, along: number): number =>
  along < p.length1 ? p.from1 + along : p.from2 + along - p.length1;
