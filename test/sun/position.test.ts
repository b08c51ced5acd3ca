import { Body, Equator, Horizon, Observer } from 'astronomy-engine';
import { describe, expect, test } from 'vitest';
import { julianDay, solarEphemeris, sunPosition } from '../../src/sun/index.ts';
import { referenceTable } from '../reference/table.ts';
import { seeded, Worst } from '../shared/seeded.ts';

const sin = (deg: number) => Math.sin((deg * Math.PI) / 180);
/** Shortest way between two azimuths, degrees. */
const turn = (a: number, b: number) => ((((a - b) % 360) + 540) % 360) - 180;

/**
 * The algorithm leaves out the small VSOP87 terms, the earth's latitude (0.0003 degrees) and the drift of TT - UT
 * (0.0003 degrees): 0.002 holds all of them. The issue asks for 0.02.
 */
const TOLERANCE_DEG = 0.002;
/** The table prints three decimals. */
const ROUNDING_DEG = 0.0005;

describe('against the worked example of Reda & Andreas, NREL/TP-560-34302 (2008), table A5.1', () => {
  const utcMs = Date.UTC(2003, 9, 17, 19, 30, 30);
  const sun = sunPosition(utcMs, 39.742476, -105.1786);

  test('the day count, declination, right ascension and distance agree', () => {
    expect(julianDay(utcMs)).toBeCloseTo(2452930.312847, 6);
    const geocentric = solarEphemeris(julianDay(utcMs));
    expect(Math.abs(geocentric.declinationDeg - -9.31434)).toBeLessThan(TOLERANCE_DEG);
    expect(Math.abs(turn(geocentric.rightAscensionDeg, 202.227408))).toBeLessThan(TOLERANCE_DEG);
    expect(Math.abs(turn(geocentric.siderealDeg, 318.51191))).toBeLessThan(TOLERANCE_DEG);
    expect(Math.abs(geocentric.distanceAu - 0.9965422974)).toBeLessThan(2e-5);
    expect(Math.abs(sun.hourAngleDeg - 11.105902)).toBeLessThan(TOLERANCE_DEG);
  });

  test('azimuth, zenith and the incidence on a plane of 30 degrees facing 170 degrees agree', () => {
    // Elevation before refraction 39.872046; the example's refraction is for 820 mbar and 11 degrees C.
    expect(Math.abs(sun.zenithDeg - (90 - 39.872046))).toBeLessThan(TOLERANCE_DEG);
    expect(Math.abs(sun.azimuthDeg - 194.340241)).toBeLessThan(TOLERANCE_DEG);
    const zenith = 90 - 39.888378;
    const cosIncidence =
      sin(90 - zenith) * sin(60) + sin(zenith) * sin(30) * sin(90 - (sun.azimuthDeg - 170));
    expect(Math.abs((Math.acos(cosIncidence) * 180) / Math.PI - 25.187)).toBeLessThan(TOLERANCE_DEG);
  });
});

test('28 instants from 1990 to 2035 agree with the sun of two professional ephemerides', () => {
  // test/reference/sun-positions.csv: ERFA (the open form of the IAU's SOFA), agreed with by PyEphem to 0.0003 degrees.
  const rows = referenceTable('sun-positions.csv');
  const [zenith, azimuth, apparent, declination, distance] = Array.from({ length: 5 }, () => new Worst());
  for (const row of rows) {
    const sun = sunPosition(Date.parse(row.utc), Number(row.latitude_deg), Number(row.longitude_deg));
    zenith.note(sun.zenithDeg - Number(row.zenith_deg), row.utc);
    azimuth.note(turn(sun.azimuthDeg, Number(row.azimuth_deg)) * sin(sun.zenithDeg), row.utc);
    if (row.refracted_zenith_deg)
      apparent.note(sun.apparentZenithDeg - Number(row.refracted_zenith_deg), row.utc);
    declination.note(sun.declinationDeg - Number(row.declination_deg), row.utc);
    distance.note(sun.distanceAu - Number(row.distance_au), row.utc);
  }
  zenith.print('28 rows, zenith, degrees');
  azimuth.print('28 rows, azimuth times sin z, degrees');
  apparent.print('28 rows, refracted zenith, degrees');
  expect(rows.length).toBe(28);
  expect(zenith.count).toBe(28);
  expect(apparent.count).toBe(26); // two rows have the sun below the horizon
  for (const worst of [zenith, azimuth, apparent, declination])
    expect(worst.size).toBeLessThan(TOLERANCE_DEG + ROUNDING_DEG);
  expect(distance.size).toBeLessThan(6e-5); // 0.012 % of irradiance: the moon's pull on the earth is left out
});

test('4,000 seeded instants at all latitudes from 1990 to 2050 agree with astronomy-engine within 0.002 degrees', () => {
  const random = seeded(20);
  const [zenith, azimuth] = [new Worst(), new Worst()];
  for (let i = 0; i < 4000; i++) {
    const latitude = (Math.asin(2 * random() - 1) * 180) / Math.PI;
    const longitude = 360 * random() - 180;
    const utcMs = Date.UTC(1990, 0, 1) + random() * (Date.UTC(2051, 0, 1) - Date.UTC(1990, 0, 1));
    const observer = new Observer(latitude, longitude, 0);
    const time = new Date(utcMs);
    const { ra, dec } = Equator(Body.Sun, time, observer, true, true);
    const theirs = Horizon(time, observer, ra, dec);
    const ours = sunPosition(time.getTime(), latitude, longitude);
    const where = `${time.toISOString()} at ${latitude.toFixed(1)}, ${longitude.toFixed(1)}`;
    zenith.note(ours.zenithDeg - (90 - theirs.altitude), where);
    azimuth.note(turn(ours.azimuthDeg, theirs.azimuth) * sin(ours.zenithDeg), where);
  }
  zenith.print('against astronomy-engine, zenith, degrees');
  azimuth.print('against astronomy-engine, azimuth times sin z, degrees');
  expect(zenith.count).toBe(4000);
  expect(zenith.size).toBeLessThan(TOLERANCE_DEG);
  expect(azimuth.size).toBeLessThan(TOLERANCE_DEG);
});

test('the sun of 22 degrees north in June stands overhead without loss of digits', () => {
  // Near the zenith an arccosine would keep half the digits: move 0.001 degrees and see 0.001 degrees.
  const utcMs = Date.UTC(2026, 5, 21, 12, 1, 49);
  const overhead = sunPosition(utcMs, 0, 0);
  const declination = overhead.declinationDeg;
  const longitude = -overhead.hourAngleDeg;
  const zeniths = [0, 0.001, 0.002].map((d) => sunPosition(utcMs, declination + d, longitude).zenithDeg);
  expect(zeniths[0]).toBeLessThan(1e-5);
  expect(zeniths[1]).toBeCloseTo(0.001, 6);
  expect(zeniths[2]).toBeCloseTo(0.002, 6);
});

test('azimuth turns clockwise from north: east in the morning, west in the afternoon, in both hemispheres', () => {
  for (const latitude of [-60, -35, 35, 60]) {
    const noon = Date.UTC(2026, 2, 20, 12, 7, 0);
    const morning = sunPosition(noon - 4 * 3_600_000, latitude, 0);
    const evening = sunPosition(noon + 4 * 3_600_000, latitude, 0);
    expect(morning.azimuthDeg).toBeLessThan(180);
    expect(evening.azimuthDeg).toBeGreaterThan(180);
    expect(morning.hourAngleDeg).toBeLessThan(0);
    const midday = sunPosition(noon, latitude, 0);
    expect(Math.abs(turn(midday.azimuthDeg, latitude > 0 ? 180 : 0))).toBeLessThan(1);
  }
});
