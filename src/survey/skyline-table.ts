import { DEG, sinDeg, wrap360 } from '../shared/index.ts';
import { elevationAt, type Skyline } from './skyline.ts';

/** Slots round the circle, half a degree each: two minutes of the earth's turn. */
export const SLOTS = 720;
const SLOTS_PER_DEG = SLOTS / 360;

/**
 * A skyline for the hot path. Slot `i` stands for true azimuths from `i / 2` to `(i + 1) / 2` degrees and holds the
 * elevation at its middle, so an edge is off by a quarter of a degree at most.
 */
export interface SkylineTable {
  /** Sine of the elevation, 0..1, comparable with the cosine of the sun's zenith angle. */
  readonly sine: Float64Array;
  /** What the skyline takes of an even sky in each slot, per unit of cos(tilt): `sin^2(e) / 2`. */
  readonly levelLoss: Float64Array;
  /** The same per unit of sin(tilt) cos(azimuth from the plane's): `(e + sin e cos e) / 2`, e in radians. */
  readonly uprightLoss: Float64Array;
  /** Share of the band along the horizon that the skyline leaves in each slot, 0..1. */
  readonly bandLeft: Float64Array;
}

/**
 * Height of the bright band along the horizon, degrees (Perez, Stewart, Arbogast, Seals & Scott 1986, An anisotropic
 * hourly diffuse radiation model for sloping surfaces, Solar Energy 36, 481; from memory). Their later models shrink it
 * to a line, which any tree would put out altogether.
 */
export const HORIZON_BAND_DEG = 6.5;

export const skylineTable = (skyline: Skyline): SkylineTable => {
  const room = new Float64Array(4 * SLOTS);
  const [sine, levelLoss, uprightLoss, bandLeft] = [0, 1, 2, 3].map((i) =>
    room.subarray(i * SLOTS, (i + 1) * SLOTS),
  );
  for (let i = 0; i < SLOTS; i++) {
    const elevationDeg = elevationAt(skyline, (i + 0.5) / SLOTS_PER_DEG);
    const s = sinDeg(elevationDeg);
    sine[i] = s;
    levelLoss[i] = (s * s) / 2;
    uprightLoss[i] = (elevationDeg * DEG + s * Math.cos(elevationDeg * DEG)) / 2;
    bandLeft[i] = 1 - Math.min(1, elevationDeg / HORIZON_BAND_DEG);
  }
  return { sine, levelLoss, uprightLoss, bandLeft };
};

/** Slot of a true azimuth, any degrees. */
export const slotOf = (azimuthDeg: number): number => Math.floor(wrap360(azimuthDeg) * SLOTS_PER_DEG) % SLOTS;

/**
 * Whether the sun's centre is behind the skyline: true azimuth in degrees, sine of the sun's elevation. A skyline of 90
 * hides even the sun overhead; on the line itself the sun is seen.
 */
export const isBlocked = (table: SkylineTable, sunAzimuthDeg: number, sinSunElevation: number): boolean => {
  const sine = table.sine[slotOf(sunAzimuthDeg)];
  return sinSunElevation < sine || sine === 1;
};
