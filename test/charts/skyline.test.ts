import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  type Direction,
  intoWindow,
  outlineLine,
  sunLines,
  windowStart,
} from '../../src/charts/azimuth-window.ts';
import { errorBox } from '../../src/charts/error-box.ts';
import { elevationOf, sunStretches } from '../../src/charts/hidden-sun.ts';
import { type Pixel, placeOnLines } from '../../src/charts/line-labels.ts';
import { inventedMount } from './fixture.ts';
import { sunPath } from './skyline-fixture.ts';

const line = (points: [number, number][]): Direction[] => outlineLine(points.map((p) => p[0]), points.map((p) => p[1])); // biome-ignore format: short
const pairs = (pieces: Direction[][]) =>
  pieces.map((piece) => piece.map((p) => [p.azimuthDeg, p.elevationDeg]));

test('a panorama begins in the north north of the equator and in the south south of it', () => {
  expect([windowStart(40), windowStart(0), windowStart(-33)]).toEqual([0, 0, -180]);
});

test('a skyline fills a panorama from north as it is, and is parted at south by a straight line for the other', () => {
  const skyline = line([[0, 4], [120, 10], [240, 30], [360, 4]]); // biome-ignore format: points
  expect(pairs(intoWindow(skyline, 0))).toEqual([[[0, 4], [120, 10], [240, 30], [360, 4]]]); // biome-ignore format: points
  // Halfway from 120 to 240 the line stands at 20.
  expect(pairs(intoWindow(skyline, -180))).toEqual([
    [[0, 4], [120, 10], [180, 20]],
    [[-180, 20], [-120, 30], [0, 4]],
  ]); // biome-ignore format: points
});

test('one angle all round spans both panoramas', () => {
  const ring = line([[0, 12], [360, 12]]); // biome-ignore format: points
  expect(pairs(intoWindow(ring, 0))).toEqual([[[0, 12], [360, 12]]]); // biome-ignore format: points
  expect(pairs(intoWindow(ring, -180))).toEqual([[[0, 12], [180, 12]], [[-180, 12], [0, 12]]]); // biome-ignore format: points
});

test('an upright edge at the border of a panorama is drawn once', () => {
  const wall = line([[0, 2], [180, 2], [180, 40], [360, 2]]); // biome-ignore format: points
  expect(pairs(intoWindow(wall, -180))).toEqual([[[0, 2], [180, 2], [180, 40]], [[-180, 40], [0, 2]]]); // biome-ignore format: points
});

test('whatever is cut loses no length and stays within the panorama', () => {
  const point = fc.tuple(fc.integer({ min: 0, max: 360 }), fc.integer({ min: 0, max: 90 }));
  fc.assert(
    fc.property(fc.array(point, { minLength: 2, maxLength: 12 }), fc.constantFrom(0, -180), (points, start) => {
      const whole = line([...points].sort((a, b) => a[0] - b[0]));
      const span = (l: Direction[]) => l.at(-1)!.azimuthDeg - l[0].azimuthDeg;
      const climb = (l: Direction[]) => l.slice(1).reduce((sum, p, i) => sum + Math.abs(p.elevationDeg - l[i].elevationDeg), 0);
      const pieces = intoWindow(whole, start);
      const sum = (f: (l: Direction[]) => number) => pieces.reduce((all, piece) => all + f(piece), 0);
      expect(sum(span)).toBeCloseTo(span(whole), 9);
      expect(sum(climb)).toBeCloseTo(climb(whole), 9);
      for (const p of pieces.flat()) {
        expect(p.azimuthDeg).toBeGreaterThanOrEqual(start);
        expect(p.azimuthDeg).toBeLessThanOrEqual(start + 360);
      }
    }),
  ); // biome-ignore format: one property
});

test('a day is one line, wherever the clock begins it; two days meet where the clock is far off', () => {
  const path = (latitude: number, declination: number, firstHour = 0) => {
    const { azimuths_deg, elevations_deg } = sunPath('day', latitude, declination, firstHour);
    return sunLines(azimuths_deg, elevations_deg);
  };
  expect(path(40, 23.4)).toHaveLength(1);
  // The clock's day begins at nine in the morning of the sun: the evening comes first, then night, then the morning.
  expect(path(40, 0, 9)).toHaveLength(2);
  expect(path(80, -23.4)).toEqual([]);
  // The sun that never sets closes its ring: a full turn, its end on its beginning.
  for (const firstHour of [0, 19]) {
    const [ring, ...more] = path(78, 23.4, firstHour);
    expect(more).toEqual([]);
    expect(ring.at(-1)!.azimuthDeg - ring[0].azimuthDeg).toBeCloseTo(360, 9);
    expect(intoWindow(ring, 0).flat().every((p) => p.azimuthDeg >= 0 && p.azimuthDeg <= 360)).toBe(true); // biome-ignore format: short
  }
  // South of the equator it turns the other way.
  const [ring] = path(-78, -23.4);
  expect(ring.at(-1)!.azimuthDeg - ring[0].azimuthDeg).toBeCloseTo(-360, 9);
});

test('names stand on their lines, clear of other lines and of each other where there is room', () => {
  const flat = (y: number): Pixel[] => Array.from({ length: 60 }, (_, i) => [i * 10, y]);
  const lines = [flat(100), flat(200)];
  const bounds = { left: 0, right: 590, top: 0, bottom: 290 };
  const boxes = placeOnLines(lines.map((l) => ({ text: '21 March', line: l, near: l[30] })), lines, 12, bounds); // biome-ignore format: short
  expect(boxes.map((b) => b.x)).toEqual([300, 300]);
  for (const [i, b] of boxes.entries()) expect(lines[i][0][1] - (b.y + b.halfHeight)).toBe(3);
  // A line close above drives the name below its own.
  const crowded = [flat(100), flat(88)];
  const [below] = placeOnLines(
    [{ text: '21 March', line: crowded[0], near: [300, 100] }],
    crowded,
    12,
    bounds,
  );
  expect(below.y - below.halfHeight).toBe(103);
});

test('the box of the reading errors is a sector, cut at flat and upright, a ring where any azimuth will do', () => {
  const mount = (tilt: number, tiltError?: number, azimuthError?: number) => errorBox({ ...inventedMount({ id: 'm', tilt, azimuth: 90 }), tilt_error_deg: tiltError ?? null, azimuth_error_deg: azimuthError ?? null }); // biome-ignore format: short
  const reach = (box: readonly (readonly [number, number])[]) => box.map((p) => Math.hypot(...p));
  expect(mount(30)).toBeNull();
  expect(mount(30, 0, 0)).toBeNull();
  const low = reach(mount(3, 5, 10)![0] as [number, number][]);
  expect(Math.min(...low)).toBe(0);
  expect(Math.max(...low)).toBeCloseTo(8, 9);
  expect(Math.max(...reach(mount(88, 5, 10)![0] as [number, number][]))).toBeCloseTo(90, 9);
  expect(mount(30, 5, 180)).toHaveLength(2);
  // Tilt alone leaves a line along one azimuth.
  for (const [, north] of mount(30, 5)![0]) expect(north).toBeCloseTo(0, 9);
});

test("a sun's path is parted where the skyline hides it, and loses no length", () => {
  // Flat at 10 degrees, with a wall of 40 from 150 to 170.
  const elevationAt = elevationOf([line([[0, 10], [150, 10], [150, 40], [170, 40], [170, 10], [360, 10]])]); // biome-ignore format: points
  expect([100, 160, 300].map(elevationAt)).toEqual([10, 40, 10]);
  const path = line([[100, 0], [140, 30], [180, 30], [240, 0]]); // biome-ignore format: points
  const parts = sunStretches(path, elevationAt);
  expect(parts.map((p) => p.hidden)).toEqual([true, false, true, false, true]);
  // It rises over 10 degrees a third of the way from 100 to 140, and sets behind 10 two thirds from 180 to 240.
  const ends = parts.map((p) => p.points.at(-1)!.azimuthDeg);
  for (const [i, expected] of [100 + 40 / 3, 150, 170, 220, 240].entries())
    expect(Math.abs(ends[i] - expected)).toBeLessThanOrEqual(0.51);
  for (const [i, part] of parts.entries())
    if (i > 0) expect(part.points[0]).toEqual(parts[i - 1].points.at(-1));
  expect(sunStretches(path, () => 0)).toHaveLength(1);
});
