import type { Comparison } from '../shared/index.ts';
import { DEFERRAL } from '../wind/index.ts';
import { isGrade } from './limit-words.ts';

/** True where the output shows any figure or verdict about wind, height or projection. */
export const showsWind = (c: Comparison): boolean =>
  c.wind_basis !== null ||
  c.mounts.some(
    ({ limits, wind, stow }) =>
      stow !== null ||
      limits.some((limit) => limit.bound === 'most' && !isGrade(limit) && limit.status !== 'not_checked') ||
      wind.highest_edge_m !== null ||
      wind.roof_projection_m !== null ||
      wind.velocity_pressure_pa !== null,
  );

/** The sentence that stands beside every wind figure. */
export const windDeferral = (c: Comparison): string => c.wind_basis?.deferral ?? DEFERRAL;
