import { acosDeg, DEG } from '../shared/index.ts';

/** Angular loss coefficient of clean glass over silicon, Martin & Ruiz 2001 (their range 0.16 to 0.17). */
const ANGULAR_LOSS = 0.16;
const NORMALISED = 1 - Math.exp(-1 / ANGULAR_LOSS);

/**
 * Share of the light from one direction that passes the glass, against normal incidence; 0..1.
 * Martin & Ruiz 2001, Solar Energy Materials and Solar Cells 70, 25, eq. 2.
 * @param cosIncidence cosine of the angle of incidence; 0 at or behind the plane
 */
export const beamThroughGlass = (cosIncidence: number): number =>
  cosIncidence > 0 ? (1 - Math.exp(-cosIncidence / ANGULAR_LOSS)) / NORMALISED : 0;

/** The same for diffuse light, for planes of tilt 0, 1 .. 90: even sky, even ground, and the band of the horizon. */
export interface DiffuseGlass {
  readonly sky: Float64Array;
  readonly ground: Float64Array;
  readonly horizon: Float64Array;
}

/** Midpoints each way; 48 are within 0.0005 of 400. */
const STEPS = 48;

/**
 * Mean over the part of a half-space of even brightness that a plane sees. Directions are taken by elevation and by
 * azimuth from the way the plane faces, midpoint rule; the ground is the sky of the plane turned over.
 */
const evenHalf = (tiltDeg: number, upward: boolean): number => {
  const [sinTilt, cosTilt] = [Math.sin(tiltDeg * DEG), Math.cos(tiltDeg * DEG) * (upward ? 1 : -1)];
  let [light, through] = [0, 0];
  for (let i = 0; i < STEPS; i++) {
    const elevation = ((i + 0.5) / STEPS) * (Math.PI / 2);
    const [sinEl, cosEl] = [Math.sin(elevation), Math.cos(elevation)];
    for (let j = 0; j < STEPS; j++) {
      const cosIncidence = sinTilt * cosEl * Math.cos(((j + 0.5) / STEPS) * Math.PI) + cosTilt * sinEl;
      if (cosIncidence <= 0) continue;
      light += cosIncidence * cosEl;
      through += cosIncidence * cosEl * beamThroughGlass(cosIncidence);
    }
  }
  return light > 0 ? through / light : 0;
};

/** The horizon is a thin bright band: only its azimuth varies. */
const horizonBand = (tiltDeg: number): number => {
  let [light, through] = [0, 0];
  for (let j = 0; j < STEPS; j++) {
    const cosIncidence = Math.sin(tiltDeg * DEG) * Math.cos(((j + 0.5) / STEPS) * (Math.PI / 2));
    light += cosIncidence;
    through += cosIncidence * beamThroughGlass(cosIncidence);
  }
  return light > 0 ? through / light : 0;
};

let table: DiffuseGlass | null = null;

/** Built on first use (tilts in steps of 5 degrees, straight lines between) and kept: it depends on nothing but the glass. */
export const diffuseThroughGlass = (): DiffuseGlass => {
  if (table) return table;
  const knots = (f: (tiltDeg: number) => number) => {
    const at = Array.from({ length: 19 }, (_, i) => f(i * 5));
    return Float64Array.from({ length: 91 }, (_, tilt) => {
      const i = Math.min(17, Math.floor(tilt / 5));
      return at[i] + (at[i + 1] - at[i]) * (tilt / 5 - i);
    });
  };
  // A level plane sees no ground and no horizon: the value is held from a hair above level.
  table = {
    sky: knots((tilt) => evenHalf(tilt, true)),
    ground: knots((tilt) => evenHalf(Math.max(tilt, 1), false)),
    horizon: knots((tilt) => horizonBand(Math.max(tilt, 1))),
  };
  return table;
};

/** Reads a table by the cosine of the tilt (to the nearest degree: the table moves by under 0.01 a degree at 30). */
export const tiltIndex = (cosTilt: number): number => Math.round(acosDeg(Math.max(0, cosTilt)));
