import type { SkyModelFunction } from './weights.ts';

/**
 * The share of beam that the air lets through (anisotropy index, DNI over extraterrestrial) of the diffuse light
 * comes from the sun's direction: Hay & Davies 1980, as in Duffie & Beckman, Solar Engineering of Thermal
 * Processes, eq. 2.16.3 and 2.16.4.
 */
export const hayDaviesSky: SkyModelFunction = (hour, out) => {
  const index = Math.min(1, hour.directNormal / hour.extraterrestrialNormal);
  out.isotropic = 1 - index;
  out.circumsolar = index;
  out.horizon = 0;
  out.steepness = 0;
};
