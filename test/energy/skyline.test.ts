import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { lightThrough, planeViews, skylineShade } from '../../src/energy/index.ts';
import { pointMount, type ResolvedGeometry } from '../../src/mounts/index.ts';
import { cosDeg, yearlySum } from '../../src/shared/index.ts';
import { type SkyHours, skyOverHours } from '../../src/sky/index.ts';
import type { SunHours } from '../../src/sun/index.ts';
import { checkedSkyline, OPEN_SKYLINE, type Skyline } from '../../src/survey/index.ts';
import { inventedSky } from '../shared/invented-sky.ts';

const year = inventedSky(44, 11);
const sky = skyOverHours(year.sun, year.radiation, 0.2, 'perez');
const even = skyOverHours(year.sun, year.radiation, 0.2, 'isotropic');

const around = (elevationDeg: number): Skyline =>
  checkedSkyline(
    'around',
    [0, 120, 240].map((azimuthDeg) => ({ azimuthDeg, elevationDeg })),
    0,
  );
const hills = checkedSkyline(
  'hills',
  [
    [0, 4],
    [60, 12],
    [95, 18],
    [130, 6],
    [180, 3],
    [240, 9],
    [275, 22],
    [320, 7],
  ].map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, elevationDeg })),
  0,
);

const MOUNTS: ResolvedGeometry[] = [
  { kind: 'roof-plane', tiltDeg: 14, azimuthDeg: 166 },
  { kind: 'fixed-tilt', tiltDeg: 35, azimuthDeg: 180, rows: { gcr: 0.45, lowSun: 'shade' } },
  {
    kind: 'single-axis',
    axisAzimuthDeg: 180,
    axisTiltDeg: 0,
    swingDeg: 60,
    rows: { gcr: 0.4, lowSun: 'backtrack' },
  },
  { kind: 'dual-axis', rows: null },
];

const lightOf = (
  mount: ResolvedGeometry,
  skylines: Skyline[] | null,
  light: SkyHours = sky,
  sun: SunHours = year.sun,
) => {
  const shade = skylines && skylineShade(sun, skylines);
  const views = planeViews(sun, pointMount(sun, mount), shade);
  const [open, past, rows, glass] = [views.open, views.skyline, views.rows, views.glass].map((v) =>
    yearlySum(lightThrough(light, v)),
  );
  return { views, open, past, rows, glass, shading: 1 - past / open };
};

describe('a skyline', () => {
  test('of zero changes nothing, on any mount', () => {
    for (const mount of MOUNTS) {
      const [without, level] = [lightOf(mount, null), lightOf(mount, [OPEN_SKYLINE])];
      for (const depth of ['open', 'past', 'rows', 'glass'] as const)
        expect(level[depth] / without[depth]).toBeCloseTo(1, 12);
    }
  });

  test('of 90 degrees leaves no beam and no sky', () => {
    for (const mount of MOUNTS) {
      const { skyline, open } = lightOf(mount, [around(90)]).views;
      expect(yearlySum(skyline.beam)).toBe(0);
      expect(yearlySum(skyline.sky)).toBeLessThan(1e-9);
      expect(yearlySum(skyline.horizon)).toBeLessThan(1e-9);
      expect(yearlySum(skyline.ground)).toBe(yearlySum(open.ground));
    }
  });

  test('of one height all round leaves cos^2 of it of an even sky to a level plane', () => {
    // Closed form: the view of an even sky above elevation e is cos^2 e. No beam: the shading is that of the sky alone.
    const overcast = { ...even, direct: new Float64Array(8760) };
    for (const e of [5, 15, 30, 60]) {
      const { shading } = lightOf({ kind: 'roof-plane', tiltDeg: 0, azimuthDeg: 0 }, [around(e)], overcast);
      expect(Math.abs(1 - shading - cosDeg(e) ** 2)).toBeLessThan(0.002); // the lookup between whole planes
    }
  });

  test('takes more the higher it is, and never gives light', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 60, noNaN: true }),
        fc.double({ min: 0, max: 20, noNaN: true }),
        (low, more) => {
          for (const mount of MOUNTS) {
            const [a, b] = [
              lightOf(mount, [around(low)]).shading,
              lightOf(mount, [around(low + more)]).shading,
            ];
            expect(a).toBeGreaterThanOrEqual(-1e-12);
            expect(b).toBeGreaterThanOrEqual(a - 1e-9);
          }
        },
      ),
      { numRuns: 12 },
    );
  });

  test('hurts a tracker more than the roof, early and late', () => {
    const shading = MOUNTS.map((mount) => lightOf(mount, [hills]).shading);
    expect(shading[3]).toBeGreaterThan(shading[0]);
    expect(shading[3]).toBeGreaterThan(0.02);
  });

  test('seen from several points takes the mean of what it takes from each', () => {
    for (const mount of MOUNTS) {
      const [a, b, both] = [[hills], [OPEN_SKYLINE], [hills, OPEN_SKYLINE]].map(
        (s) => lightOf(mount, s).past,
      );
      expect(both).toBeCloseTo((a + b) / 2, 6);
    }
  });

  test('is followed by four samples an hour as by sixty, to 0.1 % of the year', () => {
    const minutes = inventedSky(44, 11, 60);
    let worst = 0;
    for (const mount of MOUNTS) {
      const coarse = lightOf(mount, [hills]);
      const fine = lightOf(
        mount,
        [hills],
        skyOverHours(minutes.sun, minutes.radiation, 0.2, 'perez'),
        minutes.sun,
      );
      for (const depth of ['past', 'rows', 'glass'] as const)
        worst = Math.max(worst, Math.abs(coarse[depth] / fine[depth] - 1));
    }
    console.info(`behind hills, four samples against sixty: worst ${(worst * 100).toFixed(3)} %`);
    expect(worst).toBeLessThan(0.001);
  });
});
