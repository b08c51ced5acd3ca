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
  const [azimuthAt, tiltAt] = [new Float64Array(4), new Float64Array(4)];
  const [here, across] = [nodes(), nodes()];
  const alongTilt = nodes();

  const findAzimuth = (azimuthDeg: number, found: Nodes): void => {
    const next = firstAbove(azimuths, azimuthDeg);
    for (let k = 0; k < 4; k++) {
      const turns = Math.floor((next - 2 + k) / azimuths.length);
      found.index[k] = next - 2 + k - turns * azimuths.length;
      azimuthAt[k] = azimuths[found.index[k]] + 360 * turns;
    }
    lagrange(azimuthAt, azimuthDeg, found.weight);
  };
  // A row at tilt -t is the row at tilt t, seen from the opposite azimuth.
  const centred = tilts[0] === 0 ? 1 : 0;

  return (x, y) => {
    const tilt = Math.hypot(x, y);
    const azimuth = wrap360(atan2Deg(x, y));
    findAzimuth(azimuth, here);
    const next = Math.min(firstAbove(tilts, tilt), tilts.length - 2);
    if (next < 2) findAzimuth(wrap360(azimuth + 180), across);
    for (let k = 0; k < 4; k++) {
      const i = next - 2 + k;
      alongTilt.index[k] = i < 0 ? -i - 1 + centred : i;
      tiltAt[k] = i < 0 ? -tilts[alongTilt.index[k]] : tilts[i];
    }
    lagrange(tiltAt, tilt, alongTilt.weight);
    let sum = 0;
    for (let k = 0; k < 4; k++) {
      const row = rows[alongTilt.index[k]];
      const { index, weight } = next - 2 + k < 0 ? across : here;
      const value =
        weight[0] * row[index[0]] +
        weight[1] * row[index[1]] +
        weight[2] * row[index[2]] +
        weight[3] * row[index[3]];
      sum += alongTilt.weight[k] * value;
    }
    return sum;
  };
};

/** Four neighbours on one axis and what each counts for. */
interface Nodes {
  readonly index: Int32Array;
  readonly weight: Float64Array;
}
const nodes = (): Nodes => ({ index: new Int32Array(4), weight: new Float64Array(4) });

/** Index of the first entry of a rising list that is above `x`; its length if none is. */
const firstAbove = (rising: readonly number[], x: number): number => {
  let [low, high] = [0, rising.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rising[middle] > x) high = middle;
    else low = middle + 1;
  }
  return low;
};

/** Weights of the values at four places in the cubic through them, at `x`. */
const lagrange = (at: Float64Array, x: number, weight: Float64Array): void => {
  for (let i = 0; i < 4; i++) {
    let product = 1;
    for (let j = 0; j < 4; j++) if (j !== i) product *= (x - at[j]) / (at[i] - at[j]);
    weight[i] = product;
  }
};
