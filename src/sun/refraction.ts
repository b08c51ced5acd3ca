import { tanDeg } from '../shared/index.ts';

/** Below this elevation of the sun's centre (radius plus refraction at the horizon) no light is bent into view. */
const LOWEST_DEG = -(0.26667 + 0.5667);

/**
 * How much the air lifts the sun, in degrees, at 1013.25 mbar and 15 degrees C.
 * Bennett 1982 as used by Reda & Andreas, NREL/TP-560-34302 (2008), eq. 42; 0 below the horizon.
 * @param elevationDeg true elevation of the sun's centre
 */
export const refractionDeg = (elevationDeg: number): number =>
  elevationDeg < LOWEST_DEG
    ? 0
    : ((1013.25 / 1010) * (283 / (273 + 15)) * 1.02) /
      (60 * tanDeg(elevationDeg + 10.3 / (elevationDeg + 5.11)));
