import type { SunHours } from '../../src/sun/index.ts';

const DEG = Math.PI / 180;

/** Sun samples made by hand, all in one hour after another: `[zenith, azimuth]` in degrees, one sample an hour. */
export const sunAt = (directions: readonly (readonly [number, number])[]): SunHours => {
  const pick = (f: (z: number, a: number) => number) =>
    Float64Array.from(directions, ([z, a]) => f(z * DEG, a * DEG));
  return {
    first: Int32Array.from({ length: directions.length + 1 }, (_, i) => i),
    east: pick((z, a) => Math.sin(z) * Math.sin(a)),
    north: pick((z, a) => Math.sin(z) * Math.cos(a)),
    up: pick((z) => Math.cos(z)),
    sunlit: pick(() => 1),
    cosZenith: pick((z) => Math.cos(z)),
    extraterrestrialWm2: pick(() => 1361),
  };
};
