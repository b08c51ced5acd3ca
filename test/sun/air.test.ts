import { expect, test } from 'vitest';
import { refractionDeg, relativeAirMass } from '../../src/sun/index.ts';
import { Worst } from '../shared/seeded.ts';

test('refraction agrees with NREL/TP-560-34302, eq. 42, at 1013.25 mbar and 15 degrees C', () => {
  // Worked out from the equation in another program (Python); five decimals.
  const table = [
    [0, 0.47617],
    [0.5, 0.41081],
    [1, 0.35725],
    [5, 0.15895],
    [10, 0.08885],
    [20, 0.04504],
    [45, 0.01664],
  ];
  const worst = new Worst();
  for (const [elevation, expected] of table)
    worst.note(refractionDeg(elevation) - expected, `${elevation} degrees`);
  worst.print('refraction, degrees');
  expect(worst.count).toBe(7);
  expect(worst.size).toBeLessThan(1e-5);
});

test('refraction is none once the upper edge is below the horizon, and falls with height', () => {
  expect(refractionDeg(-0.84)).toBe(0);
  expect(refractionDeg(-0.83)).toBeGreaterThan(0.5);
  for (let e = -0.8; e < 85; e += 0.2) expect(refractionDeg(e + 0.2)).toBeLessThan(refractionDeg(e));
  expect(Math.abs(refractionDeg(90))).toBeLessThan(1e-4);
});

test('air mass agrees with Kasten & Young 1989 (Applied Optics 28, 4735)', () => {
  // Worked out from their eq. 3 in another program (Python); about 38 at the horizon, as their paper says.
  const table = [
    [0, 0.9997],
    [30, 1.154],
    [45, 1.4126],
    [60, 1.9943],
    [70, 2.9031],
    [75, 3.8129],
    [80, 5.586],
    [85, 10.3058],
    [87, 15.1477],
    [88, 19.4332],
    [89, 26.3106],
    [90, 37.9196],
  ];
  const worst = new Worst();
  for (const [zenith, expected] of table) worst.note(relativeAirMass(zenith) - expected, `${zenith} degrees`);
  worst.print('air mass');
  expect(worst.count).toBe(12);
  expect(worst.size).toBeLessThan(2e-4);
});

test('air mass holds its value at the horizon below it and is never NaN', () => {
  for (const zenith of [90.5, 96, 96.08, 97, 180]) expect(relativeAirMass(zenith)).toBe(relativeAirMass(90));
});
