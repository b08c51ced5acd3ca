import { skyViewLeft } from './sky-view.ts';
import type { Skyline } from './skyline.ts';
import { skylineTable } from './skyline-table.ts';
import { unionOf } from './skyline-union.ts';

export interface SkylineSurvey {
  /** As given, one per point of the array. */
  readonly profiles: readonly Skyline[];
  /** Share (0..1) of an even sky's light on a level plane that each profile takes. */
  readonly blockedSky: readonly number[];
  /** The profile that takes most; the first of equals. */
  readonly worst: Skyline;
  /** The higher of all profiles at every azimuth: what an array in series sees that suffers at its worst point. */
  readonly union: Skyline;
}

/** Several profiles of one array compared; at least one. */
export const surveySkylines = (profiles: readonly Skyline[]): SkylineSurvey => {
  const blockedSky = profiles.map((profile) => 1 - skyViewLeft(skylineTable(profile), 0, 0));
  const worst = profiles[blockedSky.indexOf(Math.max(...blockedSky))];
  return {
    profiles,
    blockedSky,
    worst,
    union: profiles.length === 1 ? worst : unionOf('all points together', profiles),
  };
};
