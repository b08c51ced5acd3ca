import { hayDaviesSky } from './hay-davies.ts';
import type { SkyModelFunction } from './weights.ts';

/**
 * Hay & Davies with a brighter horizon for steep planes, by the root of the beam share of global light:
 * Reindl, Beckman & Duffie 1990, Solar Energy 45, 9; Duffie & Beckman eq. 2.16.5 to 2.16.7.
 */
export const reindlSky: SkyModelFunction = (hour, out) => {
  hayDaviesSky(hour, out);
  const beam = hour.directNormal * hour.cosZenith;
  const global = beam + hour.diffuseHorizontal;
  out.steepness = global > 0 ? Math.sqrt(beam / global) : 0;
};
