import { cosDeg, sinDeg, tanDeg } from '../shared/index.ts';
import type { SunHours } from '../sun/index.ts';
import { pointFixed } from './fixed.ts';
import { emptyPointing, type Pointing } from './pointing.ts';
import { rowShade } from './row-shade.ts';
import { groundLeftByRows, skyLeftByRows } from './row-view.ts';
import { facingOfTurn } from './single-axis.ts';
import { crossAxisTiltOf } from './slope.ts';
import type { DualAxis, SingleAxis } from './spec.ts';

/**
 * A single-axis tracker that stands still, and the rows beside it with it. The frame is that of
 * {@link pointSingleAxis}: turning right-handed about the axis, so that with the axis falling south a positive turn
 * faces west. On sloping ground its neighbours stand on the slope, as there.
 */
export const pointAtTurn = (
  sun: SunHours,
  mount: SingleAxis,
  turnDeg: number,
  used: Pointing | null = null,
): Pointing => {
  const gcr = mount.rows?.gcr ?? null;
  const facing = facingOfTurn(mount, turnDeg);
  const pointing = emptyPointing(sun, gcr !== null, () => facing, used);
  const { cosIncidence, neighbours } = pointing;
  const [sinAz, cosAz] = [sinDeg(mount.axisAzimuthDeg), cosDeg(mount.axisAzimuthDeg)];
  const [sinAxis, cosAxis] = [sinDeg(mount.axisTiltDeg), cosDeg(mount.axisTiltDeg)];
  const [sinTurn, cosTurn] = [sinDeg(turnDeg), cosDeg(turnDeg)];
  const crossDeg = crossAxisTiltOf(mount);
  const [cosCross, tanCross] = [cosDeg(crossDeg), tanDeg(crossDeg)];
  const cosTilt = cosTurn * cosAxis;
  pointing.cosTilt.fill(cosTilt);
  pointing.sinTilt.fill(Math.sqrt(Math.max(0, 1 - cosTilt * cosTilt)));
  if (gcr !== null && neighbours) {
    const cosOffSlope = cosDeg(turnDeg - crossDeg);
    neighbours.skyLeft.fill(skyLeftByRows(cosOffSlope, gcr * cosCross));
    neighbours.groundLeft.fill(groundLeftByRows(cosOffSlope, gcr * cosCross));
  }
  for (let s = 0; s < cosIncidence.length; s++) {
    const across = sun.east[s] * cosAz - sun.north[s] * sinAz;
    const out = (sun.east[s] * sinAz + sun.north[s] * cosAz) * sinAxis + sun.up[s] * cosAxis;
    const incidence = across * sinTurn + out * cosTurn;
    cosIncidence[s] = incidence;
    if (gcr !== null && neighbours)
      neighbours.shaded[s] = incidence > 0 ? rowShade(out + tanCross * across, incidence, gcr) : 0;
  }
  return pointing;
};

/**
 * A dual-axis tracker that stands still, and the masts beside it with it. Masts that do not face the sun shade each
 * other as long rows at the same pitch would, times the share of a row that they fill: an assumption, as for their
 * diffuse light.
 */
export const pointMastAt = (
  sun: SunHours,
  mount: DualAxis,
  tiltDeg: number,
  azimuthDeg: number,
  used: Pointing | null = null,
): Pointing => {
  if (!mount.rows) return pointFixed(sun, tiltDeg, azimuthDeg, null, used);
  const filled = Math.sqrt(mount.rows.gcr);
  const pointing = pointFixed(sun, tiltDeg, azimuthDeg, filled, used);
  const neighbours = pointing.neighbours as NonNullable<Pointing['neighbours']>;
  for (let s = 0; s < neighbours.shaded.length; s++) {
    // A plane with the sun behind it has no beam to lose, and its old figure may be another plane's.
    neighbours.shaded[s] = pointing.cosIncidence[s] > 0 ? filled * neighbours.shaded[s] : 0;
    neighbours.skyLeft[s] = 1 - filled * (1 - neighbours.skyLeft[s]);
    neighbours.groundLeft[s] = 1 - filled * (1 - neighbours.groundLeft[s]);
  }
  return pointing;
};
