import type { Neighbours, Pointing } from '../mounts/index.ts';
import { acosDeg } from '../shared/index.ts';
import type { SkyHours } from '../sky/index.ts';
import type { SunHours } from '../sun/index.ts';
import { beamThroughGlass, diffuseThroughGlass, tiltIndex } from './incidence.ts';
import type { SkylineShade } from './skyline-shade.ts';

/**
 * How much of each kind of light a plane takes in each hour, whatever the sky's brightness: means over the hour's
 * sunlit samples. Four depths: `open` (nothing in the way), `skyline` (behind hills and trees), `rows` (neighbours'
 * shade and masking taken off too), `glass` (reflection at the glass taken off too). A depth that takes nothing is the
 * one before it. Worked out once per mount; every sky model then costs one dot product.
 */
export interface PlaneViews {
  readonly open: Views;
  readonly skyline: Views;
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

/**
 * Averages a plane's pointing over the samples of each hour.
 * @param shade what the skyline takes; null: the horizon is open
 * @param used views of the same sun that are no longer needed: their columns are written over, which spares memory
 */
export const planeViews = (
  sun: SunHours,
  pointing: Pointing,
  shade: SkylineShade | null = null,
  used: PlaneViews | null = null,
): PlaneViews => {
  const hours = sun.cosZenith.length;
  const { cosIncidence, cosTilt, sinTilt, neighbours } = pointing;
  const open = used?.open ?? emptyViews(hours);
  const glass = used?.glass ?? emptyViews(hours);
  const tilt = new Float64Array(hours);
  for (let h = 0; h < hours; h++) {
    // Plain variables: taking arrays apart here runs their iterators and costs a quarter of the time.
    const from = sun.first[h];
    const to = sun.first[h + 1];
    if (to === from) continue;
    let beam = 0;
    let lit = 0;
    let cosine = 0;
    let steep = 0;
    let horizon = 0;
    for (let s = from; s < to; s++) {
      const away = 0.5 - 0.5 * cosTilt[s]; // view of the ground; that of the sky is the rest
      cosine += cosTilt[s];
      steep += (1 - away) * away * Math.sqrt(away);
      horizon += sinTilt[s];
      const cos = cosIncidence[s];
      if (cos > 0) {
        beam += cos;
        let arriving = cos;
        if (shade) arriving *= 1 - shade.hidden[s];
        if (neighbours) arriving *= 1 - neighbours.shaded[s];
        lit += arriving * beamThroughGlass(cos);
      }
    }
    const share = 1 / (to - from);
    tilt[h] = cosine * share;
    open.beam[h] = beam * share;
    open.sky[h] = 0.5 + 0.5 * tilt[h];
    open.steep[h] = steep * share;
    open.horizon[h] = horizon * share;
    open.ground[h] = 1 - open.sky[h];
    glass.beam[h] = lit * share;
  }
  const skyline = shade ? behindSkyline(sun, pointing, shade, open, tilt) : open;
  const usedRows = used && used.rows !== used.skyline ? used.rows : null;
  const rows = neighbours
    ? behindNeighbours(sun, pointing, neighbours, shade, skyline, open, usedRows)
    : skyline;
  diffusePastGlass(sun, rows, tilt, glass);
  return { open, skyline, rows, glass };
};

/** The views of a plane that in some hours (1 in `hours`) stands as another does. Both are of one mount, with rows or without. */
export const otherwiseIn = (hours: Uint8Array, views: PlaneViews, other: PlaneViews): PlaneViews => {
  const columns = (a: Views, b: Views): Views => {
    const choose = (key: keyof Views) => a[key].map((value, h) => (hours[h] ? b[key][h] : value));
    return {
      beam: choose('beam'),
      sky: choose('sky'),
      steep: choose('steep'),
      horizon: choose('horizon'),
      ground: choose('ground'),
    };
  };
  const open = columns(views.open, other.open);
  const skyline = views.skyline === views.open ? open : columns(views.skyline, other.skyline);
  const rows = views.rows === views.skyline ? skyline : columns(views.rows, other.rows);
  return { open, skyline, rows, glass: columns(views.glass, other.glass) };
};

/** Takes off what the skyline hides: the sun sample by sample, the sky by the plane's angles in the middle of the hour. */
const behindSkyline = (
  sun: SunHours,
  pointing: Pointing,
  shade: SkylineShade,
  open: Views,
  cosTilt: Float64Array,
): Views => {
  const views = { ...emptyViews(sun.cosZenith.length), ground: open.ground };
  const { cosIncidence, azimuthDegAt } = pointing;
  // A plane that stands still asks the same question all year.
  let [askedCosTilt, askedAzimuthDeg, skyLeft, bandLeft] = [Number.NaN, Number.NaN, 1, 1];
  for (let h = 0; h < sun.cosZenith.length; h++) {
    const from = sun.first[h];
    const to = sun.first[h + 1];
    if (to === from) continue;
    let beam = 0;
    for (let s = from; s < to; s++) if (cosIncidence[s] > 0) beam += cosIncidence[s] * (1 - shade.hidden[s]);
    const azimuthDeg = azimuthDegAt((from + to) >> 1);
    if (!(Math.abs(cosTilt[h] - askedCosTilt) < 1e-12) || azimuthDeg !== askedAzimuthDeg) {
      askedCosTilt = cosTilt[h];
      askedAzimuthDeg = azimuthDeg;
      skyLeft = shade.skyLeft(acosDeg(askedCosTilt), azimuthDeg);
      bandLeft = shade.bandLeft(azimuthDeg);
    }
    views.beam[h] = beam / (to - from);
    views.sky[h] = open.sky[h] * skyLeft;
    views.steep[h] = open.steep[h] * skyLeft;
    views.horizon[h] = open.horizon[h] * bandLeft;
  }
  return views;
};

/** Takes off what the neighbours shade and mask; of the sky they leave a share of what the skyline left. */
const behindNeighbours = (
  sun: SunHours,
  pointing: Pointing,
  neighbours: Neighbours,
  shade: SkylineShade | null,
  before: Views,
  open: Views,
  used: Views | null,
): Views => {
  const rows = used ?? emptyViews(sun.cosZenith.length);
  const { cosIncidence, cosTilt, sinTilt } = pointing;
  const { shaded, skyLeft, groundLeft } = neighbours;
  for (let h = 0; h < sun.cosZenith.length; h++) {
    const from = sun.first[h];
    const to = sun.first[h + 1];
    if (to === from) continue;
    let beam = 0;
    let sky = 0;
    let horizon = 0;
    let ground = 0;
    for (let s = from; s < to; s++) {
      const away = 0.5 - 0.5 * cosTilt[s];
      sky += (1 - away) * skyLeft[s];
      horizon += sinTilt[s] * skyLeft[s];
      ground += away * groundLeft[s];
      if (cosIncidence[s] > 0) beam += cosIncidence[s] * (1 - shaded[s]) * (shade ? 1 - shade.hidden[s] : 1);
    }
    const share = 1 / (to - from);
    rows.beam[h] = beam * share;
    rows.sky[h] = sky * share * (before.sky[h] / open.sky[h]);
    rows.steep[h] = open.steep[h] * (rows.sky[h] / open.sky[h]);
    rows.horizon[h] = open.horizon[h] > 0 ? horizon * share * (before.horizon[h] / open.horizon[h]) : 0;
    rows.ground[h] = ground * share;
  }
  return rows;
};

/** What of the diffuse light passes the glass, by the mean tilt of the hour. */
const diffusePastGlass = (sun: SunHours, before: Views, cosTilt: Float64Array, glass: Views): void => {
  const through = diffuseThroughGlass();
  for (let h = 0; h < cosTilt.length; h++) {
    if (sun.first[h + 1] === sun.first[h]) continue;
    const index = tiltIndex(cosTilt[h]);
    glass.sky[h] = before.sky[h] * through.sky[index];
    glass.steep[h] = before.steep[h] * through.sky[index];
    glass.horizon[h] = before.horizon[h] * through.horizon[index];
    glass.ground[h] = before.ground[h] * through.ground[index];
  }
};

/** Light that a plane takes in one hour under one sky, W/m2: all kinds together. */
export const lightAt = (sky: SkyHours, views: Views, h: number): number =>
  (sky.direct[h] + sky.circumsolar[h]) * views.beam[h] +
  sky.isotropic[h] * views.sky[h] +
  sky.steep[h] * views.steep[h] +
  sky.horizon[h] * views.horizon[h] +
  sky.ground[h] * views.ground[h];

/** The same for every hour of the year. */
export const lightThrough = (sky: SkyHours, views: Views): Float64Array =>
  Float64Array.from({ length: sky.direct.length }, (_, h) => lightAt(sky, views, h));

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
