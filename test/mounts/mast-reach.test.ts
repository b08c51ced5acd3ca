import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  mastFieldShade,
  nearestAzimuth,
  pointDualAxis,
  pointFixed,
  pointOnMast,
  pointStoppedTurntable,
  pointTurntable,
} from '../../src/mounts/index.ts';
import { seeded, Worst } from '../shared/seeded.ts';
import { sunAt } from './direction.ts';

const DEG = Math.PI / 180;
const FLAT_OUT = { lowestDeg: 0, highestDeg: 90 };
const angle = (min: number, max: number) =>
  fc.integer({ min: 0, max: 3600 }).map((i) => min + ((max - min) * i) / 3600);

test('of the azimuths within reach the nearest is taken, round north too', () => {
  // Hand arithmetic.
  const table = [
    [60, 300, 180, 180],
    [60, 300, 60, 60],
    [60, 300, 59, 60],
    [60, 300, 1, 60],
    [60, 300, 359, 300],
    [300, 60, 10, 10],
    [300, 60, 350, 350],
    [300, 60, 170, 60],
    [300, 60, 190, 300],
    [300, 0, 20, 0],
    [0, 90, 350, 0],
  ];
  for (const [fromDeg, toDeg, asked, expected] of table)
    expect([fromDeg, toDeg, asked, nearestAzimuth({ fromDeg, toDeg }, asked)]).toEqual([
      fromDeg,
      toDeg,
      asked,
      expected,
    ]);
  expect(nearestAzimuth(null, 213)).toBe(213);
});

test('a turntable sees the sun as published for an upright axis: cos z cos b + sin z sin b', () => {
  // Duffie & Beckman, Solar Engineering of Thermal Processes, eq. 1.7.4 family (upright axis, held slope), here from memory.
  let count = 0;
  for (const zenith of [0, 20, 45, 70, 89])
    for (const tilt of [0, 30, 55, 90]) {
      const plane = pointTurntable(sunAt([[zenith, 217]]), {
        kind: 'turntable',
        planeTiltDeg: tilt,
        rows: null,
      });
      expect(plane.cosIncidence[0]).toBeCloseTo(Math.cos((zenith - tilt) * DEG), 12);
      expect(plane.cosTilt[0]).toBeCloseTo(Math.cos(tilt * DEG), 12);
      if (zenith > 0) expect(plane.azimuthDegAt(0)).toBeCloseTo(217, 9);
      count++;
    }
  expect(count).toBe(20);
});

test('without limits a mast on this path is the mast that faces the sun, alone and in a field', () => {
  fc.assert(
    fc.property(angle(0, 89.9), angle(0, 360), (z, a) => {
      const sun = sunAt([[z, a]]);
      const rows = { gcr: 0.25, lowSun: 'shade' as const };
      const free = pointDualAxis(sun, { kind: 'dual-axis', rows });
      const limited = pointOnMast(sun, { turns: null, elevation: FLAT_OUT }, rows.gcr);
      expect(limited.cosIncidence[0]).toBeCloseTo(1, 12);
      expect(limited.cosTilt[0]).toBeCloseTo(free.cosTilt[0], 12);
      for (const key of ['shaded', 'skyLeft', 'groundLeft'] as const)
        expect(limited.neighbours![key][0]).toBeCloseTo(free.neighbours![key][0], 9);
    }),
  );
});

test('no direction within its limits is nearer to the sun than the one that a mast takes', () => {
  fc.assert(
    fc.property(
      angle(0, 90),
      angle(0, 360),
      angle(0, 360),
      angle(1, 359),
      angle(0, 60),
      angle(0, 30),
      (z, a, fromDeg, width, lowestDeg, more) => {
        const turns = { fromDeg, toDeg: (fromDeg + width) % 360 };
        const elevation = { lowestDeg, highestDeg: lowestDeg + more };
        const sun = sunAt([[z, a]]);
        const plane = pointDualAxis(sun, { kind: 'dual-axis', rows: null, turns, elevation });
        const faced = 90 - Math.acos(plane.cosTilt[0]) / DEG;
        expect(faced).toBeGreaterThan(elevation.lowestDeg - 1e-6);
        expect(faced).toBeLessThan(elevation.highestDeg + 1e-6);
        expect((plane.azimuthDegAt(0) - fromDeg + 360.000001) % 360).toBeLessThan(width + 1e-5);
        for (let i = 0; i <= 24; i++)
          for (let j = 0; j <= 12; j++) {
            const other = pointFixed(
              sun,
              90 - (lowestDeg + (more * j) / 12),
              fromDeg + (width * i) / 24,
              null,
            );
            expect(plane.cosIncidence[0]).toBeGreaterThanOrEqual(other.cosIncidence[0] - 1e-9);
          }
      },
    ),
    { numRuns: 60 },
  );
});

test('mirrored north to south with its limits, a mast mirrors', () => {
  fc.assert(
    fc.property(angle(1, 89), angle(0, 360), angle(0, 360), angle(1, 300), (z, a, fromDeg, width) => {
      const toDeg = (fromDeg + width) % 360;
      const past = (((a - fromDeg) % 360) + 360) % 360;
      fc.pre(Math.abs(past - width - (360 - past)) > 1e-3); // behind it both ends are equally near
      const elevation = { lowestDeg: 20, highestDeg: 70 };
      const mirror = (azimuth: number) => (540 - azimuth) % 360;
      const [one, other] = [
        pointDualAxis(sunAt([[z, a]]), {
          kind: 'dual-axis',
          rows: null,
          turns: { fromDeg, toDeg },
          elevation,
        }),
        pointDualAxis(sunAt([[z, mirror(a)]]), {
          kind: 'dual-axis',
          rows: null,
          turns: { fromDeg: mirror(toDeg), toDeg: mirror(fromDeg) },
          elevation,
        }),
      ];
      expect(other.cosIncidence[0]).toBeCloseTo(one.cosIncidence[0], 9);
      expect(other.cosTilt[0]).toBeCloseTo(one.cosTilt[0], 9);
    }),
  );
});

test('a stopped turntable is a fixed plane', () => {
  const sun = sunAt([
    [40, 100],
    [60, 200],
    [80, 300],
  ]);
  const stopped = pointStoppedTurntable(sun, { kind: 'turntable', planeTiltDeg: 40, rows: null }, 180);
  const fixed = pointFixed(sun, 40, 180, null);
  for (let s = 0; s < 3; s++) expect(stopped.cosIncidence[s]).toBeCloseTo(fixed.cosIncidence[s], 12);
});

type Vector = readonly [number, number, number];
const dot = (a: Vector, b: Vector) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

/** Shaded share of a unit square among others on a square grid, all facing one way: rays cast in space from seeded points. */
const byRays = (
  sun: Vector,
  elevation: number,
  azimuth: number,
  gcr: number,
  random: () => number,
): number => {
  const [sinE, cosE] = [Math.sin(elevation * DEG), Math.cos(elevation * DEG)];
  const [sinA, cosA] = [Math.sin(azimuth * DEG), Math.cos(azimuth * DEG)];
  const normal: Vector = [cosE * sinA, cosE * cosA, sinE];
  const right: Vector = [cosA, -sinA, 0];
  const upward: Vector = [-sinE * sinA, -sinE * cosA, cosE];
  const pitch = 1 / Math.sqrt(gcr);
  const offsets: [number, number][] = [];
  for (let x = -20; x <= 20; x++)
    for (let y = -20; y <= 20; y++) {
      const mast: Vector = [x * pitch, y * pitch, 0];
      const far = dot(mast, normal) / dot(sun, normal); // along the ray to that collector's plane
      if (far <= 1e-9) continue;
      const offset: Vector = [mast[0] - far * sun[0], mast[1] - far * sun[1], mast[2] - far * sun[2]];
      offsets.push([dot(offset, right), dot(offset, upward)]);
    }
  const SIDE = 60;
  let shaded = 0;
  for (let i = 0; i < SIDE * SIDE; i++) {
    const [a, b] = [((i % SIDE) + random()) / SIDE - 0.5, (Math.floor(i / SIDE) + random()) / SIDE - 0.5];
    if (offsets.some(([x, y]) => Math.abs(a - x) < 0.5 && Math.abs(b - y) < 0.5)) shaded++;
  }
  return shaded / SIDE ** 2;
};

test('in a field that faces the azimuth of the sun at another elevation, shade agrees with rays', () => {
  const random = seeded(12);
  const worst = new Worst();
  let shadedCases = 0;
  for (const gcr of [0.1, 0.3, 0.5])
    for (const height of [3, 8, 15, 30])
      for (const faced of [15, 40, 60])
        for (const azimuth of [90, 117, 203]) {
          const [z, a] = [(90 - height) * DEG, azimuth * DEG];
          const sun: Vector = [Math.sin(z) * Math.sin(a), Math.sin(z) * Math.cos(a), Math.cos(z)];
          const expected = byRays(sun, faced, azimuth, gcr, random);
          const shade = mastFieldShade(...sun, gcr, Math.cos((faced - height) * DEG));
          if (expected > 0.05) shadedCases++;
          worst.note(shade - expected, `GCR ${gcr}, sun ${height}, faced ${faced}, azimuth ${azimuth}`);
        }
  worst.print('shaded share in a field at another elevation');
  expect(worst.count).toBe(108);
  expect(shadedCases).toBeGreaterThan(30);
  // As for masts that face the sun: cells on the edge of a shadow are in doubt, some 170 of 3,600.
  expect(worst.size).toBeLessThan(0.008);
});
