import type { SkyModelFunction } from './weights.ts';

/** Diffuse light comes alike from the whole sky: Liu & Jordan 1963, Solar Energy 7, 53. A lower bound for trackers. */
export const isotropicSky: SkyModelFunction = (_hour, out) => {
  out.isotropic = 1;
  out.circumsolar = 0;
  out.horizon = 0;
  out.steepness = 0;
};
