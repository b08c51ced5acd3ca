import type { SkyModelFunction } from './weights.ts';

/** Upper edges of the first seven of eight bins of sky clearness. */
const CLEARNESS_EDGES = [1.065, 1.23, 1.5, 1.95, 2.8, 4.5, 6.2];

/** F11 F12 F13 F21 F22 F23 of each bin: all-sites composite of Perez et al. 1990, table 6, in seven digits. */
const COEFFICIENTS = [
  [-0.0083117, 0.5877285, -0.0620636, -0.0596012, 0.0721249, -0.0220216],
  [0.1299457, 0.6825954, -0.1513752, -0.0189325, 0.065965, -0.0288748],
  [0.3296958, 0.4868735, -0.2210958, 0.055414, -0.0639588, -0.0260542],
  [0.5682053, 0.1874525, -0.295129, 0.1088631, -0.1519229, -0.0139754],
  [0.873028, -0.3920403, -0.3616149, 0.2255647, -0.4620442, 0.0012448],
  [1.1326077, -1.2367284, -0.4118494, 0.2877813, -0.8230357, 0.0558651],
  [1.0601591, -1.5999137, -0.3589221, 0.2642124, -1.127234, 0.1310694],
  [0.677747, -0.3272588, -0.2504286, 0.1561313, -1.3765031, 0.2506212],
] as const;

/** Weighs the cube of the zenith angle (rad) in the clearness, eq. 1. */
const KAPPA = 1.041;

/**
 * Circumsolar and horizon brightening from the clearness and brightness of the sky: Perez, Ineichen, Seals,
 * Michalsky & Stewart 1990, Solar Energy 44, 271, eqs. 1, 2, 6, 7 and 9. The horizon term may be negative.
 */
export const perezSky: SkyModelFunction = (hour, out) => {
  const zenith = Math.acos(hour.cosZenith);
  const cubed = KAPPA * zenith * zenith * zenith;
  const clearness =
    hour.directNormal > 0 ? (1 + hour.directNormal / hour.diffuseHorizontal + cubed) / (1 + cubed) : 1;
  const brightness = (hour.airMass * hour.diffuseHorizontal) / hour.extraterrestrialNormal;
  let bin = 0;
  while (bin < 7 && clearness >= CLEARNESS_EDGES[bin]) bin++;
  const f = COEFFICIENTS[bin];
  const circumsolar = Math.max(0, f[0] + f[1] * brightness + f[2] * zenith);
  out.isotropic = 1 - circumsolar;
  out.circumsolar = circumsolar;
  out.horizon = f[3] + f[4] * brightness + f[5] * zenith;
  out.steepness = 0;
};
