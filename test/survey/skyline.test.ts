import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  checkedSkyline,
  elevationAt,
  gapFindings,
  isBlocked,
  OPEN_SKYLINE,
  obstacleElevationDeg,
  outlineOf,
  type SkylinePoint,
  skylineOfObstacles,
  skylineTable,
  surveySkylines,
  unionOf,
} from '../../src/survey/index.ts';
import { lineThrough } from './ray-casting.ts';
import { codesOf, problemsOf } from './refusals.ts';

const points = (...pairs: [number, number][]): SkylinePoint[] =>
  pairs.map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, elevationDeg }));
const skyline = (...pairs: [number, number][]) => checkedSkyline('roof', points(...pairs), 0);
/** Two to twelve points at different whole degrees. */
const anyPoints = fc
  .uniqueArray(fc.integer({ min: 0, max: 359 }), { minLength: 2, maxLength: 12 })
  .chain((azimuths) =>
    fc
      .array(fc.double({ min: 0, max: 90, noNaN: true }), {
        minLength: azimuths.length,
        maxLength: azimuths.length,
      })
      .map((elevations) => azimuths.map((azimuthDeg, i) => ({ azimuthDeg, elevationDeg: elevations[i] }))),
  );

describe('a skyline of measured points', () => {
  test('runs straight between them, and round through north', () => {
    const line = skyline([350, 20], [90, 5], [30, 10]);
    expect(elevationAt(line, 60)).toBeCloseTo(7.5, 12);
    expect(elevationAt(line, 0)).toBeCloseTo(17.5, 12);
    expect(elevationAt(line, 360)).toBeCloseTo(17.5, 12);
    expect(elevationAt(line, 350)).toBe(20);
    expect(elevationAt(line, 220)).toBeCloseTo(12.5, 12);
    expect(elevationAt(line, -10)).toBe(20);
  });

  test('agrees with a plain search along the same points', () => {
    fc.assert(
      fc.property(anyPoints, fc.double({ min: 0, max: 360, noNaN: true }), (some, azimuth) => {
        const inOrder = some.toSorted((a, b) => a.azimuthDeg - b.azimuthDeg);
        const line = checkedSkyline('any', some, 0);
        expect(elevationAt(line, azimuth)).toBeCloseTo(lineThrough(inOrder)(azimuth), 6);
      }),
    );
  });

  test('turns by the declination once', () => {
    fc.assert(
      fc.property(anyPoints, fc.double({ min: -60, max: 60, noNaN: true }), (some, declination) => {
        const [magnetic, turned] = [0, declination].map((d) => checkedSkyline('any', some, d));
        for (let az = 0.3; az < 360; az += 37)
          expect(elevationAt(turned, az + declination)).toBeCloseTo(elevationAt(magnetic, az), 4);
      }),
    );
  });

  test('warns on gaps over 15 degrees (common practice, no source), also across north', () => {
    const every15 = Array.from({ length: 24 }, (_, i): [number, number] => [i * 15, 5]);
    expect(gapFindings(skyline(...every15))).toEqual([]);
    const [finding, ...others] = gapFindings(skyline(...every15.slice(1)));
    expect(others).toEqual([]);
    expect(finding).toMatchObject({ code: 'skyline-gap', severity: 'warning' });
    expect(finding.text).toContain('from 345 to 15;');
    expect(gapFindings(skyline([10, 5], [200, 5]))[0].text).toContain('from 10 to 200, 200 to 10;');
  });

  test('gives its outline for a chart, from north to north', () => {
    expect(outlineOf(skyline([90, 10], [270, 30]))).toEqual(points([0, 20], [90, 10], [270, 30], [360, 20]));
  });

  test('is refused with all its problems at once', async () => {
    const problems = await problemsOf(() =>
      skyline([400, 5], [10, 95], [20, -1], [30, 5], [30, 6], [40, Number.NaN]),
    );
    expect(problems.map(({ code, field }) => [code, field])).toEqual([
      ['wrong-bearing', 'points[0]'],
      ['wrong-elevation', 'points[1]'],
      ['wrong-elevation', 'points[2]'],
      ['wrong-elevation', 'points[5]'],
      ['two-elevations', 'points[4]'],
    ]);
    expect(await codesOf(() => skyline([180, 5]))).toEqual(['too-few-points']);
    expect(await codesOf(() => skyline([0, 5], [360, 5]))).toEqual(['too-few-points']);
    expect(await codesOf(() => skyline())).toEqual(['too-few-points']);
    expect(await codesOf(() => skyline([0, 5], [360, 7], [90, 0]))).toEqual(['two-elevations']);
    expect(await codesOf(() => checkedSkyline('turned', points([400, 5], [10, 5]), 16))).toEqual([
      'wrong-bearing',
    ]);
  });
});

describe('a skyline of obstacles', () => {
  const wall = { heightM: 3, distanceM: 3, fromDeg: 350, toDeg: 20 };
  const tower = { heightM: 17.32051, distanceM: 10, fromDeg: 10, toDeg: 15 };

  test('has each at its own angle, the higher in front of the lower, level elsewhere', () => {
    expect(obstacleElevationDeg(wall)).toBe(45);
    const line = skylineOfObstacles('yard', [wall, tower], 0);
    for (const [azimuth, expected] of [
      [0, 45],
      [355, 45],
      [12, 60],
      [18, 45],
      [25, 0],
      [340, 0],
      [180, 0],
    ])
      expect(elevationAt(line, azimuth)).toBeCloseTo(expected, 5);
    expect(elevationAt(line, 350)).toBe(45); // at an edge the higher side
  });

  test('may stand all round, and turns with the declination', () => {
    const fence = skylineOfObstacles('fence', [{ heightM: 1, distanceM: 10, fromDeg: 0, toDeg: 360 }], 16);
    for (let az = 0; az < 360; az += 7) expect(elevationAt(fence, az)).toBeCloseTo(5.710593, 6);
    const turned = skylineOfObstacles('yard', [wall], -13);
    expect([336, 338, 6, 8].map((az) => Math.round(elevationAt(turned, az)))).toEqual([0, 45, 45, 0]);
  });

  test('is refused with all its problems at once', async () => {
    const wrong = [
      { ...wall, heightM: 0 },
      { ...wall, distanceM: -2 },
      { ...wall, fromDeg: 400 },
      { ...wall, toDeg: 350 },
    ];
    expect(await codesOf(() => skylineOfObstacles('yard', wrong, 0))).toEqual([
      'wrong-obstacle',
      'wrong-obstacle',
      'wrong-bearing',
      'wrong-bearing',
    ]);
    expect(await codesOf(() => skylineOfObstacles('yard', [], 0))).toEqual(['wrong-obstacle']);
  });
});

describe('several skylines of one array', () => {
  test('joined are the higher at every azimuth, between their points too', () => {
    fc.assert(
      fc.property(anyPoints, anyPoints, anyPoints, (a, b, c) => {
        const lines = [a, b, c].map((some) => checkedSkyline('any', some, 0));
        const joined = unionOf('all', lines);
        for (let az = 0.1; az < 360; az += 3.7)
          expect(elevationAt(joined, az)).toBeCloseTo(
            Math.max(...lines.map((line) => elevationAt(line, az))),
            6,
          );
      }),
    );
  });

  test('name the one that takes most of the sky', () => {
    const corners = [
      checkedSkyline('north-west corner', points([90, 10], [270, 10]), 0),
      checkedSkyline('south-east corner', points([90, 30], [270, 5]), 0),
      OPEN_SKYLINE,
    ];
    const survey = surveySkylines(corners);
    expect(survey.worst.name).toBe('south-east corner');
    // Uniform 10 degrees on a level plane takes sin^2(10): the closed form.
    expect(survey.blockedSky[0]).toBeCloseTo(Math.sin((10 * Math.PI) / 180) ** 2, 9);
    expect(survey.blockedSky[2]).toBe(0);
    expect(elevationAt(survey.union, 90)).toBe(30);
    expect(elevationAt(survey.union, 270)).toBe(10);
    expect(surveySkylines([corners[0]]).union).toBe(corners[0]);
  });
});

describe('the beam', () => {
  const sine = (deg: number) => Math.sin((deg * Math.PI) / 180);

  test('is never taken by an open skyline, and always by one of 90 degrees', () => {
    const open = skylineTable(skyline([0, 0], [180, 0]));
    const shut = skylineTable(skyline([0, 90], [180, 90]));
    fc.assert(
      fc.property(
        fc.double({ min: -360, max: 720, noNaN: true }),
        fc.double({ min: 0, max: 90, noNaN: true }),
        (azimuth, elevation) => {
          expect(isBlocked(open, azimuth, sine(elevation))).toBe(false);
          expect(isBlocked(shut, azimuth, sine(elevation))).toBe(true);
        },
      ),
    );
    expect(isBlocked(shut, 360, 1)).toBe(true);
  });

  test('is taken where the sun stands lower than the skyline, to a quarter of a degree of azimuth', () => {
    fc.assert(
      fc.property(
        anyPoints,
        fc.double({ min: 0, max: 360, noNaN: true }),
        fc.double({ min: 0, max: 89, noNaN: true }),
        (some, azimuth, elevation) => {
          const line = checkedSkyline('any', some, 0);
          const near = [-0.25, 0, 0.25].map((d) => elevationAt(line, azimuth + d));
          // Points lie on whole degrees, so the line bends at the edges of slots and not inside.
          const blocked = isBlocked(skylineTable(line), azimuth, sine(elevation));
          if (elevation < Math.min(...near) - 1e-6) expect(blocked).toBe(true);
          if (elevation > Math.max(...near) + 1e-6) expect(blocked).toBe(false);
        },
      ),
    );
  });
});
