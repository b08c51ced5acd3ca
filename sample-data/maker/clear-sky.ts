import { DEG } from '../../src/shared/index.ts';

/** What a cloudless atmosphere holds above the site. */
export interface ClearAir {
  /** Of the air at the site, hPa. */
  readonly pressureHpa: number;
  /** Depth of the ozone at standard conditions, cm. */
  readonly ozoneCm: number;
  /** Precipitable water, cm. */
  readonly waterCm: number;
  /** Optical depth of the aerosol at 380 nm and at 500 nm. */
  readonly aerosol380: number;
  readonly aerosol500: number;
  /** Reflectance of the ground, 0..1. */
  readonly groundAlbedo: number;
}

/** Direct normal and diffuse horizontal irradiance, W/m2. */
export interface Light {
  readonly dni: number;
  readonly dhi: number;
}

/** Share of what aerosol scatters that goes forward (Ba), and the constant of its absorption (K1), both as Bird & Hulstrom 1981 give them. */
const FORWARD = 0.84;
const ABSORBED = 0.1;

/**
 * Light from a cloudless sky: Bird & Hulstrom 1981, A Simplified Clear Sky Model for Direct and Diffuse Insolation on
 * Horizontal Surfaces, SERI/TR-642-761, with the relative air mass of Kasten 1966 that it uses. The paper's symbols
 * are kept beside its equations; M is the relative air mass, Mp the same corrected for pressure, T a transmittance.
 *
 * @param cosZenith above 0; @param extraterrestrial normal to the beam, W/m2.
 */
export const clearSky = (cosZenith: number, extraterrestrial: number, air: ClearAir): Light => {
  const zenithDeg = Math.acos(Math.min(1, cosZenith)) / DEG;
  const M = 1 / (cosZenith + 0.15 * (93.885 - zenithDeg) ** -1.253);
  const Mp = (M * air.pressureHpa) / 1013;
  const TR = Math.exp(-0.0903 * Mp ** 0.84 * (1 + Mp - Mp ** 1.01));
  const Xo = air.ozoneCm * M;
  const To =
    1 - 0.1611 * Xo * (1 + 139.48 * Xo) ** -0.3035 - (0.002715 * Xo) / (1 + 0.044 * Xo + 0.0003 * Xo * Xo);
  const Tum = Math.exp(-0.0127 * Mp ** 0.26);
  const Xw = air.waterCm * M;
  const Tw = 1 - (2.4959 * Xw) / ((1 + 79.034 * Xw) ** 0.6828 + 6.385 * Xw);
  const depth = 0.2758 * air.aerosol380 + 0.35 * air.aerosol500;
  const TA = Math.exp(-(depth ** 0.873) * (1 + depth - depth ** 0.7088) * M ** 0.9108);
  const TAA = 1 - ABSORBED * (1 - M + M ** 1.06) * (1 - TA);
  const TAS = TA / TAA;
  const dni = extraterrestrial * 0.9662 * TR * To * Tum * Tw * TA;
  const scattered =
    (extraterrestrial * cosZenith * 0.79 * To * Tum * Tw * TAA * (0.5 * (1 - TR) + FORWARD * (1 - TAS))) /
    (1 - M + M ** 1.02);
  const skyAlbedo = 0.0685 + (1 - FORWARD) * (1 - TAS);
  const beam = dni * cosZenith;
  return { dni, dhi: (beam + scattered) / (1 - air.groundAlbedo * skyAlbedo) - beam };
};
