/** Geometry by hand arithmetic; lengths invented. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  type EdgeGeometry,
  highestEdge,
  steepestChordAboveSlopeDeg,
  steepestChordTiltDeg,
} from '../../src/wind/index.ts';

const BLANK: Omit<EdgeGeometry, 'arrangement' | 'steepestTiltDeg'> = {
  slantM: null,
  axisHeightM: null,
  lowerEdgeM: null,
  airBehindM: null,
  moduleThicknessM: null,
  roofHeightM: null,
};

test('a rack reaches lower edge plus the rise of its slant', () => {
  const rack = {
    ...BLANK,
    arrangement: 'ground-rack',
    steepestTiltDeg: 30,
    slantM: 3.5,
    lowerEdgeM: 0.6,
  } as const;
  expect(highestEdge(rack)).toEqual({
    aboveGroundM: expect.closeTo(0.6 + 1.75, 12),
    aboveRoofM: null,
    missing: [],
  });
});

test('a single-axis tracker reaches axis height plus half its chord at full swing', () => {
  const tracker = { ...BLANK, arrangement: 'tracker', slantM: 4, axisHeightM: 1.5 } as const;
  const level = steepestChordTiltDeg(60, 0);
  expect(level).toBeCloseTo(60, 9);
  expect(highestEdge({ ...tracker, steepestTiltDeg: level }).aboveGroundM).toBeCloseTo(1.5 + Math.sqrt(3), 9);
  // axis tilted 60 degrees: the chord's vertical part is halved, sin 30 = cos 60 sin 90
  expect(steepestChordTiltDeg(90, 60)).toBeCloseTo(30, 9);
});

test('on a slope across the axis the edge that stands out downhill is higher above its ground', () => {
  // Half a chord of 2 at 50 degrees rises 2 sin 50 over the axis while the ground falls 2 cos 50 tan 10 below it.
  const DEG = Math.PI / 180;
  const rise = 2 * Math.sin(50 * DEG) + 2 * Math.cos(50 * DEG) * Math.tan(10 * DEG);
  for (const cross of [10, -10]) {
    const steepestTiltDeg = steepestChordAboveSlopeDeg(50, cross, 10);
    const tracker = {
      ...BLANK,
      arrangement: 'tracker',
      slantM: 4,
      axisHeightM: 1.5,
      steepestTiltDeg,
    } as const;
    expect(highestEdge(tracker).aboveGroundM).toBeCloseTo(1.5 + rise, 9);
  }
  expect(steepestChordAboveSlopeDeg(60, 0, 0)).toBeCloseTo(60, 9);
});

test('a dual-axis mast reaches axis height plus half its chord', () => {
  const mast = {
    ...BLANK,
    arrangement: 'tracker',
    steepestTiltDeg: 90,
    slantM: 4,
    axisHeightM: 1.9,
  } as const;
  expect(highestEdge(mast).aboveGroundM).toBeCloseTo(3.9, 12);
});

test('a parallel roof array projects by its gap and its thickness, and needs no slant', () => {
  const roof = {
    ...BLANK,
    arrangement: 'roof',
    steepestTiltDeg: 0,
    airBehindM: 0.1,
    moduleThicknessM: 0.035,
    roofHeightM: 5,
  } as const;
  expect(highestEdge(roof)).toEqual({
    aboveGroundM: expect.closeTo(5.135, 12),
    aboveRoofM: expect.closeTo(0.135, 12),
    missing: [],
  });
  const raised = highestEdge({ ...roof, steepestTiltDeg: 30, slantM: 1.8 });
  expect(raised.aboveRoofM).toBeCloseTo(0.135 + 0.9, 12);
});

test('what is blank leaves the height unknown and is named by its key', () => {
  const rows: [EdgeGeometry['arrangement'], number, string[]][] = [
    ['ground-rack', 30, ['lower_edge', 'slant']],
    ['tracker', 60, ['axis_height', 'slant']],
    ['roof', 0, ['air_behind', 'array.module.thickness', 'site.roof_height']],
    ['roof', 10, ['air_behind', 'array.module.thickness', 'slant', 'site.roof_height']],
  ];
  for (const [arrangement, steepestTiltDeg, missing] of rows)
    expect(highestEdge({ ...BLANK, arrangement, steepestTiltDeg })).toEqual({
      aboveGroundM: null,
      aboveRoofM: null,
      missing,
    });
  const half = highestEdge({ ...BLANK, arrangement: 'tracker', steepestTiltDeg: 60, axisHeightM: 1.5 });
  expect(half).toEqual({ aboveGroundM: null, aboveRoofM: null, missing: ['slant'] });
});

test('the highest edge rises with every length and with the angle', () => {
  const length = fc.double({ min: 0.1, max: 10, noNaN: true });
  const angle = fc.double({ min: 0, max: 89, noNaN: true });
  const kind = fc.constantFrom('ground-rack', 'tracker', 'roof');
  fc.assert(
    fc.property(kind, angle, length, length, length, (arrangement, tilt, slant, base, more) => {
      const at = (tiltDeg: number, slantM: number, baseM: number) =>
        highestEdge({
          arrangement: arrangement as EdgeGeometry['arrangement'],
          steepestTiltDeg: tiltDeg,
          slantM,
          axisHeightM: baseM,
          lowerEdgeM: baseM,
          airBehindM: baseM,
          moduleThicknessM: 0.04,
          roofHeightM: 4,
        }).aboveGroundM ?? Number.NaN;
      const here = at(tilt, slant, base);
      expect(at(tilt + 1, slant, base)).toBeGreaterThan(here);
      expect(at(tilt, slant + more, base)).toBeGreaterThanOrEqual(here);
      expect(at(tilt, slant, base + more)).toBeCloseTo(here + more, 9);
    }),
  );
});

test('a single-axis chord is never steeper than its swing, and as steep where the axis is level', () => {
  const angle = fc.double({ min: 0, max: 90, noNaN: true });
  fc.assert(
    fc.property(angle, angle, (swing, axisTilt) => {
      expect(steepestChordTiltDeg(swing, axisTilt)).toBeLessThanOrEqual(swing + 1e-5);
      expect(steepestChordTiltDeg(swing, 0)).toBeCloseTo(swing, 5);
    }),
  );
});
