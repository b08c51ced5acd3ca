import type { Comparison, SkylineResult } from '../../src/shared/index.ts';
import { EIGHT, type InventedMount, inventedComparison, USUAL } from './fixture.ts';

/** Invented skylines, and the sun's paths by plain spherical trigonometry (no refraction, no equation of time). */

const DEG = Math.PI / 180;

/** Every ten minutes while the sun is up, from `firstHour` of the sun's own time on. */
export const sunPath = (name: string, latitude: number, declination: number, firstHour = 0) => {
  const samples = Array.from({ length: 144 }, (_, i) => {
    const hour = (((firstHour + i / 6) % 24) - 12) * 15 * DEG;
    const [la, de] = [latitude * DEG, declination * DEG];
    const up = Math.sin(la) * Math.sin(de) + Math.cos(la) * Math.cos(de) * Math.cos(hour);
    const north = Math.cos(la) * Math.sin(de) - Math.sin(la) * Math.cos(de) * Math.cos(hour);
    const east = -Math.cos(de) * Math.sin(hour);
    return { azimuth: ((Math.atan2(east, north) / DEG) + 360) % 360, elevation: Math.asin(up) / DEG };
  }).filter((s) => s.elevation > 0); // biome-ignore format: formulas
  return {
    name,
    azimuths_deg: samples.map((s) => s.azimuth),
    elevations_deg: samples.map((s) => s.elevation),
  };
};

type Profile = SkylineResult['profiles'][number];

export const profile = (name: string, points: [azimuth: number, elevation: number][]): Profile => ({
  name,
  azimuths_deg: points.map((p) => p[0]),
  elevations_deg: points.map((p) => p[1]),
  sky_blocked: 0.04,
});

const RIDGE: [number, number][] = [
  [0, 4], [40, 6], [75, 12], [100, 17], [120, 9], [150, 5], [180, 3], [215, 6], [240, 14], [262, 22], [285, 12],
  [320, 5], [360, 4],
]; // biome-ignore format: points
const raised = (points: [number, number][], factor: number, shift: number): [number, number][] =>
  points.map(([a, e]) => [a, Math.max(0, e * factor + shift)]);
/** A wall to the south with upright edges, and a tree. */
const WALL: [number, number][] = [
  [0, 0], [130, 0], [130, 64], [180, 78], [228, 66], [228, 2], [290, 2], [300, 35], [310, 2], [360, 0],
]; // biome-ignore format: points

export const withSkyline = (
  comparison: Comparison,
  latitude: number,
  profiles: Profile[],
  worst = profiles[0].name,
  firstHour = 0,
): Comparison => ({
  ...comparison,
  site: { ...comparison.site, latitude_deg: latitude },
  skyline: {
    profiles,
    worst_point: worst,
    sun_paths: [
      sunPath('21 June', latitude, 23.44, firstHour),
      sunPath('21 March', latitude, 0.1, firstHour),
      sunPath('21 December', latitude, -23.44, firstHour),
    ],
  },
});

const SURVEYED: InventedMount[] = USUAL.map((m, i) => ({
  ...m,
  shading: [0.021, 0.034, 0.062, 0.071][i],
  ...(m.id === 'roof' ? { tiltError: 2, azimuthError: 5, band: { low: 0.921, high: 0.947 } } : {}),
}));
const usual = () => inventedComparison(SURVEYED);
const south = () => inventedComparison(SURVEYED, { tilt: 34, azimuth: 354 });
const SIX = Array.from({ length: 6 }, (_, i) => profile(`row ${i + 1}`, raised(RIDGE, 1 + i * 0.22, i - 2)));

const HOSTILE_NAME = `</script><img src=x onerror="alert('1')">|\n=1+1 & ]]> <!-- \u202E\u0000\uD800 {datum.x}`;

/** Every shape of skyline that the chart must bear. */
export const SKYLINES = {
  'a ridge in the north': () => withSkyline(usual(), 40.1, [profile('array', RIDGE)]),
  'a ridge in the south': () => withSkyline(south(), -40.1, [profile('array', RIDGE)]),
  'large reading errors': () => withSkyline(inventedComparison(EIGHT.map((m, i) => ({ ...m, shading: 0.01 * i, tiltError: [2, 5, 10, 0, 4, 9, 9, 20][i], azimuthError: [2, 180, 15, 10, 7, 9, 9, 400][i], band: { low: 0.7, high: 1 } }))), 47, [profile('array', RIDGE)]),
  'six points': () => withSkyline(usual(), 40.1, SIX, 'row 6'),
  'a steep wall': () => withSkyline(usual(), 51, [profile('north row', raised(WALL, 0.6, 0)), profile('south row', WALL)], 'south row'),
  'polar day and night': () => withSkyline(usual(), 78, [profile('array', raised(RIDGE, 0.4, 0))]),
  'polar day in the south, clock far off': () => withSkyline(south(), -72, [profile('array', RIDGE)], 'array', 19),
  'under the tropic': () => withSkyline(usual(), 12, [profile('array', RIDGE)]),
  'on the equator, clock far off': () => withSkyline(usual(), 0, [profile('array', RIDGE)], 'array', 9),
  'one angle all round': () => withSkyline(inventedComparison([{ ...SURVEYED[0] }]), 35, [profile('array', [[0, 90], [360, 90]])]),
  'open and dark': () => withSkyline(inventedComparison(USUAL.map((m) => ({ ...m, light: 0, tof: null, lcoe: null }))), 40, [profile('', [[0, 0], [360, 0]])]),
  'hostile names': () => withSkyline(inventedComparison(EIGHT.map((m) => ({ ...m, shading: 0.03, label: HOSTILE_NAME + m.id }))), 40, [profile(HOSTILE_NAME, RIDGE), profile(`${HOSTILE_NAME}2`, raised(RIDGE, 1.4, 0))], HOSTILE_NAME),
} as const; // biome-ignore format: a case a line
