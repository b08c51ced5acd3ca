import { asinDeg, atan2Deg, cosDeg, sinDeg, tanDeg } from '../shared/index.ts';

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
