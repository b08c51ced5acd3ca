import { cosDeg, sinDeg } from '../shared/index.ts';
import type { SunHours } from '../sun/index.ts';
import { emptyPointing, type Pointing } from './pointing.ts';
import { rowShade } from './row-shade.ts';
import { groundLeftByRows, skyLeftByRows } from './row-view.ts';

/**
 * A plane that never moves, alone or in level rows that run across its azimuth.
 * @param tiltDeg 0..90
 * @param azimuthDeg the way it faces, clockwise from true north
 * @param gcr ground coverage ratio of the rows, or null for a plane without rows
 * @param used see {@link emptyPointing}
 */
export const pointFixed = (
  sun: SunHours,
  tiltDeg: number,
  azimuthDeg: number,
  gcr: number | null,
  used: Pointing | null = null,
): Pointing => {
  const pointing = emptyPointing(sun, gcr !== null, () => azimuthDeg, used);
  const { cosIncidence, neighbours } = pointing;
  const [sinTilt, cosTilt] = [sinDeg(tiltDeg), cosDeg(tiltDeg)];
  const [east, north] = [sinTilt * sinDeg(azimuthDeg), sinTilt * cosDeg(azimuthDeg)];
  pointing.cosTilt.fill(cosTilt);
  pointing.sinTilt.fill(sinTilt);
  for (let s = 0; s < cosIncidence.length; s++)
    cosIncidence[s] = sun.east[s] * east + sun.north[s] * north + sun.up[s] * cosTilt;
  if (gcr !== null && neighbours) {
    neighbours.skyLeft.fill(skyLeftByRows(cosTilt, gcr));
    neighbours.groundLeft.fill(groundLeftByRows(cosTilt, gcr));
    for (let s = 0; s < cosIncidence.length; s++)
      if (cosIncidence[s] > 0) neighbours.shaded[s] = rowShade(sun.up[s], cosIncidence[s], gcr);
  }
  return pointing;
};
