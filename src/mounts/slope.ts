import { asinDeg, atan2Deg, cosDeg, sinDeg, tanDeg } from '../shared/index.ts';
import type { GroundSlope, SingleAxis } from './spec.ts';

/**
 * Tilt of a tracker axis laid on sloping ground, degrees, positive where the axis falls towards its azimuth.
 * Anderson & Mikofski 2020, NREL/TP-5K00-76626, eq. 18.
 * @param slopeDeg steepness of the ground, 0..90
 * @param fallsTowardDeg azimuth of the downhill direction
 */
export const axisTiltOnSlope = (slopeDeg: number, fallsTowardDeg: number, axisAzimuthDeg: number): number =>
  atan2Deg(tanDeg(slopeDeg) * cosDeg(fallsTowardDeg - axisAzimuthDeg), 1);

/**
 * Tilt of the line from one tracker axis to the next, measured in the plane square to the axes, degrees; its sign
 * follows the turn of the tracker. Anderson & Mikofski 2020, eq. 26 (the elevation of the same line above the
 * horizontal is another, smaller angle).
 */
export const crossAxisTilt = (slopeDeg: number, fallsTowardDeg: number, axisAzimuthDeg: number): number =>
  asinDeg(sinDeg(slopeDeg) * sinDeg(fallsTowardDeg - axisAzimuthDeg));

/** {@link crossAxisTilt} of a tracker's own ground; 0 where that is level. */
export const crossAxisTiltOf = ({ ground, axisAzimuthDeg }: SingleAxis): number =>
  ground ? crossAxisTilt(ground.slopeDeg, ground.fallsTowardDeg, axisAzimuthDeg) : 0;

/**
 * Grade of the ground along a tracker's axis and straight across it, rise over level run, 0 and up: what a maker's
 * limits are for. Plain geometry of an even slope.
 */
export const gradesByAxis = (
  { slopeDeg, fallsTowardDeg }: GroundSlope,
  axisAzimuthDeg: number,
): { along: number; across: number } => ({
  along: Math.abs(tanDeg(slopeDeg) * cosDeg(fallsTowardDeg - axisAzimuthDeg)),
  across: Math.abs(tanDeg(slopeDeg) * sinDeg(fallsTowardDeg - axisAzimuthDeg)),
});
