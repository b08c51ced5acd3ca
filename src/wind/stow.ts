import type { StowSpec } from './spec.ts';

/**
 * Gust of a few seconds over the hourly mean, where a study gives none. Assumption: about what open country has
 * (Durst 1960 gives 1.52 for 3 seconds; from memory).
 */
export const GUST_FACTOR = 1.5;

export interface StowHours {
  /** 1 for each hour in which the tracker is parked. */
  readonly stowed: Uint8Array;
  readonly hours: number;
  /** Runs of parked hours, and the longest of them. */
  readonly events: number;
  readonly longestH: number;
}

/**
 * In which hours of a year a tracker is parked. It parks in an hour whose mean wind times the gust factor reaches the
 * gust of the rule, and goes back to work once that product has been below the release for the hold time; an hour is
 * parked whole or not at all, so a hold of 2.5 h keeps it for three. The year begins at work.
 * @param windMs hourly mean at 10 m
 */
export const stowHours = (windMs: Float64Array, rule: Omit<StowSpec, 'angleDeg'>): StowHours => {
  const factor = rule.gustFactor ?? GUST_FACTOR;
  const releaseMs = rule.releaseMs ?? rule.gustMs;
  const stowed = new Uint8Array(windMs.length);
  let [hours, events, longestH, run, calmH] = [0, 0, 0, 0, 0];
  for (let h = 0; h < windMs.length; h++) {
    const gustMs = windMs[h] * factor;
    const parked = run > 0;
    calmH = gustMs >= releaseMs ? 0 : calmH + 1;
    if (gustMs >= rule.gustMs || (parked && (calmH === 0 || calmH < rule.holdH + 1))) {
      if (!parked) events++;
      stowed[h] = 1;
      hours++;
      run++;
      longestH = Math.max(longestH, run);
    } else run = 0;
  }
  return { stowed, hours, events, longestH };
};
