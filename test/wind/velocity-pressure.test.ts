import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Exposure, exposureCoefficient, velocityPressure, windBasis } from '../../src/wind/index.ts';

const FOOT_M = 0.3048;
const MPH_MS = 0.44704;
const PSF_PA = 47.88026;
const exposures = fc.constantFrom<Exposure>('B', 'C', 'D');
const gust = fc.double({ min: 5, max: 90, noNaN: true });
const height = fc.double({ min: 0, max: 400, noNaN: true });

/** Heights in feet and Kz by exposure, ASCE 7-16, worked out independently by script (check values, section 7.1). */
const HEIGHTS_FT = [15, 20, 30, 40, 60, 100];
const KZ: Record<Exposure, number[]> = {
  B: [0.575, 0.624, 0.701, 0.761, 0.854, 0.988],
  C: [0.849, 0.902, 0.982, 1.044, 1.137, 1.266],
  D: [1.03, 1.083, 1.162, 1.222, 1.311, 1.433],
};

test('exposure coefficients agree with the table in all three exposures, to its last digit', () => {
  let compared = 0;
  let worst = 0;
  for (const [exposure, row] of Object.entries(KZ)) {
    for (const [i, kz] of row.entries()) {
      const error = Math.abs(exposureCoefficient(exposure as Exposure, HEIGHTS_FT[i] * FOOT_M) - kz);
      worst = Math.max(worst, error);
      expect(error, `${exposure} ${HEIGHTS_FT[i]} ft`).toBeLessThanOrEqual(0.0006); // three decimals, rounded
      compared++;
    }
  }
  expect(compared).toBe(18);
  console.log(`Kz: 18 rows, worst error ${worst.toFixed(5)}`);
});

test('exposure coefficients round to the standard table at 15 and 30 ft', () => {
  // ASCE 7-16, Table 26.10-1, as printed: two decimals
  const printed: [Exposure, number, number][] = [
    ['B', 30, 0.7],
    ['C', 15, 0.85],
    ['C', 30, 0.98],
    ['D', 15, 1.03],
    ['D', 30, 1.16],
  ];
  for (const [exposure, ft, kz] of printed)
    expect(exposureCoefficient(exposure, ft * FOOT_M)).toBeCloseTo(kz, 2);
});

/**
 * Worked examples at 115 mph with Kz read off the printed table, two decimals. With the same Kz the pressure must
 * agree to the last printed digit (inch-pound figures within 0.07 %: the constants 0.613 and 0.00256 differ by
 * 0.06 %); with the unrounded Kz it may differ by as much as the rounding of Kz, up to 0.2 %.
 */
const WORKED: [Exposure, number, number, number][] = [
  ['C', 15, 0.85, 24.461],
  ['D', 30, 1.16, 33.38],
];

test('115 mph presses with 24.46 psf at 15 ft in exposure C and 33.38 psf at 30 ft in exposure D', () => {
  for (const [exposure, ft, tableKz, psf] of WORKED) {
    const { pressurePa, ...factors } = velocityPressure({
      designGustMs: 115 * MPH_MS,
      exposure,
      heightM: ft * FOOT_M,
    });
    expect(factors).toMatchObject({ kzt: 1, kd: 0.85, ke: 1 });
    expect(Math.abs((pressurePa * tableKz) / factors.kz / PSF_PA / psf - 1)).toBeLessThan(0.0007);
    expect(Math.abs(pressurePa / PSF_PA / psf - 1)).toBeLessThan(0.0027);
  }
});

test('the SI form gives 1170.5 N/m2 for 115 mph in exposure C at 15 ft', () => {
  const { pressurePa, kz } = velocityPressure({ designGustMs: 115 * MPH_MS, exposure: 'C', heightM: 4.572 });
  expect((pressurePa * 0.85) / kz).toBeCloseTo(1170.5, 1);
});

test('pressure rises with height and never falls, and grows with the square of the gust', () => {
  fc.assert(
    fc.property(exposures, gust, height, height, (exposure, designGustMs, a, b) => {
      const at = (heightM: number, v = designGustMs) =>
        velocityPressure({ designGustMs: v, exposure, heightM }).pressurePa;
      expect(at(Math.max(a, b))).toBeGreaterThanOrEqual(at(Math.min(a, b)));
      expect(at(a, 2 * designGustMs) / at(a)).toBeCloseTo(4, 9);
    }),
  );
});

test('below 15 ft the pressure is that of 15 ft', () => {
  fc.assert(
    fc.property(exposures, fc.double({ min: 0, max: 4.572, noNaN: true }), (exposure, heightM) => {
      expect(exposureCoefficient(exposure, heightM)).toBe(exposureCoefficient(exposure, 4.572));
    }),
  );
});

test('from the gradient height up the coefficient is 2.01 in every exposure', () => {
  for (const exposure of ['B', 'C', 'D'] as const)
    for (const heightM of [365.76, 400]) expect(exposureCoefficient(exposure, heightM)).toBeCloseTo(2.01, 12);
});

test('open water presses more than open ground, and that more than suburbs', () => {
  fc.assert(
    fc.property(fc.double({ min: 0, max: 200, noNaN: true }), (heightM) => {
      const [b, c, d] = (['B', 'C', 'D'] as const).map((e) => exposureCoefficient(e, heightM));
      expect(d).toBeGreaterThan(c);
      expect(c).toBeGreaterThan(b);
    }),
  );
});

test('the basis names the edition and every factor, and is null where gust or exposure is blank', () => {
  const limits = { roofProjectionM: null, heightM: null };
  expect(windBasis({ designGustMs: 51.4, exposure: 'C', limits })).toMatchObject({
    edition: 'ASCE 7-16',
    design_gust_ms: 51.4,
    exposure: 'C',
    kzt: 1,
    kd: 0.85,
    ke: 1,
    deferral: expect.stringMatching(/screening only.*code.*licensed engineer/),
  });
  expect(windBasis({ designGustMs: null, exposure: 'C', limits })).toBeNull();
  expect(windBasis({ designGustMs: 51.4, exposure: null, limits })).toBeNull();
  expect(windBasis(null)).toBeNull();
});
