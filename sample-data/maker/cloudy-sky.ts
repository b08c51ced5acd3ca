import type { Light } from './clear-sky.ts';

/**
 * Light below clouds that cover the share `cover` (0..1) of the sky, from the light of the clear sky: Kasten & Czeplak
 * 1980, Solar and terrestrial radiation dependent on the amount and type of cloud, Solar Energy 24, 177-189.
 * Global light falls to 1 - 0.75 cover^3.4 of the clear sky's. Their diffuse share, 0.3 + 0.7 cover^2, belongs to
 * Hamburg's clear sky; here the clear sky's own share takes the place of 0.3, so that no cloud gives the clear sky
 * back. The beam follows from the two, and is never negative.
 */
export const belowClouds = (clear: Light, cover: number, cosZenith: number): Light => {
  const passes = 1 - 0.75 * cover ** 3.4;
  const ghi = (clear.dni * cosZenith + clear.dhi) * passes;
  const dni = clear.dni * passes * (1 - cover * cover);
  return { dni, dhi: ghi - dni * cosZenith };
};
