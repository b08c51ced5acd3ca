/** Invented heights and limits; expectations by hand. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  checkLimits,
  type EdgeGeometry,
  screenWind,
  velocityPressure,
  type WindSpec,
} from '../../src/wind/index.ts';

const ground = (aboveGroundM: number | null, missing: string[] = []) => ({
  aboveGroundM,
  aboveRoofM: null,
  missing,
});
const roof = (aboveRoofM: number | null, missing: string[] = []) => ({
  aboveGroundM: 5,
  aboveRoofM,
  missing,
});
const limits = { heightM: 3, roofProjectionM: 0.254 };

test('a height within its limit is kept, and the detail gives both in metres', () => {
  expect(checkLimits('ground-rack', ground(2.35), limits)).toEqual([
    {
      name: 'height',
      bound: 'most',
      status: 'kept',
      detail: 'within: 2.35 of 3 m',
      value: 2.35,
      asked: 3,
      excess_m: expect.closeTo(-0.65, 12),
    },
  ]);
});

test('a height over its limit is broken, and the detail says by how much', () => {
  expect(checkLimits('tracker', ground(3.9), limits)).toEqual([
    {
      name: 'height',
      bound: 'most',
      status: 'broken',
      detail: 'exceeds 3 m by 0.9 m',
      value: 3.9,
      asked: 3,
      excess_m: expect.closeTo(0.9, 12),
    },
  ]);
  expect(checkLimits('tracker', ground(3.001), limits)[0].detail).toBe('exceeds 3 m by 0.001 m');
  // both lengths are printed to the centimetre, and so is what lies between them
  expect(checkLimits('tracker', ground(7.55), limits)[0].detail).toBe('exceeds 3 m by 4.55 m');
});

test('a roof array is held to its projection, not to the height of a building', () => {
  expect(checkLimits('roof', roof(0.135), limits)).toEqual([
    {
      name: 'roof projection',
      bound: 'most',
      status: 'kept',
      detail: 'within: 0.14 of 0.25 m',
      value: 0.135,
      asked: 0.254,
      excess_m: expect.closeTo(-0.119, 12),
    },
  ]);
  expect(checkLimits('roof', roof(0.3), limits)[0].status).toBe('broken');
});

test('exactly at the limit is kept, whatever the last bit of the sum says', () => {
  expect(checkLimits('roof', roof(0.1 + 0.2), { ...limits, roofProjectionM: 0.3 })[0].status).toBe('kept');
});

test('without a limit or without lengths nothing is checked, and the detail names what is lacking', () => {
  const rows: [string, ReturnType<typeof checkLimits>][] = [
    ['the study gives no wind.limits.height', checkLimits('tracker', ground(2), null)],
    [
      'the study gives no wind.limits.roof_projection',
      checkLimits('roof', roof(0.1), { ...limits, roofProjectionM: null }),
    ],
    [
      'axis_height and slant are blank',
      checkLimits('tracker', ground(null, ['axis_height', 'slant']), limits),
    ],
    ['air_behind is blank', checkLimits('roof', roof(null, ['air_behind', 'site.roof_height']), limits)],
  ];
  for (const [why, [limit]] of rows)
    expect(limit).toMatchObject({ status: 'not_checked', detail: `not checked: ${why}`, excess_m: null });
});

test('a height nearer to its limit than the reading error is neither kept nor broken', () => {
  for (const heightM of [2.96, 3, 3.04]) {
    const [limit] = checkLimits('tracker', ground(heightM), limits, 0.05);
    expect(limit.status).toBe('within_reading_error');
  }
  expect(checkLimits('tracker', ground(2.9), limits, 0.05)[0].status).toBe('kept');
  expect(checkLimits('tracker', ground(3.1), limits, 0.05)[0].status).toBe('broken');
});

test('a higher limit never breaks what a lower one keeps', () => {
  const length = fc.double({ min: 0.1, max: 9, noNaN: true });
  fc.assert(
    fc.property(length, length, length, (heightM, limitM, more) => {
      const at = (m: number) => checkLimits('tracker', ground(heightM), { ...limits, heightM: m })[0].status;
      expect(at(limitM) === 'kept' && at(limitM + more) === 'broken').toBe(false);
    }),
  );
});

const MAST: EdgeGeometry = {
  arrangement: 'tracker',
  steepestTiltDeg: 90,
  slantM: 4,
  axisHeightM: 3,
  lowerEdgeM: null,
  airBehindM: null,
  moduleThicknessM: null,
  roofHeightM: null,
};
const wind: WindSpec = { designGustMs: 51.4, exposure: 'C', limits };

test('the screen takes the pressure at the highest edge and checks the limit there', () => {
  const { wind: found, limits: checked } = screenWind(MAST, wind);
  const there = velocityPressure({ designGustMs: 51.4, exposure: 'C', heightM: 5 });
  expect(found).toEqual({
    highest_edge_m: 5,
    roof_projection_m: null,
    velocity_pressure_pa: there.pressurePa,
    kz: there.kz,
    missing: [],
  });
  expect(checked[0]).toMatchObject({ status: 'broken', detail: 'exceeds 3 m by 2 m' });
});

test('without gust, exposure or lengths there is no pressure, but a height that is known stays', () => {
  for (const blank of [null, { ...wind, designGustMs: null }, { ...wind, exposure: null }])
    expect(screenWind(MAST, blank).wind).toMatchObject({
      highest_edge_m: 5,
      velocity_pressure_pa: null,
      kz: null,
    });
  expect(screenWind({ ...MAST, slantM: null }, wind).wind).toEqual({
    highest_edge_m: null,
    roof_projection_m: null,
    velocity_pressure_pa: null,
    kz: null,
    missing: ['slant'],
  });
});
