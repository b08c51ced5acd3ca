import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  checkedSkyline,
  horizonBandLeft,
  OPEN_SKYLINE,
  type SkylinePoint,
  skylineTable,
  skyViewLeft,
  skyViewLookup,
} from '../../src/survey/index.ts';
import { seeded, Worst } from '../shared/seeded.ts';
import { castRays, lineThrough } from './ray-casting.ts';

const RAD = Math.PI / 180;
const tableOf = (points: readonly SkylinePoint[]) => skylineTable(checkedSkyline('any', points, 0));
const uniform = (elevationDeg: number) =>
  tableOf([
    { azimuthDeg: 0, elevationDeg },
    { azimuthDeg: 180, elevationDeg },
  ]);
/** A point every 15 degrees, up to `highest`. */
const jagged = (seed: number, highest: number): SkylinePoint[] => {
  const random = seeded(seed);
  return Array.from({ length: 24 }, (_, i) => ({ azimuthDeg: i * 15, elevationDeg: highest * random() }));
};

describe('what a skyline leaves of an even sky', () => {
  test('is all of it under an open horizon, exactly, at any tilt and azimuth', () => {
    const table = skylineTable(OPEN_SKYLINE);
    for (let tilt = 0; tilt <= 90; tilt += 1)
      for (let az = 0; az <= 360; az += 45) {
        expect(skyViewLeft(table, tilt, az)).toBe(1);
        expect(horizonBandLeft(table, az)).toBe(1);
      }
  });

  test('on a level plane under a uniform skyline e is cos^2(e), the closed form', () => {
    const worst = new Worst();
    for (let e = 0; e <= 90; e += 2.5)
      worst.note(skyViewLeft(uniform(e), 0, 123) - Math.cos(e * RAD) ** 2, `${e}`);
    worst.print('uniform skyline, level plane');
    expect(worst.count).toBe(37);
    expect(worst.size).toBeLessThan(1e-12);
  });

  test('on an upright plane under a uniform skyline e is 1 - (2 e + sin 2 e) / pi, the closed form', () => {
    // Over its half circle of azimuths: the integral of cos^2 from e to 90 degrees over that from 0.
    for (const e of [0, 5, 10, 30, 60, 90])
      expect(skyViewLeft(uniform(e), 90, 200)).toBeCloseTo(
        1 - (2 * e * RAD + Math.sin(2 * e * RAD)) / Math.PI,
        4,
      );
  });

  test('agrees with rays cast from the plane, and so do the values read between', () => {
    const [rays, between] = [new Worst(), new Worst()];
    for (const [seed, highest] of [
      [1, 20],
      [2, 45],
      [3, 80],
    ]) {
      const points = jagged(seed, highest);
      const table = tableOf(points);
      const lookup = skyViewLookup(table);
      for (const tilt of [0, 14, 33, 58, 87])
        for (const az of [4, 95, 187, 278]) {
          const where = `skyline to ${highest}, tilt ${tilt}, azimuth ${az}`;
          rays.note(skyViewLeft(table, tilt, az) - castRays(lineThrough(points), tilt, az), where);
          between.note(lookup.skyLeft(tilt, az) - skyViewLeft(table, tilt, az), where);
        }
    }
    rays.print('sky left, against rays');
    between.print('sky left, read between');
    expect(rays.count).toBe(60);
    // 160,000 jittered rays scatter by some 3e-4.
    expect(rays.size).toBeLessThan(0.001);
    expect(between.size).toBeLessThan(0.002);
  });

  test('never grows as the skyline rises, lies in 0..1, and is nothing where it reaches the zenith', () => {
    const tilts = fc.double({ min: 0, max: 90, noNaN: true });
    const azimuths = fc.double({ min: 0, max: 360, noNaN: true });
    fc.assert(
      fc.property(fc.integer(), tilts, azimuths, (seed, tilt, az) => {
        const [low, high] = [30, 60].map((highest) => tableOf(jagged(seed, highest)));
        const [lowLeft, highLeft] = [low, high].map((table) => skyViewLeft(table, tilt, az));
        expect(highLeft).toBeLessThanOrEqual(lowLeft);
        expect(lowLeft).toBeLessThanOrEqual(1);
        expect(highLeft).toBeGreaterThanOrEqual(0);
        expect(horizonBandLeft(high, az)).toBeLessThanOrEqual(horizonBandLeft(low, az));
        expect(skyViewLeft(uniform(90), tilt, az)).toBeLessThan(1e-4);
      }),
    );
  });

  test('turns with skyline and plane together', () => {
    const points = jagged(5, 40);
    const turned = tableOf(points.map((p) => ({ ...p, azimuthDeg: (p.azimuthDeg + 90) % 360 })));
    for (const tilt of [0, 30, 90])
      for (const az of [10, 100, 222]) {
        expect(skyViewLeft(turned, tilt, az + 90)).toBeCloseTo(skyViewLeft(tableOf(points), tilt, az), 9);
        expect(horizonBandLeft(turned, az + 90)).toBeCloseTo(horizonBandLeft(tableOf(points), az), 9);
      }
  });

  test('behind a plane nothing is lost below the edge of its own view', () => {
    // A wall of 20 degrees to the north of a plane that faces south at 60 degrees: its view begins at 60 due north.
    const wall = tableOf([
      { azimuthDeg: 340, elevationDeg: 20 },
      { azimuthDeg: 20, elevationDeg: 20 },
      { azimuthDeg: 21, elevationDeg: 0 },
      { azimuthDeg: 339, elevationDeg: 0 },
    ]);
    expect(skyViewLeft(wall, 60, 180)).toBe(1);
    expect(skyViewLeft(wall, 0, 180)).toBeLessThan(1);
  });
});

describe('what a skyline leaves of the horizon band', () => {
  test('falls in proportion to its height up to 6.5 degrees, and is nothing above', () => {
    expect(horizonBandLeft(uniform(3.25), 50)).toBeCloseTo(0.5, 12);
    expect(horizonBandLeft(uniform(6.5), 50)).toBe(0);
    expect(horizonBandLeft(uniform(40), 50)).toBe(0);
  });

  test('counts what stands before the plane alone, by the cosine of its azimuth', () => {
    // All of 60 degrees to either side of south shut: sin(60) of the half circle's light.
    const south = tableOf([
      { azimuthDeg: 119.99, elevationDeg: 0 },
      { azimuthDeg: 120, elevationDeg: 10 },
      { azimuthDeg: 240, elevationDeg: 10 },
      { azimuthDeg: 240.01, elevationDeg: 0 },
    ]);
    expect(horizonBandLeft(south, 180)).toBeCloseTo(1 - Math.sin(60 * RAD), 4);
    expect(horizonBandLeft(south, 0)).toBe(1);
    expect(skyViewLookup(south).bandLeft(185)).toBeCloseTo(horizonBandLeft(south, 185), 2);
    expect(skyViewLookup(south).bandLeft(360)).toBe(horizonBandLeft(south, 0));
  });
});
