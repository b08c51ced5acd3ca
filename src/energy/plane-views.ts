import type { Pointing } from '../mounts/index.ts';
import type { SkyHours } from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';
import { beamThroughGlass, diffuseThroughGlass, tiltIndex } from './incidence.ts';

/**
 * How much of each kind of light a plane takes in each hour, whatever the sky's brightness: means over the hour's
 * sunlit samples. Three depths: `open` (no neighbours), `rows` (neighbours' shade and masking taken off), `glass`
 * (reflection at the glass taken off too). Worked out once per mount; every sky model then costs one dot product.
 */
export interface PlaneViews {
  readonly open: Views;
  readonly rows: Views;
  readonly glass: Views;
}

export interface Views {
  /** Of direct and circumsolar light: mean cosine of incidence that arrives. */
  readonly beam: Float64Array;
  /** Of the even sky: (1 + cos tilt)/2 where open. */
  readonly sky: Float64Array;
  /** Of Reindl's steepness term. */
  readonly steep: Float64Array;
  /** Of the horizon band: sin tilt where open. */
  readonly horizon: Float64Array;
  /** Of the even ground: (1 - cos tilt)/2 where open. */
  readonly ground: Float64Array;
}

const emptyViews = (hours: number): Views => {
  const column = () => new Float64Array(hours);
  return { beam: column(), sky: column(), steep: column(), horizon: column(), ground: column() };
};

/** Averages a plane's pointing over the samples of each hour. */
export const planeViews = (sun: SunHours, pointing: Pointing): PlaneViews => {
  const hours = sun.cosZenith.length;
  const { cosIncidence, cosTilt, sinTilt, neighbours } = pointing;
  const [open, rows, glass] = [emptyViews(hours), neighbours ? emptyViews(hours) : null, emptyViews(hours)];
  const through = diffuseThroughGlass();
  for (let h = 0; h < hours; h++) {
    const [from, to] = [sun.first[h], sun.first[h + 1]];
    if (to === from) continue;
    let [beam, beamRows, beamGlass, tilt, sky, skyRows, steep, horizon, horizonRows, groundRows] = [
      0, 0, 0, 0, 0, 0, 0, 0, 0, 0,
    ]; // biome-ignore format: sums over the samples
    for (let s = from; s < to; s++) {
      const view = (1 + cosTilt[s]) / 2;
      tilt += cosTilt[s];
      sky += view;
      steep += view * (1 - view) * Math.sqrt(1 - view);
      horizon += sinTilt[s];
      const cos = cosIncidence[s];
      let lit = cos;
      if (neighbours) {
        skyRows += view * neighbours.skyLeft[s];
        horizonRows += sinTilt[s] * neighbours.skyLeft[s];
        groundRows += (1 - view) * neighbours.groundLeft[s];
        lit *= 1 - neighbours.shaded[s];
      }
      if (cos > 0) {
        beam += cos;
        beamRows += lit;
        beamGlass += lit * beamThroughGlass(cos);
      }
    }
    const n = to - from;
    open.beam[h] = beam / n;
    open.sky[h] = sky / n;
    open.steep[h] = steep / n;
    open.horizon[h] = horizon / n;
    open.ground[h] = 1 - sky / n;
    if (rows) {
      rows.beam[h] = beamRows / n;
      rows.sky[h] = skyRows / n;
      rows.steep[h] = (steep / n) * (skyRows / sky);
      rows.horizon[h] = horizonRows / n;
      rows.ground[h] = groundRows / n;
    }
    const before = rows ?? open;
    const index = tiltIndex(tilt / n);
    glass.beam[h] = beamGlass / n;
    glass.sky[h] = before.sky[h] * through.sky[index];
    glass.steep[h] = before.steep[h] * through.sky[index];
    glass.horizon[h] = before.horizon[h] * through.horizon[index];
    glass.ground[h] = before.ground[h] * through.ground[index];
  }
  return { open, rows: rows ?? open, glass };
};

/** Light that a plane takes in every hour under one sky, W/m2: all kinds together. */
export const lightThrough = (sky: SkyHours, views: Views): Float64Array => {
  const light = new Float64Array(sky.direct.length);
  for (let h = 0; h < light.length; h++)
    light[h] =
      (sky.direct[h] + sky.circumsolar[h]) * views.beam[h] +
      sky.isotropic[h] * views.sky[h] +
      sky.steep[h] * views.steep[h] +
      sky.horizon[h] * views.horizon[h] +
      sky.ground[h] * views.ground[h];
  return light;
};

/** The year's open light by where it comes from, kWh/m2. Circumsolar light counts as sky, as the contract says. */
export const lightBySource = (sky: SkyHours, open: Views): { beam: number; sky: number; ground: number } => {
  const sums = { beam: 0, sky: 0, ground: 0 };
  for (let h = 0; h < sky.direct.length; h++) {
    sums.beam += (sky.direct[h] * open.beam[h]) / 1000;
    sums.sky +=
      (sky.circumsolar[h] * open.beam[h] +
        sky.isotropic[h] * open.sky[h] +
        sky.steep[h] * open.steep[h] +
        sky.horizon[h] * open.horizon[h]) /
      1000;
    sums.ground += (sky.ground[h] * open.ground[h]) / 1000;
  }
  return sums;
};
