import fc from 'fast-check';
import { expect, test } from 'vitest';
import { yearlySum } from '../../src/shared/index.ts';
import { erbsDiffuseFraction, planeIrradiation, skyOverHours, splitGlobal } from '../../src/sky/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';
import { everyDay, placeAt } from '../shared/invented-sky.ts';
import { Worst } from '../shared/seeded.ts';

test('the diffuse share agrees with Erbs, Klein & Duffie 1982 at ten clearnesses', () => {
  // Worked out from their eq. 1 in another program (Python); 0.4454 is Duffie & Beckman's example 2.15.1 (0.766).
  const table = [
    [0.1, 0.991],
    [0.22, 0.9802],
    [0.3, 0.9486],
    [0.4, 0.84],
    [0.4454, 0.7655],
    [0.5, 0.6591],
    [0.6, 0.4395],
    [0.7, 0.244],
    [0.75, 0.1831],
    [0.8, 0.1653],
    [0.85, 0.165],
  ];
  const worst = new Worst();
  for (const [clearness, expected] of table)
    worst.note(erbsDiffuseFraction(clearness) - expected, `clearness ${clearness}`);
  worst.print('Erbs diffuse share');
  expect(worst.count).toBe(11);
  expect(worst.size).toBeLessThan(1.2e-4); // four decimals are printed
});

test('the diffuse share steps by under 0.001 where its pieces meet', () => {
  for (const edge of [0.22, 0.8])
    expect(Math.abs(erbsDiffuseFraction(edge + 1e-9) - erbsDiffuseFraction(edge - 1e-9))).toBeLessThan(1e-3);
});

test('splitting conserves the light, invents no negative and no beam above that outside the air', () => {
  const sun = sunOverHours(placeAt(50), everyDay(2020));
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 1.6, noNaN: true }),
      fc.integer({ min: 0, max: 8759 }),
      (share, from) => {
        const ghi = sun.cosZenith.map((c, h) =>
          h >= from && h < from + 24 ? share * c * sun.sunlit[h] * sun.extraterrestrialWm2[h] : 0,
        );
        const { dni, dhi } = splitGlobal(ghi, sun);
        for (let h = from; h < Math.min(8760, from + 24); h++) {
          const again = dni[h] * sun.cosZenith[h] + dhi[h];
          expect(Math.abs(again - ghi[h])).toBeLessThan(1e-9);
          expect(dni[h]).toBeGreaterThanOrEqual(0);
          expect(dhi[h]).toBeGreaterThanOrEqual(0);
          expect(dni[h]).toBeLessThanOrEqual(sun.extraterrestrialWm2[h] * sun.sunlit[h]);
          if (sun.cosZenith[h] < Math.cos((87 * Math.PI) / 180)) expect(dni[h]).toBe(0);
        }
      },
    ),
    { numRuns: 60 },
  );
});

test('split light put back on a level plane is the global light again, sunrise and sunset hours included', () => {
  const sun = sunOverHours(placeAt(50), everyDay(2020));
  for (const share of [0.15, 0.5, 0.72]) {
    const ghi = sun.cosZenith.map((c, h) => share * c * sun.sunlit[h] * sun.extraterrestrialWm2[h]);
    const sky = skyOverHours(sun, { ghi, ...splitGlobal(ghi, sun) }, 0.2, 'isotropic');
    expect(planeIrradiation(sun, sky, 0, 180) / (yearlySum(ghi) / 1000)).toBeCloseTo(1, 12);
  }
});

test('light in an hour without sun is not split', () => {
  const sun = sunOverHours(placeAt(50), everyDay(2020));
  const { dni, dhi } = splitGlobal(new Float64Array(8760).fill(100), sun);
  expect([dni[0], dhi[0]]).toEqual([0, 0]);
  expect(dhi[12]).toBeGreaterThan(0);
});
