import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  gradeOfTilt,
  parseSlope,
  slopeOfRiseRun,
  slopeWords,
  surveyCautions,
  tiltErrorOfGrade,
  tiltOfGrade,
  tiltOfRiseRun,
  tiltOfSlopeText,
} from '../../src/survey/index.ts';
import { Worst } from '../shared/seeded.ts';
import { codesOf, problemsOf } from './refusals.ts';

describe('a roof slope', () => {
  test('agrees with a table of rise in 12 (arithmetic: the inverse tangent)', () => {
    const table = [
      [1, 4.764],
      [2, 9.462],
      [3, 14.036],
      [4, 18.435],
      [5, 22.62],
      [6, 26.565],
      [7, 30.256],
      [8, 33.69],
      [9, 36.87],
      [10, 39.806],
      [12, 45],
    ];
    const worst = new Worst();
    for (const [rise, expected] of table)
      for (const text of [`${rise}:12`, `${rise}/12`, `${rise} in 12`, `${rise} : 12`])
        worst.note(parseSlope(text).tiltDeg - expected, text);
    worst.print('rise in 12, degrees');
    expect(worst.count).toBe(44);
    expect(worst.size).toBeLessThan(0.0005); // the table's rounding
    expect([gradeOfTilt(18.4349), gradeOfTilt(26.565), gradeOfTilt(45)].map((g) => g.toFixed(2))).toEqual([
      '33.33', '50.00', '100.00',
    ]); // biome-ignore format: one table
  });

  test('fits what installers say (common practice, no source)', () => {
    expect(parseSlope('3 in 12').tiltDeg).toBeCloseTo(14, 0);
    expect(parseSlope('2 in 12').tiltDeg).toBeCloseTo(9.5, 1);
    expect(gradeOfTilt(30) * 0.12).toBeCloseTo(7, 0);
  });

  test('is the same in every form', () => {
    const forms = [
      '6:12',
      '6/12',
      '6 in 12',
      '50 %',
      '50%',
      '1:2',
      '26.56505117707799',
      '26.56505117707799°',
    ];
    for (const text of forms) expect(parseSlope(text).tiltDeg, text).toBeCloseTo(26.565051, 5);
    expect(parseSlope(14).tiltDeg).toBe(14);
    expect(parseSlope('14 deg', 2)).toEqual({ tiltDeg: 14, errorDeg: 2 });
    fc.assert(
      fc.property(fc.double({ min: 0, max: 89, noNaN: true }), (tilt) => {
        expect(tiltOfGrade(gradeOfTilt(tilt))).toBeCloseTo(tilt, 9);
        expect(tiltOfRiseRun(gradeOfTilt(tilt), 100)).toBeCloseTo(tilt, 9);
      }),
    );
  });

  test('is echoed in all forms', () => {
    expect(slopeWords(parseSlope('6:12').tiltDeg)).toBe('6:12 = 50 % = 26.6 degrees');
    expect(slopeWords(parseSlope('3/12').tiltDeg)).toBe('3:12 = 25 % = 14 degrees');
    expect(slopeWords(0)).toBe('0:12 = 0 % = 0 degrees');
    expect(slopeWords(90)).toBe('upright, 90 degrees');
  });

  test('from rise and run does not depend on the unit', () => {
    const feet = slopeOfRiseRun({ riseM: 4 * 0.3048, runM: 12.5 * 0.3048 });
    expect(feet.tiltDeg).toBeCloseTo((Math.atan2(48, 150) * 180) / Math.PI, 9);
    expect(feet.errorDeg).toBeNull();
  });

  test('carries the errors of rise and run as small changes of each do', () => {
    // Against the finite differences of the inverse tangent itself.
    const [riseM, runM, riseErrorM, runErrorM] = [1.2, 3.8, 0.02, 0.05];
    const tilt = (rise: number, run: number) => (Math.atan(rise / run) * 180) / Math.PI;
    const byRise = (tilt(riseM + riseErrorM / 100, runM) - tilt(riseM - riseErrorM / 100, runM)) * 50;
    const byRun = (tilt(riseM, runM + runErrorM / 100) - tilt(riseM, runM - runErrorM / 100)) * 50;
    const { errorDeg } = slopeOfRiseRun({ riseM, runM, riseErrorM, runErrorM });
    expect(errorDeg).toBeCloseTo(Math.hypot(byRise, byRun), 5);
    expect(slopeOfRiseRun({ riseM, runM, riseErrorM }).errorDeg).toBeCloseTo(Math.abs(byRise), 5);
    expect(slopeOfRiseRun({ riseM, runM, runErrorM, riseErrorM: null }).errorDeg).toBeCloseTo(
      Math.abs(byRun),
      5,
    );
    expect(tiltErrorOfGrade(26.565, 2)).toBeCloseTo((tilt(0.51, 1) - tilt(0.49, 1)) / 1, 3);
  });

  test('of no run, below level, beyond upright or in words is refused', async () => {
    for (const raw of [
      '3/0',
      '3:0',
      '0/0',
      -5,
      '-5',
      91,
      '95 deg',
      'steep',
      '',
      null,
      '3:',
      '3:12:4',
      '6,5:12',
      '-3:12',
    ])
      expect(await codesOf(() => parseSlope(raw)), String(raw)).toEqual(['wrong-slope']);
    const [problem] = await problemsOf(() => parseSlope('3/0'));
    expect(problem).toMatchObject({ expected: 'a run above 0', found: '"3/0"' });
    expect(await codesOf(() => slopeOfRiseRun({ riseM: 1, runM: 0 }))).toEqual(['wrong-slope']);
    expect(await codesOf(() => slopeOfRiseRun({ riseM: -1, runM: 2 }))).toEqual(['wrong-slope']);
    expect(await codesOf(() => slopeOfRiseRun({ riseM: Number.NaN, runM: 2 }))).toEqual(['wrong-slope']);
    expect(tiltOfSlopeText('14 deg')).toBeNull();
  });
});

test('cautions go with what was surveyed', () => {
  const none = { compass: false, roof: false, riseAndRun: false, skyline: false };
  expect(surveyCautions(none)).toEqual([]);
  const all = surveyCautions({ compass: true, roof: true, riseAndRun: true, skyline: true }).join('\n');
  for (const word of [
    'fall protection',
    'iron',
    'current',
    'Metal roof',
    'Phone compass',
    'once',
    'level',
    'lowest point',
  ])
    expect(all).toContain(word);
  expect(surveyCautions({ ...none, compass: true }).join('\n')).not.toContain('Metal roof');
});
