import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { wrap180, wrap360 } from '../../src/shared/index.ts';
import {
  type BearingReading,
  declinationMistakes,
  facingOf,
  facingWords,
  magneticFromTrue,
  meanReading,
  parseBearing,
  parseDownslope,
  planeAzimuth,
  sumToMagnetic,
  sumToTrue,
  type Taken,
  trueFromMagnetic,
} from '../../src/survey/index.ts';
import { codesOf, problemsOf } from './refusals.ts';

const bearings = fc.double({ min: 0, max: 360, noNaN: true });
const declinations = fc.double({ min: -180, max: 180, noNaN: true });
/** Degrees apart on the circle. */
const apart = (a: number, b: number) => Math.abs(wrap180(a - b));

describe('magnetic and true', () => {
  test('fit the cases that surveyors are taught (common practice, no source)', () => {
    expect(trueFromMagnetic(150, 16)).toBe(166);
    expect(magneticFromTrue(180, 17.5)).toBe(162.5);
    expect(trueFromMagnetic(135, -13)).toBe(122);
    expect(magneticFromTrue(180, -7)).toBe(187);
  });

  test('there and back is the identity, on the circle', () => {
    fc.assert(
      fc.property(bearings, declinations, (bearing, declination) => {
        const there = trueFromMagnetic(bearing, declination);
        expect(there).toBeGreaterThanOrEqual(0);
        expect(there).toBeLessThan(360);
        expect(apart(magneticFromTrue(there, declination), bearing)).toBeLessThan(1e-9);
      }),
    );
  });

  test('wrap at north', () => {
    expect(trueFromMagnetic(350, 16)).toBe(6);
    expect(trueFromMagnetic(5, -13)).toBe(352);
    expect(trueFromMagnetic(344, 16)).toBe(0);
    expect(trueFromMagnetic(360, 0)).toBe(0);
  });

  test('the sum is written out, wraps included', () => {
    expect(sumToTrue(150, 16)).toBe('150 + 16 E = 166 true');
    expect(sumToTrue(135, -13)).toBe('135 - 13 W = 122 true');
    expect(sumToTrue(350, 16)).toBe('350 + 16 E = 366 = 6 true');
    expect(sumToTrue(5, -13)).toBe('5 - 13 W = -8 = 352 true');
    expect(sumToMagnetic(180, 17.5)).toBe('180 true - 17.5 E = 162.5 magnetic');
    expect(sumToMagnetic(180, -7)).toBe('180 true + 7 W = 187 magnetic');
    expect(sumToTrue(150, 0)).toBe('150 + 0 E = 150 true');
    expect(sumToTrue(150, -0.001)).toBe('150 + 0 E = 150 true');
  });

  test('what the sum prints adds up, and is the bearing to a hundredth', () => {
    fc.assert(
      fc.property(bearings, declinations, (bearing, declination) => {
        const parts = /^(\S+) ([+-]) (\S+) [EW] = (\S+)(?: = (\S+))? true$/.exec(
          sumToTrue(bearing, declination),
        );
        if (!parts) return expect.fail('no sum');
        const [a, b, sum, wrapped] = [parts[1], `${parts[2]}${parts[3]}`, parts[4], parts[5] ?? parts[4]].map(
          Number,
        );
        expect(a + b).toBeCloseTo(sum, 6);
        expect(apart(sum, wrapped)).toBeLessThan(1e-6);
        expect(apart(wrapped, trueFromMagnetic(bearing, declination))).toBeLessThan(0.0101);
      }),
    );
  });

  test('declination forgotten is off by once, reversed by twice its size', () => {
    const mistakes = declinationMistakes(trueFromMagnetic(150, 16), 16);
    expect(mistakes).toEqual({ forgottenDeg: 150, reversedDeg: 134 });
    expect(declinationMistakes(6, 16)).toEqual({ forgottenDeg: 350, reversedDeg: 334 });
  });

  test('a bearing is 0 to 360 degrees and nothing else', async () => {
    expect([parseBearing(150), parseBearing('150'), parseBearing('150.5°'), parseBearing('0 deg')]).toEqual([
      150, 150, 150.5, 0,
    ]);
    for (const raw of [400, '400', -5, '-5', '360.1', 'south', '', null, Number.NaN, '150 W', '1e2'])
      expect(await codesOf(() => parseBearing(raw)), String(raw)).toEqual(['wrong-bearing']);
  });
});

describe('the way a plane faces', () => {
  const facing = (bearingDeg: number, taken: Taken, downslope: string | null = null) =>
    facingOf({ bearingDeg, taken, downslope: downslope === null ? null : parseDownslope(downslope) });

  test('follows from how the bearing was taken', () => {
    expect(facing(166, 'facing')).toBe(166);
    expect(facing(346, 'looking_at')).toBe(166);
    expect(facing(76, 'along_ridge', 'right')).toBe(166);
    expect(facing(256, 'along_ridge', 'left')).toBe(166);
    expect(facing(76, 'along_ridge', 'south')).toBe(166);
    expect(facing(256, 'along_ridge', 'South East')).toBe(166);
    expect(facing(76, 'along_ridge', 'NNW')).toBe(346);
    expect(facingWords(166)).toBe('faces south-south-east');
  });

  test('of a ridge is the same from either end', () => {
    fc.assert(
      fc.property(bearings, (bearing) => {
        const right = facing(bearing, 'along_ridge', 'right');
        expect(apart(right, facing(wrap360(bearing + 180), 'along_ridge', 'left'))).toBeLessThan(1e-9);
        expect(apart(right, facing(bearing, 'along_ridge', 'left'))).toBeCloseTo(180, 9);
      }),
    );
  });

  test('of a ridge without its downslope side is refused, and both facings are named', async () => {
    const [problem] = await problemsOf(() => facing(76, 'along_ridge'));
    expect(problem.code).toBe('ambiguous-facing');
    expect(problem.expected).toContain('left, and it faces 346 (north-north-west)');
    expect(problem.expected).toContain('right, and it faces 166 (south-south-east)');
    expect(await codesOf(() => facing(90, 'along_ridge', 'east'))).toEqual(['ambiguous-facing']);
    expect(await codesOf(() => facing(76, 'along_ridge', 'west'))).toEqual(['ambiguous-facing']);
  });

  test('must not contradict the downslope, and left or right need a ridge', async () => {
    expect(facing(166, 'facing', 'south')).toBe(166);
    expect(await codesOf(() => facing(166, 'facing', 'north'))).toEqual(['wrong-downslope']);
    expect(await codesOf(() => facing(166, 'looking_at', 'south'))).toEqual(['wrong-downslope']);
    expect(await codesOf(() => facing(166, 'facing', 'left'))).toEqual(['wrong-downslope']);
    for (const raw of ['down', '', 12, null, 'southish'])
      expect(await codesOf(() => parseDownslope(raw))).toEqual(['wrong-downslope']);
  });
});

describe('two readings of one line', () => {
  test('are averaged across north', () => {
    expect(meanReading(358, 182)).toMatchObject({ bearingDeg: 0, disagreementDeg: 4, leastErrorDeg: 2 });
    expect(meanReading(1, 179).bearingDeg).toBe(0);
    expect(meanReading(90, 271)).toMatchObject({ bearingDeg: 90.5, disagreementDeg: 1, findings: [] });
  });

  test('warn of local iron where they miss 180 by over 2 degrees (common practice, no source)', () => {
    expect(meanReading(90, 272).findings).toEqual([]);
    expect(meanReading(90.1, 272.1).findings).toEqual([]);
    const [finding] = meanReading(90, 272.5).findings;
    expect(finding).toMatchObject({ code: 'bearings-disagree', severity: 'warning' });
    expect(finding.text).toContain('local iron');
    expect(finding.fix).toContain('map');
  });

  test('give the same line from either end, and an error of at least half of what they miss', () => {
    const offsets = fc.double({ min: -89, max: 89, noNaN: true });
    fc.assert(
      fc.property(bearings, offsets, (forward, offset) => {
        const back = wrap360(forward + 180 + offset);
        const mean = meanReading(forward, back);
        expect(apart(mean.bearingDeg, forward)).toBeCloseTo(Math.abs(offset) / 2, 6);
        expect(apart(mean.bearingDeg, wrap360(back + 180))).toBeCloseTo(Math.abs(offset) / 2, 6);
        expect(apart(meanReading(back, forward).bearingDeg, mean.bearingDeg)).toBeCloseTo(180, 6);
        expect(mean.leastErrorDeg).toBeCloseTo(Math.abs(offset) / 2, 6);
      }),
    );
  });

  test('taken the same way are refused', async () => {
    expect(await codesOf(() => meanReading(150, 151))).toEqual(['not-a-back-bearing']);
    expect(await codesOf(() => meanReading(0, 0))).toEqual(['not-a-back-bearing']);
  });
});

describe('from readings to a plane', () => {
  const magnetic: BearingReading = { north: 'magnetic', bearingDeg: 150, taken: 'facing' };

  test('a facing bearing takes the declination once and says so', () => {
    const plane = planeAzimuth({ ...magnetic, errorDeg: 5 }, 16);
    expect(plane).toMatchObject({
      azimuthDeg: 166,
      errorDeg: 5,
      words: 'faces south-south-east',
      findings: [],
    });
    expect(plane.steps[0]).toBe('150 + 16 E = 166 true');
    expect(plane.mistakes).toEqual({ forgottenDeg: 150, reversedDeg: 134 });
  });

  test('a true bearing takes none, even where one is known', () => {
    const plane = planeAzimuth({ ...magnetic, north: 'true' }, 16);
    expect(plane).toMatchObject({ azimuthDeg: 150, errorDeg: null, mistakes: null });
    expect(plane.steps[0]).toBe('150 true as read');
  });

  test('a ridge read twice is averaged, corrected and turned, with half the disagreement as its least error', () => {
    const ridge: BearingReading = {
      ...magnetic,
      bearingDeg: 59,
      backDeg: 241,
      taken: 'along_ridge',
      downslope: 'right',
      errorDeg: 0.5,
    };
    const plane = planeAzimuth(ridge, 16);
    expect(plane).toMatchObject({ azimuthDeg: 166, errorDeg: 1, words: 'faces south-south-east' });
    expect(plane.steps).toEqual([
      'forward 59 and back 241: mean 60, 2 degrees from opposite',
      '60 + 16 E = 76 true',
      'taken along the ridge or eave, so turned by 90 to the downslope side: 166 true, faces south-south-east',
    ]);
    expect(plane.mistakes).toEqual({ forgottenDeg: 150, reversedDeg: 134 });
    expect(planeAzimuth({ ...ridge, errorDeg: null }, 16).errorDeg).toBe(1);
  });

  test('a magnetic bearing without declination is refused', async () => {
    expect(await codesOf(() => planeAzimuth(magnetic, null))).toEqual(['missing-declination']);
  });
});
