import { cosDeg } from '../shared/index.ts';

/**
 * Relative optical air mass, 1 overhead and about 38 at the horizon (not corrected for pressure).
 * Kasten & Young 1989, Applied Optics 28, 4735, eq. 3. Beyond 90 degrees the value at the horizon is held.
 * @param apparentZenithDeg refracted zenith angle, 0..90
 */
export const relativeAirMass = (apparentZenithDeg: number): number => {
  const z = Math.min(apparentZenithDeg, 90);
  // (96.07995 - z) to the power of -1.6364; the operator takes four times as long.
  return 1 / (cosDeg(z) + 0.50572 * Math.exp(-1.6364 * Math.log(96.07995 - z)));
};
