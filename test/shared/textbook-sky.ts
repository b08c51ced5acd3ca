import { lightThrough, planeViews } from '../../src/energy/index.ts';
import type { Pointing } from '../../src/mounts/index.ts';
import { yearlySum } from '../../src/shared/index.ts';
import { type SkyHours, skyOverHours } from '../../src/sky/index.ts';
import { relativeAirMass, type SunHours } from '../../src/sun/index.ts';

const DEG = Math.PI / 180;

/** Day of the year and solar time of each step, beside the sun there. */
export interface TextbookSun extends SunHours {
  readonly dayOfYear: Int16Array;
}

/**
 * A sun that can be written on one line: days 1..365, declination 23.45 sin(360 (284 + n)/365) (Cooper 1969), solar
 * time, `stepsPerHour` midpoints an hour. Each step is an "hour" of its own with one sample, so that sums are exact.
 * @param declinationDeg another declination for every day, for example 0 for the equinox
 */
export const textbookSun = (
  latitudeDeg: number,
  stepsPerHour = 1,
  declinationDeg: (n: number) => number = (n) => 23.45 * Math.sin(((360 * (284 + n)) / 365) * DEG),
  days = 365,
): TextbookSun => {
  const steps = days * 24 * stepsPerHour;
  const first = new Int32Array(steps + 1);
  const column = () => new Float64Array(steps);
  const [east, north, up, sunlit, cosZenith, above] = [
    column(),
    column(),
    column(),
    column(),
    column(),
    column(),
  ];
  const dayOfYear = new Int16Array(steps);
  const [sinLat, cosLat] = [Math.sin(latitudeDeg * DEG), Math.cos(latitudeDeg * DEG)];
  let count = 0;
  for (let step = 0; step < steps; step++) {
    const n = Math.floor(step / (24 * stepsPerHour)) + 1;
    const hourAngle = 15 * (((step % (24 * stepsPerHour)) + 0.5) / stepsPerHour - 12) * DEG;
    const declination = declinationDeg(n) * DEG;
    const cosZ = sinLat * Math.sin(declination) + cosLat * Math.cos(declination) * Math.cos(hourAngle);
    first[step] = count;
    dayOfYear[step] = n;
    above[step] = 1361;
    if (cosZ <= 0) continue;
    east[count] = -Math.cos(declination) * Math.sin(hourAngle);
    north[count] = cosLat * Math.sin(declination) - sinLat * Math.cos(declination) * Math.cos(hourAngle);
    up[count++] = cosZ;
    sunlit[step] = 1;
    cosZenith[step] = cosZ;
  }
  first[steps] = count;
  return {
    first,
    east: east.subarray(0, count),
    north: north.subarray(0, count),
    up: up.subarray(0, count),
    sunlit,
    cosZenith,
    extraterrestrialWm2: above,
    dayOfYear,
  };
};

/**
 * An isotropic sky over it: clear (direct 1361 * 0.7^(m^0.678), Meinel & Meinel 1976, diffuse a tenth of it), or hazy
 * (half that direct, diffuse (0.1 + 0.3 cos z) of it); ground reflectance 0.2.
 */
export const textbookSky = (sun: SunHours, kind: 'clear' | 'hazy'): SkyHours => {
  const clear = sun.cosZenith.map((c) =>
    c > 0 ? 1361 * 0.7 ** (relativeAirMass(Math.acos(c) / DEG) ** 0.678) : 0,
  );
  const hazy = kind === 'hazy';
  const dni = hazy ? clear.map((x) => x / 2) : clear;
  const dhi = clear.map((x, i) => (hazy ? (0.1 + 0.3 * sun.cosZenith[i]) * x : 0.1 * x));
  const ghi = dni.map((x, i) => x * sun.cosZenith[i] + dhi[i]);
  return skyOverHours(sun, { ghi, dni, dhi }, 0.2, 'isotropic');
};

/** Light on a pointing without anything that neighbours take, kWh/m2 over all steps. */
export const openLight = (sun: SunHours, sky: SkyHours, pointing: Pointing, stepsPerHour = 1): number =>
  yearlySum(lightThrough(sky, planeViews(sun, { ...pointing, neighbours: null }).open)) / 1000 / stepsPerHour;
