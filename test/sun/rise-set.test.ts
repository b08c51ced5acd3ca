import { expect, test } from 'vitest';
import { hourAngleOfElevation, sunriseSunset } from '../../src/sun/index.ts';
import { Worst } from '../shared/seeded.ts';

/**
 * Upper edge, 34' of refraction, sea level, UTC: PyEphem 4.1.4 and astronomy-engine, which agree within 1 s.
 * `near` is any time within half a day of the noon that is meant.
 */
const TABLE = [
  [40, -105, '2026-03-20T18:00Z', '2026-03-20T13:03:10Z', '2026-03-20T19:07:21Z', '2026-03-21T01:12:12Z'],
  [40, -105, '2026-06-21T18:00Z', '2026-06-21T11:31:25Z', '2026-06-21T19:01:53Z', '2026-06-22T02:32:20Z'],
  [40, -105, '2026-12-21T18:00Z', '2026-12-21T14:18:21Z', '2026-12-21T18:58:13Z', '2026-12-21T23:38:04Z'],
  [-33.87, 151.21, '2026-06-22T02:00Z', '2026-06-21T21:00:12Z', '2026-06-22T01:57:06Z', '2026-06-22T06:54:01Z'],
  [51.4779, 0, '2026-06-21T12:00Z', '2026-06-21T03:42:47Z', '2026-06-21T12:01:49Z', '2026-06-21T20:20:50Z'],
  [0, 0, '2026-03-20T12:00Z', '2026-03-20T06:04:11Z', '2026-03-20T12:07:26Z', '2026-03-20T18:10:41Z'],
  [65, 25, '2026-12-21T10:00Z', '2026-12-21T08:30:31Z', '2026-12-21T10:18:02Z', '2026-12-21T12:05:32Z'],
] as const; // biome-ignore format: a table

test('sunrise, noon and sunset of seven days agree with two ephemerides', () => {
  const worst = new Worst();
  for (const [latitude, longitude, near, rise, noon, set] of TABLE) {
    const day = sunriseSunset(Date.parse(near), latitude, longitude);
    expect(day.allDay).toBeNull();
    worst.note((day.riseUtcMs! - Date.parse(rise)) / 1000, `rise ${rise}`);
    worst.note((day.transitUtcMs - Date.parse(noon)) / 1000, `noon ${noon}`);
    worst.note((day.setUtcMs! - Date.parse(set)) / 1000, `set ${set}`);
  }
  worst.print('sunrise, noon and sunset, s');
  expect(worst.count).toBe(21);
  // The issue asks for 60 s. TT - UT held at 66 s, 0.001 degrees of sun over a slanting path (3 s at 65 north), and the
  // table's own spread of 1 s add up to this.
  expect(worst.size).toBeLessThan(6);
});

test('the worked example of NREL/TP-560-34302, table A5.1, rises at 06:12:43 and sets at 17:20:19', () => {
  // It takes the earth at 0.5667 + 0.2667 degrees: the same 50'. Its method works by days of universal time, and in
  // Colorado the evening of 16 October is the sunset of the 17th in that time: the printed one belongs to the 16th.
  const sixteenth = sunriseSunset(Date.UTC(2003, 9, 16, 19), 39.742476, -105.1786);
  const seventeenth = sunriseSunset(Date.UTC(2003, 9, 17, 19), 39.742476, -105.1786);
  expect(Math.abs(seventeenth.riseUtcMs! - Date.UTC(2003, 9, 17, 13, 12, 43))).toBeLessThan(4000);
  expect(Math.abs(sixteenth.setUtcMs! - Date.UTC(2003, 9, 17, 0, 20, 19))).toBeLessThan(4000);
});

test('at 70 degrees north the sun never sets in June and never rises in December', () => {
  const june = sunriseSunset(Date.UTC(2026, 5, 21, 10), 70, 25);
  expect([june.riseUtcMs, june.setUtcMs, june.allDay]).toEqual([null, null, 'up']);
  const december = sunriseSunset(Date.UTC(2026, 11, 21, 10), 70, 25);
  expect([december.riseUtcMs, december.setUtcMs, december.allDay]).toEqual([null, null, 'down']);
  const south = sunriseSunset(Date.UTC(2026, 11, 21, 10), -70, 25);
  expect(south.allDay).toBe('up');
});

test('the geometric sunrise is at cos w = -tan(latitude) tan(declination)', () => {
  for (const [latitude, declination] of [
    [40, 20],
    [-35, 10],
    [60, -15],
  ]) {
    const tan = (d: number) => Math.tan((d * Math.PI) / 180);
    const expected = (Math.acos(-tan(latitude) * tan(declination)) * 180) / Math.PI;
    expect(hourAngleOfElevation(latitude, declination, 0)).toBeCloseTo(expected, 9);
  }
});
