import type { HourlyYear } from '../shared/index.ts';

/** trackworth's choice: nine tenths of the light on level ground come from the sky, so hardly a shadow is cast. */
export const OVERCAST_DIFFUSE = 0.9;

/**
 * 1 for every hour of light whose sky is overcast: DHI is at least 0.9 of GHI. That a flat plane then collects more than
 * one that faces the hidden sun was measured by Kelly & Gibson 2009, Solar Energy 83, 2092 (from memory); the
 * threshold is not theirs.
 */
export const overcastHours = ({ ghi, dhi }: Pick<HourlyYear, 'ghi' | 'dhi'>): Uint8Array =>
  Uint8Array.from(ghi, (global, h) => (global > 0 && dhi[h] >= OVERCAST_DIFFUSE * global ? 1 : 0));
