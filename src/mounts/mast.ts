import { atan2Deg, cosDeg, sinDeg, wrap360 } from '../shared/index.ts';
import { type SunHours, sunAzimuthDeg } from '../sun/index.ts';
import { mastFieldShade } from './mast-field.ts';
import { emptyPointing, type Pointing } from './pointing.ts';
import { groundLeftByRows, skyLeftByRows } from './row-view.ts';
import type { ElevationRange, TurnRange } from './spec.ts';

/** Where a plane on a mast can face. */
export interface MastReach {
  /** Null: all round. */
  readonly turns: TurnRange | null;
  readonly elevation: ElevationRange;
}

/** The azimuth within reach that is nearest to one asked for, 0..360; of two ends equally near, the first. */
export const nearestAzimuth = (turns: TurnRange | null, azimuthDeg: number): number => {
  if (!turns) return azimuthDeg;
  const width = wrap360(turns.toDeg - turns.fromDeg);
  const past = wrap360(azimuthDeg - turns.fromDeg);
  if (past <= width) return azimuthDeg;
  return wrap360(past - width < 360 - past ? turns.toDeg : turns.fromDeg);
};

/** The plane within reach that faces nearest to a direction, by the rule of {@link pointOnMast}. */
export const nearestPlane = (
  { turns, elevation }: MastReach,
  azimuthDeg: number,
  elevationDeg: number,
): { tiltDeg: number; azimuthDeg: number } => {
  const facedAzimuthDeg = nearestAzimuth(turns, azimuthDeg);
  const ahead = cosDeg(elevationDeg) * cosDeg(facedAzimuthDeg - azimuthDeg);
  const bestDeg = atan2Deg(Math.max(0, sinDeg(elevationDeg)), ahead);
  const facedDeg = Math.min(elevation.highestDeg, Math.max(elevation.lowestDeg, bestDeg));
  return { tiltDeg: 90 - facedDeg, azimuthDeg: facedAzimuthDeg };
};

/**
 * A plane on a mast that faces as near to the sun as its reach allows. Seen at azimuth A and elevation E of its normal, the
 * cosine of incidence is cos h cos E cos(A - a) + sin h sin E for a sun at azimuth a and elevation h (Duffie & Beckman,
 * Solar Engineering of Thermal Processes, eq. 1.6.3). With E in 0..90 the azimuth nearest to the sun's is best
 * whatever E, and then the elevation nearest to atan2(sin h, cos h cos(A - a)): behind the mast that is beyond 90.
 *
 * In a field of masts the beam is that of {@link mastFieldShade}; what neighbours take of sky and ground is that of long
 * rows at the same pitch times the share of a row that the masts fill (assumption: no published figure is known to us).
 * @param gcr area of a collector over the ground of one mast, or null for a lone mast
 */
export const pointOnMast = (
  sun: SunHours,
  { turns, elevation }: MastReach,
  gcr: number | null,
  used: Pointing | null = null,
): Pointing => {
  const facingAt = (s: number) => nearestAzimuth(turns, sunAzimuthDeg(sun, s));
  const pointing = emptyPointing(sun, gcr !== null, facingAt, used);
  const { cosIncidence, cosTilt, sinTilt, neighbours } = pointing;
  const filled = Math.sqrt(gcr ?? 0);
  for (let s = 0; s < sun.up.length; s++) {
    const level = Math.sqrt(sun.east[s] * sun.east[s] + sun.north[s] * sun.north[s]);
    const up = Math.max(0, sun.up[s]);
    let ahead = level; // of the sun's level part, what lies the way that the plane faces
    if (turns) {
      const azimuthDeg = sunAzimuthDeg(sun, s);
      ahead *= cosDeg(nearestAzimuth(turns, azimuthDeg) - azimuthDeg);
    }
    const facedDeg = Math.min(elevation.highestDeg, Math.max(elevation.lowestDeg, atan2Deg(up, ahead)));
    cosTilt[s] = sinDeg(facedDeg);
    sinTilt[s] = cosDeg(facedDeg);
    cosIncidence[s] = ahead * sinTilt[s] + sun.up[s] * cosTilt[s];
    if (neighbours && gcr !== null) {
      neighbours.shaded[s] =
        cosIncidence[s] > 0 ? mastFieldShade(sun.east[s], sun.north[s], sun.up[s], gcr, cosIncidence[s]) : 0;
      neighbours.skyLeft[s] = 1 - filled * (1 - skyLeftByRows(cosTilt[s], filled));
      neighbours.groundLeft[s] = 1 - filled * (1 - groundLeftByRows(cosTilt[s], filled));
    }
  }
  return pointing;
};
