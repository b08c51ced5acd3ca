import { expect, test } from 'vitest';
import { extraterrestrialNormalWm2, SOLAR_CONSTANT_WM2, sunOverHours } from '../../src/sun/index.ts';
import { Worst } from '../shared/seeded.ts';

const DEG = Math.PI / 180;

/** Extraterrestrial light on level ground over a year, kWh/m2, from the samples. */
const yearAboveTheAir = (latitudeDeg: number): number => {
  const place = { latitudeDeg, longitudeDeg: 0, elevationM: 0, utcOffsetH: 0 };
  const sun = sunOverHours(place, new Array<number>(365).fill(2026));
  let sum = 0;
  for (let h = 0; h < 8760; h++) sum += sun.extraterrestrialWm2[h] * sun.cosZenith[h] * sun.sunlit[h];
  return sum / 1000;
};

test('the solar constant lies between Kopp & Lean 2011 (1360.8) and Gueymard 2018 (1361.1)', () => {
  expect(SOLAR_CONSTANT_WM2).toBeGreaterThan(1360.8);
  expect(SOLAR_CONSTANT_WM2).toBeLessThan(1361.1);
});

test('irradiance above the air falls with the square of the distance: +3.4 % in January, -3.3 % in July', () => {
  expect(extraterrestrialNormalWm2(2)).toBeCloseTo(1361 / 4, 9);
  const sun = sunOverHours(
    { latitudeDeg: 0, longitudeDeg: 0, elevationM: 0, utcOffsetH: 0 },
    new Array<number>(365).fill(2026),
  );
  // Perihelion 0.98330 au on 3 January 2026, aphelion 1.01664 au on 6 July (almanac values, from memory).
  expect(sun.extraterrestrialWm2[2 * 24 + 12]).toBeCloseTo(1361 / 0.9833 ** 2, 0);
  expect(sun.extraterrestrialWm2[186 * 24 + 12]).toBeCloseTo(1361 / 1.01664 ** 2, 0);
});

/**
 * The same from the law of areas alone: time spent at a longitude goes with r^2 and light with 1/r^2, so the distance
 * drops out and the yearly mean is the mean over the longitudes of the sun, over sqrt(1 - e^2).
 */
const yearByLawOfAreas = (latitudeDeg: number): number => {
  const [latitude, obliquity, eccentricity] = [latitudeDeg * DEG, 23.436 * DEG, 0.0167];
  let mean = 0;
  const steps = 3600;
  for (let i = 0; i < steps; i++) {
    const declination = Math.asin(Math.sin(obliquity) * Math.sin((2 * Math.PI * (i + 0.5)) / steps));
    const cosHalf = -Math.tan(latitude) * Math.tan(declination);
    const half = Math.acos(Math.max(-1, Math.min(1, cosHalf)));
    mean +=
      (Math.cos(latitude) * Math.cos(declination) * Math.sin(half) +
        half * Math.sin(latitude) * Math.sin(declination)) /
      Math.PI /
      steps;
  }
  return (365 * 24 * 1.361 * mean) / Math.sqrt(1 - eccentricity ** 2);
};

test('yearly sums on level ground follow from the law of areas at every latitude, north and south', () => {
  const worst = new Worst();
  for (let latitude = -90; latitude <= 90; latitude += 15)
    worst.note(yearAboveTheAir(latitude) / yearByLawOfAreas(latitude) - 1, `latitude ${latitude}`);
  worst.print('yearly extraterrestrial sum against the law of areas, relative');
  expect(worst.count).toBe(13);
  // 365 days leave out 0.24 days at the turn of the year, in the southern summer: 0.15 % at the south pole.
  expect(worst.size).toBeLessThan(0.0016);
});

test('yearly sums on level ground agree with the closed daily form of the textbooks as far as that can be', () => {
  // Duffie & Beckman, eq. 1.10.3, summed over 365 days with Cooper's declination and 1 + 0.033 cos(360 n / 365),
  // worked out in another program (Python), kWh/m2.
  const table = [
    [0, 3637.74],
    [20, 3425.34],
    [35, 3023.25],
    [40, 2850.11],
    [50, 2459.54],
    [65, 1840.76],
    [-35, 3067.76],
  ];
  const worst = new Worst();
  for (const [latitude, expected] of table)
    worst.note(yearAboveTheAir(latitude) / expected - 1, `latitude ${latitude}`);
  worst.print('yearly extraterrestrial sum against the textbook form, relative');
  expect(worst.count).toBe(7);
  // Cooper's seasons are of equal length; the true northern summer is 7.6 days longer than the southern and makes up
  // for the greater distance. So the form is low in the north and high in the south (by up to 1.8 % at 65 degrees).
  expect(worst.size).toBeLessThan(0.02);
  // That difference has opposite signs in the two hemispheres and leaves the mean of the two.
  const both = (yearAboveTheAir(35) + yearAboveTheAir(-35)) / (3023.25 + 3067.76) - 1;
  console.log(`mean of 35 north and 35 south: ${both.toExponential(2)}`);
  expect(Math.abs(both)).toBeLessThan(0.001);
});
