import { cosDeg } from '../shared/index.ts';
import type { Side } from './fields/angles.ts';

const AZIMUTH: Record<Side, number> = { north: 0, east: 90, south: 180, west: 270 };
/** A side nearer to the axis than this, degrees, is no side of it. */
const CLEAR_OF_AXIS = cosDeg(80);

/**
 * The signed turn of a single-axis tracker that is turned `turnDeg` to face a side; positive faces the axis's azimuth
 * plus 90 degrees (west of an axis that falls south). Null where the side lies along the axis.
 */
export const sideTurn = (turnDeg: number, side: Side, axisAzimuthDeg: number): number | null => {
  const across = cosDeg(AZIMUTH[side] - axisAzimuthDeg - 90);
  return Math.abs(across) < CLEAR_OF_AXIS ? null : Math.sign(across) * turnDeg;
};
