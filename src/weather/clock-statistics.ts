import { HOURS, type HourlyYear } from '../shared/index.ts';
import { clearSkyLimitWm2 } from './clear-sky-limit.ts';
import type { SunHours } from './sun-hours.ts';

/** How badly the light of a year (or a season) fits the sun under one trial shift of the clock. */
export interface Misfit {
  /** Light above the clear-sky limit while the sun rises or before it does, as a share of all light. */
  morning: number;
  /** The same while it sinks or after it has set. */
  evening: number;
  /** Mean square of GHI - DHI - DNI cos z over the hours with beam, (W/m2)2; NaN where there are none. */
  closure: number;
  /** Hours with beam that entered `closure`. */
  beamHours: number;
}

/** Which hours count: all, or those of a season. */
export type Season = (hour: number) => boolean;

/** Twilight, rounding and the offset of a thermopile at night stay below, W/m2. */
const STRAY_LIGHT_WM2 = 5;
/** Only a low sun tells the time by its light; above about 20 degrees clear and hazy skies differ more than an hour does. */
const LOW_SUN_COSINE = 0.35;
/** Beam weaker than this, W/m2, says little. */
const LEAST_BEAM_WM2 = 50;
/** An hour without sun belongs to the nearer twilight, if there is one within so many hours. */
const TWILIGHT_HOURS = 4;

export const misfit = (year: HourlyYear, sun: SunHours, counts: Season): Misfit => {
  const { ghi, dni, dhi } = year;
  let [light, morning, evening, squares, beamHours] = [0, 0, 0, 0, 0];
  for (let h = 0; h < HOURS; h++) {
    if (!counts(h)) continue;
    light += ghi[h];
    const cosine = sun.cosZenith[h];
    if (dni[h] > LEAST_BEAM_WM2) {
      beamHours++;
      squares += (ghi[h] - dhi[h] - dni[h] * cosine) ** 2;
    }
    if (ghi[h] <= STRAY_LIGHT_WM2 || cosine > LOW_SUN_COSINE) continue;
    const limit = sun.sunlit[h] * clearSkyLimitWm2(cosine, year.place.elevationM);
    const excess = ghi[h] - limit - STRAY_LIGHT_WM2;
    if (excess <= 0) continue;
    const rise = rising(sun, h);
    if (rise > 0) morning += excess;
    else if (rise < 0) evening += excess;
  }
  const closure = beamHours > 0 ? squares / beamHours : Number.NaN;
  return { morning: morning / light, evening: evening / light, closure, beamHours };
};

/** Positive while the sun rises (or will rise next), negative while it sinks (or has sunk last), 0 deep in the night. */
const rising = (sun: SunHours, hour: number): number => {
  const height = (h: number): number => {
    const i = (h + HOURS) % HOURS;
    return sun.cosZenith[i] * sun.sunlit[i];
  };
  for (let k = 1; k <= TWILIGHT_HOURS; k++) {
    const difference = height(hour + k) - height(hour - k);
    if (difference !== 0) return difference;
  }
  return 0;
};

/**
 * How much earlier the light of the year comes than the sun, minutes, -720..720: the difference between the centres of
 * their days on the 24-hour ring. Fog and storms move it by tens of minutes, so it only tells where to search.
 */
export const lightAheadOfSunMin = (year: HourlyYear, sun: SunHours): number => {
  const hourOfLight = ringCentre((h) => year.ghi[h]);
  const hourOfSun = ringCentre((h) => sun.cosZenith[h] * sun.sunlit[h]);
  return ((((hourOfSun - hourOfLight + 12) % 24) + 24) % 24) * 60 - 720;
};

const ringCentre = (weight: (hour: number) => number): number => {
  let [x, y] = [0, 0];
  for (let h = 0; h < HOURS; h++) {
    const w = weight(h);
    const angle = RING[h % 24];
    x += w * angle.cos;
    y += w * angle.sin;
  }
  return (Math.atan2(y, x) * 12) / Math.PI;
};

const RING = Array.from({ length: 24 }, (_, h) => ({
  cos: Math.cos((h * Math.PI) / 12),
  sin: Math.sin((h * Math.PI) / 12),
}));
