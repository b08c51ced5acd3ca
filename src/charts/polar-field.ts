import { atan2Deg, cosDeg, type OrientationMapResult, sinDeg, wrap360 } from '../shared/index.ts';

/** A point of the dial: degrees of tilt towards east (`x`) and north (`y`) from lying flat in the centre. */
export type DialPoint = readonly [x: number, y: number];

/** Where a plane stands on the dial; north is up, east is right. */
export const dialPoint = (tiltDeg: number, azimuthDeg: number): DialPoint => [
  tiltDeg * sinDeg(azimuthDeg),
  tiltDeg * cosDeg(azimuthDeg),
];

/**
 * The orientation map as a smooth function on the dial. Between the map's nodes it is a cubic through the four nearest
 * in azimuth and in tilt (Lagrange's formula; Abramowitz & Stegun, Handbook of Mathematical Functions, 1964, 25.2.1),
 * which is good to a few parts in a million on a 2 by 5 degree map. Through the centre the map goes on to the
 * opposite azimuth; a little beyond the rim it is carried on by the same cubic.
 * @param map tilts rising from 0, azimuths rising and closed round the circle, at least four of each
 * @returns kWh/m² at a point of the dial
 */
export const polarField = (map: OrientationMapResult): ((x: number, y: number) => number) => {
  const { tilts_deg: tilts, azimuths_deg: azimuths, irradiation_kwh_m2: rows } = map;
  const rowAt = (row: readonly number[], azimuthDeg: number): number => {
    let next = azimuths.findIndex((a) => a > azimuthDeg);
    if (next < 0) next = azimuths.length;
    const at: number[] = [];
    const value: number[] = [];
    for (let i = next - 2; i < next + 2; i++) {
      const turns = Math.floor(i / azimuths.length);
      at.push(azimuths[i - turns * azimuths.length] + 360 * turns);
      value.push(row[i - turns * azimuths.length]);
    }
    return cubic(at, value, azimuthDeg);
  };
  const centred = tilts[0] === 0 ? 1 : 0;
  return (x, y) => {
    const tilt = Math.hypot(x, y);
    const azimuth = wrap360(atan2Deg(x, y));
    const opposite = wrap360(azimuth + 180);
    let next = tilts.findIndex((t) => t > tilt);
    if (next < 0 || next > tilts.length - 2) next = tilts.length - 2;
    const at: number[] = [];
    const value: number[] = [];
    for (let i = next - 2; i < next + 2; i++) {
      const mirrored = -i - 1 + centred;
      at.push(i < 0 ? -tilts[mirrored] : tilts[i]);
      value.push(i < 0 ? rowAt(rows[mirrored], opposite) : rowAt(rows[i], azimuth));
    }
    return cubic(at, value, tilt);
  };
};

const cubic = (at: readonly number[], value: readonly number[], x: number): number => {
  let sum = 0;
  for (let i = 0; i < at.length; i++) {
    let weight = value[i];
    for (let j = 0; j < at.length; j++) if (j !== i) weight *= (x - at[j]) / (at[i] - at[j]);
    sum += weight;
  }
  return sum;
};
