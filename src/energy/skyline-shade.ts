import { type SunHours, sunAzimuthDeg } from '../sun/index.ts';
import { isBlocked, type Skyline, skylineTable, skyViewLookup } from '../survey/index.ts';

/** What a skyline takes, ready for every mount of a site. Several points of an array count alike. */
export interface SkylineShade {
  /** Share of the array's points from which the sun is hidden, per sample, 0..1. */
  readonly hidden: Float64Array;
  /** Share of an even sky's light that is left to a plane of a tilt (0..90) and azimuth (0..360). */
  readonly skyLeft: (tiltDeg: number, azimuthDeg: number) => number;
  /** Share of the horizon band that is left before a plane of an azimuth. */
  readonly bandLeft: (azimuthDeg: number) => number;
}

const mean = (values: readonly number[]): number => values.reduce((sum, v) => sum + v, 0) / values.length;

/** Holds the sun of a year against one or several skylines, and builds their sky views. */
export const skylineShade = (sun: SunHours, skylines: readonly Skyline[]): SkylineShade => {
  const tables = skylines.map(skylineTable);
  const views = tables.map(skyViewLookup);
  const hidden = new Float64Array(sun.up.length);
  for (let s = 0; s < hidden.length; s++) {
    const azimuthDeg = sunAzimuthDeg(sun, s);
    let count = 0;
    for (const table of tables) if (isBlocked(table, azimuthDeg, sun.up[s])) count++;
    hidden[s] = count / tables.length;
  }
  return {
    hidden,
    skyLeft: (tiltDeg, azimuthDeg) => mean(views.map((view) => view.skyLeft(tiltDeg, azimuthDeg))),
    bandLeft: (azimuthDeg) => mean(views.map((view) => view.bandLeft(azimuthDeg))),
  };
};
