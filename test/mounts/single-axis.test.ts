import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  axisTiltOnSlope,
  backtrackTurn,
  crossAxisTilt,
  pointFixed,
  pointSingleAxis,
  type SingleAxis,
  trackerRowShade,
} from '../../src/mounts/index.ts';
import { Worst } from '../shared/seeded.ts';
import { sunAt } from './direction.ts';
import { BACKTRACKED_TURNS } from './published-rows.ts';

const DEG = Math.PI / 180;
const acos = (x: number) => Math.acos(Math.min(1, x)) / DEG;

const axis = (
  axisAzimuthDeg: number,
  axisTiltDeg: number,
  swingDeg = 90,
  rows: SingleAxis['rows'] = null,
): SingleAxis => ({
  kind: 'single-axis',
  axisAzimuthDeg,
  axisTiltDeg,
  swingDeg,
  rows,
});

/**
 * zenith, azimuth, axis tilt, axis azimuth; turn, tilt, azimuth of the plane, angle of incidence; degrees. Worked out
 * by vectors in another program (Python) for the frame of Marion & Dobos 2013, NREL/TP-6A20-58891.
 */
const TABLE = [
  [60, 90, 0, 180, -60, 60, 90, 0],
  [60, 90, 0, 0, 60, 60, 90, 0],
  [45, 135, 0, 180, -35.2644, 35.2644, 90, 30],
  [30, 225, 0, 180, 22.2077, 22.2077, 270, 20.7048],
  [75, 100, 0, 180, -74.7793, 74.7793, 90, 9.6559],
  [80, 250, 0, 180, 79.3724, 79.3724, 270, 19.6835],
  [60, 135, 20, 180, -42.0343, 45.7372, 110.776, 23.8555],
  [60, 315, 20, 0, -42.0343, 45.7372, 290.776, 23.8555],
  [50, 60, 0, 90, -30.7897, 30.7897, 0, 41.5608],
  [40, 200, 10, 170, 20.6883, 22.8826, 235.306, 24.5314],
] as const; // biome-ignore format: a table

test('ten suns on five axes give the tabled tilt and incidence, and the plane so described faces the sun alike', () => {
  const [tilt, incidence, faced] = [new Worst(), new Worst(), new Worst()];
  for (const [z, a, axisTilt, axisAzimuth, turn, planeTilt, planeAzimuth, aoi] of TABLE) {
    const sun = sunAt([[z, a]]);
    const plane = pointSingleAxis(sun, axis(axisAzimuth, axisTilt));
    const where = `zenith ${z}, azimuth ${a}, axis ${axisAzimuth}`;
    tilt.note(acos(plane.cosTilt[0]) - planeTilt, where);
    incidence.note(plane.cosIncidence[0] - Math.cos(aoi * DEG), where);
    expect(plane.sinTilt[0]).toBeCloseTo(Math.sin(planeTilt * DEG), 5);
    expect(plane.cosTilt[0]).toBeCloseTo(Math.cos(turn * DEG) * Math.cos(axisTilt * DEG), 5);
    // A fixed plane put where the table says the tracker faces must see the sun at the same angle: this fixes east and west.
    const still = pointFixed(sun, planeTilt, planeAzimuth, null);
    faced.note(still.cosIncidence[0] - plane.cosIncidence[0], where);
    // and the other way about, it would not
    if (planeTilt > 20 && aoi < 1)
      expect(pointFixed(sun, planeTilt, planeAzimuth + 180, null).cosIncidence[0]).toBeLessThan(0);
  }
  tilt.print('tracker tilt, degrees');
  expect([tilt.count, incidence.count, faced.count]).toEqual([10, 10, 10]);
  expect(tilt.size).toBeLessThan(1e-3);
  expect(incidence.size).toBeLessThan(1e-5);
  expect(faced.size).toBeLessThan(2e-5);
});

test('a swing of 60 degrees holds the tracker at a tilt of 60, facing the side of the sun', () => {
  const sun = sunAt([
    [75, 100],
    [80, 250],
  ]);
  const plane = pointSingleAxis(sun, axis(180, 0, 60));
  const sides = [90, 270];
  sides.forEach((side, s) => {
    expect(acos(plane.cosTilt[s])).toBeCloseTo(60, 9);
    expect(plane.cosIncidence[s]).toBeCloseTo(pointFixed(sun, 60, side, null).cosIncidence[s], 12);
  });
});

test('turning the axis end for end changes nothing on the level', () => {
  const anySun = fc.tuple(
    fc.double({ min: 1, max: 89.9, noNaN: true }),
    fc.double({ min: 0, max: 360, noNaN: true }),
  );
  fc.assert(
    fc.property(
      anySun,
      fc.double({ min: 0, max: 180, noNaN: true }),
      fc.boolean(),
      (direction, azimuth, backtrack) => {
        const rows = { gcr: 0.45, lowSun: backtrack ? ('backtrack' as const) : ('shade' as const) };
        const sun = sunAt([direction]);
        const a = pointSingleAxis(sun, axis(azimuth, 0, 55, rows));
        const b = pointSingleAxis(sun, axis(azimuth + 180, 0, 55, rows));
        expect(a.cosIncidence[0]).toBeCloseTo(b.cosIncidence[0], 9);
        expect(a.cosTilt[0]).toBeCloseTo(b.cosTilt[0], 9);
        expect(a.neighbours!.shaded[0]).toBeCloseTo(b.neighbours!.shaded[0], 7);
      },
    ),
  );
});

test('a tracker is never worse aimed than any fixed turn within its swing', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 89.9, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      fc.double({ min: -60, max: 60, noNaN: true }),
      (z, a, turn) => {
        const sun = sunAt([[z, a]]);
        const best = pointSingleAxis(sun, axis(180, 0, 60)).cosIncidence[0];
        const other = pointFixed(sun, Math.abs(turn), turn > 0 ? 270 : 90, null).cosIncidence[0];
        expect(best).toBeGreaterThanOrEqual(other - 1e-12);
      },
    ),
  );
});

describe('on sloping ground (slope 10 degrees falling south, axis 195, GCR 0.5)', () => {
  // Anderson & Mikofski 2020, NREL/TP-5K00-76626, sample data for 2019-01-01.
  const crossAxis = crossAxisTilt(10, 180, 195);
  const axisTilt = axisTiltOnSlope(10, 180, 195);

  /** hour, elevation and azimuth of the sun; turn that faces the sun, and the turn after backtracking. */
  const HOURS = [
    [8, 2.404287, 122.79177, -84.44, -10.899],
    [9, 11.263058, 133.288729, -72.604, -25.747],
    [10, 18.733558, 145.285552, -59.861, -59.861],
    [11, 24.109076, 158.939435, -45.578, -45.578],
    [12, 26.810735, 173.931802, -28.764, -28.764],
    [13, 26.482495, 189.371536, -8.475, -8.475],
    [14, 23.170447, 204.13681, 15.12, 15.12],
    [15, 17.296785, 217.446538, 39.562, 39.562],
    [16, 9.461862, 229.102218, 61.587, 32.339],
    [17, 0.524817, 239.330401, 79.53, 5.49],
  ] as const; // biome-ignore format: a table

  /** The turn that faces the sun, from where `pointSingleAxis` puts the plane. */
  const trueTurn = (elevation: number, azimuth: number): number => {
    const sun = sunAt([[90 - elevation, azimuth]]);
    const plane = pointSingleAxis(sun, axis(195, axisTilt, 90));
    const size = acos(plane.cosTilt[0] / Math.cos(axisTilt * DEG));
    return Math.sin((azimuth - 195) * DEG) > 0 ? size : -size;
  };

  test('the axis falls by 9.666 degrees and the ground crosses it at -2.576', () => {
    expect(Math.abs(axisTilt - 9.666)).toBeLessThan(5e-4);
    expect(Math.abs(crossAxis - -2.576)).toBeLessThan(5e-4);
    // Not the elevation of the same line above the horizontal, which is another angle.
    expect(Math.abs(crossAxis - -2.539)).toBeGreaterThan(0.03);
  });

  test('ten hours turn as published, true and backtracked', () => {
    const [facing, back] = [new Worst(), new Worst()];
    for (const [hour, elevation, azimuth, turn, backtracked] of HOURS) {
      const facesSun = trueTurn(elevation, azimuth);
      facing.note(facesSun - turn, `${hour}:00`);
      back.note(backtrackTurn(facesSun, 0.5, crossAxis) - backtracked, `${hour}:00`);
      // Backtracked rows touch: no shade, and a hair further they would shade.
      expect(trackerRowShade(backtracked, facesSun, 0.5, crossAxis)).toBeLessThan(2e-3);
    }
    facing.print('turn that faces the sun, degrees');
    back.print('backtracked turn, degrees');
    expect([facing.count, back.count]).toEqual([10, 10]);
    expect(facing.size).toBeLessThan(1e-3);
    expect(back.size).toBeLessThan(2e-3); // near the horizon the arccosine doubles the rounding of the slope
  });

  test('a wrong sign of the cross slope, or none, would be seen', () => {
    const low = HOURS.slice(0, 3).map(([, elevation, azimuth]) => trueTurn(elevation, azimuth));
    const wrong = low.map((turn) => backtrackTurn(turn, 0.5, -crossAxis));
    const level = low.map((turn) => backtrackTurn(turn, 0.5, 0));
    [-0.422, -13.407, -37.737].forEach((turn, i) => {
      expect(Math.abs(wrong[i] - turn)).toBeLessThan(2e-3);
    });
    [-5.614, -19.328, -59.861].forEach((turn, i) => {
      expect(Math.abs(level[i] - turn)).toBeLessThan(2e-3);
    });
  });
});

test('backtracking on level ground and across two slopes turns as worked out', () => {
  // Lorenzo, Narvarte & Munoz 2011 (Prog. Photovolt. 19, 747) and Anderson & Mikofski 2020, in another program (Python).
  const table = BACKTRACKED_TURNS;
  const worst = new Worst();
  for (const [turn, gcr, crossAxis, expected] of table) {
    const back = backtrackTurn(turn, gcr, crossAxis);
    worst.note(back - expected, `turn ${turn}, GCR ${gcr}, cross slope ${crossAxis}`);
    expect(trackerRowShade(back, turn, gcr, crossAxis)).toBeLessThan(1e-9);
    expect(trackerRowShade(back + Math.sign(turn), turn, gcr, crossAxis)).toBeGreaterThan(0.001);
  }
  worst.print('backtracked turn, degrees');
  expect(worst.count).toBe(8);
  expect(worst.size).toBeLessThan(1e-3);
});

test('backtracking leaves no shade, lies flat as the sun sets, and never turns past the sun', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -89.99, max: 89.99, noNaN: true }),
      fc.double({ min: 0.1, max: 0.9, noNaN: true }),
      (turn, gcr) => {
        const back = backtrackTurn(turn, gcr);
        expect(trackerRowShade(back, turn, gcr)).toBeLessThan(1e-9);
        expect(Math.abs(back)).toBeLessThanOrEqual(Math.abs(turn) + 1e-12);
        expect(back * turn).toBeGreaterThanOrEqual(0);
        expect(backtrackTurn(-turn, gcr)).toBeCloseTo(-back, 9);
      },
    ),
  );
  expect(Math.abs(backtrackTurn(89.9999, 0.5))).toBeLessThan(0.01);
});

test('the plane of a whole tracker backtracks as the formula says, under its limit of swing', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1, max: 89.5, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      fc.double({ min: 0.15, max: 0.8, noNaN: true }),
      (z, a, gcr) => {
        const sun = sunAt([[z, a]]);
        const plane = pointSingleAxis(sun, axis(180, 0, 50, { gcr, lowSun: 'backtrack' }));
        const west = Math.tan(z * DEG) * Math.sin((a - 180) * DEG);
        const expected = Math.max(-50, Math.min(50, backtrackTurn(Math.atan(west) / DEG, gcr)));
        expect(acos(plane.cosTilt[0])).toBeCloseTo(Math.abs(expected), 5);
        // The limit turns it back further, never into shade.
        expect(plane.neighbours!.shaded[0]).toBeLessThan(1e-9);
      },
    ),
  );
});
