import { acosDeg, atan2Deg, cosDeg, sinDeg, tanDeg, wrap360 } from '../shared/index.ts';
import type { SunHours } from '../sun/index.ts';
import { emptyPointing, type Pointing } from './pointing.ts';
import { rowShade } from './row-shade.ts';
import { groundLeftByRows, skyLeftByRows } from './row-view.ts';
import { crossAxisTiltOf } from './slope.ts';
import type { SingleAxis } from './spec.ts';

/**
 * Turn of a single-axis tracker that keeps out of its neighbours' shade when the sun is low, degrees: back from the
 * turn towards the sun until the rows just touch, edge to edge. Anderson & Mikofski 2020, NREL/TP-5K00-76626,
 * eqs. 11 to 14; on level ground that of Lorenzo, Narvarte & Munoz 2011, Prog. Photovolt. 19, 747.
 * @param trueTurnDeg turn that faces the sun, -180..180, 0 lying flat
 * @param gcr slant of a row over the distance from axis to axis in plan, as seen along the axes
 * @param crossAxisTiltDeg see {@link crossAxisTiltOf}; 0 on level ground
 */
export const backtrackTurn = (trueTurnDeg: number, gcr: number, crossAxisTiltDeg = 0): number => {
  const room = Math.abs(cosDeg(trueTurnDeg - crossAxisTiltDeg)) / (gcr * cosDeg(crossAxisTiltDeg));
  return room < 1 ? trueTurnDeg - Math.sign(trueTurnDeg) * acosDeg(room) : trueTurnDeg;
};

/**
 * Share of a tracker row shaded by the next, 0..1: Anderson & Mikofski 2020, eq. 32, by {@link rowShade}.
 * @param turnDeg actual turn of the rows
 * @param trueTurnDeg turn that would face the sun
 */
export const trackerRowShade = (
  turnDeg: number,
  trueTurnDeg: number,
  gcr: number,
  crossAxisTiltDeg = 0,
): number => {
  const cosIncidence = cosDeg(turnDeg - trueTurnDeg);
  const up = cosDeg(trueTurnDeg) + tanDeg(crossAxisTiltDeg) * sinDeg(trueTurnDeg);
  return cosIncidence > 0 ? rowShade(up, cosIncidence, gcr) : 0;
};

/** Turn of a tracker in one sample, degrees, within its swing; positive as for {@link pointSingleAxis}. */
export const turnAt = (sun: SunHours, mount: SingleAxis, s: number): number => {
  const [sinAz, cosAz] = [sinDeg(mount.axisAzimuthDeg), cosDeg(mount.axisAzimuthDeg)];
  const [sinAxis, cosAxis] = [sinDeg(mount.axisTiltDeg), cosDeg(mount.axisTiltDeg)];
  const across = sun.east[s] * cosAz - sun.north[s] * sinAz;
  const out = (sun.east[s] * sinAz + sun.north[s] * cosAz) * sinAxis + sun.up[s] * cosAxis;
  const trueTurnDeg = atan2Deg(across, out);
  const free =
    mount.rows?.lowSun === 'backtrack'
      ? backtrackTurn(trueTurnDeg, mount.rows.gcr, crossAxisTiltOf(mount))
      : trueTurnDeg;
  return Math.max(-mount.swingDeg, Math.min(mount.swingDeg, free));
};

/** The way a plane turned about an axis faces, 0..360: its normal taken out of the axis's frame. */
export const facingOfTurn = (mount: SingleAxis, turnDeg: number): number => {
  const [sinAz, cosAz] = [sinDeg(mount.axisAzimuthDeg), cosDeg(mount.axisAzimuthDeg)];
  const sinAxis = sinDeg(mount.axisTiltDeg);
  const [aside, forward] = [sinDeg(turnDeg), cosDeg(turnDeg) * sinAxis];
  return wrap360(atan2Deg(aside * cosAz + forward * sinAz, forward * cosAz - aside * sinAz));
};

/**
 * A plane that turns about one axis, as near to the sun as its swing and its neighbours allow. The sun is taken into
 * the axis's own frame (across, along, out): Marion & Dobos 2013, NREL/TP-6A20-58891, eq. 3; turning right-handed
 * about the axis, so that with the axis falling south a positive turn faces west. Limits apply after backtracking.
 *
 * On sloping ground the rows' neighbours stand on the slope: the sun is low when it is low above the slope, and what
 * rows leave of sky and ground is their share of what a lone plane on the same slope would see (assumption: the rise
 * of the ground itself takes no even sky). A lone tracker's slope hides nothing of it: that belongs to a skyline.
 */
export const pointSingleAxis = (sun: SunHours, mount: SingleAxis, used: Pointing | null = null): Pointing => {
  const gcr = mount.rows?.gcr ?? null;
  const pointing = emptyPointing(sun, gcr !== null, (s) => facingOfTurn(mount, turnAt(sun, mount, s)), used);
  const { cosIncidence, cosTilt, sinTilt, neighbours } = pointing;
  const [sinAz, cosAz] = [sinDeg(mount.axisAzimuthDeg), cosDeg(mount.axisAzimuthDeg)];
  const [sinAxis, cosAxis] = [sinDeg(mount.axisTiltDeg), cosDeg(mount.axisTiltDeg)];
  const backtracks = mount.rows?.lowSun === 'backtrack';
  const [sinSwing, cosSwing] = [sinDeg(mount.swingDeg), cosDeg(mount.swingDeg)];
  const crossDeg = crossAxisTiltOf(mount);
  const [sinCross, cosCross, tanCross] = [sinDeg(crossDeg), cosDeg(crossDeg), tanDeg(crossDeg)];
  const slantPerDistance = gcr === null ? 0 : gcr * cosCross; // of the line from axis to axis, on the slope
  for (let s = 0; s < cosIncidence.length; s++) {
    const across = sun.east[s] * cosAz - sun.north[s] * sinAz;
    const out = (sun.east[s] * sinAz + sun.north[s] * cosAz) * sinAxis + sun.up[s] * cosAxis;
    const reach = Math.sqrt(across * across + out * out);
    let sinTurn = reach > 0 ? across / reach : 0;
    let cosTurn = reach > 0 ? out / reach : 1;
    const aboveSlope = cosTurn + tanCross * sinTurn; // cos(turn - cross) / cos(cross)
    if (backtracks && gcr !== null && Math.abs(aboveSlope) < gcr) {
      // backtrackTurn by its sine and cosine: the turn less the angle whose cosine is `room`, towards lying flat.
      const room = Math.abs(aboveSlope) / gcr;
      const back = Math.sqrt((1 - room) * (1 + room)) * (sinTurn < 0 ? -1 : 1);
      const sinBefore = sinTurn;
      sinTurn = sinTurn * room - cosTurn * back;
      cosTurn = cosTurn * room + sinBefore * back;
    }
    if (cosTurn < cosSwing) {
      sinTurn = sinTurn < 0 ? -sinSwing : sinSwing;
      cosTurn = cosSwing;
    }
    const incidence = across * sinTurn + out * cosTurn;
    cosIncidence[s] = incidence;
    cosTilt[s] = cosTurn * cosAxis;
    sinTilt[s] = Math.sqrt(Math.max(0, 1 - cosTilt[s] * cosTilt[s]));
    if (gcr !== null && neighbours) {
      const cosOffSlope = cosTurn * cosCross + sinTurn * sinCross;
      neighbours.shaded[s] = incidence > 0 ? rowShade(out + tanCross * across, incidence, gcr) : 0;
      neighbours.skyLeft[s] = skyLeftByRows(cosOffSlope, slantPerDistance);
      neighbours.groundLeft[s] = groundLeftByRows(cosOffSlope, slantPerDistance);
    }
  }
  return pointing;
};
