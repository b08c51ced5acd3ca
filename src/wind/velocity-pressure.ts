import type { WindBasis } from '../shared/index.ts';
import type { Exposure, WindSpec } from './spec.ts';
import { DEFERRAL } from './words.ts';

export const WIND_EDITION = 'ASCE 7-16';

/** Terrain constants: power-law exponent and gradient height (1200, 900, 700 ft). ASCE 7-16, Table 26.11-1. */
const TERRAIN: Record<Exposure, { readonly alpha: number; readonly gradientHeightM: number }> = {
  B: { alpha: 7, gradientHeightM: 365.76 },
  C: { alpha: 9.5, gradientHeightM: 274.32 },
  D: { alpha: 11.5, gradientHeightM: 213.36 },
};

/** 15 ft: below it the exposure coefficient stays what it is there. */
export const LOWEST_HEIGHT_M = 4.572;

/** Taken as level ground at sea level (topography, elevation), and the directionality of most structures. */
export const SCREENING_FACTORS = { kzt: 1, kd: 0.85, ke: 1 } as const;

/**
 * Exposure coefficient Kz = 2.01 (z / zg)^(2 / alpha), with z from 15 ft to the gradient height zg; `heightM`
 * above ground. ASCE 7-16, Table 26.10-1, note 1.
 */
export const exposureCoefficient = (exposure: Exposure, heightM: number): number => {
  const { alpha, gradientHeightM } = TERRAIN[exposure];
  const z = Math.min(Math.max(heightM, LOWEST_HEIGHT_M), gradientHeightM);
  return 2.01 * (z / gradientHeightM) ** (2 / alpha);
};

export interface VelocityPressure {
  readonly pressurePa: number;
  /** All four factors, so that an output can print them. */
  readonly kz: number;
  readonly kzt: number;
  readonly kd: number;
  readonly ke: number;
}

/**
 * Velocity pressure qz = 0.613 Kz Kzt Kd Ke V^2, N/m2 with V in m/s. V is the design gust: 3 s, at 10 m, open
 * ground, strength level, from the code's map. Screening only. ASCE 7-16, eq. 26.10-1 (SI form); later editions
 * move Kd out of qz.
 */
export const velocityPressure = (input: {
  readonly designGustMs: number;
  readonly exposure: Exposure;
  /** Above ground. */
  readonly heightM: number;
}): VelocityPressure => {
  const { kzt, kd, ke } = SCREENING_FACTORS;
  const kz = exposureCoefficient(input.exposure, input.heightM);
  return { pressurePa: 0.613 * kz * kzt * kd * ke * input.designGustMs ** 2, kz, kzt, kd, ke };
};

/** What every pressure of a study rests on; null where the gust or the exposure is blank. */
export const windBasis = (wind: WindSpec | null): WindBasis | null =>
  wind === null || wind.designGustMs === null || wind.exposure === null
    ? null
    : {
        edition: WIND_EDITION,
        design_gust_ms: wind.designGustMs,
        exposure: wind.exposure,
        ...SCREENING_FACTORS,
        deferral: DEFERRAL,
      };
