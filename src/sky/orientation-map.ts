import { cosDeg, goldenMaximum, sinDeg, wrap360 } from '../shared/index.ts';
import type { SunHours } from '../sun/index.ts';
import type { SkyHours } from './sky-over-hours.ts';

/** Yearly irradiation of an unshaded fixed plane for every tilt and azimuth, kWh/m2: `at[tilt index][azimuth index]`. */
export interface OrientationMap {
  readonly tiltsDeg: readonly number[];
  readonly azimuthsDeg: readonly number[];
  readonly irradiationKwhM2: readonly (readonly number[])[];
  readonly best: { readonly tiltDeg: number; readonly azimuthDeg: number; readonly irradiationKwhM2: number };
}

/** Sums over the year that do not depend on where a plane faces, kWh/m2. */
interface DiffuseYear {
  isotropic: number;
  horizon: number;
  steep: number;
  ground: number;
}

/** Light that comes straight from the sun's direction, one vector per sample: length kWh/m2, towards the sun. */
interface SunVectors {
  readonly east: Float64Array;
  readonly north: Float64Array;
  readonly up: Float64Array;
}

/** From one day to the next the sun moves by under half a degree at the same hour, so a few days may be added up. */
const DAYS_TOGETHER = 5;

/**
 * Gathers the sun vectors of a year, adding those of the same hour and sample on `daysTogether` days. Adding is exact
 * for every plane that all of them light; only where the plane's own horizon runs between them, and so where they
 * graze it, is anything lost: under 0.03 % of any plane of the map with five days together (as tested).
 */
const sunVectors = (sun: SunHours, sky: SkyHours, daysTogether: number): SunVectors => {
  const hours = sky.direct.length;
  let samples = 0;
  for (let h = 0; h < hours; h++) samples = Math.max(samples, sun.first[h + 1] - sun.first[h]);
  const room = Math.ceil(hours / 24 / daysTogether) * 24 * samples;
  const [east, north, up] = [new Float64Array(room), new Float64Array(room), new Float64Array(room)];
  for (let h = 0; h < hours; h++) {
    const from = sun.first[h];
    const to = sun.first[h + 1];
    const share = (sky.direct[h] + sky.circumsolar[h]) / (1000 * (to - from));
    if (!(share > 0)) continue; // dark, or wholly overcast
    const slot = (Math.floor(h / 24 / daysTogether) * 24 + (h % 24)) * samples - from;
    for (let s = from; s < to; s++) {
      east[slot + s] += share * sun.east[s];
      north[slot + s] += share * sun.north[s];
      up[slot + s] += share * sun.up[s];
    }
  }
  return withoutDark({ east, north, up });
};

/** Closes the gaps that the night leaves. */
const withoutDark = ({ east, north, up }: SunVectors): SunVectors => {
  let count = 0;
  for (let s = 0; s < up.length; s++) {
    if (up[s] <= 0) continue;
    east[count] = east[s];
    north[count] = north[s];
    up[count++] = up[s];
  }
  return { east: east.subarray(0, count), north: north.subarray(0, count), up: up.subarray(0, count) };
};

const diffuseYear = (sky: SkyHours): DiffuseYear => {
  const year: DiffuseYear = { isotropic: 0, horizon: 0, steep: 0, ground: 0 };
  for (let h = 0; h < sky.isotropic.length; h++) {
    year.isotropic += sky.isotropic[h] / 1000;
    year.horizon += sky.horizon[h] / 1000;
    year.steep += sky.steep[h] / 1000;
    year.ground += sky.ground[h] / 1000;
  }
  return year;
};

const diffuseOn = (year: DiffuseYear, tiltDeg: number): number => {
  const skyView = (1 + cosDeg(tiltDeg)) / 2;
  return (
    skyView * (year.isotropic + year.steep * sinDeg(tiltDeg / 2) ** 3) +
    year.horizon * sinDeg(tiltDeg) +
    year.ground * (1 - skyView)
  );
};

/**
 * Beam and circumsolar light on planes of every whole-numbered tilt 0..90 that face one way, and the opposite way,
 * kWh/m2. Seen from the side, each sun vector is (forward, up); it lights the plane of tilt b while
 * forward sin b + up cos b > 0. On the plane that faces it that is so for every tilt; on the other it ends at a tilt of
 * atan(up / |forward|), so summing vectors by the tilt at which they go out, and then down the tilts, gives all planes
 * of both ways in one pass.
 */
const beamByTilt = (v: SunVectors, azimuthDeg: number): [Float64Array, Float64Array] => {
  const [sinAz, cosAz] = [sinDeg(azimuthDeg), cosDeg(azimuthDeg)];
  const [facing, opposite] = [new LitUntil(), new LitUntil()];
  for (let s = 0; s < v.up.length; s++) {
    const forward = v.east[s] * sinAz + v.north[s] * cosAz;
    const up = v.up[s];
    const last = Math.ceil(Math.atan(up / Math.abs(forward)) * (180 / Math.PI));
    facing.add(forward >= 0 ? ALWAYS : last, forward, up);
    opposite.add(forward <= 0 ? ALWAYS : last, -forward, up);
  }
  return [facing.onPlanes(), opposite.onPlanes()];
};

/** Beyond every tilt of the map. */
const ALWAYS = 91;

/** Sun vectors seen from the side, summed by the first whole tilt that they do not light. */
class LitUntil {
  private readonly forward = new Float64Array(ALWAYS + 1);
  private readonly up = new Float64Array(ALWAYS + 1);

  add(tilt: number, forward: number, up: number): void {
    this.forward[tilt] += forward;
    this.up[tilt] += up;
  }

  /** Light on the planes of tilt 0..90. */
  onPlanes(): Float64Array {
    const light = new Float64Array(ALWAYS);
    let [forward, up] = [this.forward[ALWAYS], this.up[ALWAYS]];
    for (let tilt = 90; tilt >= 0; tilt--) {
      light[tilt] = forward * sinDeg(tilt) + up * cosDeg(tilt);
      forward += this.forward[tilt];
      up += this.up[tilt];
    }
    return light;
  }
}

const beamOn = (v: SunVectors, tiltDeg: number, azimuthDeg: number): number => {
  const [e, n, u] = [
    sinDeg(tiltDeg) * sinDeg(azimuthDeg),
    sinDeg(tiltDeg) * cosDeg(azimuthDeg),
    cosDeg(tiltDeg),
  ]; // biome-ignore format: one vector
  let sum = 0;
  for (let s = 0; s < v.up.length; s++) {
    const light = v.east[s] * e + v.north[s] * n + v.up[s] * u;
    if (light > 0) sum += light;
  }
  return sum;
};

/** Yearly irradiation of unshaded fixed planes, kWh/m2, as a function of tilt and azimuth; gathers the year's sun once. */
export const irradiationOfPlanes = (
  sun: SunHours,
  sky: SkyHours,
): ((tiltDeg: number, azimuthDeg: number) => number) => {
  const vectors = sunVectors(sun, sky, 1);
  const diffuse = diffuseYear(sky);
  return (tiltDeg, azimuthDeg) => beamOn(vectors, tiltDeg, azimuthDeg) + diffuseOn(diffuse, tiltDeg);
};

/** Yearly irradiation of one unshaded fixed plane, kWh/m2. */
export const planeIrradiation = (sun: SunHours, sky: SkyHours, tiltDeg: number, azimuthDeg: number): number =>
  irradiationOfPlanes(sun, sky)(tiltDeg, azimuthDeg);

/** The tilt (0..90, to 0.1 degrees) at which a plane that faces one way receives most in the year. */
export const bestTiltFacing = (sun: SunHours, sky: SkyHours, azimuthDeg: number): number => {
  const at = irradiationOfPlanes(sun, sky);
  return tenth(goldenMaximum((tilt) => at(tilt, azimuthDeg), 0, 90, 0.05));
};

/** The azimuth (to 0.1 degrees) at which a plane of one tilt receives most in the year. */
export const bestAzimuthAtTilt = (sun: SunHours, sky: SkyHours, tiltDeg: number): number => {
  const at = irradiationOfPlanes(sun, sky);
  let best = 0;
  for (let azimuth = 10; azimuth < 360; azimuth += 10)
    if (at(tiltDeg, azimuth) > at(tiltDeg, best)) best = azimuth;
  return wrap360(tenth(goldenMaximum((azimuth) => at(tiltDeg, azimuth), best - 10, best + 10, 0.05)));
};

const tenth = (deg: number): number => Math.round(deg * 10) / 10;

/** Climbs from the best grid point by turns in tilt and azimuth, to 0.05 degrees. */
const refine = (
  at: (tiltDeg: number, azimuthDeg: number) => number,
  tiltDeg: number,
  azimuthDeg: number,
  step: number,
) => {
  let [tilt, azimuth] = [tiltDeg, azimuthDeg];
  for (let round = 0; round < 3; round++) {
    azimuth = goldenMaximum((a) => at(tilt, a), azimuth - step, azimuth + step, 0.05);
    tilt = goldenMaximum((t) => at(t, azimuth), Math.max(0, tilt - 2), Math.min(90, tilt + 2), 0.05);
  }
  return { tilt, azimuth };
};

/**
 * The orientation map of a site from its own hours, and its optimum in tilt and azimuth (0.05 degrees). On a site
 * where lying flat is best the azimuth has no meaning and is given towards the equator.
 * @param azimuthStepDeg a divisor of 180; 5 gives 72 columns; tilts are 0, 1 .. 90
 */
export const orientationMap = (
  sun: SunHours,
  sky: SkyHours,
  latitudeDeg: number,
  azimuthStepDeg = 5,
): OrientationMap => {
  const vectors = sunVectors(sun, sky, DAYS_TOGETHER);
  const diffuse = diffuseYear(sky);
  const tiltsDeg = Array.from({ length: 91 }, (_, tilt) => tilt);
  const azimuthsDeg = Array.from({ length: Math.round(360 / azimuthStepDeg) }, (_, i) => i * azimuthStepDeg);
  // Azimuths come in opposite pairs: `azimuthStepDeg` divides 180.
  const pairs = azimuthsDeg.slice(0, azimuthsDeg.length / 2).map((azimuth) => beamByTilt(vectors, azimuth));
  const columns = [...pairs.map(([facing]) => facing), ...pairs.map(([, opposite]) => opposite)];
  const irradiationKwhM2 = tiltsDeg.map((tilt) => {
    const fromSky = diffuseOn(diffuse, tilt);
    return columns.map((column) => column[tilt] + fromSky);
  });
  let [bestTilt, bestAzimuth] = [0, 0];
  for (const tilt of tiltsDeg)
    for (let a = 0; a < azimuthsDeg.length; a++)
      if (irradiationKwhM2[tilt][a] > irradiationKwhM2[bestTilt][bestAzimuth])
        [bestTilt, bestAzimuth] = [tilt, a];
  const at = (tilt: number, azimuth: number) => beamOn(vectors, tilt, azimuth) + diffuseOn(diffuse, tilt);
  const fine = refine(at, bestTilt, azimuthsDeg[bestAzimuth], azimuthStepDeg);
  const flat = fine.tilt < 0.5;
  const tiltDeg = flat ? 0 : tenth(fine.tilt);
  const azimuthDeg = flat ? (latitudeDeg >= 0 ? 180 : 0) : wrap360(tenth(fine.azimuth));
  return {
    tiltsDeg,
    azimuthsDeg,
    irradiationKwhM2,
    best: { tiltDeg, azimuthDeg, irradiationKwhM2: planeIrradiation(sun, sky, tiltDeg, azimuthDeg) },
  };
};
